package nearworld.engine.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Measures over the score against sums over the atoms themselves. The error of degree-9 interpolation with steps of h is
 * h^10·max|f^(10)|·max|Π(s − j)|/10!, with s halfway between the two middle nodes (0.5·1.5·2.5·3.5·4.5)² = 872 and
 * f = exp(−H·e^x) having a tenth derivative below 7.1e3 whatever H: 0.08^10·7.1e3·872/3628800 = 1.9e-11.
 */
class ScoreGridTest {
    private static final long SEED = 5001;
    private static final double ONE_SPREADING = 1e-10;

    private record Atoms(double[] scores, double[] masses, ScoreMeasure measure, ScoreGrid grid) {
        static Atoms of(double steepest) {
            Random random = new Random(SEED);
            ScoreGrid grid = new ScoreGrid(-4, 5, steepest, false);
            ScoreMeasure measure = new ScoreMeasure(grid);
            double[] scores = new double[200];
            double[] masses = new double[200];
            for (int i = 0; i < scores.length; i++) {
                scores[i] = -3 + 6 * random.nextDouble();
                masses[i] = random.nextDouble() / 100;
                measure.add(scores[i], masses[i]);
            }
            return new Atoms(scores, masses, measure, grid);
        }

        double exactly(double g, double hazard, double shift) {
            double sum = 0;
            for (int i = 0; i < scores.length; i++) {
                sum += masses[i] * Math.exp(-hazard * Math.exp(g * (scores[i] + shift)));
            }
            return sum;
        }

        double onGrid(ScoreMeasure of, double g, double hazard) {
            double[] function = new double[grid.size()];
            for (int n = 0; n < function.length; n++) {
                function[n] = Math.exp(-hazard * Math.exp(g * grid.score(n)));
            }
            return of.integral(function);
        }
    }

    @ParameterizedTest
    @ValueSource(doubles = {0.2, 1, 1.6, 2.5})
    void interpolationKeepsItsBound(double g) {
        Atoms atoms = Atoms.of(g);
        double size = Arrays.stream(atoms.masses()).sum();
        for (double hazard = 1e-8; hazard < 1e3; hazard *= 1.7) {
            assertThat(atoms.onGrid(atoms.measure(), g, hazard))
                    .as("H = %s, seed %d", hazard, SEED)
                    .isEqualTo(atoms.exactly(g, hazard, 0), within(ONE_SPREADING * size));
        }
    }

    /** Shifts by what is no multiple of the step spread once more each. */
    @Test
    void shiftsAddUp() {
        Atoms atoms = Atoms.of(1.6);
        ScoreMeasure moved = atoms.measure();
        double shift = 0;
        for (double by : new double[] {0.31, -0.77, 1.234, 0.05, -0.6}) {
            ScoreMeasure next = new ScoreMeasure(atoms.grid());
            next.addShifted(moved, by, 1);
            moved = next;
            shift += by;
        }
        double size = Arrays.stream(atoms.masses()).sum();
        for (double hazard = 1e-6; hazard < 100; hazard *= 3) {
            assertThat(atoms.onGrid(moved, 1.6, hazard))
                    .as("H = %s", hazard)
                    .isEqualTo(atoms.exactly(1.6, hazard, shift), within(6 * ONE_SPREADING * size));
        }
    }

    /** Scores that add up: a convolution is a shift by each atom of the other. */
    @Test
    void aConvolutionAddsScores() {
        Atoms atoms = Atoms.of(1);
        ScoreMeasure other = new ScoreMeasure(atoms.grid());
        other.add(0.4321, 0.3);
        other.add(-0.8765, 0.7);
        ScoreMeasure sum = new ScoreMeasure(atoms.grid());
        sum.addConvolution(atoms.measure(), other, 2);

        double exactly = 2 * (0.3 * atoms.exactly(1, 0.2, 0.4321) + 0.7 * atoms.exactly(1, 0.2, -0.8765));
        assertThat(atoms.onGrid(sum, 1, 0.2)).isEqualTo(exactly, within(1e-9));
    }

    /** Lagrange's weights reproduce polynomials up to degree 9 (Abramowitz and Stegun 25.2.1). */
    @Test
    void weightsReproducePolynomials() {
        double[] w = new double[ScoreGrid.POINTS];
        for (double s = 0; s <= 1; s += 0.125) {
            ScoreGrid.lagrange(s, w);
            for (int degree = 0; degree < ScoreGrid.POINTS; degree++) {
                double sum = 0;
                for (int j = 0; j < w.length; j++) {
                    sum += w[j] * Math.pow(j - 4, degree);
                }
                assertThat(sum).as("s = %s, degree %d", s, degree).isEqualTo(Math.pow(s, degree), within(1e-8));
            }
        }
    }

    @Test
    void trimmingKeepsTheWhole() {
        Atoms atoms = Atoms.of(1);
        double before = atoms.measure().total();

        atoms.measure().trim();

        assertThat(atoms.measure().total()).isEqualTo(before, within(1e-15));
        assertThat(atoms.measure().to()).isLessThan(atoms.grid().size());
    }
}
