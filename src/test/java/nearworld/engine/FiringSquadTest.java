package nearworld.engine;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.List;
import java.util.stream.Stream;
import nearworld.engine.PublishedChecks.Row;
import nearworld.engine.assessment.AssessmentResult;
import nearworld.engine.assessment.Assessor;
import nearworld.engine.basics.AgeCurve;
import nearworld.engine.basics.AgeCurve.Scale;
import nearworld.engine.basics.BySex;
import nearworld.engine.basics.Estimate;
import nearworld.engine.mortality.MortalityTable;
import nearworld.engine.network.EvidencePack;
import nearworld.engine.network.EvidencePack.Condition;
import nearworld.engine.network.EvidencePack.Finding;
import nearworld.engine.network.EvidencePack.FindingLevel;
import nearworld.engine.network.EvidencePack.Link;
import nearworld.engine.network.EvidencePack.Ratio;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * The firing squad (Balke and Pearl 1994; Pearl, Causality, 2000, section 7.1.2, from memory): the court orders an execution
 * with probability p, the captain signals if it does, riflemen A and B fire at his signal, A out of nervousness also without
 * one with probability q, and either shot kills. The prisoner is dead; what if A had not fired? He would be alive with
 * probability q(1−p)/(1 − (1−q)(1−p)), rows of {@code oracles/published_checks.csv}.
 *
 * <p>Here all five are conditions, sure causes are links of 1, q is A's leak, and being dead is a condition that doubles the
 * hazard: the what-if world's survival x·e^{−H} + (1 − x)·e^{−2H}, e^{−2H} the recorded world's, gives the probability x.
 */
class FiringSquadTest {
    private static final List<String> NODES = List.of("courtOrder", "captain", "riflemanA", "riflemanB", "dead");

    static Stream<Row> squads() {
        return PublishedChecks.of("Pearl firing squad").stream();
    }

    @ParameterizedTest
    @MethodSource("squads")
    void thePrisonerWouldBeAlive(Row row) {
        double p = row.parameters().get(0);
        double q = row.parameters().get(1);

        assertThat(alive(p, q, "{\"without\": {\"condition\": \"riflemanA\"}}"))
                .isEqualTo(row.computed(), within(1e-9));
    }

    /** Had neither fired he would live; had B not fired he would be as dead, for A fires whenever B does. */
    @ParameterizedTest
    @MethodSource("squads")
    void theOtherAnswersAreCertain(Row row) {
        double p = row.parameters().get(0);
        double q = row.parameters().get(1);

        assertThat(alive(
                        p,
                        q,
                        "{\"without\": {\"condition\": \"riflemanA\"}}, {\"without\": {\"condition\": \"riflemanB\"}}"))
                .isEqualTo(1, within(1e-9));
        assertThat(alive(p, q, "{\"without\": {\"condition\": \"riflemanB\"}}")).isEqualTo(0, within(1e-9));
        // Without the order only A's nervousness is left: alive unless he was nervous, given that somebody fired.
        assertThat(alive(p, q, "{\"without\": {\"condition\": \"courtOrder\"}}"))
                .isEqualTo(1 - q / (1 - (1 - q) * (1 - p)), within(1e-9));
    }

    private static double alive(double p, double q, String changes) {
        EvidencePack pack = pack(p, q);
        MortalityTable table = Inputs.law(x -> 0.01 * x);
        String json = """
                {"format": "case/1", "caseRef": "X", "assessedOn": "2026-12-01",
                 "applicant": {"sex": "male", "bornOn": "1986-12-01"},
                 "findings": [{"finding": "body", "level": "dead"}],
                 "whatIfs": [{"name": "other", "changes": [%s]}]}
                """.formatted(changes);

        AssessmentResult result = Inputs.result(new Assessor(table, pack).assess(Inputs.caseFile(pack, table, json)));

        double recorded = result.world("recorded").survival().get(29);
        double whatIf = result.world("whatIf:other").survival().get(29);
        double once = Math.sqrt(recorded);
        return (whatIf - recorded) / (once - recorded);
    }

    private static EvidencePack pack(double p, double q) {
        double fires = 1 - (1 - p) * (1 - q);
        List<Condition> conditions = List.of(
                node(0, p),
                node(1, p, 0),
                node(2, fires, 1),
                node(3, p, 1),
                // Dead whenever A or B fires, which is whenever A does.
                node(4, fires, 2, 3));
        Finding body = new Finding(
                "body",
                List.of(4),
                List.of(
                        new FindingLevel("dead", List.of(Estimate.of(1)), Estimate.of(0)),
                        new FindingLevel("alive", List.of(Estimate.of(0)), Estimate.of(1))),
                null,
                null);
        return Inputs.bare(0, 1, conditions, List.of(), List.of(body), List.of());
    }

    /** A hair above its causes' share, so that a leak of nothing does not round to one below nothing. */
    private static Condition node(int number, double probability, int... causes) {
        double hair = causes.length == 0 ? 0 : 1e-13 * number;
        return new Condition(
                NODES.get(number),
                BySex.both(AgeCurve.constant(Scale.LOGIT, Estimate.of(probability + hair))),
                new Ratio(Estimate.of(number == 4 ? 2 : 1), 65),
                null,
                null,
                Arrays.stream(causes)
                        .mapToObj(c -> new Link(-1, c, Estimate.of(1)))
                        .toList());
    }
}
