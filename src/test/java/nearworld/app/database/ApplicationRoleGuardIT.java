package nearworld.app.database;

import static org.assertj.core.api.Assertions.assertThatCode;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import org.flywaydb.core.Flyway;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.springframework.jdbc.datasource.DriverManagerDataSource;

class ApplicationRoleGuardIT {
    private static TestDatabase database;

    @BeforeAll
    static void migrate() {
        database = PostgresForTests.freshDatabase();
        Flyway.configure()
                .dataSource(database.url(), DatabaseRoles.OWNER, database.ownerPassword())
                .locations("classpath:db/migration")
                .load()
                .migrate();
    }

    @Test
    void theApplicationsOwnRolePasses() {
        assertThatCode(() -> guard(DatabaseRoles.APPLICATION, database.appPassword()))
                .doesNotThrowAnyException();
    }

    @Test
    void theOwnerIsRefused() {
        assertThatThrownBy(() -> guard(DatabaseRoles.OWNER, database.ownerPassword()))
                .hasMessageContaining("\"nearworld_owner\" owns the tables");
    }

    @Test
    void aSuperuserIsRefused() {
        assertThatThrownBy(() ->
                        new ApplicationRoleGuard(PostgresForTests.superuser(database)).afterSingletonsInstantiated())
                .hasMessageContaining("has rights over the whole server");
    }

    private static void guard(String user, String password) {
        new ApplicationRoleGuard(new DriverManagerDataSource(database.url(), user, password))
                .afterSingletonsInstantiated();
    }
}
