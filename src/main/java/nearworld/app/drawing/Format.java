package nearworld.app.drawing;

/** How wide a drawing is: it is laid out afresh for each, with letters of the same size, and never merely shrunk. */
public enum Format {
    /** For a whole page, 1160 units: words left and right of the strips. */
    WIDE(1160, 226, 166, 5),
    /** For a column beside a form, 720 units: words above the strips. */
    MEDIUM(720, 14, 14, 5),
    /** For a telephone, 358 units. */
    NARROW(358, 4, 4, 10);

    private final double width;
    private final double leftGutter;
    private final double rightGutter;
    private final int yearStep;

    Format(double width, double leftGutter, double rightGutter, int yearStep) {
        this.width = width;
        this.leftGutter = leftGutter;
        this.rightGutter = rightGutter;
        this.yearStep = yearStep;
    }

    double width() {
        return width;
    }

    double left() {
        return leftGutter;
    }

    /** Where words begin: right of the lines of worlds that always were different. */
    double textLeft() {
        return wordsBeside() ? 8 : leftGutter + 14;
    }

    double right() {
        return width - rightGutter;
    }

    /** Years between two ticks, at least. */
    int yearStep() {
        return yearStep;
    }

    /** Whether words stand beside the strips, rather than above them. */
    boolean wordsBeside() {
        return this == WIDE;
    }

    boolean brief() {
        return this == NARROW;
    }

    String key() {
        return name().toLowerCase(java.util.Locale.ROOT);
    }
}
