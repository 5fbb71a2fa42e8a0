package nearworld.app.keys;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.PosixFileAttributeView;
import java.nio.file.attribute.PosixFilePermission;
import java.security.GeneralSecurityException;
import java.util.Set;
import nearworld.app.installation.DataFolder;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.beans.factory.annotation.Value;
import org.springframework.stereotype.Component;

/**
 * The file of the master key: {@code NEARWORLD_MASTER_KEY_FILE}, by default {@code master.key} in the data folder. Only
 * the server's own user may read it. Whoever loses it loses every case: it belongs into a backup, apart from the
 * database's.
 */
@Component
class MasterKeyFile {
    private static final Logger LOG = LoggerFactory.getLogger(MasterKeyFile.class);
    private static final Set<PosixFilePermission> OTHERS =
            Set.of(PosixFilePermission.OTHERS_READ, PosixFilePermission.OTHERS_WRITE, PosixFilePermission.GROUP_WRITE);

    private final DataFolder folder;
    private final Path path;
    private final boolean own;

    MasterKeyFile(DataFolder folder, @Value("${nearworld.master-key-file:}") String setting) {
        this.folder = folder;
        this.own = setting.isBlank();
        this.path = own
                ? folder.path().resolve("master.key")
                : Path.of(setting).toAbsolutePath().normalize();
    }

    Path path() {
        return path;
    }

    /** The key in the file; refused where there is none, because stored cases need the one that they were made with. */
    MasterKey read() {
        if (!Files.exists(path)) {
            throw new IllegalStateException("The master key file " + path
                    + " is missing, and cases of this database are encrypted by it; restore it from a backup.");
        }
        try {
            refuseOpenToOthers();
            return MasterKey.parse(Files.readString(path));
        } catch (IOException | GeneralSecurityException e) {
            throw new IllegalStateException("The master key file " + path + " cannot be read: " + e.getMessage(), e);
        }
    }

    /** The key in the file; a new one is made where there is no file, which is right only as long as there are no cases. */
    MasterKey readOrMake() {
        if (Files.exists(path)) {
            return read();
        }
        if (!own) {
            throw new IllegalStateException("NEARWORLD_MASTER_KEY_FILE names " + path
                    + ", which does not exist; leave the variable out once to have one made in the data folder.");
        }
        MasterKey key = MasterKey.random();
        try {
            folder.writePrivately(path, key.toText());
        } catch (IOException e) {
            throw new IllegalStateException("The master key file " + path + " cannot be written", e);
        }
        LOG.info("A master key was made in {}: keep a copy of it apart from the database's backups.", path);
        return key;
    }

    private void refuseOpenToOthers() throws IOException {
        PosixFileAttributeView view = Files.getFileAttributeView(path, PosixFileAttributeView.class);
        if (view == null) {
            return;
        }
        Set<PosixFilePermission> permissions = view.readAttributes().permissions();
        if (permissions.stream().anyMatch(OTHERS::contains)) {
            throw new IOException("others may read or change it; run chmod 600 " + path);
        }
    }
}
