package nearworld.app.drawing;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;

/** The part right of today: one strip of ink for each world, with its quantiles below and the table's outline behind. */
final class WorldStrips {
    /** A world that dies much faster than all others is cut at this multiple of the table's peak, lest they vanish. */
    private static final double CUT_AT_TABLE_PEAKS = 3.2;

    private static final int FEW = 6;
    private static final double TITLE_SIZE = 13.5;
    private static final double NOTE_SIZE = 11.5;

    private final Lifeline lifeline;
    private final Format format;
    private final TimeScale time;
    private final double inkHeight;
    private final double pitch;
    private final double top;
    private final List<DeathDensity> densities;
    private final double unitsPerDensity;

    WorldStrips(Lifeline lifeline, Format format, TimeScale time, double top) {
        this.lifeline = lifeline;
        this.format = format;
        this.time = time;
        this.top = top;
        int count = lifeline.strips().size();
        this.inkHeight = count <= FEW ? 50 : 40;
        this.pitch = inkHeight + (format.wordsBeside() ? 26 : 54);
        this.densities = lifeline.strips().stream()
                .map(s -> new DeathDensity(s.monthly()))
                .toList();
        double highest =
                densities.stream().mapToDouble(DeathDensity::peak).max().orElseThrow();
        double cap = densities.get(0).peak() * CUT_AT_TABLE_PEAKS;
        this.unitsPerDensity = inkHeight / Math.max(Math.min(highest, cap), 1e-9);
    }

    double bottom() {
        return top + lifeline.strips().size() * pitch;
    }

    /** The line on which a strip's ink stands. */
    private double base(int strip) {
        return top + strip * pitch + pitch - 17;
    }

    void draw(Svg svg) {
        for (int i = 0; i < lifeline.strips().size(); i++) {
            strip(svg, i);
        }
        partings(svg);
        for (int i = 0; i < lifeline.strips().size(); i++) {
            Lifeline.Strip strip = lifeline.strips().get(i);
            spread(svg, strip, base(i) + 8);
            words(svg, strip, base(i));
        }
    }

    private void strip(Svg svg, int i) {
        Lifeline.Strip strip = lifeline.strips().get(i);
        double base = base(i);
        if (strip.kind() == Lifeline.Kind.TABLE) {
            svg.fill(area(i, base, 0, Double.MAX_VALUE), Ink.TABLE);
        } else {
            svg.fill(area(0, base, 0, Double.MAX_VALUE), Ink.BEHIND);
            ink(svg, i, strip, base);
            svg.stroke(outline(0, base, 0), Ink.PAPER, 1.1, "1.5 2.5");
        }
        svg.line(time.today(), base, time.right(), base, Ink.RULE, 1);
    }

    private void ink(Svg svg, int i, Lifeline.Strip strip, double base) {
        double parting = partingYears(strip);
        if (strip.kind() == Lifeline.Kind.CONTRAST) {
            svg.stroke(outline(i, base, 0), Ink.CONTRAST, 1.4, "");
            return;
        }
        if (parting > 0) {
            svg.fill(area(recorded(), base, 0, parting), Ink.CONTRAST);
        }
        svg.fill(
                area(i, base, Math.max(0, parting), Double.MAX_VALUE),
                strip.kind().ink());
    }

    private double partingYears(Lifeline.Strip strip) {
        Lifeline.Parting parting = strip.parting();
        return parting == null || parting.on() == null ? 0 : TimeScale.years(lifeline.today(), parting.on());
    }

    private int recorded() {
        return IntStream.range(0, lifeline.strips().size())
                .filter(i -> lifeline.strips().get(i).kind() == Lifeline.Kind.RECORDED)
                .findFirst()
                .orElseThrow();
    }

    private String outline(int i, double base, double fromYears) {
        StringBuilder path = new StringBuilder();
        for (double[] p : points(i, base, fromYears, Double.MAX_VALUE)) {
            path.append(path.isEmpty() ? 'M' : 'L')
                    .append(Svg.n(p[0]))
                    .append(' ')
                    .append(Svg.n(p[1]));
        }
        return path.toString();
    }

    private String area(int i, double base, double fromYears, double toYears) {
        List<double[]> points = points(i, base, fromYears, toYears);
        StringBuilder path = new StringBuilder("M" + Svg.n(points.get(0)[0]) + " " + Svg.n(base));
        points.forEach(p -> path.append('L').append(Svg.n(p[0])).append(' ').append(Svg.n(p[1])));
        return path + "L" + Svg.n(points.get(points.size() - 1)[0]) + " " + Svg.n(base) + "Z";
    }

    private List<double[]> points(int i, double base, double fromYears, double toYears) {
        DeathDensity density = densities.get(i);
        double end = Math.min(time.endYears(), toYears);
        List<double[]> points = new ArrayList<>();
        points.add(point(density, base, fromYears));
        for (int k = 0; k < density.size(); k++) {
            double years = DeathDensity.years(k);
            if (years > fromYears && years < end) {
                points.add(point(density, base, years));
            }
        }
        points.add(point(density, base, end));
        return points;
    }

