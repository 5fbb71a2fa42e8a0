package nearworld.engine.basics;

/**
 * A number of an evidence pack with its 95% interval.
 *
 * @param value the point value, finite
 * @param low lower end of the 95% interval, NaN where none is given
 * @param high upper end of the 95% interval, NaN where none is given
 */
public record Estimate(double value, double low, double high) {
    public Estimate {
        if (!Double.isFinite(value)) {
            throw new IllegalArgumentException("value must be finite, is " + value);
        }
        if (Double.isNaN(low) != Double.isNaN(high)) {
            throw new IllegalArgumentException("an interval needs both ends, is " + low + " to " + high);
        }
        if (!Double.isNaN(low) && !(low <= value && value <= high)) {
            throw new IllegalArgumentException(
                    "the interval must hold the value, is " + low + " to " + high + " around " + value);
        }
    }

    /** A number without an interval. */
    public static Estimate of(double value) {
        return new Estimate(value, Double.NaN, Double.NaN);
    }

    public boolean hasInterval() {
        return !Double.isNaN(low);
    }
}
