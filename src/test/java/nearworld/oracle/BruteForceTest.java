package nearworld.oracle;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.List;
import nearworld.oracle.BruteForce.Assessment;
import nearworld.oracle.BruteForce.World;
import nearworld.oracle.RandomPacks.Draw;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import tools.jackson.databind.json.JsonMapper;
import tools.jackson.databind.node.ObjectNode;

/** What must hold of the enumeration whatever is drawn, and of the draws themselves. */
class BruteForceTest {
    @ParameterizedTest
    @ValueSource(longs = {101, 103, 107, 104, 105, 106})
    void withoutEvidenceTheRecordedWorldIsTheTable(long seed) {
        Draw draw = RandomPacks.draw(seed, 4);
        assertThat(draw.table()).as("who says nothing of smoking has no class").doesNotContain("#smokingLevels");

        Assessment bare = BruteForce.assess(draw.table(), draw.pack(), withoutEvidence(draw.caseText()));

        assertThat(bare.logEvidence()).as("seed %d", seed).isEqualTo(0, within(1e-12));
        World table = bare.worlds().get("table");
        World recorded = bare.worlds().get("recorded");
        for (int month = 0; month < table.monthly().size(); month++) {
            assertThat(recorded.monthly().get(month))
                    .as("month %d of %s", month, draw)
                    .isEqualTo(table.monthly().get(month), within(1e-12));
        }
    }

    private static String withoutEvidence(String caseText) {
        JsonMapper json = JsonMapper.builder().build();
        ObjectNode file = (ObjectNode) json.readTree(caseText);
        file.remove(List.of("statements", "findings", "history", "whatIfs"));
        ((ObjectNode) file.get("applicant")).remove("behaviours");
        return json.writeValueAsString(file);
    }

    @ParameterizedTest
    @ValueSource(longs = {111, 112, 113, 114, 115, 116})
    void survivalNeverRises(long seed) {
        Draw draw = RandomPacks.draw(seed, 4);

        for (World world : draw.expected().worlds().values()) {
            for (int month = 1; month < world.monthly().size(); month++) {
                assertThat(world.monthly().get(month))
                        .as("month %d of %s in %s", month, world.id(), draw)
                        .isLessThanOrEqualTo(world.monthly().get(month - 1));
            }
        }
    }

    @Test
    void theSameSeedGivesTheSameTexts() {
        Draw first = RandomPacks.draw(121, 5);
        Draw second = RandomPacks.draw(121, 5);

        assertThat(second).isEqualTo(first);
    }

    @Test
    void frailtyBinsKeepTheMean() {
        double[] bins = FrailtyBins.of(0.3, 9);

        assertThat(Arrays.stream(bins).average().orElseThrow()).isEqualTo(1, within(1e-13));
        assertThat(bins).isSorted();
    }

    /** An exponential's thirds are cut at ln 1.5 and ln 3; the mean of z below t is 1 − (1 + t)e^−t over its share. */
    @Test
    void frailtyBinsOfAnExponentialAreKnown() {
        double first = Math.log(1.5);
        double second = Math.log(3);
        double belowFirst = 1 - (1 + first) / 1.5;
        double belowSecond = 1 - (1 + second) / 3;

        double[] bins = FrailtyBins.of(1, 3);

        assertThat(bins[0]).isEqualTo(3 * belowFirst, within(1e-12));
        assertThat(bins[1]).isEqualTo(3 * (belowSecond - belowFirst), within(1e-12));
        assertThat(bins[2]).isEqualTo(3 * (1 - belowSecond), within(1e-12));
    }

    @Test
    void linksThatExplainMoreThanThePrevalenceAreRefused() {
        String pack = Oracles.text("worked/pack-1.yaml").replace("coronaryDisease: 0.12", "coronaryDisease: 0.6");

        assertThatThrownBy(() ->
                        BruteForce.assess(Oracles.text("worked/table.csv"), pack, Oracles.text("worked/case-1.json")))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("heartFailure");
    }
}
