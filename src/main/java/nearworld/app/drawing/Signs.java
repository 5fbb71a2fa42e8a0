package nearworld.app.drawing;

/** The signs of the history: shapes that tell outcomes apart without colour, and the flag of an onset. */
final class Signs {
    /** Outcomes from this rank on share one sign. */
    static final int MOST_SEVERE = 3;

    private Signs() {}

    /** The mildest outcome is an open ring, then a square, a lozenge and a four-pointed star. */
    static void mark(Svg svg, double x, double y, int severity) {
        switch (Math.min(severity, MOST_SEVERE)) {
            case 0 -> svg.circle(x, y, 5, Ink.PAPER, Ink.TEXT, 2);
            case 1 -> polygon(svg, x, y, -5, -5, 5, -5, 5, 5, -5, 5);
            case 2 -> polygon(svg, x, y, 0, -7.5, 7.5, 0, 0, 7.5, -7.5, 0);
            default -> polygon(svg, x, y, 0, -10, 2.6, -2.6, 10, 0, 2.6, 2.6, 0, 10, -2.6, 2.6, -10, 0, -2.6, -2.6);
        }
    }

    static void flag(Svg svg, double x, double y) {
        polygon(svg, x, y, 0, -7.5, 11, -4, 0, -0.5);
        svg.line(x, y - 7.5, x, y + 8, Ink.TEXT, 1.5);
    }

    private static void polygon(Svg svg, double x, double y, double... offsets) {
        StringBuilder path = new StringBuilder();
        for (int i = 0; i < offsets.length; i += 2) {
            path.append(i == 0 ? 'M' : 'L')
                    .append(Svg.n(x + offsets[i]))
                    .append(' ')
                    .append(Svg.n(y + offsets[i + 1]));
        }
        svg.sign(path.append('Z').toString());
    }
}
