package nearworld.engine.basics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class GammaBinsTest {
    /**
     * Percentage points of χ² as printed in Abramowitz and Stegun, table 26.8 (digits from memory, that of ν = 4 at ½ corrected by recomputation): P(ν/2, χ²/2) is the
     * probability below, to half a unit of the last digit.
     */
    @ParameterizedTest
    @CsvSource({
        "1, 0.454936, 0.5", "1, 3.84146, 0.95", "2, 1.38629, 0.5", "2, 5.99146, 0.95", "4, 3.35669, 0.5",
        "4, 9.48773, 0.95", "10, 9.34182, 0.5", "10, 18.3070, 0.95", "10, 23.2093, 0.99", "20, 31.4104, 0.95"
    })
    void regularisedGammaAgreesWithPrintedChiSquarePoints(int degrees, double point, double below) {
        double halfUnit = point < 1 ? 5e-7 : point < 10 ? 5e-6 : 5e-5;
        double density = density(degrees / 2.0, point / 2) / 2;

        assertThat(GammaBins.regularised(degrees / 2.0, point / 2))
                .isEqualTo(below, within(halfUnit * density + 1e-12));
    }

    private static double density(double shape, double x) {
        return Math.exp((shape - 1) * Math.log(x) - x - GammaBins.logGamma(shape));
    }

    /** Γ(n) = (n − 1)! and Γ(½) = √π. */
    @Test
    void logGammaAtKnownPoints() {
        double factorial = 1;
        for (int n = 1; n <= 20; n++) {
            factorial *= Math.max(1, n - 1);
            assertThat(GammaBins.logGamma(n)).as("n = %d", n).isEqualTo(Math.log(factorial), within(1e-13 * n));
        }
        assertThat(GammaBins.logGamma(0.5)).isEqualTo(Math.log(Math.PI) / 2, within(1e-14));
    }

    @ParameterizedTest
    @CsvSource({"0.05, 9", "0.3, 9", "0.5, 4", "1, 9", "1.7, 7", "2, 30"})
    void binsRiseAndAverageToOne(double variance, int points) {
        double[] means = GammaBins.means(variance, points);

        assertThat(means).hasSize(points).isSorted();
        assertThat(Arrays.stream(means).average().orElseThrow()).isEqualTo(1, within(2e-14));
    }

    /**
     * Each bin against a Simpson sum of the density: bounds are walked to with steps of equal probability, and z·f(z) is
     * summed between them.
     */
    @ParameterizedTest
    @CsvSource({"0.3, 9", "0.45, 5", "0.1, 7"})
    void binsAgreeWithQuadrature(double variance, int points) {
        double shape = 1 / variance;
        double[] means = GammaBins.means(variance, points);
        int bin = 0;
        double probability = 0;
        double mean = 0;
        double h = 2e-5;
        for (double z = 0; bin < points - 1; z += h) {
            double f0 = z == 0 ? 0 : shape * density(shape, shape * z);
            double f1 = shape * density(shape, shape * (z + h / 2));
            double f2 = shape * density(shape, shape * (z + h));
            double p = h / 6 * (f0 + 4 * f1 + f2);
            double m = h / 6 * (z * f0 + 4 * (z + h / 2) * f1 + (z + h) * f2);
            double end = (bin + 1.0) / points;
            if (probability + p >= end) {
                double part = (end - probability) / p;
                assertThat((mean + part * m) * points)
                        .as("bin %d of variance %s", bin, variance)
                        .isEqualTo(means[bin], within(1e-7));
                mean = (1 - part) * m;
                bin++;
            } else {
                mean += m;
            }
            probability += p;
        }
        assertThat(bin).isEqualTo(points - 1);
    }

    @Test
    void noVarianceIsOneBin() {
        assertThat(GammaBins.means(0, 9)).containsExactly(1);
        assertThat(GammaBins.means(0.4, 1)).containsExactly(1);
    }

    @Test
    void refusesWhatIsNoVariance() {
        assertThatThrownBy(() -> GammaBins.means(Double.NaN, 9)).hasMessageContaining("NaN");
        assertThatThrownBy(() -> GammaBins.means(-0.1, 9)).hasMessageContaining("-0.1");
        assertThatThrownBy(() -> GammaBins.means(0.3, 0)).hasMessageContaining("0");
    }
}
