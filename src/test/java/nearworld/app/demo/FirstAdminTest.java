package nearworld.app.demo;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.mockito.ArgumentMatchers.any;
import static org.mockito.ArgumentMatchers.argThat;
import static org.mockito.ArgumentMatchers.eq;
import static org.mockito.Mockito.mock;
import static org.mockito.Mockito.never;
import static org.mockito.Mockito.verify;
import static org.mockito.Mockito.when;

import nearworld.app.people.People;
import nearworld.app.people.Role;
import org.junit.jupiter.api.Test;

/** A production start on an empty database. */
class FirstAdminTest {
    private final People people = mock(People.class);

    @Test
    void withoutANameTheStartIsRefusedAndSaysHowToNameOne() {
        when(people.isEmpty()).thenReturn(true);
        assertThatThrownBy(() -> new FirstAdmin(people, "", " ").ensure())
                .isInstanceOfSatisfying(
                        FirstAdminMissingException.class,
                        e -> assertThat(new FirstAdminMissingAnalyzer()
                                        .analyze(e)
                                        .getAction())
                                .contains("--first-admin=NAME", "NEARWORLD_FIRST_ADMIN=NAME", "NEARWORLD_DEMO=true"));
        verify(people, never()).add(any(), any(), any(), any(), any());
    }

    @Test
    void theOneNamedOnTheCommandLineIsAddedWithARandomPassword() {
        when(people.isEmpty()).thenReturn(true);
        new FirstAdmin(people, "root.admin", "from.setting").ensure();
        verify(people)
                .add(
                        eq("root.admin"),
                        eq("root.admin"),
                        eq(Role.ADMIN),
                        argThat(password -> password.matches("[a-z2-9]{5}(-[a-z2-9]{5}){3}")),
                        eq("system"));
    }

    @Test
    void whereThereIsSomebodyNothingIsAdded() {
        new FirstAdmin(people, "root.admin", "").ensure();
        verify(people, never()).add(any(), any(), any(), any(), any());
    }
}
