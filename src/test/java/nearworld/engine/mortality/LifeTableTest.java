package nearworld.engine.mortality;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import nearworld.engine.basics.Sex;
import nearworld.engine.mortality.MortalityTable.AgeBasis;
import nearworld.engine.mortality.MortalityTable.Column;
import nearworld.engine.mortality.MortalityTable.WithinYear;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;

/** A table of three ages by hand: q = 0.1, 0.2, 1 at 50, 51, 52. */
class LifeTableTest {
    private static LifeTable life(AgeBasis basis, WithinYear within, Double... q) {
        Column column = new Column(Sex.MALE, List.of(), 50, List.of(q));
        return new MortalityTable("hand", basis, within, "general", List.of(column)).life(column);
    }

    /**
     * Years lived by one alive at the start of a year: uniform 1 − q/2, constant force q/−ln p, Balducci (p/q)·(−ln p); the
     * last year, where q = 1, is uniform in all: ½ of 0.72. (Bowers et al., Actuarial Mathematics, section 3.6, from memory.)
     */
    @ParameterizedTest
    @CsvSource({"UNIFORM, 2.12", "CONSTANT_FORCE, 2.1157777793", "BALDUCCI, 2.1115614257"})
    void expectationOfThreeYears(WithinYear within, double byHand) {
        assertThat(life(AgeBasis.EXACT, within, 0.1, 0.2, 1.0).expectation(50)).isEqualTo(byHand, within(1e-9));
    }

    /** Half a year: 1 − q/2, √p, p/(1 − q/2). */
    @ParameterizedTest
    @CsvSource({"UNIFORM, 0.95", "CONSTANT_FORCE, 0.9486832980505138", "BALDUCCI, 0.9473684210526315"})
    void halfAYear(WithinYear within, double byHand) {
        assertThat(life(AgeBasis.EXACT, within, 0.1, 0.2, 1.0).survival(50, 50.5))
                .isEqualTo(byHand, within(1e-15));
    }

    /** A quarter into the second year: q/(1 − s·q), −ln p, q/(1 − (1 − s)·q). */
    @ParameterizedTest
    @CsvSource({"UNIFORM, 0.21052631578947367", "CONSTANT_FORCE, 0.2231435513142097", "BALDUCCI, 0.23529411764705882"})
    void forceOfMortality(WithinYear within, double byHand) {
        assertThat(life(AgeBasis.EXACT, within, 0.1, 0.2, 1.0).force(51.25)).isEqualTo(byHand, within(1e-15));
    }

    @ParameterizedTest
    @EnumSource(WithinYear.class)
    void theForceIsTheSlopeOfTheCumulativeHazard(WithinYear within) {
        LifeTable life = life(AgeBasis.EXACT, within, 0.1, 0.2, 1.0);
        double h = 1e-6;
        for (double age : new double[] {50.1, 50.7, 51.3, 51.9, 52.4}) {
            double slope = (life.cumulativeHazard(age + h) - life.cumulativeHazard(age - h)) / (2 * h);

            assertThat(life.force(age)).as("age %s", age).isEqualTo(slope, within(1e-8));
        }
    }

    @ParameterizedTest
    @EnumSource(WithinYear.class)
    void theExpectationIsTheIntegralOfSurvival(WithinYear within) {
        LifeTable life = life(AgeBasis.LAST, within, 0.1, 0.2, 0.4, 1.0);
        for (double age : new double[] {50.5, 50.9, 51.5, 52.25, 53.6}) {
            int n = 400_000;
            double sum = 0;
            double h = (life.omega() - age) / n;
            for (int i = 0; i < n; i++) {
                sum += h * life.survival(age, age + (i + 0.5) * h);
            }

            assertThat(life.expectation(age)).as("age %s", age).isEqualTo(sum, within(1e-9));
        }
    }

