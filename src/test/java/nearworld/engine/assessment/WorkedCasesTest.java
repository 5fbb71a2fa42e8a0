package nearworld.engine.assessment;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import nearworld.engine.Inputs;
import nearworld.engine.assessment.AssessmentResult.ConditionShift;
import nearworld.engine.assessment.AssessmentResult.WorldResult;
import nearworld.oracle.Oracles;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/**
 * The worked cases of living persons, {@code oracles/worked}: results of an independent program that enumerates every state
 * of the model. Tolerances are those of section 10 of the model; those of the other headline numbers follow from them.
 */
class WorkedCasesTest {
    private static final double POSTERIOR = 1e-9;
    private static final double SURVIVAL = 1e-7;
    private static final double EXPECTATION_YEARS = 1e-5;
    /** 1e-7 of survival over a density of at least 1% a year where quarters and halves have died. */
    private static final double QUANTILE_YEARS = 1e-5;
    /** ln S(n) to 1e-7 over ln S0(n) of at least 0.1 in size in these cases. */
    private static final double RATIO = 1e-6;
    /** 1000/n times the same, n at least 10 years. */
    private static final double PER_MILLE = 1e-5;

    @ParameterizedTest
    @CsvSource({"1, 1", "2, 1", "4, 2"})
    void agreeWithTheEnumeration(int caseNumber, int packNumber) {
        JsonNode expected =
                JsonMapper.builder().build().readTree(Oracles.text("worked/case-" + caseNumber + ".expected.json"));

        AssessmentResult result = Inputs.result(
                Oracles.text("worked/table.csv"),
                Oracles.text("worked/pack-" + packNumber + ".yaml"),
                Oracles.text("worked/case-" + caseNumber + ".json"));

        assertThat(result.age()).isEqualTo(expected.get("age").doubleValue(), within(1e-12));
        assertThat(result.logEvidence()).isEqualTo(expected.get("logEvidence").doubleValue(), within(POSTERIOR));
        conditions(result, expected.get("conditions"));
        assertThat(result.worlds()).hasSameSizeAs(expected.get("worlds"));
        for (int w = 0; w < result.worlds().size(); w++) {
            world(result.worlds().get(w), expected.get("worlds").get(w));
        }
    }

    private static void conditions(AssessmentResult result, JsonNode expected) {
        assertThat(result.conditions()).hasSameSizeAs(expected);
        for (int i = 0; i < expected.size(); i++) {
            ConditionShift shift = result.conditions().get(i);
            assertThat(shift.id()).isEqualTo(expected.get(i).get("id").asString());
            assertThat(shift.prior())
                    .as(shift.id())
                    .isEqualTo(expected.get(i).get("prior").doubleValue(), within(POSTERIOR));
            assertThat(shift.posterior())
                    .as(shift.id())
                    .isEqualTo(expected.get(i).get("posterior").doubleValue(), within(POSTERIOR));
        }
    }

    private static void world(WorldResult world, JsonNode expected) {
        assertThat(world.id()).isEqualTo(expected.get("id").asString());
        number(world.id(), "expectation", world.expectation(), expected.get("expectation"), EXPECTATION_YEARS);
        number(world.id(), "median", world.median(), expected.get("median"), QUANTILE_YEARS);
        JsonNode quartiles = expected.get("quartiles");
        number(world.id(), "lower quartile", world.lowerQuartile(), quartiles.get(0), QUANTILE_YEARS);
        number(world.id(), "upper quartile", world.upperQuartile(), quartiles.get(1), QUANTILE_YEARS);
        number(world.id(), "ratio", world.mortalityRatio(), expected.get("mortalityRatio"), RATIO);
        number(world.id(), "extra", world.extraPerMille(), expected.get("extraPerMille"), PER_MILLE);
        if (expected.has("aliveToday")) {
            Double alive = world.aliveToday();
            assertThat(alive).as(world.id()).isNotNull();
            number(world.id(), "alive today", alive, expected.get("aliveToday"), POSTERIOR);
        }
        JsonNode survival = expected.get("survival");
        // Beyond the table's end nobody is left, whether a list says so or stops.
        for (int y = 0; y < Math.max(survival.size(), world.survival().size()); y++) {
            double years = y < world.survival().size() ? world.survival().get(y) : 0;
            double all = y < survival.size() ? survival.get(y).doubleValue() : 0;
            assertThat(years).as("%s: survival of %d years", world.id(), y + 1).isEqualTo(all, within(SURVIVAL));
        }
    }

    private static void number(String world, String what, double actual, JsonNode expected, double tolerance) {
        assertThat(actual).as("%s: %s", world, what).isEqualTo(expected.doubleValue(), within(tolerance));
    }
}
