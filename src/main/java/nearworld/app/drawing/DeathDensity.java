package nearworld.app.drawing;

import java.util.List;

/**
 * The density of the time of death, as the share of those alive today who die within the year around each moment:
 * d(t) = (S(t − ½) − S(t + ½)) / 1 year, t in half-years from today. At t = 0 and below half a year the window is cut at today and
 * the share scaled to a year, so that the ink begins at full height and not with an artificial slope.
 */
final class DeathDensity {
    private static final int STEP_MONTHS = 6;
    private static final int HALF_WINDOW_MONTHS = 6;

    private final double[] perYear;

    DeathDensity(List<Double> monthly) {
        int steps = (monthly.size() - 1) / STEP_MONTHS + 1;
        perYear = new double[steps];
        for (int i = 0; i < steps; i++) {
            int from = Math.max(0, i * STEP_MONTHS - HALF_WINDOW_MONTHS);
            int to = Math.min(monthly.size() - 1, i * STEP_MONTHS + HALF_WINDOW_MONTHS);
            perYear[i] = (monthly.get(from) - monthly.get(to)) * 12 / (to - from);
        }
    }

    int size() {
        return perYear.length;
    }

    /** Years from today of a point. */
    static double years(int i) {
        return i * STEP_MONTHS / 12.0;
    }

    /** Share of those alive today that die per year around a point. */
    double at(int i) {
        return perYear[i];
    }

    double peak() {
        return java.util.Arrays.stream(perYear).max().orElse(0);
    }
}
