package nearworld.app.keys;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.PosixFilePermissions;
import java.security.GeneralSecurityException;
import java.util.UUID;
import nearworld.app.installation.DataFolder;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class MasterKeyTest {
    private static final UUID ID = UUID.fromString("8a4f2e1c-0000-4000-8000-000000000001");

    @TempDir
    private Path folder;

    private MasterKeyFile file(String setting) {
        return new MasterKeyFile(new DataFolder(folder.resolve("data")), setting);
    }

    @Test
    void aSealedTextOpensForItsPurposeOnly() throws Exception {
        MasterKey master = MasterKey.random();
        CaseKey key = master.unwrap(ID, master.newWrappedKey(ID));
        byte[] sealed = key.seal("born 1961", "typed:person");
        assertThat(key.open(sealed, "typed:person")).isEqualTo("born 1961");
        assertThatThrownBy(() -> key.open(sealed, "valid:person")).isInstanceOf(IllegalStateException.class);
    }

    @Test
    void equalTextsAreSealedDifferently() throws Exception {
        MasterKey master = MasterKey.random();
        CaseKey key = master.unwrap(ID, master.newWrappedKey(ID));
        assertThat(key.seal("same", "a")).isNotEqualTo(key.seal("same", "a"));
    }

    @Test
    void aFlippedBitIsNoticed() throws Exception {
        MasterKey master = MasterKey.random();
        CaseKey key = master.unwrap(ID, master.newWrappedKey(ID));
        byte[] sealed = key.seal("born 1961", "typed:person");
        sealed[sealed.length - 1] ^= 1;
        assertThatThrownBy(() -> key.open(sealed, "typed:person")).isInstanceOf(IllegalStateException.class);
    }

    @Test
    void aWrappedKeyOpensUnderItsOwnMasterAndIdOnly() {
        MasterKey master = MasterKey.random();
        byte[] wrapped = master.newWrappedKey(ID);
        assertThatThrownBy(() -> MasterKey.random().unwrap(ID, wrapped)).isInstanceOf(GeneralSecurityException.class);
        assertThatThrownBy(() -> master.unwrap(UUID.randomUUID(), wrapped))
                .isInstanceOf(GeneralSecurityException.class);
    }

    @Test
    void theFileGivesTheSameKeyAgain() throws Exception {
        MasterKey made = file("").readOrMake();
        byte[] wrapped = made.newWrappedKey(ID);
        byte[] sealed = made.unwrap(ID, wrapped).seal("born 1961", "p");
        MasterKey read = file("").read();
        assertThat(read.unwrap(ID, wrapped).open(sealed, "p")).isEqualTo("born 1961");
        assertThat(read.blindIndex("EXT-1")).isEqualTo(made.blindIndex("EXT-1"));
        assertThat(read.blindIndex("EXT-1")).isNotEqualTo(made.blindIndex("EXT-2"));
    }

    @Test
    void theFileIsForItsOwnerOnly() throws Exception {
        file("").readOrMake();
        Path path = folder.resolve("data/master.key");
        assertThat(PosixFilePermissions.toString(Files.getPosixFilePermissions(path)))
                .isEqualTo("rw-------");
        Files.setPosixFilePermissions(path, PosixFilePermissions.fromString("rw-r--r--"));
        assertThatThrownBy(() -> file("").read()).hasMessageContaining("chmod 600 " + path);
    }

    @Test
    void aMissingFileIsNotReplacedWhereCasesNeedIt() {
        assertThatThrownBy(() -> file("").read())
                .isInstanceOf(IllegalStateException.class)
                .hasMessageContaining("master.key is missing");
        assertThat(folder.resolve("data/master.key")).doesNotExist();
    }

    @Test
    void aFileNamedInTheSettingsIsNeverMade() {
        assertThatThrownBy(
                        () -> file(folder.resolve("elsewhere.key").toString()).readOrMake())
                .hasMessageContaining("elsewhere.key");
    }

    @Test
    void aBrokenFileIsRefusedByItsPath() throws Exception {
        file("").readOrMake();
        Path path = folder.resolve("data/master.key");
        Files.writeString(path, "{}");
        assertThatThrownBy(() -> file("").read()).hasMessageContaining(path.toString());
    }
}
