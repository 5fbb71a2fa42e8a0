package nearworld.engine.inference;

import java.util.List;
import nearworld.engine.basics.Sex;

/**
 * What is known about a person, dates resolved to days (counted from 1970-01-01) and occurrences merged into episodes.
 * Indices are those of the evidence pack.
 *
 * @param bornDay day of birth
 * @param today the assessment day
 * @param levels level by behaviour, -1 where unknown
 * @param habits a habit that was given up, by behaviour; null where none was
 * @param onsetDay day of onset by condition, {@link #NO_DAY} where it is not dated
 * @param occurrences by day, episodes merged
 */
public record Evidence(
        Sex sex,
        long bornDay,
        long today,
        List<Integer> levels,
        List<GivenUp> habits,
        List<Long> onsetDay,
        List<Said> statements,
        List<Found> findings,
        List<Window> windows,
        List<Occurrence> occurrences) {
    /** No day is given. */
    public static final long NO_DAY = Long.MIN_VALUE;
    /** Days in a year, by the model's definition of exact age. */
    public static final double DAYS_PER_YEAR = 365.25;

    public Evidence {
        levels = List.copyOf(levels);
        habits = List.copyOf(habits);
        onsetDay = List.copyOf(onsetDay);
        statements = List.copyOf(statements);
        findings = List.copyOf(findings);
        windows = List.copyOf(windows);
        occurrences = List.copyOf(occurrences);
    }

    /** A habit given up on a day, from a level to the one that is known. */
    public record GivenUp(int behaviour, long since, int left) {}

    /** A source said that a condition was present or absent on a day. */
    public record Said(int condition, boolean present, int source, long day) {}

    /** A finding's level on a day. */
    public record Found(int finding, int level, long day) {}

    /** All occurrences of an event within the window are known. */
    public record Window(int event, long from, long to) {}

    /**
     * An occurrence, or an episode of several.
     *
     * @param day of the first date
     * @param lastDay of the last date, from which the after-effect runs
     */
    public record Occurrence(int event, long day, long lastDay, int outcome) {}

    /** Exact age in years on a day. */
    public double age(long day) {
        return (day - bornDay) / DAYS_PER_YEAR;
    }

    /** x, the exact age today. */
    public double age() {
        return age(today);
    }

    /** Years from today to a day, negative for the past. */
    public double yearsFromToday(long day) {
        return (day - today) / DAYS_PER_YEAR;
    }
}
