package nearworld.engine.basics;

/**
 * A gamma distribution of mean 1 as equally probable bins, each at its mean.
 *
 * <p>With shape k = 1/variance, E[Z; Z ≤ q] = P(k + 1, k·q), P the regularised incomplete gamma function (Abramowitz and
 * Stegun 6.5.1), computed by its series 6.5.29 and its continued fraction 6.5.31 to about 1e-14.
 */
public final class GammaBins {
    private static final int MAX_TERMS = 20_000;
    private static final double PRECISION = 1e-16;
    private static final double[] LANCZOS = {
        0.99999999999980993,
        676.5203681218851,
        -1259.1392167224028,
        771.32342877765313,
        -176.61502916214059,
        12.507343278686905,
        -0.13857109526572012,
        9.9843695780195716e-6,
        1.5056327351493116e-7
    };

    private GammaBins() {}

    /**
     * The bin means, rising; their average is 1.
     *
     * @param variance 0 gives the single value 1
     * @param points number of bins, at least 1
     */
    public static double[] means(double variance, int points) {
        if (!(variance >= 0) || points < 1) {
            throw new IllegalArgumentException(
                    "variance and points must be >= 0 and >= 1, are " + variance + ", " + points);
        }
        if (variance == 0 || points == 1) {
            return new double[] {1};
        }
        double shape = 1 / variance;
        double[] means = new double[points];
        double below = 0;
        for (int i = 0; i < points; i++) {
            double upTo = i == points - 1 ? 1 : regularised(shape + 1, quantile(shape, (i + 1.0) / points));
            means[i] = points * (upTo - below);
            below = upTo;
        }
        return means;
    }

    private static double quantile(double shape, double probability) {
        double low = 0;
        double high = shape + 10;
        while (regularised(shape, high) < probability) {
            high *= 2;
        }
        while (true) {
            double middle = (low + high) / 2;
            if (!(middle > low && middle < high)) {
                return middle;
            }
            if (regularised(shape, middle) < probability) {
                low = middle;
            } else {
                high = middle;
            }
        }
    }

    /** P(a, x) = γ(a, x)/Γ(a) for a > 0, x ≥ 0. */
    static double regularised(double a, double x) {
        if (x == 0) {
            return 0;
        }
        double front = StrictMath.exp(a * StrictMath.log(x) - x - logGamma(a));
        if (x < a + 1) {
            double term = 1 / a;
            double sum = term;
            for (int n = 1; n < MAX_TERMS && term > sum * PRECISION; n++) {
                term *= x / (a + n);
                sum += term;
            }
            return front * sum;
        }
        double b = x + 1 - a;
        double c = 1e300;
        double d = 1 / b;
        double fraction = d;
        for (int n = 1; n < MAX_TERMS; n++) {
            double an = -n * (n - a);
            b += 2;
            d = 1 / (an * d + b);
            c = b + an / c;
            double step = c * d;
            fraction *= step;
            if (Math.abs(step - 1) < PRECISION) {
                break;
            }
        }
        return 1 - front * fraction;
    }

    /** ln Γ(a) for a > 0 by Lanczos' approximation (g = 7, n = 9), relative error about 1e-15. */
    static double logGamma(double a) {
        double x = a - 1;
        double sum = LANCZOS[0];
        for (int i = 1; i < LANCZOS.length; i++) {
            sum += LANCZOS[i] / (x + i);
        }
        double t = x + 7.5;
        return 0.91893853320467274178 + (x + 0.5) * StrictMath.log(t) - t + StrictMath.log(sum);
    }
}
