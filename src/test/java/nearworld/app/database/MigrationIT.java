package nearworld.app.database;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.sql.Connection;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.ArrayList;
import java.util.List;
import org.flywaydb.core.Flyway;
import org.flywaydb.core.api.output.MigrateResult;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** All migrations from an empty database, and what the application's role may do afterwards. */
class MigrationIT {
    private static TestDatabase database;
    private static MigrateResult result;

    @BeforeAll
    static void migrateFromEmpty() {
        database = PostgresForTests.freshDatabase();
        result = flyway().migrate();
    }

    private static Flyway flyway() {
        return Flyway.configure()
                .dataSource(database.url(), DatabaseRoles.OWNER, database.ownerPassword())
                .locations("classpath:db/migration")
                .load();
    }

    @Test
    void migrationsRunFromEmptyAndNothingIsLeftToDo() {
        assertThat(result.success).isTrue();
        assertThat(result.migrationsExecuted).isPositive();
        assertThat(flyway().validateWithResult().validationSuccessful).isTrue();
        assertThat(flyway().migrate().migrationsExecuted).isZero();
    }

    @Test
    void theApplicationsRoleHasNoRightsOverTheServer() throws SQLException {
        assertThat(answers("""
                        select rolname from pg_roles where rolname = current_user
                        and not (rolsuper or rolcreaterole or rolcreatedb or rolbypassrls or rolreplication)
                        """)).containsExactly("nearworld_app");
    }

    @Test
    void theApplicationsRoleOwnsNothingAndIsNoMemberOfTheOwner() throws SQLException {
        assertThat(
                        answers(
                                "select relname from pg_class c join pg_roles r on r.oid = c.relowner where r.rolname = current_user"))
                .isEmpty();
        assertThat(answers("select pg_has_role('nearworld_owner', 'MEMBER')::text"))
                .containsExactly("false");
    }

    @Test
    void everyTableBelongsToTheOwner() throws SQLException {
        assertThat(answers("""
                        select distinct r.rolname from pg_class c join pg_roles r on r.oid = c.relowner
                        where c.relnamespace = 'public'::regnamespace
                        """)).containsExactly("nearworld_owner");
    }

    @Test
    void nothingIsGrantedToEverybody() throws SQLException {
        assertThat(answers("""
                        select table_name from information_schema.table_privileges
                        where grantee = 'PUBLIC' and table_schema = 'public'
                        """)).isEmpty();
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "create table mine (id int)",
                "create temporary table mine (id int)",
                "create schema mine",
                "create role mine",
                "create database mine",
                "create function mine() returns int language sql as 'select 1'",
                "alter table spring_session add column mine int",
                "alter table spring_session owner to nearworld_app",
                "drop table spring_session",
                "truncate spring_session",
                "select * from flyway_schema_history",
                "grant nearworld_owner to nearworld_app",
                "set role nearworld_owner",
                "set session authorization nearworld_owner",
                "set session_replication_role = replica",
                "copy spring_session to program 'true'"
            })
    void theApplicationsRoleIsRefused(String command) throws SQLException {
        try (Connection connection = database.asApplication();
                Statement statement = connection.createStatement()) {
            assertThatThrownBy(() -> statement.execute(command))
                    .isInstanceOfSatisfying(
                            SQLException.class,
                            e -> assertThat(e.getSQLState()).as(e.getMessage()).isEqualTo("42501"));
        }
    }

    @Test
    void aTableWithoutAGrantIsClosedToTheApplicationsRole() throws SQLException {
        try (Connection owner = database.asOwner();
                Statement statement = owner.createStatement()) {
            statement.execute("create table without_grant (id int)");
            try {
                assertThat(answers("""
                                select p from unnest(array['SELECT', 'INSERT', 'UPDATE', 'DELETE']) p
                                where has_table_privilege('without_grant', p)
                                """)).isEmpty();
            } finally {
                statement.execute("drop table without_grant");
            }
        }
    }

    private static List<String> answers(String question) throws SQLException {
        List<String> answers = new ArrayList<>();
        try (Connection connection = database.asApplication();
                Statement statement = connection.createStatement();
                ResultSet rows = statement.executeQuery(question)) {
            while (rows.next()) {
                answers.add(rows.getString(1));
            }
        }
        return answers;
    }
}
