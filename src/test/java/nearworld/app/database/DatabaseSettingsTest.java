package nearworld.app.database;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import org.junit.jupiter.api.Test;

class DatabaseSettingsTest {
    @Test
    void withoutAnAddressTheServerIsEmbedded() {
        assertThat(new DatabaseSettings("", "", "", "", "").external()).isEmpty();
        assertThat(new DatabaseSettings(null, null, null, null, null).external())
                .isEmpty();
    }

    @Test
    void anAddressAndBothLoginsMakeAnExternalServer() {
        Database database = new DatabaseSettings("jdbc:postgresql://db/nearworld", "o", "op", "a", "ap")
                .external()
                .orElseThrow();
        assertThat(database.kind()).isEqualTo(DatabaseKind.EXTERNAL);
        assertThat(database.owner()).isEqualTo(new Login("o", "op"));
        assertThat(database.application()).isEqualTo(new Login("a", "ap"));
    }

    @Test
    void aMissingCompanionIsNamed() {
        assertThatThrownBy(() -> new DatabaseSettings("jdbc:postgresql://db/nearworld", "o", "op", "a", " ").external())
                .hasMessageContaining("NEARWORLD_DATABASE_APP_PASSWORD must be set");
    }

    @Test
    void anotherKindOfAddressIsRefusedWithItsValue() {
        assertThatThrownBy(() -> new DatabaseSettings("postgres://db/nearworld", "o", "op", "a", "ap").external())
                .hasMessageContaining("must start with jdbc:postgresql:, was \"postgres://db/nearworld\"");
    }

    @Test
    void aPrintedLoginShowsNoPassword() {
        assertThat(new Login("someone", "secret").toString()).doesNotContain("secret");
    }
}
