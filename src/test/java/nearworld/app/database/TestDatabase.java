package nearworld.app.database;

import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.SQLException;
import java.util.Map;

/**
 * An empty database of its own on the tests' server, with the logins of both roles.
 *
 * @param url JDBC address without user and password
 * @param ownerPassword password of {@code nearworld_owner}
 * @param appPassword password of {@code nearworld_app}
 */
public record TestDatabase(String url, String ownerPassword, String appPassword) {
    /** The settings that lead an application to this database as to an external server. */
    public Map<String, String> settings() {
        return Map.of(
                "nearworld.data",
                "target/test-data",
                "nearworld.first-admin",
                "first.admin",
                "nearworld.database.url",
                url,
                "nearworld.database.user",
                DatabaseRoles.OWNER,
                "nearworld.database.password",
                ownerPassword,
                "nearworld.database.app-user",
                DatabaseRoles.APPLICATION,
                "nearworld.database.app-password",
                appPassword,
                "spring.datasource.hikari.maximum-pool-size",
                "4",
                "spring.datasource.hikari.minimum-idle",
                "0");
    }

    /** A connection of the role that migrates and owns the tables. */
    public Connection asOwner() throws SQLException {
        return DriverManager.getConnection(url, DatabaseRoles.OWNER, ownerPassword);
    }

    /** A connection of the application's role. */
    public Connection asApplication() throws SQLException {
        return DriverManager.getConnection(url, DatabaseRoles.APPLICATION, appPassword);
    }
}
