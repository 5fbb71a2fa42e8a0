package nearworld.engine;

import java.nio.charset.StandardCharsets;
import java.util.List;
import nearworld.engine.assessment.AssessmentOutcome;
import nearworld.engine.assessment.AssessmentResult;
import nearworld.engine.assessment.Assessor;
import nearworld.engine.assessment.CaseFile;
import nearworld.engine.assessment.Refusal;
import nearworld.engine.basics.Estimate;
import nearworld.engine.basics.Sex;
import nearworld.engine.mortality.MortalityTable;
import nearworld.engine.mortality.MortalityTable.AgeBasis;
import nearworld.engine.mortality.MortalityTable.Column;
import nearworld.engine.mortality.MortalityTable.WithinYear;
import nearworld.engine.network.EvidencePack;
import nearworld.exchange.cases.CaseReader;
import nearworld.exchange.faults.Reading;
import nearworld.exchange.packs.PackReader;
import nearworld.exchange.tables.TableReader;
import org.jspecify.annotations.Nullable;

/** Texts in the exchange format as the engine takes them, through the readers. */
public final class Inputs {
    private Inputs() {}

    public static MortalityTable table(String csv) {
        return accepted(TableReader.read(bytes(csv))).rates();
    }

    public static EvidencePack pack(String yaml) {
        return accepted(PackReader.read(bytes(yaml))).evidence();
    }

    /** @param table that the case is checked against when it is read; null: none */
    public static CaseFile caseFile(EvidencePack pack, @Nullable MortalityTable table, String json) {
        return accepted(new CaseReader(pack, table).read(bytes(json)));
    }

    public static AssessmentOutcome outcome(String table, String pack, String json) {
        MortalityTable rates = table(table);
        EvidencePack evidence = pack(pack);
        return new Assessor(rates, evidence).assess(caseFile(evidence, rates, json));
    }

    /** The result; a refusal fails the test. */
    public static AssessmentResult result(String table, String pack, String json) {
        return result(outcome(table, pack, json));
    }

    public static AssessmentResult result(AssessmentOutcome outcome) {
        if (outcome instanceof Refusal refusal) {
            throw new AssertionError(refusal.faults().toString());
        }
        return (AssessmentResult) outcome;
    }

    /** A law of mortality. */
    public interface Cumulated {
        /** The force integrated from age 0. */
        double to(double age);
    }

    /** Ages 0 to 119 of a law of mortality, men only: q(a) = 1 − exp(−∫ of the force over the year), constant force within. */
    public static MortalityTable law(Cumulated hazard) {
        List<Double> q = java.util.stream.IntStream.range(0, 120)
                .mapToObj(a -> -Math.expm1(hazard.to(a) - hazard.to(a + 1)))
                .toList();
        // A rate that rounds to 1 closes the table there.
        int end = q.indexOf(1.0) < 0 ? q.size() : q.indexOf(1.0) + 1;
        Column column = new Column(Sex.MALE, List.of(), 0, q.subList(0, end));
        return new MortalityTable("law", AgeBasis.EXACT, WithinYear.CONSTANT_FORCE, "general", List.of(column));
    }

    /** Ratios that are the same at every age, a frailty, and nothing else. */
    public static EvidencePack bare(
            double variance,
            int points,
            List<EvidencePack.Condition> conditions,
            List<EvidencePack.EventType> events,
            List<EvidencePack.Finding> findings,
            List<EvidencePack.Treatment> treatments) {
        return new EvidencePack(
                "bare",
                1,
                "general",
                new EvidencePack.Taper(120, 120, 121),
                new EvidencePack.Frailty(Estimate.of(variance), points),
                List.of(),
                conditions,
                List.of(),
                events,
                findings,
                List.of(),
                treatments);
    }

    private static <T> T accepted(Reading<T> reading) {
        if (!reading.isAccepted()) {
            throw new AssertionError(reading.located().toString());
        }
        return reading.value();
    }

    private static byte[] bytes(String text) {
        return text.getBytes(StandardCharsets.UTF_8);
    }
}
