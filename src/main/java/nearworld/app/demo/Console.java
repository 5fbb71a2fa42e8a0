package nearworld.app.demo;

/** What only the person at the console is to read, and no log file is to keep. */
final class Console {
    private Console() {}

    static void print(String text) {
        System.out.println("\n" + text + "\n");
    }
}
