package nearworld.app.drawing;

import java.time.LocalDate;
import java.time.temporal.ChronoUnit;

/** Draws a lifeline. Stateless; the same input gives the same bytes. */
public final class LifelineDrawing {
    private static final double HEAD = 34;
    private static final double AXIS = 40;
    private static final double BAND_GAP = 16;
    private static final double SMALL = 12;
    /** Ticks closer than this have no room for four digits. */
    private static final double LEAST_TICK_UNITS = 38;

    private LifelineDrawing() {}

    /** The drawing as the text of an SVG document, without an XML declaration, so that it can stand in a page. */
    public static String svg(Lifeline lifeline, Format format) {
        TimeScale time = TimeScale.of(lifeline, format);
        Svg svg = new Svg();
        HistoryBand history = new HistoryBand(lifeline, format, time, HEAD);
        double worldsTop = history.bottom() + BAND_GAP;
        WorldStrips worlds = new WorldStrips(lifeline, format, time, worldsTop);
        Legend legend = new Legend(lifeline, format, svg);
        double axis = worlds.bottom() + 4;
        Lifeline.Words words = lifeline.words();
        svg.open(
                "lifeline-" + format.key(),
                format.width(),
                axis + AXIS + legend.height() + 6,
                words.title(),
                words.description());
        ticks(svg, lifeline, format, time, axis);
        svg.line(time.today(), HEAD - 12, time.today(), axis, Ink.TEXT, 1.3);
        today(svg, words.today(), format, time.today());
        history.draw(svg);
        worlds.draw(svg);
        legend.draw(svg, axis + AXIS);
        return svg.close();
    }

    private static void today(Svg svg, String words, Format format, double x) {
        double width = Lettering.width(words, SMALL);
        boolean fits = x + width < format.width();
        String anchor = fits ? "start" : "end";
        svg.text(fits ? x : format.width() - 2, HEAD - 18, SMALL, Ink.TEXT, anchor, words, true);
    }

    private static void ticks(Svg svg, Lifeline lifeline, Format format, TimeScale time, double axis) {
        int step = step(format, time);
        LocalDate first = time.firstDay();
        String prefix = format.wordsBeside() ? "" : lifeline.words().age() + " ";
        for (int year = Math.floorDiv(first.getYear(), step) * step;
                year <= time.lastDay().getYear();
                year += step) {
            LocalDate day = LocalDate.of(year, 1, 1);
            if (!day.isBefore(first) && !day.isAfter(time.lastDay())) {
                tick(svg, time.x(day), axis, year, prefix + age(lifeline, day));
                prefix = "";
            }
        }
        if (format.wordsBeside()) {
            svg.text(8, axis + 16, SMALL, Ink.MUTED, "start", lifeline.words().year());
            svg.text(8, axis + 31, SMALL, Ink.MUTED, "start", lifeline.words().age());
        }
    }

    private static int step(Format format, TimeScale time) {
        int step = format.yearStep();
        while (step * time.unitsPerYear() < LEAST_TICK_UNITS) {
            step *= 2;
        }
        return step;
    }

    private static void tick(Svg svg, double x, double axis, int year, String age) {
        svg.line(x, HEAD - 12, x, axis, Ink.RULE, 0.8);
        svg.text(x, axis + 16, SMALL, Ink.MUTED, "middle", Integer.toString(year));
        boolean cut = x < Lettering.width(age, SMALL) / 2;
        svg.text(cut ? 0 : x, axis + 31, SMALL, Ink.MUTED, cut ? "start" : "middle", age);
    }

    private static String age(Lifeline lifeline, LocalDate day) {
        long years = ChronoUnit.YEARS.between(lifeline.born(), day);
        return day.isBefore(lifeline.born()) ? "" : Long.toString(years);
    }
}