    /** Age last birthday 50 covers exact ages 50 to 51, of middle 50.5: the rate of 50 runs from there on. */
    @Test
    void ageLastBirthdayReadsHalfAYearBelow() {
        LifeTable last = life(AgeBasis.LAST, WithinYear.CONSTANT_FORCE, 0.1, 0.2, 1.0);

        assertThat(last.firstAge()).isEqualTo(50.5);
        assertThat(last.omega()).isEqualTo(53.5);
        assertThat(last.survival(50.5, 51.5)).isEqualTo(0.9, within(1e-15));
        assertThat(last.survival(51, 52)).isEqualTo(Math.sqrt(0.9 * 0.8), within(1e-15));
        assertThat(last.nextBreak(51)).isEqualTo(51.5);
        assertThat(last.nextBreak(51.5)).isEqualTo(52.5);
    }

    @Test
    void ageNearestReadsAtTheAge() {
        LifeTable nearest = life(AgeBasis.NEAREST, WithinYear.UNIFORM, 0.1, 0.2, 1.0);

        assertThat(nearest.firstAge()).isEqualTo(50);
        assertThat(nearest.survival(50, 51)).isEqualTo(0.9, within(1e-15));
        assertThat(nearest.nextBreak(50)).isEqualTo(51);
        assertThat(nearest.nextBreak(50.99)).isEqualTo(51);
    }

    @Test
    void aClosedTableEndsAtItsLastAge() {
        LifeTable life = life(AgeBasis.EXACT, WithinYear.CONSTANT_FORCE, 0.1, 0.2, 1.0);

        assertThat(life.isExtended()).isFalse();
        assertThat(life.omega()).isEqualTo(53);
        assertThat(life.survival(50, 52.75)).isEqualTo(0.9 * 0.8 * 0.25, within(1e-15));
        assertThat(life.survival(50, 53)).isZero();
        assertThat(life.cumulativeHazard(53)).isEqualTo(Double.POSITIVE_INFINITY);
    }

    /** The last rate goes on to 119, nobody is counted beyond 120: 70 − 50 years of p = 0.9 and so on. */
    @Test
    void anOpenTableRepeatsItsLastRateUpTo119() {
        LifeTable life = life(AgeBasis.EXACT, WithinYear.CONSTANT_FORCE, 0.1, 0.2);

        assertThat(life.isExtended()).isTrue();
        assertThat(life.omega()).isEqualTo(120);
        assertThat(life.survival(50, 119)).isEqualTo(0.9 * Math.pow(0.8, 68), within(1e-18));
        assertThat(life.survival(50, 120)).isZero();
        double force = -Math.log(0.8);
        double secondOn = 0.9 * (1 - Math.pow(0.8, 69)) / force;
        assertThat(life.expectation(50)).isEqualTo(0.1 / -Math.log(0.9) + secondOn, within(1e-12));
    }

    @Test
    void zeroRatesAreYearsLivedInFull() {
        LifeTable life = life(AgeBasis.EXACT, WithinYear.CONSTANT_FORCE, 0.0, 0.0, 1.0);

        assertThat(life.expectation(50)).isEqualTo(2.5, within(1e-12));
        assertThat(life.force(50.5)).isZero();
    }

    @Test
    void refusesAgesOutside() {
        LifeTable life = life(AgeBasis.EXACT, WithinYear.UNIFORM, 0.1, 0.2, 1.0);

        assertThatThrownBy(() -> life.cumulativeHazard(49.9))
                .hasMessageContaining("49.9")
                .hasMessageContaining("50");
        assertThatThrownBy(() -> life.force(53)).hasMessageContaining("53.0");
        assertThatThrownBy(() -> life.force(Double.NaN)).hasMessageContaining("NaN");
    }

    @Test
    void refusesRatesThatAreNone() {
        assertThatThrownBy(() -> life(AgeBasis.EXACT, WithinYear.UNIFORM, 0.1, 1.2))
                .hasMessageContaining("1.2")
                .hasMessageContaining("51");
        assertThatThrownBy(() -> life(AgeBasis.EXACT, WithinYear.UNIFORM, -0.1)).hasMessageContaining("-0.1");
        assertThatThrownBy(() -> life(AgeBasis.EXACT, WithinYear.UNIFORM, Double.NaN))
                .hasMessageContaining("NaN");
        assertThatThrownBy(() -> life(AgeBasis.EXACT, WithinYear.UNIFORM, 1.0, 0.5))
                .hasMessageContaining("50");
    }
}
