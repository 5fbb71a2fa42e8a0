package nearworld.app.drawing;

import java.time.LocalDate;
import java.time.temporal.ChronoUnit;
import java.util.stream.Stream;

/** The one time axis of a drawing: from days to units across. */
final class TimeScale {
    static final double DAYS_PER_YEAR = 365.25;
    /** The axis ends where in every world fewer than this share are alive: further on there is nothing to see. */
    private static final double ALL_BUT_GONE = 0.002;
    /** The past is never narrower than this, so that a person without history still has a left of today. */
    private static final double LEAST_PAST_YEARS = 3;

    private final LocalDate today;
    private final double startYears;
    private final double endYears;
    private final double left;
    private final double right;

    private TimeScale(LocalDate today, double startYears, double endYears, double left, double right) {
        this.today = today;
        this.startYears = startYears;
        this.endYears = endYears;
        this.left = left;
        this.right = right;
    }

    static TimeScale of(Lifeline lifeline, Format format) {
        double first = Stream.of(
                        lifeline.lanes().stream().flatMap(TimeScale::days),
                        lifeline.flags().stream().map(Lifeline.Flag::on),
                        lifeline.strips().stream().map(Lifeline.Strip::parting).flatMap(TimeScale::day))
                .flatMap(days -> days)
                .mapToDouble(day -> years(lifeline.today(), day))
                .min()
                .orElse(0);
        double end = lifeline.strips().stream()
                .mapToDouble(s -> lastYears(s.monthly()))
                .max()
                .orElseThrow();
        double past = Math.max(LEAST_PAST_YEARS, -first * 1.03 + 0.4);
        return new TimeScale(lifeline.today(), -past, end, format.left(), format.right());
    }

    private static Stream<LocalDate> days(Lifeline.Lane lane) {
        return Stream.concat(
                Stream.ofNullable(lane.from()), lane.marks().stream().map(Lifeline.Mark::on));
    }

    private static Stream<LocalDate> day(Lifeline.@org.jspecify.annotations.Nullable Parting parting) {
        return parting == null ? Stream.empty() : Stream.ofNullable(parting.on());
    }

    private static double lastYears(java.util.List<Double> monthly) {
        int month = monthly.size() - 1;
        while (month > 1 && monthly.get(month - 1) < ALL_BUT_GONE) {
            month--;
        }
        return month / 12.0;
    }

    static double years(LocalDate today, LocalDate day) {
        return ChronoUnit.DAYS.between(today, day) / DAYS_PER_YEAR;
    }

    double x(LocalDate day) {
        return xAfter(years(today, day));
    }

    /** @param years from today, negative in the past */
    double xAfter(double years) {
        double within = Math.min(Math.max(years, startYears), endYears);
        return left + (within - startYears) / (endYears - startYears) * (right - left);
    }

    double today() {
        return xAfter(0);
    }

    double left() {
        return left;
    }

    double right() {
        return right;
    }

    double endYears() {
        return endYears;
    }

    /** Units across for one year. */
    double unitsPerYear() {
        return (right - left) / (endYears - startYears);
    }

    LocalDate day(double years) {
        return today.plusDays(Math.round(years * DAYS_PER_YEAR));
    }

    LocalDate firstDay() {
        return day(startYears);
    }

    LocalDate lastDay() {
        return day(endYears);
    }
}
