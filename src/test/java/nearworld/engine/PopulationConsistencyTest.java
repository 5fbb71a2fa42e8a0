package nearworld.engine;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.time.LocalDate;
import java.util.List;
import java.util.stream.LongStream;
import nearworld.engine.assessment.AssessmentResult;
import nearworld.engine.assessment.AssessmentResult.WorldResult;
import nearworld.engine.assessment.Assessor;
import nearworld.engine.assessment.CaseFile;
import nearworld.engine.basics.AgeCurve;
import nearworld.engine.basics.PartialDate;
import nearworld.engine.mortality.MortalityTable;
import nearworld.engine.network.EvidencePack;
import nearworld.engine.network.EvidencePack.EventType;
import nearworld.engine.network.EvidencePack.Outcome;
import nearworld.oracle.RandomPacks;
import nearworld.oracle.RandomPacks.Draw;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import tools.jackson.databind.json.JsonMapper;
import tools.jackson.databind.node.ObjectNode;

/** Every published average comes back exactly when nothing is known (model, section 4), on random packs and tables. */
class PopulationConsistencyTest {
    private static final JsonMapper JSON = JsonMapper.builder().build();
    /** Section 10 of the model. */
    private static final double EVERY_MONTH = 1e-9;

    static LongStream seeds() {
        return LongStream.rangeClosed(2001, 2064);
    }

    private record Setting(Draw draw, MortalityTable table, EvidencePack pack, CaseFile bare) {
        static Setting of(long seed) {
            Draw draw = RandomPacks.draw(seed, 3);
            MortalityTable table = Inputs.table(draw.table());
            EvidencePack pack = Inputs.pack(draw.pack());
            ObjectNode file = (ObjectNode) JSON.readTree(draw.caseText());
            file.remove(List.of("statements", "findings", "history", "whatIfs"));
            if (!table.isSmokingDistinct()) {
                ((ObjectNode) file.get("applicant")).remove("behaviours");
            }
            return new Setting(draw, table, pack, Inputs.caseFile(pack, table, JSON.writeValueAsString(file)));
        }

        /** The case with one entry of history and nothing else. */
        AssessmentResult with(CaseFile.History history) {
            CaseFile file = new CaseFile(
                    bare.caseRef(),
                    bare.assessedOn(),
                    bare.sex(),
                    bare.bornOn(),
                    bare.behaviours(),
                    List.of(),
                    List.of(),
                    List.of(history),
                    null,
                    null,
                    List.of());
            return Inputs.result(new Assessor(table, pack).assess(file));
        }

        double age() {
            return (bare.assessedOn().toEpochDay() - bare.bornOn().middle().toEpochDay()) / 365.25;
        }
    }

    @ParameterizedTest
    @MethodSource("seeds")
    void nothingKnownIsTheTableAtEveryMonth(long seed) {
        Setting s = Setting.of(seed);
        if (s.table().isSmokingDistinct()) {
            // A split table asks for the level of smoking, and speaks of its whole class: a known level is evidence.
            return;
        }

        AssessmentResult result = Inputs.result(new Assessor(s.table(), s.pack()).assess(s.bare()));

        assertThat(result.logEvidence()).isEqualTo(0, within(1e-12));
        List<Double> table = result.world("table").monthly();
        for (WorldResult world : result.worlds()) {
            assertThat(world.monthly()).hasSameSizeAs(table);
            for (int k = 0; k < table.size(); k++) {
                if (Math.abs(world.monthly().get(k) - table.get(k)) > EVERY_MONTH) {
                    assertThat(world.monthly().get(k))
                            .as("%s, month %d, %s", world.id(), k, s.draw())
                            .isEqualTo(table.get(k), within(EVERY_MONTH));
                }
            }
            // The table is integrated by its own rule within the month, a world at a constant hazard: b/(12·144) years
            // of
            // difference in Gompertz's law, see ClosedFormsTest.
            assertThat(world.expectation())
                    .as("%s, %s", world.id(), s.draw())
                    .isEqualTo(result.world("table").expectation(), within(2e-4));
        }
        result.conditions().forEach(c -> assertThat(c.posterior()).as(c.id()).isEqualTo(c.prior(), within(1e-11)));
    }

    /**
     * E_P[R/E R] = 1: in a short window without any event −ln P(evidence) is ∫λ·(1 − Var(R/E R)·∫λ/2 …), the published rate
     * up to its square.
     */
    @ParameterizedTest
    @MethodSource("seeds")
    void publishedRatesComeBack(long seed) {
        Setting s = Setting.of(seed);
        if (!s.bare().behaviours().isEmpty()) {
            return;
        }
        LocalDate today = s.bare().assessedOn();
        for (int e = 0; e < s.pack().events().size(); e++) {
            EventType event = s.pack().events().get(e);
            AgeCurve rate = event.ratePerYear().get(s.bare().sex());
            double middle = s.age() - 0.5 / 365.25;
            double expected = rate.at(middle) / 365.25;

            AssessmentResult result = s.with(new CaseFile.History(
                    e, PartialDate.ofDay(today.minusDays(1)), PartialDate.ofDay(today), List.of()));

            // Var(R/E R) stays below 100 in these packs; a day's ∫λ below 1e-3.
            assertThat(-result.logEvidence() / expected)
                    .as("%s, %s", event.id(), s.draw())
                    .isEqualTo(1, within(50 * expected + 1e-9));
        }
    }

    /** The share of an outcome is its average over those who have the event: P(event today with outcome o)/P(event today). */
    @ParameterizedTest
    @MethodSource("seeds")
    void publishedOutcomeSharesComeBack(long seed) {
        Setting s = Setting.of(seed);
        if (!s.bare().behaviours().isEmpty()) {
            return;
        }
        for (int e = 0; e < s.pack().events().size(); e++) {
            EventType event = s.pack().events().get(e);
            double all = event.outcomes().stream().mapToDouble(o -> share(s, o)).sum();
            for (int o = 0; o < event.outcomes().size(); o++) {
                Outcome outcome = event.outcomes().get(o);
                if (!outcome.fatal()) {
                    AssessmentResult result = s.with(new CaseFile.History(
                            e,
                            null,
                            null,
                            List.of(new CaseFile.Occurrence(
                                    PartialDate.ofDay(s.bare().assessedOn()), o))));

                    assertThat(Math.exp(result.logEvidence()))
                            .as("%s %s, %s", event.id(), outcome.id(), s.draw())
                            .isEqualTo(share(s, outcome) / all, within(1e-9));
                }
            }
        }
    }

    private static double share(Setting s, Outcome outcome) {
        return outcome.share().get(s.bare().sex()).at(s.age());
    }
}
