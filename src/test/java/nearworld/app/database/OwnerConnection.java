package nearworld.app.database;

import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.SQLException;
import java.sql.Statement;
import org.springframework.boot.flyway.autoconfigure.FlywayConnectionDetails;
import org.springframework.boot.test.context.TestComponent;

/** What only the tables' owner can do: tamper with what the application may not change. */
@TestComponent
public class OwnerConnection {
    private final FlywayConnectionDetails owner;

    OwnerConnection(FlywayConnectionDetails owner) {
        this.owner = owner;
    }

    /** Runs one statement as the owner. */
    public void execute(String statement) {
        try (Connection connection =
                        DriverManager.getConnection(owner.getJdbcUrl(), owner.getUsername(), owner.getPassword());
                Statement command = connection.createStatement()) {
            command.execute(statement);
        } catch (SQLException e) {
            throw new IllegalStateException("the owner cannot: " + statement, e);
        }
    }
}
