package nearworld.app.installation;

import java.io.IOException;
import java.nio.file.FileAlreadyExistsException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.attribute.PosixFilePermission;
import java.nio.file.attribute.PosixFilePermissions;
import java.security.SecureRandom;
import java.util.HexFormat;
import java.util.Set;
import org.springframework.beans.factory.annotation.Value;
import org.springframework.stereotype.Component;

/**
 * The folder of this installation: the embedded database's files, and secrets that only the server's own user may
 * read. Nothing is created before it is asked for.
 */
@Component
public class DataFolder {
    private static final Set<PosixFilePermission> OWNER_ONLY = PosixFilePermissions.fromString("rw-------");
    private static final Set<PosixFilePermission> OWNER_ONLY_FOLDER = PosixFilePermissions.fromString("rwx------");
    private static final int SECRET_BYTES = 24;

    private final Path path;

    /**
     * The folder at this path, relative to the working directory unless absolute.
     *
     * @param path setting {@code nearworld.data}
     */
    public DataFolder(@Value("${nearworld.data}") Path path) {
        this.path = path.toAbsolutePath().normalize();
    }

    /** Absolute path of the folder, which need not exist yet. */
    public Path path() {
        return path;
    }

    /**
     * Creates the folder where it is missing, closed to every other user.
     *
     * @return its absolute path
     */
    public Path create() throws IOException {
        return createPrivately(path);
    }

    /**
     * Creates a folder of this name inside, where it is missing, closed to every other user.
     *
     * @return its absolute path
     */
    public Path create(String name) throws IOException {
        create();
        return createPrivately(path.resolve(name));
    }

    /**
     * The secret of this name: a random text of 192 bits in hexadecimal, made on first use and kept from then on in a
     * file that only the server's own user may read.
     *
     * @param name file name below the folder's {@code secrets}
     */
    public String secret(String name) throws IOException {
        Path file = secretFile(name);
        if (!Files.exists(file)) {
            byte[] random = new byte[SECRET_BYTES];
            new SecureRandom().nextBytes(random);
            writePrivately(file, HexFormat.of().formatHex(random));
        }
        String secret = Files.readString(file).strip();
        if (secret.isEmpty()) {
            throw new IOException("The secret file " + file + " is empty; restore it from a backup.");
        }
        return secret;
    }

    /**
     * Where the secret of this name is kept; the file need not exist yet.
     *
     * @param name file name below the folder's {@code secrets}
     */
    public Path secretFile(String name) {
        return path.resolve("secrets").resolve(name);
    }

    /**
     * Writes a file that only the server's own user may read; it appears whole or not at all.
     *
     * @param file absolute path inside the folder
     * @param content what it holds afterwards
     */
    public void writePrivately(Path file, String content) throws IOException {
        Path parent = file.normalize().getParent();
        if (parent == null || !parent.startsWith(path)) {
            throw new IllegalArgumentException("file must be inside " + path + ", was " + file);
        }
        Path folder = createPrivately(parent);
        Path draft = Files.createTempFile(folder, ".draft", ".tmp", PosixFilePermissions.asFileAttribute(OWNER_ONLY));
        try {
            Files.writeString(draft, content);
            Files.move(draft, file, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
        } finally {
            Files.deleteIfExists(draft);
        }
    }

    private static Path createPrivately(Path folder) throws IOException {
        Path parent = folder.getParent();
        // Asked first, as createDirectories of Java 17 refuses a symbolic link to a folder.
        if (parent != null && !Files.isDirectory(parent)) {
            Files.createDirectories(parent);
        }
        try {
            return Files.createDirectory(folder, PosixFilePermissions.asFileAttribute(OWNER_ONLY_FOLDER));
        } catch (FileAlreadyExistsException e) {
            if (Files.isDirectory(folder)) {
                return folder;
            }
            throw e;
        }
    }
}
