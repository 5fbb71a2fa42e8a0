package nearworld.app.database;

import java.sql.Connection;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Statement;
import javax.sql.DataSource;
import org.springframework.beans.factory.SmartInitializingSingleton;

/**
 * Refuses to serve with a database role that could change what is append-only: a superuser, the tables' owner or a
 * member of it, or a role that may make roles, make databases or pass row security.
 */
class ApplicationRoleGuard implements SmartInitializingSingleton {
    private static final String QUESTION = """
            select r.rolname,
                   r.rolsuper or r.rolcreaterole or r.rolcreatedb or r.rolbypassrls or r.rolreplication as mighty,
                   pg_has_role(r.oid, t.relowner, 'MEMBER') as owner,
                   has_table_privilege(r.oid, t.oid, 'SELECT') as granted
            from pg_roles r, pg_class t
            where r.rolname = current_user and t.oid = 'spring_session'::regclass
            """;

    private final DataSource dataSource;

    ApplicationRoleGuard(DataSource dataSource) {
        this.dataSource = dataSource;
    }

    /** Runs after the migrations and before the first request. */
    @Override
    public void afterSingletonsInstantiated() {
        try (Connection connection = dataSource.getConnection();
                Statement statement = connection.createStatement();
                ResultSet answer = statement.executeQuery(QUESTION)) {
            answer.next();
            String role = answer.getString("rolname");
            refuse(answer.getBoolean("mighty"), role, "has rights over the whole server");
            refuse(answer.getBoolean("owner"), role, "owns the tables or is a member of the role that does");
            refuse(!answer.getBoolean("granted"), role, "is neither nearworld_app nor a member of it");
        } catch (SQLException e) {
            throw new DatabaseRefusedException("The rights of the application's database role cannot be read", e);
        }
    }

    private static void refuse(boolean wrong, String role, String what) {
        if (wrong) {
            throw new DatabaseRefusedException("The application's database role \"" + role + "\" " + what
                    + "; NEARWORLD_DATABASE_APP_USER must name a role that is only a member of nearworld_app.");
        }
    }
}
