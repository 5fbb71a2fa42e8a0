package nearworld.app.database;

/** A running PostgreSQL database and the two roles that use it. */
interface Database extends AutoCloseable {
    DatabaseKind kind();

    /** JDBC address without user and password. */
    String url();

    /** Migrates, and owns what the migrations make. */
    Login owner();

    /** Serves the application; never a superuser. */
    Login application();

    /** Stops the server where the application started it. */
    @Override
    void close();
}
