package nearworld.app.database;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.PosixFilePermissions;
import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.concurrent.TimeUnit;
import java.util.stream.Stream;
import nearworld.app.installation.DataFolder;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The server that the application starts itself, through restarts and crashes. */
class EmbeddedDatabaseIT {
    @TempDir
    private Path temp;

    private Path binaries;

    /** Unpacking the binaries anew for each test would take most of its time. */
    private DataFolder folderWithBinaries(Path path) throws IOException {
        DataFolder folder = new DataFolder(path);
        binaries = folder.create().resolve("postgres-binaries");
        Files.createSymbolicLink(binaries, PostgresForTests.binaries());
        return folder;
    }

    @AfterEach
    void removeLink() throws IOException {
        Files.delete(binaries);
    }

    @Test
    void dataIsKeptAcrossARestartAndSecretsAreClosedToOthers() throws Exception {
        DataFolder folder = folderWithBinaries(temp.resolve("a folder"));
        try (EmbeddedDatabase database = EmbeddedDatabase.open(folder)) {
            asOwner(database, "create table kept as select 42 as answer");
        }
        try (EmbeddedDatabase database = EmbeddedDatabase.open(folder)) {
            assertThat(ask(database.url(), database.owner(), "select answer from kept"))
                    .isEqualTo("42");
        }
        try (Stream<Path> secrets = Files.list(folder.path().resolve("secrets"))) {
            assertThat(secrets.toList())
                    .hasSize(3)
                    .allSatisfy(
                            secret -> assertThat(PosixFilePermissions.toString(Files.getPosixFilePermissions(secret)))
                                    .isEqualTo("rw-------"));
        }
        assertThat(PosixFilePermissions.toString(Files.getPosixFilePermissions(folder.path())))
                .isEqualTo("rwx------");
    }

    @Test
    void confirmedWritesAreDurableAndEverybodyNeedsAPassword() throws Exception {
        try (EmbeddedDatabase database = EmbeddedDatabase.open(folderWithBinaries(temp))) {
            for (String setting : new String[] {"fsync", "synchronous_commit", "full_page_writes"}) {
                assertThat(ask(database.url(), database.application(), "show " + setting))
                        .as(setting)
                        .isEqualTo("on");
            }
            for (String user : new String[] {"postgres", "nearworld_owner", "nearworld_app"}) {
                assertThatThrownBy(() -> ask(database.url(), new Login(user, "guess"), "select 1"))
                        .as(user)
                        .hasMessageContaining("password authentication failed");
            }
        }
    }

    @Test
    void aServerLeftBehindByAKilledProcessIsStopped() throws Exception {
        DataFolder folder = folderWithBinaries(temp);
        long process;
        try (EmbeddedDatabase database = EmbeddedDatabase.open(folder)) {
            asOwner(database, "create table kept as select 42 as answer");
            process = serverProcess(folder);
            // Another trace of the same running server: what a killed application leaves.
            OrphanedServer.stop(folder.path().resolve("postgres"));
            assertThat(ProcessHandle.of(process)).isEmpty();
        }
        try (EmbeddedDatabase database = EmbeddedDatabase.open(folder)) {
            assertThat(serverProcess(folder)).isNotEqualTo(process);
            assertThat(ask(database.url(), database.owner(), "select answer from kept"))
                    .isEqualTo("42");
        }
    }

    @Test
    void aCrashedServerRecoversWhatWasConfirmed() throws Exception {
        DataFolder folder = folderWithBinaries(temp);
        try (EmbeddedDatabase database = EmbeddedDatabase.open(folder)) {
            asOwner(database, "create table kept as select 42 as answer");
            ProcessHandle server = ProcessHandle.of(serverProcess(folder)).orElseThrow();
            server.destroyForcibly();
            server.onExit().get(30, TimeUnit.SECONDS);
        }
        try (EmbeddedDatabase database = EmbeddedDatabase.open(folder)) {
            assertThat(ask(database.url(), database.owner(), "select answer from kept"))
                    .isEqualTo("42");
        }
    }

    @Test
    void aRecordedNumberThatNowBelongsToAnotherProcessDoesNotStopTheStart() throws Exception {
        DataFolder folder = folderWithBinaries(temp);
        EmbeddedDatabase.open(folder).close();
        long ourselves = ProcessHandle.current().pid();
        Files.writeString(folder.path().resolve("postgres/postmaster.pid"), ourselves + "\n");
        try (EmbeddedDatabase database = EmbeddedDatabase.open(folder)) {
            assertThat(ask(database.url(), database.owner(), "select 1")).isEqualTo("1");
        }
    }

    @Test
    void filesHalfMadeByAFirstStartThatWasKilledAreMadeAgain() throws Exception {
        DataFolder folder = folderWithBinaries(temp);
        Path draft = Files.createDirectories(folder.path().resolve("postgres.new"));
        Files.writeString(draft.resolve("PG_VERSION"), "17\n");
        try (EmbeddedDatabase database = EmbeddedDatabase.open(folder)) {
            assertThat(ask(database.url(), database.owner(), "select 1")).isEqualTo("1");
        }
        assertThat(draft).doesNotExist();
    }

    @Test
    void aSecondServerOnTheSameFolderIsRefused() throws Exception {
        DataFolder folder = folderWithBinaries(temp);
        try (EmbeddedDatabase database = EmbeddedDatabase.open(folder)) {
            assertThatThrownBy(() -> EmbeddedDatabase.open(folder))
                    .isInstanceOf(DatabaseRefusedException.class)
                    .hasMessageContaining("Another Nearworld is running")
                    .hasMessageContaining(temp.toString());
            assertThat(ask(database.url(), database.owner(), "select 1")).isEqualTo("1");
        }
    }

    @Test
    void filesOfAnotherMajorVersionAreRefused() throws Exception {
        DataFolder folder = folderWithBinaries(temp);
        Path files = Files.createDirectories(folder.path().resolve("postgres"));
        Files.writeString(files.resolve("PG_VERSION"), "16\n");
        assertThatThrownBy(() -> EmbeddedDatabase.open(folder))
                .isInstanceOf(DatabaseRefusedException.class)
                .hasMessageContaining("PostgreSQL 16")
                .hasMessageContaining("PostgreSQL 17");
    }

    @Test
    void aDatabaseWithoutItsPasswordFileIsRefused() throws Exception {
        DataFolder folder = folderWithBinaries(temp);
        EmbeddedDatabase.open(folder).close();
        Files.delete(folder.secretFile("database-superuser"));
        assertThatThrownBy(() -> EmbeddedDatabase.open(folder))
                .isInstanceOf(DatabaseRefusedException.class)
                .hasMessageContaining("database-superuser");
    }

    private static long serverProcess(DataFolder folder) throws IOException {
        return Long.parseLong(Files.readAllLines(folder.path().resolve("postgres/postmaster.pid"))
                .get(0));
    }

    private static void asOwner(EmbeddedDatabase database, String command) throws SQLException {
        Login owner = database.owner();
        try (Connection connection = DriverManager.getConnection(database.url(), owner.user(), owner.password());
                Statement statement = connection.createStatement()) {
            statement.execute(command);
        }
    }

    private static String ask(String url, Login login, String question) throws SQLException {
        try (Connection connection = DriverManager.getConnection(url, login.user(), login.password());
                Statement statement = connection.createStatement();
                ResultSet rows = statement.executeQuery(question)) {
            rows.next();
            return rows.getString(1);
        }
    }
}
