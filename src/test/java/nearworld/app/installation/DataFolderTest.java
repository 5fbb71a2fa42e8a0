package nearworld.app.installation;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.PosixFilePermissions;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class DataFolderTest {
    @TempDir
    private Path temp;

    @Test
    void aSecretIsMadeOnceAndKept() throws IOException {
        DataFolder folder = new DataFolder(temp.resolve("data"));
        String secret = folder.secret("one");
        assertThat(secret).matches("[0-9a-f]{48}");
        assertThat(new DataFolder(temp.resolve("data")).secret("one")).isEqualTo(secret);
        assertThat(folder.secret("two")).isNotEqualTo(secret);
    }

    @Test
    void anEmptySecretIsRefusedRatherThanReplaced() throws IOException {
        DataFolder folder = new DataFolder(temp);
        folder.secret("one");
        Files.writeString(folder.secretFile("one"), "");
        assertThatThrownBy(() -> folder.secret("one"))
                .isInstanceOf(IOException.class)
                .hasMessageContaining(folder.secretFile("one").toString());
    }

    @Test
    void aFileWrittenPrivatelyReplacesTheOldOneAndIsClosedToOthers() throws IOException {
        DataFolder folder = new DataFolder(temp);
        Path file = folder.path().resolve("people.txt");
        folder.writePrivately(file, "old");
        folder.writePrivately(file, "new");
        assertThat(file).hasContent("new");
        assertThat(PosixFilePermissions.toString(Files.getPosixFilePermissions(file)))
                .isEqualTo("rw-------");
        assertThat(temp).isDirectoryNotContaining("glob:**/.draft*");
    }

    @Test
    void aFileOutsideTheFolderIsRefused() {
        DataFolder folder = new DataFolder(temp.resolve("data"));
        Path outside = temp.resolve("data/../elsewhere");
        assertThatThrownBy(() -> folder.writePrivately(outside, "x"))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("elsewhere");
    }
}
