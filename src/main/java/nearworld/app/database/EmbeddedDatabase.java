package nearworld.app.database;

import io.zonky.test.db.postgres.embedded.EmbeddedPostgres;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.sql.SQLException;
import java.time.Duration;
import nearworld.app.installation.DataFolder;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.util.FileSystemUtils;

/**
 * A PostgreSQL server started from the binaries on the class path, with its files in the data folder. They are kept
 * across restarts; what a killed process left running is stopped first.
 */
final class EmbeddedDatabase implements Database {
    /** Major version of the binaries; files of another one cannot be opened. */
    private static final String MAJOR_VERSION = "17";

    private static final Duration STARTUP_WAIT = Duration.ofSeconds(60);
    private static final String DATABASE = "nearworld";
    private static final Logger LOG = LoggerFactory.getLogger(EmbeddedDatabase.class);

    private final FolderLock lock;
    private final EmbeddedPostgres server;
    private final Login owner;
    private final Login application;

    private EmbeddedDatabase(FolderLock lock, EmbeddedPostgres server, Login owner, Login application) {
        this.lock = lock;
        this.server = server;
        this.owner = owner;
        this.application = application;
    }

    /** Starts the server, making its files, roles and database where they are missing. */
    static EmbeddedDatabase open(DataFolder folder) throws IOException {
        FolderLock lock = FolderLock.acquire(folder.create());
        try {
            Path files = folder.path().resolve("postgres");
            if (!Files.exists(files)) {
                initialise(folder, files);
            }
            requireSameMajorVersion(files);
            EmbeddedPostgres server = start(folder, files);
            Login owner = new Login(DatabaseRoles.OWNER, folder.secret("database-owner"));
            Login application = new Login(DatabaseRoles.APPLICATION, folder.secret("database-application"));
            EmbeddedDatabase database = new EmbeddedDatabase(lock, server, owner, application);
            database.prepareRoles();
            LOG.info("Embedded PostgreSQL answers on port {}", server.getPort());
            return database;
        } catch (IOException | RuntimeException e) {
            lock.release();
            throw e;
        }
    }

    /**
     * What every embedded server has in common, those of the tests too: passwords for everyone (the library's own
     * default trusts every local process), no socket beside the port on localhost, one collation on every machine.
     */
    static EmbeddedPostgres.Builder builder(Path files, Path binaries, Path passwordFile) throws IOException {
        // The library hands "locale" settings to initdb as --name=value.
        return EmbeddedPostgres.builder()
                .setDataDirectory(files)
                .setOverrideWorkingDirectory(binaries.toFile())
                .setConnectConfig("password", Files.readString(passwordFile).strip())
                .setLocaleConfig("pwfile", passwordFile.toString())
                .setLocaleConfig("auth-host", "scram-sha-256")
                .setLocaleConfig("auth-local", "scram-sha-256")
                .setLocaleConfig("locale-provider", "builtin")
                .setLocaleConfig("builtin-locale", "C.UTF-8")
                .setServerConfig("unix_socket_directories", "")
                .setPGStartupWait(STARTUP_WAIT);
    }

    /** Makes the files under another name and renames them when complete, so that half-made ones are never opened. */
    private static void initialise(DataFolder folder, Path files) throws IOException {
        Path draft = files.resolveSibling("postgres.new");
        OrphanedServer.stop(draft);
        FileSystemUtils.deleteRecursively(draft);
        folder.secret("database-superuser");
        start(folder, draft).close();
        Files.move(draft, files, StandardCopyOption.ATOMIC_MOVE);
    }

    private static EmbeddedPostgres start(DataFolder folder, Path files) throws IOException {
        Path password = folder.secretFile("database-superuser");
        if (!Files.exists(password)) {
            throw new DatabaseRefusedException("The database in " + files + " lacks its password file " + password
                    + "; restore it from a backup.");
        }
        OrphanedServer.stop(files);
        Path binaries = folder.create("postgres-binaries");
        // The library passes -F (no fsync): what was confirmed must survive a power cut, so durability is set back.
        EmbeddedPostgres.Builder builder = builder(files, binaries, password)
                .setCleanDataDirectory(false)
                .setRegisterShutdownHook(false)
                .setServerConfig("max_connections", "50")
                .setServerConfig("fsync", "on")
                .setServerConfig("synchronous_commit", "on")
                .setServerConfig("full_page_writes", "on");
        try {
            return builder.start();
        } catch (IOException | IllegalStateException e) {
            throw new DatabaseRefusedException(
                    "The embedded PostgreSQL server does not start: " + e.getMessage()
                            + ". NEARWORLD_DATABASE_URL and its companions lead to a server of your own instead.",
                    e);
        }
    }

    private static void requireSameMajorVersion(Path files) throws IOException {
        String version = Files.readString(files.resolve("PG_VERSION")).strip();
        if (!version.equals(MAJOR_VERSION)) {
            throw new DatabaseRefusedException("The database in " + files + " is of PostgreSQL " + version
                    + ", this application brings PostgreSQL " + MAJOR_VERSION + "; dump and restore it.");
        }
    }

    private void prepareRoles() throws IOException {
        DatabaseRoles roles = new DatabaseRoles(server.getPostgresDatabase());
        try {
            roles.prepare(owner);
            roles.prepare(application);
            roles.createDatabase(DATABASE);
        } catch (SQLException e) {
            server.close();
            throw new DatabaseRefusedException("The roles of the embedded database cannot be prepared", e);
        }
    }

    @Override
    public DatabaseKind kind() {
        return DatabaseKind.EMBEDDED;
    }

    @Override
    public String url() {
        return "jdbc:postgresql://localhost:" + server.getPort() + "/" + DATABASE;
    }

    @Override
    public Login owner() {
        return owner;
    }

    @Override
    public Login application() {
        return application;
    }

    @Override
    public void close() {
        try {
            server.close();
        } catch (IOException e) {
            LOG.warn("Embedded PostgreSQL did not stop cleanly; the next start recovers it", e);
        } finally {
            lock.release();
        }
    }
}
