package nearworld.engine.mortality;

import nearworld.engine.mortality.MortalityTable.WithinYear;

/**
 * The survival of one life by a table, closed at the top.
 *
 * <p>All ages are exact, in years. H(a) = −ln l(a) is the force of mortality integrated from the table's first age.
 */
public final class LifeTable {
    /** A table whose last rate is below 1 repeats it up to this age. */
    public static final int LAST_CLOSING_AGE = 119;
    /** Nobody is counted beyond this exact age. */
    public static final double LAST_AGE = 120;

    private final int firstAge;
    private final double[] q;
    private final double[] hazardBefore;
    private final WithinYear withinYear;
    private final double shift;
    private final boolean extended;

    LifeTable(int firstAge, double[] q, WithinYear withinYear, double shift, boolean extended) {
        this.firstAge = firstAge;
        this.q = q.clone();
        this.withinYear = withinYear;
        this.shift = shift;
        this.extended = extended;
        this.hazardBefore = new double[q.length + 1];
        for (int i = 0; i < q.length; i++) {
            hazardBefore[i + 1] = hazardBefore[i] - StrictMath.log1p(-q[i]);
        }
    }

    /** The lowest exact age that the table speaks of. */
    public double firstAge() {
        return firstAge + shift;
    }

    /** ω: the exact age that nobody outlives. */
    public double omega() {
        return Math.min(firstAge + q.length + shift, LAST_AGE);
    }

    /** True where the table's last rate was below 1 and was repeated up to age {@value #LAST_CLOSING_AGE}. */
    public boolean isExtended() {
        return extended;
    }

    /** H(a), infinite from ω of a closed table on. */
    public double cumulativeHazard(double age) {
        double a = age - shift - firstAge;
        if (!(a >= 0)) {
            throw new IllegalArgumentException("age must be at least " + firstAge() + ", is " + age);
        }
        int year = (int) a;
        if (year >= q.length) {
            return extended ? hazardBefore[q.length] : Double.POSITIVE_INFINITY;
        }
        return hazardBefore[year] + hazardWithin(q[year], a - year);
    }

    private double hazardWithin(double rate, double s) {
        if (rate == 1 || withinYear == WithinYear.UNIFORM) {
            return -StrictMath.log1p(-s * rate);
        }
        if (withinYear == WithinYear.BALDUCCI) {
            return StrictMath.log1p(-(1 - s) * rate) - StrictMath.log1p(-rate);
        }
        return -s * StrictMath.log1p(-rate);
    }

    /** μ(a), the force of mortality a year. */
    public double force(double age) {
        double a = age - shift - firstAge;
        int year = (int) a;
        if (!(a >= 0) || year >= q.length) {
            throw new IllegalArgumentException("age must lie within " + firstAge() + ".." + omega() + ", is " + age);
        }
        double rate = q[year];
        double s = a - year;
        if (rate == 1 || withinYear == WithinYear.UNIFORM) {
            return rate / (1 - s * rate);
        }
        return withinYear == WithinYear.BALDUCCI ? rate / (1 - (1 - s) * rate) : -StrictMath.log1p(-rate);
    }

    /** The first age above {@code age} at which the force of mortality may jump. */
    public double nextBreak(double age) {
        return Math.floor(age - shift - firstAge + 1) + shift + firstAge;
    }

    /**
     * The complete expectation of remaining life at an exact age, in years: ∫ S0 to ω, each year of age in closed form.
     *
     * @param age within {@link #firstAge()} and ω
     */
    public double expectation(double age) {
        double sum = 0;
        double reached = 1;
        double a = age;
        while (a < omega()) {
            double next = Math.min(nextBreak(a), omega());
            sum += reached * livedBetween(a, next);
            reached *= StrictMath.exp(cumulativeHazard(a) - cumulativeHazard(next));
            a = next;
        }
        return sum;
    }

    /** Years lived between two ages of the same year of age by somebody alive at the first. */
    private double livedBetween(double from, double to) {
        double a = from - shift - firstAge;
        int year = (int) Math.floor(a + 1e-12);
        double rate = q[year];
        double s = Math.max(0, a - year);
        double end = s + (to - from);
        if (rate == 0) {
            return to - from;
        }
        if (rate == 1 || withinYear == WithinYear.UNIFORM) {
            return ((end - s) - rate * (end * end - s * s) / 2) / (1 - s * rate);
        }
        if (withinYear == WithinYear.BALDUCCI) {
            double start = 1 - (1 - s) * rate;
            return StrictMath.log((1 - (1 - end) * rate) / start) / rate * start;
        }
        double force = -StrictMath.log1p(-rate);
        return -StrictMath.expm1(-force * (end - s)) / force;
    }

    /** S0: the probability that a life of age {@code from} reaches age {@code to}; 0 beyond ω. */
    public double survival(double from, double to) {
        if (to >= omega()) {
            return 0;
        }
        return StrictMath.exp(cumulativeHazard(from) - cumulativeHazard(to));
    }
}
