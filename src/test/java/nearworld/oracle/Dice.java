package nearworld.oracle;

import java.util.List;
import java.util.Random;

/** Seeded draws. */
final class Dice {
    private final Random random;

    Dice(long seed) {
        random = new Random(seed);
    }

    /** One of low, …, high. */
    int whole(int low, int high) {
        return low + random.nextInt(high - low + 1);
    }

    double between(double low, double high) {
        return low + (high - low) * random.nextDouble();
    }

    /** Uniform in the logarithm. */
    double ratio(double low, double high) {
        return Math.exp(between(Math.log(low), Math.log(high)));
    }

    boolean chance(double p) {
        return random.nextDouble() < p;
    }

    <T> T of(List<T> choices) {
        return choices.get(random.nextInt(choices.size()));
    }

    /** A probability in whole thousandths, so that it and what is left of 1 add up. */
    double thousandths(double low, double high) {
        return Math.round(1000 * between(low, high)) / 1000.0;
    }

    /** To five digits, so that a failing example can be read. */
    static double round(double value) {
        return new java.math.BigDecimal(value)
                .round(new java.math.MathContext(5))
                .doubleValue();
    }
}
