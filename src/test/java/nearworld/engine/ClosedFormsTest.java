package nearworld.engine;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.stream.Stream;
import nearworld.engine.PublishedChecks.Row;
import nearworld.engine.assessment.AssessmentResult;
import nearworld.engine.assessment.AssessmentResult.WorldResult;
import nearworld.engine.assessment.Assessor;
import nearworld.engine.basics.AgeCurve;
import nearworld.engine.basics.AgeCurve.Scale;
import nearworld.engine.basics.BySex;
import nearworld.engine.basics.Estimate;
import nearworld.engine.mortality.MortalityTable;
import nearworld.engine.network.EvidencePack;
import nearworld.engine.network.EvidencePack.Condition;
import nearworld.engine.network.EvidencePack.EventType;
import nearworld.engine.network.EvidencePack.Finding;
import nearworld.engine.network.EvidencePack.FindingLevel;
import nearworld.engine.network.EvidencePack.Outcome;
import nearworld.engine.network.EvidencePack.Ratio;
import nearworld.engine.network.EvidencePack.Treatment;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

/** Whole assessments against closed forms. DEVELOPERS.md, "How the engine computes", derives those that are ours. */
class ClosedFormsTest {
    /** Aged 40 exactly: 14610 days are 40 years of 365.25. */
    private static final String FORTY = """
            {"format": "case/1", "caseRef": "X", "assessedOn": "2026-12-01",
             "applicant": {"sex": "male", "bornOn": "1986-12-01"}%s}
            """;

    private static final String BORN_TODAY = """
            {"format": "case/1", "caseRef": "X", "assessedOn": "2026-12-01",
             "applicant": {"sex": "male", "bornOn": "2026-12-01"}}
            """;

    private static AssessmentResult assess(MortalityTable table, EvidencePack pack, String json) {
        return Inputs.result(new Assessor(table, pack).assess(Inputs.caseFile(pack, table, json)));
    }

    private static EvidencePack frail(double variance, int points) {
        return Inputs.bare(variance, points, List.of(), List.of(), List.of(), List.of());
    }

    static Stream<Row> gompertz() {
        return PublishedChecks.of("Gompertz closed form").stream();
    }

    /**
     * e0 = exp(a/b)·E1(a/b)/b of μ = a·e^{bt}. A table of whole ages with a constant force within the year is dead sooner by
     * ∫ S·μ′/12 = b/12 years, up to terms of b²·∫Sμ²/240.
     */
    @ParameterizedTest
    @MethodSource
    void gompertz(Row row) {
        double a = row.parameters().get(0);
        double b = row.parameters().get(1);
        MortalityTable table = Inputs.law(t -> a / b * Math.expm1(b * t));

        WorldResult world = assess(table, frail(0, 1), BORN_TODAY).world("recorded");

        assertThat(world.expectation()).isEqualTo(row.computed() - b / 12, within(2e-5));
    }

    static Stream<Row> gammaGompertz() {
        return PublishedChecks.of("gamma-Gompertz S(t)").stream();
    }

    /** S(t) = (1 + s²H)^(−1/s²), Vaupel, Manton and Stallard 1979: a table of it, and the frailty that makes it so. */
    @ParameterizedTest
    @MethodSource
    void gammaGompertz(Row row) {
        double a = row.parameters().get(0);
        double b = row.parameters().get(1);
        double s2 = row.parameters().get(2);
        int t = row.parameters().get(3).intValue();
        MortalityTable table = Inputs.law(x -> Math.log1p(s2 * a / b * Math.expm1(b * x)) / s2);

        WorldResult world = assess(table, frail(s2, 9), BORN_TODAY).world("recorded");

        assertThat(world.survival().get(t - 1)).isEqualTo(row.computed(), within(1e-9));
    }

    /**
     * A treatment of ratio r multiplies each person's hazard: S_r(t) = (1 + s²·r·H)^(−1/s²), flatter than S^r. The bins'
     * part of the error falls with their number; asserted are bounds twice what was measured.
     */
    @ParameterizedTest
    @CsvSource({"9, 2.5e-2", "100, 2e-3", "1000, 5e-5"})
    void aTreatmentOnAGammaFrailty(int points, double bound) {
        double s2 = 0.5;
        double r = 0.5;
        Treatment halves = new Treatment("halves", Estimate.of(r), -1);
        EvidencePack pack = Inputs.bare(s2, points, List.of(), List.of(), List.of(), List.of(halves));
        String whatIf =
                ", \"whatIfs\": [{\"name\": \"halved\", \"changes\": [{\"treat\": {\"treatment\": \"halves\"}}]}]";

        AssessmentResult result = assess(marginal(s2), pack, FORTY.formatted(whatIf));

        assertThat(worst(result.world("whatIf:halved"), t -> Math.pow(1 + s2 * r * cumulated(t), -1 / s2)))
                .isLessThan(bound)
                .isGreaterThan(bound / 100);
    }

    /** What a time t after 40 survival should be. */
    private interface Survival {
        double at(int years);
    }

    private static double worst(WorldResult world, Survival closedForm) {
        double worst = 0;
        for (int t = 1; t <= 70; t++) {
            worst = Math.max(worst, Math.abs(world.survival().get(t - 1) - closedForm.at(t)));
        }
        return worst;
    }

    /** ∫ of 0.002·e^{0.1t} from 40 on. */
    private static double cumulated(double years) {
        return 0.02 * Math.expm1(0.1 * years);
    }

    /** A force of 0.001 up to 40, then what a population of gamma frailty makes of {@link #cumulated}. */
    private static MortalityTable marginal(double s2) {
        return Inputs.law(x -> 0.001 * Math.min(x, 40) + Math.log1p(s2 * cumulated(Math.max(0, x - 40))) / s2);
    }

