package nearworld.oracle;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import nearworld.oracle.BruteForce.Assessment;
import nearworld.oracle.BruteForce.World;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/**
 * Brute force against the worked cases of living persons, which an independent program computed by enumeration
 * (oracles/worked). It agrees far better than section 10 of the model asks for; the bounds here leave room for rounding only.
 */
class WorkedCasesOracleTest {
    private static final double PROBABILITY = 1e-12;
    private static final double YEARS = 1e-10;

    @ParameterizedTest
    @CsvSource({"case-1,pack-1", "case-2,pack-1", "case-4,pack-2"})
    void agreesWithTheIndependentProgram(String name, String pack) {
        JsonNode expected = JsonMapper.builder().build().readTree(Oracles.text("worked/" + name + ".expected.json"));
        Assessment actual = BruteForce.assess(
                Oracles.text("worked/table.csv"),
                Oracles.text("worked/" + pack + ".yaml"),
                Oracles.text("worked/" + name + ".json"));

        assertThat(actual.age()).isEqualTo(number(expected, "age"), within(PROBABILITY));
        assertThat(actual.logEvidence()).isEqualTo(number(expected, "logEvidence"), within(PROBABILITY));
        List<String> conditions = new ArrayList<>();
        for (int i = 0; i < actual.conditions().size(); i++) {
            JsonNode belief = expected.get("conditions").get(i);
            conditions.add(belief.get("id").asString());
            assertThat(actual.conditions().get(i).prior()).isEqualTo(number(belief, "prior"), within(PROBABILITY));
            assertThat(actual.conditions().get(i).posterior())
                    .isEqualTo(number(belief, "posterior"), within(PROBABILITY));
        }
        assertThat(actual.conditions()).extracting(BruteForce.Belief::id).isEqualTo(conditions);
        assertThat(expected.get("worlds")).hasSize(actual.worlds().size());
        for (JsonNode world : expected.get("worlds")) {
            agrees(actual.worlds().get(world.get("id").asString()), world);
        }
    }

    private static void agrees(World actual, JsonNode expected) {
        assertThat(actual).as(expected.get("id").asString()).isNotNull();
        assertThat(actual.survival())
                .as(actual.id())
                .hasSize(expected.get("survival").size());
        for (int year = 0; year < actual.survival().size(); year++) {
            assertThat(actual.survival().get(year))
                    .as("%s after %d years", actual.id(), year + 1)
                    .isEqualTo(expected.get("survival").get(year).doubleValue(), within(PROBABILITY));
        }
        near(actual.id(), actual.expectation(), number(expected, "expectation"));
        near(actual.id(), actual.median(), number(expected, "median"));
        near(
                actual.id(),
                actual.firstQuartile(),
                expected.get("quartiles").get(0).doubleValue());
        near(
                actual.id(),
                actual.thirdQuartile(),
                expected.get("quartiles").get(1).doubleValue());
        near(actual.id(), actual.mortalityRatio(), number(expected, "mortalityRatio"));
        near(actual.id(), actual.extraPerMille(), number(expected, "extraPerMille"));
        if (expected.has("aliveToday")) {
            assertThat(actual.aliveToday()).isEqualTo(number(expected, "aliveToday"), within(PROBABILITY));
        } else {
            assertThat(actual.aliveToday()).isNull();
        }
    }

    private static void near(String world, double actual, double expected) {
        assertThat(actual).as(world).isEqualTo(expected, within(YEARS));
    }

    private static double number(JsonNode node, String field) {
        return node.get(field).doubleValue();
    }
}
