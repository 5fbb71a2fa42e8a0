package nearworld.app.database;

/** Where the database runs. The demo is loaded unasked only into an embedded one. */
public enum DatabaseKind {
    /** Started by the application itself, with its files in the data folder. */
    EMBEDDED,
    /** A server that somebody else runs, named in the settings. */
    EXTERNAL
}
