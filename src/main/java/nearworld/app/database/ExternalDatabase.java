package nearworld.app.database;

/** A server that somebody else runs: nothing to start, nothing to stop. */
record ExternalDatabase(String url, Login owner, Login application) implements Database {
    @Override
    public DatabaseKind kind() {
        return DatabaseKind.EXTERNAL;
    }

    @Override
    public void close() {
        // The server is not ours to stop.
    }
}
