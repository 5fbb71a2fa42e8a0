package nearworld.oracle;

/** A gamma distribution of mean 1 cut into bins of equal probability, each at its mean. */
final class FrailtyBins {
    private FrailtyBins() {}

    static double[] of(double variance, int points) {
        double[] means = new double[points];
        if (variance == 0) {
            java.util.Arrays.fill(means, 1);
            return means;
        }
        double shape = 1 / variance;
        double below = 0;
        for (int i = 0; i < points; i++) {
            // E[Z; Z < t] of a gamma of mean 1 is the distribution function of the next shape at t.
            double upTo = i == points - 1 ? 1 : lowerGamma(shape + 1, quantile(shape, (i + 1.0) / points));
            means[i] = points * (upTo - below);
            below = upTo;
        }
        return means;
    }

    /** Quantile of the gamma of this shape and scale 1, by bisection. */
    private static double quantile(double shape, double p) {
        double low = 0;
        double high = shape + 1;
        while (lowerGamma(shape, high) < p) {
            high *= 2;
        }
        for (int i = 0; i < 200; i++) {
            double middle = 0.5 * (low + high);
            if (lowerGamma(shape, middle) < p) {
                low = middle;
            } else {
                high = middle;
            }
        }
        return 0.5 * (low + high);
    }

    /** Regularised lower incomplete gamma by its power series, which converges everywhere and suits these sizes. */
    private static double lowerGamma(double shape, double t) {
        if (t <= 0) {
            return 0;
        }
        double term = 1 / shape;
        double sum = term;
        for (int n = 1; n < 100_000 && term > sum * 1e-18; n++) {
            term *= t / (shape + n);
            sum += term;
        }
        return sum * Math.exp(shape * Math.log(t) - t - logGamma(shape));
    }

    /** Stirling's series after shifting the argument above 30. */
    private static double logGamma(double s) {
        double shift = 0;
        double y = s;
        while (y < 30) {
            shift += Math.log(y);
            y++;
        }
        double r = 1 / (y * y);
        double series = (1.0 / 12 - r * (1.0 / 360 - r * (1.0 / 1260 - r / 1680))) / y;
        return (y - 0.5) * Math.log(y) - y + 0.5 * Math.log(2 * Math.PI) + series - shift;
    }
}
