package nearworld.app.database;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.jdbc.core.JdbcTemplate;

/** The whole application on an empty database. */
@SpringBootTest
@OnPostgres
class ApplicationStartIT {
    @Autowired
    private JdbcTemplate jdbc;

    @Test
    void theApplicationMigratesAsOwnerAndServesAsItsOwnRole() {
        assertThat(jdbc.queryForObject("select current_user", String.class)).isEqualTo("nearworld_app");
        assertThat(jdbc.queryForObject("select count(*) from spring_session", Integer.class))
                .isZero();
    }
}
