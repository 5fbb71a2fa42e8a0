package nearworld.engine.basics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.List;
import nearworld.engine.basics.AgeCurve.Scale;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class AgeCurveTest {
    private static AgeCurve curve(Scale scale, double[] ages, double... values) {
        List<Estimate> estimates = Arrays.stream(values).mapToObj(Estimate::of).toList();
        return AgeCurve.of(scale, ages, estimates);
    }

    /** The middle of a straight line in the logarithm is the geometric mean. */
    @Test
    void ratesRunInTheLogarithm() {
        AgeCurve rate = curve(Scale.LOG, new double[] {40, 60}, 0.002, 0.018);

        assertThat(rate.at(50)).isEqualTo(0.006, within(1e-15));
        assertThat(rate.at(20)).isEqualTo(0.002, within(1e-15));
        assertThat(rate.at(90)).isEqualTo(0.018, within(1e-15));
    }

    /** Odds 1/9 and 4: the middle has odds 2/3, a probability of 0.4. */
    @Test
    void probabilitiesRunInTheLogit() {
        AgeCurve prevalence = curve(Scale.LOGIT, new double[] {40, 60}, 0.1, 0.8);

        assertThat(prevalence.at(50)).isEqualTo(0.4, within(1e-15));
        assertThat(prevalence.at(40)).isEqualTo(0.1, within(1e-15));
    }

    @ParameterizedTest
    @CsvSource({"45, 46", "30, 100", "20, 35", "85, 90", "59.5, 60.5", "40, 80", "61.2, 61.2"})
    void integralAgreesWithQuadrature(double from, double to) {
        AgeCurve rate = curve(Scale.LOG, new double[] {40, 60, 80}, 0.002, 0.008, 0.0079999);

        assertThat(rate.integral(from, to)).isEqualTo(midpoints(rate, from, to), within(1e-9));
    }

    private static double midpoints(AgeCurve rate, double from, double to) {
        int n = 200_000;
        double h = (to - from) / n;
        double sum = 0;
        for (int i = 0; i < n; i++) {
            sum += rate.at(from + (i + 0.5) * h) * h;
        }
        return sum;
    }

    @Test
    void refusesWhatHasNoLogarithm() {
        assertThatThrownBy(() -> curve(Scale.LOG, new double[] {40}, 0)).hasMessageContaining("0.0");
        assertThatThrownBy(() -> curve(Scale.LOGIT, new double[] {40}, 1)).hasMessageContaining("1.0");
        assertThatThrownBy(() -> curve(Scale.LOG, new double[] {40, 40}, 1, 2)).hasMessageContaining("40.0");
        assertThatThrownBy(() -> curve(Scale.LOGIT, new double[] {40}, 0.1).integral(40, 41))
                .hasMessageContaining("LOGIT");
    }
}
