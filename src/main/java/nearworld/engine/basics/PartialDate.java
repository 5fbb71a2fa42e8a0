package nearworld.engine.basics;

import java.time.LocalDate;

/**
 * A date as people remember it: a day, a month or a year. It stands for the middle of its period: the 16th of a month,
 * the 1st of July of a year.
 *
 * @param earliest first day of the period
 * @param latest last day of the period
 * @param middle the day that the calculation uses
 */
public record PartialDate(LocalDate earliest, LocalDate latest, LocalDate middle) {
    public PartialDate {
        if (middle.isBefore(earliest) || latest.isBefore(middle)) {
            throw new IllegalArgumentException("the middle " + middle + " must lie within " + earliest + ".." + latest);
        }
    }

    public static PartialDate ofDay(LocalDate day) {
        return new PartialDate(day, day, day);
    }

    public static PartialDate ofMonth(int year, int month) {
        LocalDate first = LocalDate.of(year, month, 1);
        return new PartialDate(first, first.plusMonths(1).minusDays(1), LocalDate.of(year, month, 16));
    }

    public static PartialDate ofYear(int year) {
        return new PartialDate(LocalDate.of(year, 1, 1), LocalDate.of(year, 12, 31), LocalDate.of(year, 7, 1));
    }

    public boolean isExact() {
        return earliest.equals(latest);
    }
}
