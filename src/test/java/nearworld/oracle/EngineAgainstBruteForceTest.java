package nearworld.oracle;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.stream.LongStream;
import nearworld.engine.assessment.AssessmentOutcome;
import nearworld.engine.assessment.AssessmentResult;
import nearworld.engine.assessment.AssessmentResult.WorldResult;
import nearworld.engine.assessment.Assessor;
import nearworld.engine.assessment.CaseFile;
import nearworld.exchange.cases.CaseReader;
import nearworld.exchange.faults.Reading;
import nearworld.exchange.packs.Pack;
import nearworld.exchange.packs.PackReader;
import nearworld.exchange.tables.Table;
import nearworld.exchange.tables.TableReader;
import nearworld.oracle.BruteForce.Assessment;
import nearworld.oracle.BruteForce.World;
import nearworld.oracle.RandomPacks.Draw;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * The engine against enumeration of every hidden state, on random packs, tables and cases that both read from the same
 * texts. The tolerances are those of section 10 of the model; a failure shows the seed and the texts.
 */
class EngineAgainstBruteForceTest {
    private static final double PROBABILITY = 1e-9;
    private static final double SURVIVAL = 1e-7;
    private static final double YEARS = 1e-5;
    /** Quartiles and ratios follow from survival: its tolerance over the density, and over the logarithm, at their worst. */
    private static final double FROM_SURVIVAL = 1e-4;

    static LongStream smallPacks() {
        return LongStream.rangeClosed(1, 40);
    }

    static LongStream largerPacks() {
        return LongStream.rangeClosed(1001, 1003);
    }

    @ParameterizedTest
    @MethodSource("smallPacks")
    void agreesOnPacksOfUpToFiveConditions(long seed) {
        compare(RandomPacks.draw(seed, 5));
    }

    @ParameterizedTest
    @MethodSource("largerPacks")
    void agreesOnPacksOfUpToEightConditions(long seed) {
        compare(RandomPacks.draw(seed, 8));
    }

    private static void compare(Draw draw) {
        AssessmentOutcome outcome = assess(draw);
        assertThat(outcome).as(draw.toString()).isInstanceOf(AssessmentResult.class);
        AssessmentResult actual = (AssessmentResult) outcome;
        Assessment expected = draw.expected();

        assertThat(actual.logEvidence()).as(draw.toString()).isEqualTo(expected.logEvidence(), within(PROBABILITY));
        assertThat(actual.conditions()).hasSize(expected.conditions().size());
        for (int i = 0; i < expected.conditions().size(); i++) {
            BruteForce.Belief belief = expected.conditions().get(i);
            assertThat(actual.conditions().get(i).id()).isEqualTo(belief.id());
            assertThat(actual.conditions().get(i).prior())
                    .as("prior of %s, %s", belief.id(), draw)
                    .isEqualTo(belief.prior(), within(PROBABILITY));
            assertThat(actual.conditions().get(i).posterior())
                    .as("posterior of %s, %s", belief.id(), draw)
                    .isEqualTo(belief.posterior(), within(PROBABILITY));
        }
        assertThat(actual.worlds())
                .extracting(WorldResult::id)
                .containsExactlyElementsOf(expected.worlds().keySet());
        for (WorldResult world : actual.worlds()) {
            compare(world, expected.worlds().get(world.id()), draw);
        }
    }

    private static void compare(WorldResult actual, World expected, Draw draw) {
        String where = actual.id() + ", " + draw;
        near(actual.survival(), expected.survival(), where);
        near(actual.monthly(), expected.monthly(), where);
        assertThat(actual.expectation()).as(where).isEqualTo(expected.expectation(), within(YEARS));
        assertThat(actual.curtate()).as(where).isEqualTo(expected.curtate(), within(YEARS));
        assertThat(actual.median()).as(where).isEqualTo(expected.median(), within(FROM_SURVIVAL));
        assertThat(actual.lowerQuartile()).as(where).isEqualTo(expected.firstQuartile(), within(FROM_SURVIVAL));
        assertThat(actual.upperQuartile()).as(where).isEqualTo(expected.thirdQuartile(), within(FROM_SURVIVAL));
        if (Double.isFinite(expected.mortalityRatio())) {
            assertThat(actual.mortalityRatio() / expected.mortalityRatio())
                    .as(where)
                    .isEqualTo(1, within(FROM_SURVIVAL));
            assertThat(actual.extraPerMille()).as(where).isEqualTo(expected.extraPerMille(), within(0.01));
        }
        if (expected.aliveToday() == null) {
            assertThat(actual.aliveToday()).as(where).isNull();
        } else {
            assertThat(actual.aliveToday()).as(where).isEqualTo(expected.aliveToday(), within(PROBABILITY));
        }
    }

    private static void near(List<Double> actual, List<Double> expected, String where) {
        assertThat(actual).as(where).hasSameSizeAs(expected);
        for (int k = 0; k < actual.size(); k++) {
            // Written out: a description for each of thousands of months would take longer than the assessments.
            if (!(Math.abs(actual.get(k) - expected.get(k)) <= SURVIVAL)) {
                assertThat(actual.get(k)).as("point %d of %s", k, where).isEqualTo(expected.get(k), within(SURVIVAL));
            }
        }
    }

    private static AssessmentOutcome assess(Draw draw) {
        Table table = accepted(TableReader.read(bytes(draw.table())), draw);
        Pack pack = accepted(PackReader.read(bytes(draw.pack())), draw);
        CaseFile file = accepted(new CaseReader(pack.evidence(), table.rates()).read(bytes(draw.caseText())), draw);
        return new Assessor(table.rates(), pack.evidence()).assess(file);
    }

    private static <T> T accepted(Reading<T> reading, Draw draw) {
        assertThat(reading.isAccepted()).as("%s: %s", reading, draw).isTrue();
        return reading.value();
    }

    private static byte[] bytes(String text) {
        return text.getBytes(StandardCharsets.UTF_8);
    }
}