    /**
     * Gamma is conjugate to Poisson: shape k = 1/s², n events where Λ were expected give shape k + n and rate k + Λ, so that
     * S(t) = ((k + Λ)/(k + Λ + H))^(k + n), and P(evidence) of the n ordered dates = Γ(k+n)/Γ(k)·k^k/(k+Λ)^(k+n).
     */
    @ParameterizedTest
    @CsvSource({"0, 9, 2e-2", "0, 1000, 2.5e-5", "3, 9, 5e-2", "3, 1000, 2e-5", "3, 4000, 3e-6"})
    void occurrencesReviseAGammaFrailty(int occurrences, int points, double bound) {
        double s2 = 0.5;
        double k = 1 / s2;
        double expected = 2;
        EventType event = event(expected / 8);
        EvidencePack pack = Inputs.bare(s2, points, List.of(), List.of(event), List.of(), List.of());
        String dates = List.of("2019-03-01", "2021-05-05", "2024-08-09").subList(0, occurrences).stream()
                .map(d -> "{\"on\": \"" + d + "\", \"outcome\": \"over\"}")
                .collect(java.util.stream.Collectors.joining(","));
        // 2922 days are 8 years of 365.25.
        String history = ", \"history\": [{\"event\": \"fall\", \"from\": \"2018-12-01\", \"to\": \"2026-12-01\","
                + " \"occurrences\": [" + dates + "]}]";

        AssessmentResult result = assess(marginal(s2), pack, FORTY.formatted(history));

        double mean = worst(
                result.world("recorded"),
                t -> Math.pow((k + expected) / (k + expected + cumulated(t)), k + occurrences));
        assertThat(mean).isLessThan(bound).isGreaterThan(bound / 100);
        double evidence =
                Math.pow(k / (k + expected), k) * rising(k, occurrences) / Math.pow(k + expected, occurrences);
        assertThat(Math.exp(result.logEvidence())).isEqualTo(evidence, within(bound * evidence * 4));
    }

    private static double rising(double k, int n) {
        double product = 1;
        for (int i = 0; i < n; i++) {
            product *= k + i;
        }
        return product;
    }

    private static EventType event(double rate) {
        BySex<AgeCurve> always = BySex.both(AgeCurve.constant(Scale.LOG, Estimate.of(1)));
        return new EventType(
                "fall",
                Estimate.of(1),
                0,
                BySex.both(AgeCurve.constant(Scale.LOG, Estimate.of(rate))),
                List.of(),
                List.of(),
                List.of(new Outcome("over", always, List.of(), null, false)),
                List.of());
    }

    /** A rare condition, certain in this person, that multiplies the table's force by a ratio. */
    private static AssessmentResult ratio(MortalityTable table, double ratio) {
        Condition rare = new Condition(
                "rare",
                BySex.both(AgeCurve.constant(Scale.LOGIT, Estimate.of(1e-12))),
                new Ratio(Estimate.of(ratio), 65),
                null,
                null,
                List.of());
        Finding seen = new Finding(
                "seen",
                List.of(0),
                List.of(
                        new FindingLevel("yes", List.of(Estimate.of(1)), Estimate.of(0)),
                        new FindingLevel("no", List.of(Estimate.of(0)), Estimate.of(1))),
                null,
                null);
        EvidencePack pack = Inputs.bare(0, 1, List.of(rare), List.of(), List.of(seen), List.of());
        return assess(table, pack, FORTY.formatted(", \"findings\": [{\"finding\": \"seen\", \"level\": \"yes\"}]"));
    }

    /** MR = 100·q/q′ and EDR = 1000·(q − q′), the definitions of medical underwriting, rows of published_checks.csv. */
    @ParameterizedTest
    @CsvSource({"0.01, 0.025, 250, 15", "0.004, 0.006, 150, 2", "0.05, 0.06, 120, 10"})
    void relativeMortalityAndExcessDeathRate(double expected, double observed, double ratio, double excess) {
        MortalityTable table = Inputs.law(x -> -x * Math.log1p(-expected));

        AssessmentResult result = ratio(table, Math.log1p(-observed) / Math.log1p(-expected));

        double q = 1 - result.world("recorded").survival().get(0);
        double own = 1 - result.world("table").survival().get(0);
        assertThat(100 * q / own).isEqualTo(ratio, within(1e-6));
        assertThat(1000 * (q - own)).isEqualTo(excess, within(1e-7));
    }

    /** A constant ratio: ln S(n)/ln S0(n) is the ratio, whatever the term, and S(t) = S0(t)^r.
     * The term here is as long as the table's survival of 0.01 allows, where S itself is down to 1e-8. */
    @ParameterizedTest
    @CsvSource({"1.5", "2", "4", "0.6"})
    void aConstantRatioComesBack(double ratio) {
        AssessmentResult result = ratio(marginal(0.5), ratio);

        WorldResult world = result.world("recorded");
        assertThat(world.mortalityRatio()).isEqualTo(ratio, within(1e-5));
        List<Double> table = result.world("table").survival();
        for (int y = 0; y < 60; y++) {
            assertThat(world.survival().get(y)).isEqualTo(Math.pow(table.get(y), ratio), within(1e-9));
        }
    }

    /** In Gompertz's law a ratio of e^{bΔ} is Δ years older: the rated age. */
    @ParameterizedTest
    @CsvSource({"5", "8", "20"})
    void inGompertzLawARatioIsAnAge(int years) {
        MortalityTable table = Inputs.law(t -> 0.00003 / 0.09 * Math.expm1(0.09 * t));

        WorldResult world = ratio(table, Math.exp(0.09 * years)).world("recorded");

        assertThat(world.ratedAge()).isEqualTo(40 + years, within(1e-6));
    }
}
