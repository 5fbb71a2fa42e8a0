package nearworld.exchange.cases;

import java.time.LocalDate;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Objects;
import nearworld.engine.assessment.CaseFile;
import nearworld.engine.basics.Fault;
import nearworld.engine.basics.PartialDate;
import nearworld.engine.basics.Sex;
import nearworld.engine.mortality.LifeTable;
import nearworld.engine.mortality.MortalityTable;
import nearworld.engine.network.EvidencePack;
import nearworld.exchange.documents.Document;
import nearworld.exchange.documents.FormatSchema;
import nearworld.exchange.documents.JsonText;
import nearworld.exchange.documents.Spot;
import nearworld.exchange.faults.FaultList;
import nearworld.exchange.faults.Reading;
import org.jspecify.annotations.Nullable;
import tools.jackson.databind.JsonNode;

/** Reads cases ({@code case/1}) against one evidence pack: the case, or all of its faults. Safe for many threads. */
public final class CaseReader {
    /** A thousand times a long history. */
    public static final int MOST_BYTES = 1024 * 1024;

    private static final double DAYS_A_YEAR = 365.25;

    private final EvidencePack pack;
    private final @Nullable MortalityTable table;

    /** @param table whose sexes and ages a case must lie within; null: not checked */
    public CaseReader(EvidencePack pack, @Nullable MortalityTable table) {
        this.pack = pack;
        this.table = table;
    }

    /** Reads a JSON text. */
    public Reading<CaseFile> read(byte[] bytes) {
        return read(bytes, 1);
    }

    /** @param firstLine number of the text's first line within its file */
    public Reading<CaseFile> read(byte[] bytes, int firstLine) {
        return read(JsonText.read(bytes, MOST_BYTES, firstLine));
    }

    /** Reads a tree. */
    public Reading<CaseFile> read(JsonNode root) {
        return read(Document.of(root));
    }

    private Reading<CaseFile> read(Document document) {
        FaultList faults = document.faults();
        if (document.root() != null) {
            FormatSchema.CASE.validate(document.root(), faults);
            CaseFile file = caseFile(document.spot(), faults);
            if (file != null && faults.isEmpty()) {
                return Reading.accepted(file);
            }
        }
        return Reading.refused(faults.sorted());
    }

    private @Nullable CaseFile caseFile(Spot root, FaultList faults) {
        Spot applicant = root.at("applicant");
        PartialDate assessed = Dates.read(root.at("assessedOn"), faults);
        PartialDate born = Dates.read(applicant.at("bornOn"), faults);
        if (assessed == null || born == null) {
            // Without these two days no other one can be judged; names still can.
            assessed = assessed == null ? PartialDate.ofDay(LocalDate.MAX) : assessed;
            born = born == null ? PartialDate.ofDay(LocalDate.MIN) : born;
        } else if (born.earliest().isAfter(assessed.middle())) {
            Spot at = applicant.at("bornOn");
            faults.add(
                    Fault.of("dateAfterAssessment", at.path(), "value", at.shown(), "assessedOn", assessed.middle()));
            born = PartialDate.ofDay(LocalDate.MIN);
        } else {
            tableHolds(applicant, born, assessed.middle(), faults);
        }
        Dates dates = new Dates(born, assessed.middle(), faults);
        PackIndex index = new PackIndex(pack, faults);
        if (root.at("death").isGiven()) {
            faults.add(Fault.of("notSupported", "$.death"));
        }
        EvidencePart evidence = new EvidencePart(index, dates, faults);
        HistoryPart history = new HistoryPart(index, dates, faults);
        List<CaseFile.BehaviourReport> behaviours = evidence.behaviours(applicant.at("behaviours"));
        List<CaseFile.Statement> statements = evidence.statements(root.at("statements"));
        List<CaseFile.FindingReport> findings = evidence.findings(root.at("findings"));
        List<CaseFile.History> histories =
                history.read(root.at("history"), root.at("death").isGiven());
        CaseFile.Cover cover = new CoverPart(faults).read(root.at("cover"));
        List<CaseFile.WhatIf> whatIfs = new WhatIfPart(index, dates, history, faults).read(root.at("whatIfs"));
        if (!faults.isEmpty()) {
            return null;
        }
        return new CaseFile(
                Objects.requireNonNull(root.at("caseRef").text()),
                assessed.middle(),
                sex(applicant),
                born,
                behaviours,
                statements,
                findings,
                histories,
                null,
                cover,
                whatIfs);
    }

    private static Sex sex(Spot applicant) {
        return "female".equals(applicant.at("sex").text()) ? Sex.FEMALE : Sex.MALE;
    }

    private void tableHolds(Spot applicant, PartialDate born, LocalDate today, FaultList faults) {
        String sexText = applicant.at("sex").text();
        if (table == null || sexText == null) {
            return;
        }
        Sex sex = sex(applicant);
        MortalityTable.Column column =
                table.columns().stream().filter(c -> c.sex() == sex).findFirst().orElse(null);
        if (column == null) {
            faults.add(Fault.of("sexNotInTable", applicant.at("sex").path(), "sex", sexText));
            return;
        }
        LifeTable life = table.life(column);
        double age = (today.toEpochDay() - born.middle().toEpochDay()) / DAYS_A_YEAR;
        double highest = life.omega() - 1;
        if (!(age >= life.firstAge() && age <= highest)) {
            faults.add(new Fault(
                    "ageOutsideTable",
                    applicant.at("bornOn").path(),
                    Map.of(
                            "age", String.format(Locale.ROOT, "%.2f", age),
                            "lowest", String.valueOf(life.firstAge()),
                            "highest", String.valueOf(highest))));
        }
    }
}
