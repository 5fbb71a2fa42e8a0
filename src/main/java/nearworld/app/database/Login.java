package nearworld.app.database;

/** A database role and its password; the password stays out of every printed form. */
record Login(String user, String password) {
    @Override
    public String toString() {
        return "Login[" + user + "]";
    }
}
