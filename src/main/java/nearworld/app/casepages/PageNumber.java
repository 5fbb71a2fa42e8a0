package nearworld.app.casepages;

/** The number of a page as an address has it. */
final class PageNumber {
    private PageNumber() {}

    /** The number typed, or 1 where it is none. */
    static int parse(String typed) {
        return typed.matches("[0-9]{1,6}") ? Math.max(1, Integer.parseInt(typed)) : 1;
    }
}
