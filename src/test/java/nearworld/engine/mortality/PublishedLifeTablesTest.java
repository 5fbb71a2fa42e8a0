package nearworld.engine.mortality;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.stream.Stream;
import nearworld.engine.Inputs;
import nearworld.engine.basics.Sex;
import nearworld.engine.mortality.MortalityTable.Column;
import nearworld.engine.mortality.MortalityTable.WithinYear;
import nearworld.oracle.Oracles;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * {@code oracles/life_table_checks.csv}: expectations, medians and n-year survival of the population tables of the United
 * States 2010 and 2014 and of Finland 2013, by a recursion in R and a separate summation in Python.
 *
 * <p>Closing {@code A_q1} sets the last q to 1. Closing {@code B_hold} holds the last hazard for ever, ours only up to
 * age 120: what the file counts beyond is S(120)·e(120), e(120) of a life whose q never changes, and is added here in closed
 * form. All rows are checked; medians and survival, which have no closing, lie far below the tables' ends.
 */
class PublishedLifeTablesTest {
    private static final double TOLERANCE = 1e-9;

    static Stream<String> rows() {
        return Oracles.text("life_table_checks.csv").lines().skip(1);
    }

    @ParameterizedTest
    @MethodSource("rows")
    void agree(String row) {
        List<String> cells = Arrays.asList(row.split(","));
        boolean closedByOne = cells.get(2).equals("A_q1");
        String quantity = cells.get(4);
        WithinYear within = quantity.contains("uniform") ? WithinYear.UNIFORM : WithinYear.CONSTANT_FORCE;
        Column column = column(cells.get(0), Sex.valueOf(cells.get(1).toUpperCase(Locale.ROOT)), closedByOne);
        LifeTable life = new MortalityTable("check", MortalityTable.AgeBasis.EXACT, within, "general", List.of(column))
                .life(column);
        double age = Double.parseDouble(cells.get(3));

        double actual = quantity(life, quantity, age);
        if (cells.get(2).equals("B_hold")) {
            double last = column.qx().get(column.qx().size() - 1);
            actual += Math.exp(life.cumulativeHazard(age) - life.cumulativeHazard(LifeTable.LAST_AGE))
                    * beyond(quantity, last);
        }

        assertThat(actual).isEqualTo(Double.parseDouble(cells.get(5)), within(TOLERANCE));
    }

    /** Curtate Σ p^k from k = 0 (the year that ends at 120 is one of them), complete 1/μ, uniform p/q + ½. */
    private static double beyond(String quantity, double q) {
        if (quantity.startsWith("curtate")) {
            return 1 / q;
        }
        return quantity.contains("uniform") ? (1 - q) / q + 0.5 : -1 / Math.log1p(-q);
    }

    private static double quantity(LifeTable life, String quantity, double age) {
        if (quantity.startsWith("curtate")) {
            double sum = 0;
            for (int k = 1; age + k < life.omega(); k++) {
                sum += life.survival(age, age + k);
            }
            return sum;
        }
        if (quantity.startsWith("complete")) {
            return life.expectation(age);
        }
        if (quantity.startsWith("survival")) {
            return life.survival(age, age + Integer.parseInt(quantity.split(" ")[1]));
        }
        return median(life, age);
    }

    private static double median(LifeTable life, double age) {
        double low = age;
        double high = life.omega();
        for (int i = 0; i < 200; i++) {
            double middle = (low + high) / 2;
            if (life.survival(age, middle) > 0.5) {
                low = middle;
            } else {
                high = middle;
            }
        }
        return low - age;
    }

    private static Column column(String table, Sex sex, boolean closedByOne) {
        MortalityTable read = Inputs.table(Oracles.text("tables/" + table + ".csv"));
        Column column =
                read.columns().stream().filter(c -> c.sex() == sex).findFirst().orElseThrow();
        List<Double> q = new ArrayList<>(column.qx());
        if (closedByOne) {
            q.set(q.size() - 1, 1.0);
        }
        return new Column(sex, List.of(), column.firstAge(), q);
    }
}
