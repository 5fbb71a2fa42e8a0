package nearworld.app.database;

import io.zonky.test.db.postgres.embedded.EmbeddedPostgres;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.sql.SQLException;
import java.util.UUID;
import java.util.concurrent.atomic.AtomicInteger;
import javax.sql.DataSource;
import org.postgresql.ds.PGSimpleDataSource;
import org.springframework.boot.test.util.TestPropertyValues;
import org.springframework.context.ApplicationContextInitializer;
import org.springframework.context.ConfigurableApplicationContext;
import org.testcontainers.DockerClientFactory;
import org.testcontainers.postgresql.PostgreSQLContainer;

/**
 * PostgreSQL 17 for tests: a container where a container engine answers, the embedded binaries where none does. This
 * is the one place that chooses. One server a JVM, which ends with it; one fresh database a call.
 */
public final class PostgresForTests {
    private static final AtomicInteger COUNT = new AtomicInteger();
    private static final String OWNER_PASSWORD = UUID.randomUUID().toString();
    private static final String APPLICATION_PASSWORD = UUID.randomUUID().toString();

    private PostgresForTests() {}

    /** An empty database: no tables, both roles. */
    public static TestDatabase freshDatabase() {
        String name = "test_" + COUNT.incrementAndGet();
        try {
            new DatabaseRoles(Server.SUPERUSER).createDatabase(name);
        } catch (SQLException e) {
            throw new IllegalStateException("The database " + name + " cannot be made", e);
        }
        return new TestDatabase(Server.ADDRESS + name, OWNER_PASSWORD, APPLICATION_PASSWORD);
    }

    /** The server's superuser in this database, for tests that need what neither role may do. */
    static DataSource superuser(TestDatabase database) {
        PGSimpleDataSource superuser = new PGSimpleDataSource();
        superuser.setUrl(database.url());
        superuser.setUser(Server.SUPERUSER.getUser());
        superuser.setPassword(Server.SUPERUSER.getPassword());
        return superuser;
    }

    /** Where the embedded binaries are unpacked, once a build. */
    static Path binaries() throws IOException {
        return Files.createDirectories(Path.of("target", "postgres-binaries")).toAbsolutePath();
    }

    /** Gives an application context a database of its own; see {@link OnPostgres}. */
    static final class Initializer implements ApplicationContextInitializer<ConfigurableApplicationContext> {
        @Override
        public void initialize(ConfigurableApplicationContext context) {
            TestPropertyValues.of(freshDatabase().settings()).applyTo(context);
        }
    }

    /** Started on first use. */
    private static final class Server {
        static final PGSimpleDataSource SUPERUSER = start();
        static final String ADDRESS = "jdbc:postgresql://" + SUPERUSER.getServerNames()[0] + ":"
                + SUPERUSER.getPortNumbers()[0] + "/";

        private static PGSimpleDataSource start() {
            try {
                PGSimpleDataSource superuser =
                        DockerClientFactory.instance().isDockerAvailable() ? container() : embedded();
                DatabaseRoles roles = new DatabaseRoles(superuser);
                roles.prepare(new Login(DatabaseRoles.OWNER, OWNER_PASSWORD));
                roles.prepare(new Login(DatabaseRoles.APPLICATION, APPLICATION_PASSWORD));
                return superuser;
            } catch (IOException | SQLException e) {
                throw new IllegalStateException("No PostgreSQL server for the tests", e);
            }
        }

        /** Testcontainers stops the container when the JVM ends. */
        private static PGSimpleDataSource container() throws SQLException {
            PostgreSQLContainer container = new PostgreSQLContainer("postgres:17-alpine");
            container.start();
            PGSimpleDataSource superuser = new PGSimpleDataSource();
            superuser.setUrl(container.getJdbcUrl());
            superuser.setUser(container.getUsername());
            superuser.setPassword(container.getPassword());
            return superuser;
        }

        /** The server's files vanish when the JVM ends; durability is left off. */
        private static PGSimpleDataSource embedded() throws IOException, SQLException {
            Path folder = Files.createTempDirectory(Files.createDirectories(Path.of("target")), "postgres-");
            Path password = Files.writeString(
                    folder.resolve("password"), UUID.randomUUID().toString());
            EmbeddedPostgres server = EmbeddedDatabase.builder(
                            folder.resolve("files").toAbsolutePath(), binaries(), password.toAbsolutePath())
                    .setServerConfig("max_connections", "200")
                    .start();
            DataSource superuser = server.getPostgresDatabase();
            return superuser.unwrap(PGSimpleDataSource.class);
        }
    }
}
