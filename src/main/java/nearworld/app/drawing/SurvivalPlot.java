package nearworld.app.drawing;

import java.util.List;
import java.util.Locale;

/** Draws survival curves. What-ifs share one ink and are told apart by their dashes and by a letter on the line. */
public final class SurvivalPlot {
    private static final double TOP = 30;
    private static final double SMALL = 12;
    private static final double KEY_LINE = 19;
    private static final double ALL_BUT_GONE = 0.002;
    private static final List<String> DASHES =
            List.of("", "7 3", "2 2.5", "10 3 2 3", "4 4", "12 5", "1.5 4", "8 2 2 2 2 2");

    private final SurvivalCurves plot;
    private final Format format;
    private final Svg svg = new Svg();
    private final double left = 44;
    private final double right;
    private final double bottom;
    private final double years;

    private SurvivalPlot(SurvivalCurves plot, Format format) {
        this.plot = plot;
        this.format = format;
        this.right = format.width() - 14;
        this.bottom = TOP + Math.min(340, format.width() * 0.62);
        this.years =
                plot.curves().stream().mapToDouble(c -> last(c.monthly())).max().orElse(1);
    }

    /** The drawing as the text of an SVG document, without an XML declaration. */
    public static String svg(SurvivalCurves plot, Format format) {
        return new SurvivalPlot(plot, format).draw();
    }

    private static double last(List<Double> monthly) {
        int month = monthly.size() - 1;
        while (month > 12 && monthly.get(month - 1) < ALL_BUT_GONE) {
            month--;
        }
        return month / 12.0;
    }

    private String draw() {
        double keyTop = bottom + 44;
        svg.open(
                "survival-" + format.key(),
                format.width(),
                keyTop + keyLines() * KEY_LINE + 6,
                plot.title(),
                plot.description());
        svg.text(4, 14, SMALL, Ink.MUTED, "start", plot.alive());
        grid();
        int whatIf = 0;
        for (SurvivalCurves.Curve curve : plot.curves()) {
            boolean changed = curve.kind() == Lifeline.Kind.WHAT_IF;
            curve(curve, changed ? DASHES.get(whatIf % DASHES.size()) : dashes(curve.kind()), whatIf);
            whatIf += changed ? 1 : 0;
        }
        key(keyTop);
        return svg.close();
    }

    private void grid() {
        for (int percent = 0; percent <= 100; percent += 25) {
            double y = y(percent / 100.0);
            svg.line(left, y, right, y, Ink.RULE, percent == 50 ? 1.4 : 0.8);
            svg.text(left - 6, y + 4, SMALL, Ink.MUTED, "end", percent + "%");
        }
        int step = format.yearStep();
        for (int year = 0; year <= years; year += step) {
            double x = x(year);
            svg.line(x, TOP, x, bottom, Ink.RULE, 0.8);
            svg.text(x, bottom + 16, SMALL, Ink.MUTED, "middle", Integer.toString(year));
            svg.text(x, bottom + 31, SMALL, Ink.MUTED, "middle", age(year));
        }
        svg.text(4, bottom + 16, SMALL, Ink.MUTED, "start", plot.yearsFromToday());
        svg.text(4, bottom + 31, SMALL, Ink.MUTED, "start", plot.age());
    }

    private String age(int year) {
        return String.format(Locale.ROOT, "%d", (int) Math.floor(plot.startAge() + year));
    }

    private void curve(SurvivalCurves.Curve curve, String dashes, int whatIf) {
        StringBuilder path = new StringBuilder();
        int end = Math.min(curve.monthly().size() - 1, (int) Math.ceil(years * 12));
        for (int month = 0; month <= end; month = month == end ? end + 1 : Math.min(month + 6, end)) {
            path.append(month == 0 ? 'M' : 'L')
                    .append(Svg.n(x(month / 12.0)))
                    .append(' ')
                    .append(Svg.n(y(curve.monthly().get(month))));
        }
        svg.stroke(path.toString(), curve.kind().ink(), weight(curve.kind()), dashes);
        if (!curve.letter().isEmpty()) {
            letter(curve, 0.84 - 0.11 * (whatIf % 7));
        }
    }

    /** The letter sits where the curve falls through a height of its own, so that letters of close curves stay apart. */
    private void letter(SurvivalCurves.Curve curve, double height) {
        int month = 0;
        while (month < curve.monthly().size() - 1 && curve.monthly().get(month) > height) {
            month++;
        }
        double x = x(month / 12.0);
        double y = y(curve.monthly().get(month));
        svg.circle(x, y, 8.5, Ink.PAPER, Ink.WHAT_IF, 1.2);
        svg.text(x, y + 4, 11, Ink.TEXT, "middle", curve.letter(), true);
    }

    private static String dashes(Lifeline.Kind kind) {
        return kind == Lifeline.Kind.CONTRAST ? "1.5 3" : "";
    }

    private static double weight(Lifeline.Kind kind) {
        return switch (kind) {
            case TABLE -> 6;
            case REVEALED -> 3;
            case RECORDED -> 3;
            case WHAT_IF -> 1.8;
            case CONTRAST -> 1.4;
        };
    }

    private int keyLines() {
        return (plot.curves().size() + keyColumns() - 1) / keyColumns();
    }

    private int keyColumns() {
        return format.brief() ? 1 : format.wordsBeside() ? 3 : 2;
    }

    private void key(double top) {
        double column = (format.width() - 8) / keyColumns();
        int whatIf = 0;
        for (int i = 0; i < plot.curves().size(); i++) {
            SurvivalCurves.Curve curve = plot.curves().get(i);
            double x = 4 + (i % keyColumns()) * column;
            double y = top + (i / keyColumns()) * KEY_LINE + KEY_LINE / 2;
            boolean changed = curve.kind() == Lifeline.Kind.WHAT_IF;
            String dashes = changed ? DASHES.get(whatIf++ % DASHES.size()) : dashes(curve.kind());
            svg.stroke(
                    "M" + Svg.n(x) + " " + Svg.n(y) + "H" + Svg.n(x + 34),
                    curve.kind().ink(),
                    weight(curve.kind()),
                    dashes);
            String name = curve.letter().isEmpty() ? curve.name() : curve.letter() + "  " + curve.name();
            svg.text(x + 42, y + 4, SMALL, Ink.TEXT, "start", Lettering.fit(name, SMALL, column - 48));
        }
    }

    private double x(double yearsFromToday) {
        return left + Math.min(yearsFromToday, years) / years * (right - left);
    }

    private double y(double alive) {
        return bottom - alive * (bottom - TOP);
    }
}
