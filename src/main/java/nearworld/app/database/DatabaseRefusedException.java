package nearworld.app.database;

/** The database cannot be used as it is set up; the message says to the person who starts the server what to change. */
class DatabaseRefusedException extends IllegalStateException {
    private static final long serialVersionUID = 1L;

    DatabaseRefusedException(String message) {
        super(message);
    }

    DatabaseRefusedException(String message, Throwable cause) {
        super(message, cause);
    }
}
