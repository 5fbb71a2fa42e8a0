package nearworld.app.database;

import java.sql.Connection;
import java.sql.PreparedStatement;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Statement;
import javax.sql.DataSource;

/** Makes the two roles and databases on a server on which the application is the superuser. */
final class DatabaseRoles {
    static final String OWNER = "nearworld_owner";
    static final String APPLICATION = "nearworld_app";

    private final DataSource superuser;

    DatabaseRoles(DataSource superuser) {
        this.superuser = superuser;
    }

    /** Makes the role where it is missing, and sets its password in any case. */
    void prepare(Login login) throws SQLException {
        try (Connection connection = superuser.getConnection()) {
            if (isMissing(connection, "select 1 from pg_roles where rolname = ?", login.user())) {
                run(connection, "create role %I", login.user());
            }
            run(
                    connection,
                    "alter role %I login nosuperuser nocreatedb nocreaterole noreplication nobypassrls password %L",
                    login.user(),
                    login.password());
        }
    }

    /** Makes the database, owned by the owner role, where it is missing. */
    void createDatabase(String name) throws SQLException {
        try (Connection connection = superuser.getConnection()) {
            if (isMissing(connection, "select 1 from pg_database where datname = ?", name)) {
                run(connection, "create database %I owner %I", name, OWNER);
            }
        }
    }

    private static boolean isMissing(Connection connection, String question, String name) throws SQLException {
        try (PreparedStatement statement = connection.prepareStatement(question)) {
            statement.setString(1, name);
            try (ResultSet rows = statement.executeQuery()) {
                return !rows.next();
            }
        }
    }

    /** Role commands take no parameters, so the server itself quotes names (%I) and literals (%L) into the text. */
    private static void run(Connection connection, String template, String... values) throws SQLException {
        String command;
        try (PreparedStatement statement =
                connection.prepareStatement("select format(?" + ", ?::text".repeat(values.length) + ")")) {
            statement.setString(1, template);
            for (int i = 0; i < values.length; i++) {
                statement.setString(i + 2, values[i]);
            }
            try (ResultSet rows = statement.executeQuery()) {
                rows.next();
                command = rows.getString(1);
            }
        }
        try (Statement statement = connection.createStatement()) {
            statement.execute(command);
        }
    }
}
