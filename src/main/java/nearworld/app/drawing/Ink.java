package nearworld.app.drawing;

/**
 * The inks of a drawing: a colour for white paper, and the class by which a stylesheet may give it another. They differ
 * in lightness first, so that they stay apart in greyscale; no meaning hangs on a hue alone.
 */
public enum Ink {
    PAPER("#fbfbf8"),
    RULE("#d9dcd8"),
    TEXT("#1e2930"),
    MUTED("#566067"),
    TABLE("#c4c7c2"),
    BEHIND("#e3e5e1"),
    REVEALED("#6f9aa3"),
    RECORDED("#16404c"),
    WHAT_IF("#8b5a84"),
    CONTRAST("#6b7479"),
    NONE("none");

    private final String colour;

    Ink(String colour) {
        this.colour = colour;
    }

    /** The colour on white paper, for example {@code #16404c}. */
    public String colour() {
        return colour;
    }

    String key() {
        return name().toLowerCase(java.util.Locale.ROOT).replace('_', '-');
    }
}
