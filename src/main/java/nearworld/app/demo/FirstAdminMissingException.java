package nearworld.app.demo;

/** Nobody could sign in: the installation is empty, and no first admin is named. */
class FirstAdminMissingException extends RuntimeException {
    private static final long serialVersionUID = 1L;

    FirstAdminMissingException() {
        super("nobody can sign in yet, and no first admin is named");
    }
}
