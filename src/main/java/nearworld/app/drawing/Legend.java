package nearworld.app.drawing;

import java.util.ArrayList;
import java.util.List;
import java.util.function.BiConsumer;

/** The line below the drawing that explains its signs; only the signs that were used. */
final class Legend {
    private static final double SIZE = 11.5;
    private static final double LINE = 19;
    private static final double SIGN = 26;
    private static final double GAP = 16;

    private final List<Entry> entries = new ArrayList<>();
    private final Format format;

    private record Entry(String words, BiConsumer<Double, Double> sign) {}

    /** An entry with its place. */
    private record Placed(Entry entry, double x, double line) {}

    Legend(Lifeline lifeline, Format format, Svg svg) {
        this.format = format;
        Lifeline.Words words = lifeline.words();
        int worst = lifeline.lanes().stream()
                .flatMap(l -> l.marks().stream())
                .mapToInt(Lifeline.Mark::severity)
                .max()
                .orElse(-1);
        if (worst >= 0) {
            add(words.mildest(), (x, y) -> Signs.mark(svg, x + 14, y, 0));
        }
        if (worst > 0) {
            add(words.severest(), (x, y) -> Signs.mark(svg, x + 14, y, worst));
        }
        if (lifeline.lanes().stream().anyMatch(l -> l.from() != null)) {
            add(words.watched(), (x, y) -> svg.rect(x + 2, y - 3.5, 20, 7, Ink.RULE));
        }
        add(words.median(), (x, y) -> svg.rect(x + 12, y - 7, 2.2, 14, Ink.TEXT));
        add(words.middleHalf(), (x, y) -> svg.rect(x + 2, y - 2.5, 20, 5, Ink.CONTRAST));
        add(words.middleMost(), (x, y) -> svg.line(x + 2, y, x + 22, y, Ink.CONTRAST, 1.6));
        add(words.tableBehind(), (x, y) -> svg.rect(x + 2, y - 5, 20, 10, Ink.BEHIND));
        if (lifeline.strips().stream().anyMatch(s -> s.parting() != null)) {
            add(words.parts(), (x, y) -> svg.circle(x + 13, y, 3.2, Ink.PAPER, Ink.WHAT_IF, 1.6));
        }
    }

    private void add(String words, BiConsumer<Double, Double> sign) {
        entries.add(new Entry(words, sign));
    }

    double height() {
        List<Placed> places = places();
        return (places.get(places.size() - 1).line() + 1) * LINE;
    }

    void draw(Svg svg, double top) {
        for (Placed p : places()) {
            double y = top + p.line() * LINE + LINE / 2;
            p.entry().sign().accept(p.x(), y);
            svg.text(p.x() + SIGN, y + 4, SIZE, Ink.MUTED, "start", p.entry().words());
        }
    }

    private List<Placed> places() {
        List<Placed> places = new ArrayList<>();
        double left = format.wordsBeside() ? 8 : format.left();
        double x = left;
        int line = 0;
        for (Entry entry : entries) {
            double width = SIGN + Lettering.width(entry.words(), SIZE);
            if (x > left && x + width > format.width() - 4) {
                x = left;
                line++;
            }
            places.add(new Placed(entry, x, line));
            x += width + GAP;
        }
        return places;
    }
}