    private double[] point(DeathDensity density, double base, double years) {
        int below = Math.min((int) (years * 2), density.size() - 1);
        int above = Math.min(below + 1, density.size() - 1);
        double weight = years * 2 - below;
        double value = density.at(below) + (density.at(above) - density.at(below)) * Math.min(1, weight);
        return new double[] {time.xAfter(years), base - Math.min(value * unitsPerDensity, inkHeight)};
    }

    private void spread(Svg svg, Lifeline.Strip strip, double y) {
        Lifeline.Spread s = strip.spread();
        Ink ink = strip.kind() == Lifeline.Kind.TABLE
                ? Ink.CONTRAST
                : strip.kind().ink();
        svg.line(time.xAfter(s.tenth()), y, time.xAfter(s.nineTenths()), y, ink, 1.6);
        double quarter = time.xAfter(s.quarter());
        svg.rect(quarter, y - 2.5, time.xAfter(s.threeQuarters()) - quarter, 5, ink);
        double half = time.xAfter(s.half());
        svg.rect(half - 2.6, y - 6, 5.2, 12, Ink.PAPER);
        svg.rect(half - 1.1, y - 7, 2.2, 14, Ink.TEXT);
    }

    private void words(Svg svg, Lifeline.Strip strip, double base) {
        if (format.wordsBeside()) {
            double room = format.left() - 24;
            List<String> lines = Lettering.wrap(strip.title(), TITLE_SIZE + 1, room);
            for (int i = 0; i < lines.size(); i++) {
                double y = base - 15 - (lines.size() - 1 - i) * 15;
                svg.text(format.textLeft(), y, TITLE_SIZE, Ink.TEXT, "start", lines.get(i), true);
            }
            svg.text(
                    format.textLeft(),
                    base + 1,
                    NOTE_SIZE,
                    Ink.MUTED,
                    "start",
                    Lettering.fit(strip.note(), NOTE_SIZE, room));
            svg.text(format.width() - 6, base - 15, 16, Ink.TEXT, "end", strip.figure(), true);
            svg.text(format.width() - 6, base + 1, NOTE_SIZE, Ink.MUTED, "end", strip.figureNote());
            return;
        }
        wordsAbove(svg, strip, base - inkHeight - 20);
    }

    private void wordsAbove(Svg svg, Lifeline.Strip strip, double y) {
        double left = format.textLeft();
        double right = format.right();
        double figure = Lettering.width(strip.figure(), 15.5);
        String title = Lettering.fit(strip.title(), TITLE_SIZE + 1, right - left - figure - 12);
        svg.patch(left, y - 12, Lettering.width(title, TITLE_SIZE), 31, Ink.PAPER);
        svg.text(left, y, TITLE_SIZE, Ink.TEXT, "start", title, true);
        svg.text(right, y, 15, Ink.TEXT, "end", strip.figure(), true);
        double note = right - left - Lettering.width(strip.figureNote(), NOTE_SIZE) - 10;
        if (Lettering.width(strip.note(), NOTE_SIZE) <= note) {
            svg.text(left, y + 15, NOTE_SIZE, Ink.MUTED, "start", strip.note());
        }
        svg.text(right, y + 15, NOTE_SIZE, Ink.MUTED, "end", strip.figureNote());
    }

    /** The lived line of the recorded world, and where the others leave it. */
    private void partings(Svg svg) {
        double line = base(recorded());
        svg.line(time.left(), line, time.today(), line, Ink.RECORDED, 1.8);
        List<Double> taken = new ArrayList<>();
        for (int i = 0; i < lifeline.strips().size(); i++) {
            Lifeline.Parting parting = lifeline.strips().get(i).parting();
            if (parting != null) {
                double x = parting.on() == null ? time.left() : time.x(parting.on());
                parting(svg, lifeline.strips().get(i).kind().ink(), free(x, taken), line, base(i));
            }
        }
    }

    /** Worlds that part at the same moment leave side by side. */
    private double free(double wanted, List<Double> taken) {
        // A world that parts today leaves just before the line of today, so that both can be seen.
        double x = Math.abs(wanted - time.today()) < 6 ? time.today() - 6 : wanted;
        while (x - 4 > time.left() && isTaken(x, taken)) {
            x -= 4;
        }
        while (isTaken(x, taken)) {
            x += 4;
        }
        taken.add(x);
        return x;
    }

    private static boolean isTaken(double x, List<Double> taken) {
        return taken.stream().anyMatch(t -> Math.abs(t - x) < 3.5);
    }

    private void parting(Svg svg, Ink ink, double x, double from, double to) {
        double radius = Math.min(10, Math.max(0, time.today() - x));
        double bend = to > from ? to - radius : to + radius;
        String path = "M" + Svg.n(x) + " " + Svg.n(from) + "V" + Svg.n(bend) + "Q" + Svg.n(x) + " " + Svg.n(to) + " "
                + Svg.n(x + radius) + " " + Svg.n(to);
        boolean past = x < time.today() - 0.5;
        svg.stroke(past ? path + "H" + Svg.n(time.today()) : path, ink, 1.5, "");
        svg.circle(x, from, 3.2, Ink.PAPER, ink, 1.6);
        if (!past) {
            svg.circle(x, to, 3.2, ink, ink, 1);
        }
    }
}
