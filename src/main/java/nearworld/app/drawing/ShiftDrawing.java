package nearworld.app.drawing;

/**
 * Draws how a probability moved: an open ring before, a full dot after, on a line from 0 to 1. It repeats numbers that
 * stand beside it, so it is hidden from screen readers.
 */
public final class ShiftDrawing {
    private static final double WIDTH = 150;
    private static final double HEIGHT = 18;
    private static final double MARGIN = 7;

    private ShiftDrawing() {}

    /**
     * The drawing as the text of an SVG document, without an XML declaration.
     *
     * @param before within [0, 1]
     * @param after within [0, 1]
     */
    public static String svg(double before, double after) {
        if (!(before >= 0 && before <= 1 && after >= 0 && after <= 1)) {
            throw new IllegalArgumentException("probabilities must lie within 0..1, are " + before + " and " + after);
        }
        Svg svg = new Svg();
        svg.openSilent(WIDTH, HEIGHT);
        double y = HEIGHT / 2;
        svg.line(MARGIN, y, WIDTH - MARGIN, y, Ink.RULE, 1.5);
        svg.line(MARGIN, y - 4, MARGIN, y + 4, Ink.RULE, 1.5);
        svg.line(WIDTH - MARGIN, y - 4, WIDTH - MARGIN, y + 4, Ink.RULE, 1.5);
        svg.line(x(before), y, x(after), y, Ink.RECORDED, 3);
        svg.circle(x(before), y, 4.2, Ink.PAPER, Ink.RECORDED, 1.8);
        svg.circle(x(after), y, 5, Ink.RECORDED, Ink.PAPER, 0.8);
        return svg.close();
    }

    private static double x(double probability) {
        return MARGIN + probability * (WIDTH - 2 * MARGIN);
    }
}
