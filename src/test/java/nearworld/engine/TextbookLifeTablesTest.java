package nearworld.engine;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Locale;
import java.util.function.IntToDoubleFunction;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import nearworld.engine.PublishedChecks.Row;
import nearworld.engine.mortality.LifeTable;
import nearworld.engine.mortality.MortalityTable;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * The two standard teaching tables, both of Makeham's law μ(x) = A + B·c^x: Dickson, Hardy and Waters, Actuarial Mathematics
 * for Life Contingent Risks, appendix D (ultimate part), and Bowers et al., Actuarial Mathematics, appendix 2A. Printed digits
 * from memory, recomputed from the laws ({@code oracles/published_checks.csv}). Left out: complete expectations, since between
 * whole ages these books follow Makeham's law and our table a constant force; select rows.
 */
class TextbookLifeTablesTest {
    private static final Pattern ITEM = Pattern.compile(
            "(?:(?<n>\\d+)E|(?<what>(?:1000 ?)?(?:2A|term A1|A|adue|curtate e|q|l)))_(?<x>\\d+)(?::(?<term>\\d+))?.*");
    private static final double COMPUTED_RELATIVE = 1e-9;

    private static LifeTable makeham(double a, double b, double c) {
        MortalityTable table = Inputs.law(x -> a * x + b * (Math.pow(c, x) - 1) / Math.log(c));
        return table.life(table.columns().get(0));
    }

    static Stream<Row> dickson() {
        return PublishedChecks.of("DHW SSSM ultimate").stream()
                .filter(r -> !r.item().startsWith("complete"));
    }

    static Stream<Row> bowers() {
        return PublishedChecks.of("Bowers ILT").stream();
    }

    @ParameterizedTest
    @MethodSource
    void dickson(Row row) {
        check(row, makeham(0.00022, 2.7e-6, 1.124), 1 / 1.05);
    }

    @ParameterizedTest
    @MethodSource
    void bowers(Row row) {
        check(row, makeham(0.0007, 0.00005, Math.pow(10, 0.04)), 1 / 1.06);
    }

    private static void check(Row row, LifeTable life, double v) {
        double value = value(row.item(), life, v);
        assertThat(value).isEqualTo(row.computed(), within(COMPUTED_RELATIVE * row.computed()));
        if (!row.printed().isEmpty()) {
            assertThat(value).isEqualTo(Double.parseDouble(row.printed()), within(row.halfUnit()));
        }
    }

    private static double value(String item, LifeTable life, double v) {
        Matcher m = ITEM.matcher(item);
        assertThat(m.matches()).as(item).isTrue();
        int x = Integer.parseInt(m.group("x"));
        IntToDoubleFunction alive = k -> life.survival(x, x + k);
        if (m.group("n") != null) {
            int n = Integer.parseInt(m.group("n"));
            return Math.pow(v, n) * alive.applyAsDouble(n);
        }
        String what = m.group("what").replace(" ", "").toLowerCase(Locale.ROOT);
        double scale = what.startsWith("1000") ? 1000 : 1;
        int last = m.group("term") == null ? 120 - x : Integer.parseInt(m.group("term"));
        return scale
                * switch (what.replace("1000", "").replace("term", "")) {
                    case "adue" -> sum(0, last, k -> Math.pow(v, k) * alive.applyAsDouble(k));
                    case "a", "a1" -> deaths(alive, v, last);
                    case "2a" -> deaths(alive, v * v, last);
                    case "curtatee" -> sum(1, last, alive);
                    case "q" -> 1 - alive.applyAsDouble(1);
                    case "l" -> 100_000 * life.survival(20, x);
                    default -> throw new IllegalArgumentException(item);
                };
    }

    private static double deaths(IntToDoubleFunction alive, double v, int years) {
        return sum(0, years, k -> Math.pow(v, k + 1) * (alive.applyAsDouble(k) - alive.applyAsDouble(k + 1)));
    }

    private static double sum(int from, int end, IntToDoubleFunction of) {
        double sum = 0;
        for (int k = from; k < end; k++) {
            sum += of.applyAsDouble(k);
        }
        return sum;
    }
}
