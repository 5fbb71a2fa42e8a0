package nearworld.app.drawing;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** The part left of today: a lane for each type of event and one for the onsets, placed first and drawn later. */
final class HistoryBand {
    private static final double LABEL_SIZE = 11;
    private static final double TITLE_SIZE = 13;
    private static final double LEVEL_HEIGHT = 13.5;
    private static final double MARK_ROOM = 20;
    private static final double GAP = 9;
    private static final int MOST_LEVELS = 5;

    private final Lifeline lifeline;
    private final Format format;
    private final TimeScale time;
    private final List<Row> rows = new ArrayList<>();
    private double bottom;

    /** A lane with its place: {@code y} is the line on which its marks sit. */
    private record Row(
            String title,
            double y,
            double titleY,
            Lifeline.@Nullable Lane lane,
            List<LabelStack.Placed> labels,
            Swarm swarm) {}

    HistoryBand(Lifeline lifeline, Format format, TimeScale time, double top) {
        this.lifeline = lifeline;
        this.format = format;
        this.time = time;
        this.bottom = top;
        lifeline.lanes().forEach(lane -> add(lane.title(), lane, wishes(lane)));
        if (!lifeline.flags().isEmpty()) {
            add(lifeline.words().knownSince(), null, flagWishes());
        }
    }

    double bottom() {
        return bottom;
    }

    private void add(String title, Lifeline.@Nullable Lane lane, List<LabelStack.Wish> wishes) {
        LabelStack stack = new LabelStack(format.width() - 4, LABEL_SIZE, MOST_LEVELS);
        List<LabelStack.Placed> labels = stack.place(wishes);
        double titleRoom = format.wordsBeside() ? 0 : TITLE_SIZE + 4;
        double y = bottom + titleRoom + LabelStack.levels(labels) * LEVEL_HEIGHT + MARK_ROOM / 2;
        double titleY = format.wordsBeside() ? y + 4.5 : bottom + TITLE_SIZE;
        Swarm swarm = Swarm.of(wishes.stream().map(LabelStack.Wish::x).toList());
        rows.add(new Row(title, y, titleY, lane, labels, swarm));
        bottom = y + swarm.depth() + MARK_ROOM / 2 + GAP;
    }

    private List<LabelStack.Wish> wishes(Lifeline.Lane lane) {
        return lane.marks().stream()
                .map(m -> new LabelStack.Wish(time.x(m.on()), format.brief() ? m.brief() : m.label()))
                .toList();
    }

    private List<LabelStack.Wish> flagWishes() {
        return lifeline.flags().stream()
                .map(f -> new LabelStack.Wish(time.x(f.on()), format.brief() ? f.brief() : f.label()))
                .toList();
    }

    void draw(Svg svg) {
        for (Row row : rows) {
            title(svg, row);
            leaders(svg, row);
            if (row.lane() == null) {
                lifeline.flags().forEach(f -> Signs.flag(svg, time.x(f.on()), signY(row, f.on())));
            } else {
                window(svg, row.lane().from(), row.lane().to(), row.y());
                row.lane().marks().forEach(m -> Signs.mark(svg, time.x(m.on()), signY(row, m.on()), m.severity()));
            }
            labels(svg, row);
        }
    }

    private double signY(Row row, LocalDate day) {
        return row.y() + row.swarm().offset(time.x(day));
    }

    private void title(Svg svg, Row row) {
        double room = format.wordsBeside() ? format.left() - 16 : format.right() - format.textLeft();
        int count = row.lane() == null
                ? lifeline.flags().size()
                : row.lane().marks().size();
        String counted = row.title() + (count > row.labels().size() ? " · " + count : "");
        if (format.wordsBeside()) {
            List<String> lines = Lettering.wrap(counted, TITLE_SIZE, room);
            for (int i = 0; i < lines.size(); i++) {
                double y = row.titleY() - (lines.size() - 1) * 7.0 + i * 14;
                svg.text(format.left() - 12, y, TITLE_SIZE, Ink.TEXT, "end", lines.get(i));
            }
        } else {
            svg.text(
                    format.textLeft(),
                    row.titleY(),
                    TITLE_SIZE,
                    Ink.TEXT,
                    "start",
                    Lettering.fit(counted, TITLE_SIZE, room));
        }
    }

    private void window(Svg svg, @Nullable LocalDate from, @Nullable LocalDate to, double y) {
        if (from != null && to != null) {
            double x = time.x(from);
            svg.rect(x, y - 3.5, time.x(to) - x, 7, Ink.RULE);
            svg.line(x, y - 6, x, y + 6, Ink.CONTRAST, 1);
            svg.line(time.x(to), y - 6, time.x(to), y + 6, Ink.CONTRAST, 1);
        } else {
            svg.line(time.left(), y, time.today(), y, Ink.RULE, 1);
        }
    }

    private void leaders(Svg svg, Row row) {
        for (LabelStack.Placed label : row.labels()) {
            if (label.level() > 0) {
                svg.line(
                        label.x(),
                        row.y() + row.swarm().offset(label.x()),
                        label.x(),
                        labelY(row, label) + 2,
                        Ink.CONTRAST,
                        0.8);
            }
        }
    }

    private void labels(Svg svg, Row row) {
        for (LabelStack.Placed label : row.labels()) {
            double y = labelY(row, label);
            svg.patch(label.from() - 1, y - 9.5, label.to() - label.from() + 2, 12, Ink.PAPER);
            svg.text(label.from(), y, LABEL_SIZE, Ink.MUTED, "start", label.words());
        }
    }

    private static double labelY(Row row, LabelStack.Placed label) {
        return row.y() - MARK_ROOM / 2 - 1 - label.level() * LEVEL_HEIGHT;
    }
}
