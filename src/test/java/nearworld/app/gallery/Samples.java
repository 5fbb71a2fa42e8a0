package nearworld.app.gallery;

import java.math.BigDecimal;
import java.time.Instant;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.stream.IntStream;
import nearworld.app.artefacts.ArtefactView;
import nearworld.app.artefacts.PackChoices;
import nearworld.app.artefacts.PackChoices.BehaviourChoice;
import nearworld.app.artefacts.PackChoices.Choice;
import nearworld.app.artefacts.PackChoices.EventChoice;
import nearworld.app.artefacts.PackChoices.FindingChoice;
import nearworld.app.artefacts.PackChoices.OutcomeChoice;
import nearworld.app.assessments.AssessmentView;
import nearworld.app.assessments.Basis;
import nearworld.app.assessments.Calculated;
import nearworld.app.cases.CaseList;
import nearworld.app.cases.CaseQuery;
import nearworld.app.cases.CaseRow;
import nearworld.app.cases.CaseState;
import nearworld.app.cases.CaseView;
import nearworld.app.cases.SectionState;
import nearworld.app.forms.CaseForms;
import nearworld.app.forms.CoverForm;
import nearworld.app.forms.FieldFault;
import nearworld.app.forms.FieldFaults;
import nearworld.app.forms.HistoryForm;
import nearworld.app.forms.PersonForm;
import nearworld.app.forms.Section;
import nearworld.app.forms.StatementsForm;
import nearworld.app.forms.WhatIfsForm;
import nearworld.app.people.PersonView;
import nearworld.app.people.Role;
import nearworld.app.trail.TrailEntryView;
import nearworld.engine.assessment.AssessmentResult;
import nearworld.engine.assessment.AssessmentResult.WorldResult;
import nearworld.engine.assessment.CaseFile;
import nearworld.engine.basics.AgeCurve;
import nearworld.engine.basics.BySex;
import nearworld.engine.basics.Estimate;
import nearworld.engine.basics.Fault;
import nearworld.engine.basics.PartialDate;
import nearworld.engine.basics.Sex;
import nearworld.engine.network.EvidencePack;

/** Invented people, cases and results: every state that the pages can show. Their numbers come from no engine. */
final class Samples {
    static final LocalDate TODAY = LocalDate.of(2026, 12, 1);
    static final Instant NOW = Instant.parse("2026-12-01T10:15:30Z");
    static final PersonView ME = new PersonView(1, "ada", "Ada Marsh", Role.UNDERWRITER);
    static final PersonView OTHER = new PersonView(2, "ben", "Ben Tidewater", Role.MEDICAL_OFFICER);

    private static final double AGE = 64.7;

    private Samples() {}

    static PackChoices choices() {
        return new PackChoices(
                List.of(new BehaviourChoice(
                        "smoking",
                        "Smoking",
                        List.of(
                                new Choice("never", "never"),
                                new Choice("former", "given up"),
                                new Choice("current", "smokes")))),
                List.of(
                        new Choice("diabetes", "Diabetes"),
                        new Choice("copd", "Chronic obstructive lung disease"),
                        new Choice("heartFailure", "Heart failure")),
                List.of(
                        new FindingChoice(
                                "ntProBnp",
                                "NT-proBNP",
                                "ng/L",
                                List.of(new Choice("raised", "raised"), new Choice("normal", "normal"))),
                        new FindingChoice(
                                "statin",
                                "Takes a statin",
                                "",
                                List.of(new Choice("yes", "yes"), new Choice("no", "no")))),
                List.of(
                        new EventChoice(
                                "respiratoryAdmission",
                                "Respiratory admission",
                                List.of(
                                        new OutcomeChoice("ward", "ward", false),
                                        new OutcomeChoice("intensive", "intensive care", false),
                                        new OutcomeChoice("died", "died", true))),
                        new EventChoice(
                                "heartAttack",
                                "Heart attack",
                                List.of(
                                        new OutcomeChoice("treated", "treated in time", false),
                                        new OutcomeChoice("shock", "with shock", false),
                                        new OutcomeChoice("died", "died", true)))),
                List.of(new Choice("applicant", "Applicant"), new Choice("doctor", "Doctor’s report")),
                List.of(new Choice("statinTreatment", "Statin")));
    }

    static EvidencePack pack() {
        Estimate half = new Estimate(0.5, 0.5, 0.5);
        AgeCurve share = AgeCurve.constant(AgeCurve.Scale.LOG, half);
        return new EvidencePack(
                "sample",
                1,
                "general",
                new EvidencePack.Taper(40, 65, 105),
                new EvidencePack.Frailty(half, 9),
                List.of(),
                List.of(),
                List.of(),
                List.of(
                        event("respiratoryAdmission", share, "ward", "intensive"),
                        event("heartAttack", share, "treated", "shock")),
                List.of(),
                List.of(),
                List.of());
    }

    private static EvidencePack.EventType event(String id, AgeCurve share, String mild, String severe) {
        BySex<AgeCurve> shares = new BySex<>(share, share);
        List<EvidencePack.Outcome> outcomes = List.of(
                new EvidencePack.Outcome(mild, shares, List.of(), null, false),
                new EvidencePack.Outcome(severe, shares, List.of(), null, false),
                new EvidencePack.Outcome("died", shares, List.of(), null, true));
        return new EvidencePack.EventType(
                id, new Estimate(1, 1, 1), 0, shares, List.of(), List.of(), outcomes, List.of());
    }

    /** Few occurrences and four what-ifs. */
    static Calculated calculated() {
        List<CaseFile.History> history = List.of(
                new CaseFile.History(
                        0,
                        PartialDate.ofDay(TODAY.minusYears(10)),
                        PartialDate.ofDay(TODAY),
                        List.of(new CaseFile.Occurrence(PartialDate.ofDay(LocalDate.of(2024, 5, 10)), 0))),
                new CaseFile.History(
                        1,
                        PartialDate.ofDay(TODAY.minusYears(20)),
                        PartialDate.ofDay(TODAY),
                        List.of(new CaseFile.Occurrence(PartialDate.ofMonth(2022, 2), 1))));
        List<CaseFile.WhatIf> whatIfs = List.of(
                whatIf("Never admitted", new CaseFile.Remove(0, PartialDate.ofDay(LocalDate.of(2024, 5, 10)))),
                whatIf("Stops smoking", new CaseFile.ChangedBehaviour(0, 1, PartialDate.ofDay(TODAY))),
                whatIf("Caught again in two years", new CaseFile.Add(0, PartialDate.ofDay(TODAY.plusYears(2)), -1)),
                whatIf("Never smoked", new CaseFile.ChangedBehaviour(0, 0, null)));
        return calculated(history, whatIfs, List.of());
    }

    /** Twenty-six occurrences, six what-ifs with long names, warnings, and things left out. */
    static Calculated crowded() {
        List<CaseFile.Occurrence> many = IntStream.range(0, 25)
                .mapToObj(i ->
                        new CaseFile.Occurrence(PartialDate.ofDay(TODAY.minusDays(40 + (i * 7919L) % 3500)), i % 2))
                .toList();
        List<CaseFile.History> history = List.of(
                new CaseFile.History(0, PartialDate.ofYear(2016), PartialDate.ofDay(TODAY), many),
                new CaseFile.History(1, null, null, List.of(new CaseFile.Occurrence(PartialDate.ofYear(1999), 0))));
        List<CaseFile.WhatIf> whatIfs = new ArrayList<>();
        for (int i = 0; i < 6; i++) {
            whatIfs.add(whatIf(
                    "Number " + (i + 1) + " of six worlds & a name <that> runs on and on",
                    i % 2 == 0
                            ? new CaseFile.Remove(0, PartialDate.ofDay(TODAY.minusDays(400L * i + 40)))
                            : new CaseFile.Without(1, i == 1 ? null : PartialDate.ofDay(TODAY.plusMonths(7L * i)))));
        }
        List<Fault> warnings = List.of(
                Fault.of("noSuchRuleInAnyFile", "$.history[0].from"),
                new Fault("partialDate", "$.applicant.bornOn", Map.of("value", "1962", "years", "0.4")));
        return calculated(history, whatIfs, warnings);
    }

    private static CaseFile.WhatIf whatIf(String name, CaseFile.Change change) {
        return new CaseFile.WhatIf(name, List.of(change));
    }

    private static Calculated calculated(
            List<CaseFile.History> history, List<CaseFile.WhatIf> whatIfs, List<Fault> warnings) {
        CaseFile file = new CaseFile(
                "SP-1042",
                TODAY,
                Sex.MALE,
                PartialDate.ofDay(LocalDate.of(1962, 3, 9)),
                List.of(),
                List.of(new CaseFile.Statement(0, true, 1, null, PartialDate.ofMonth(2021, 5))),
                List.of(),
                history,
                null,
                new CaseFile.Cover(CaseFile.CoverKind.TERM, 15, BigDecimal.valueOf(100_000), "EUR", 0.03),
                whatIfs);
        List<WorldResult> worlds = new ArrayList<>(List.of(
                world("table", 1), world("recorded", 3.3), world("eventsRemoved", 2.4), world("unlearned", 1.5)));
        for (int i = 0; i < whatIfs.size(); i++) {
            worlds.add(world("whatIf:" + whatIfs.get(i).name(), 3.2 - 0.4 * i));
        }
        AssessmentResult result = new AssessmentResult(
                AGE,
                -5.9,
                List.of(
                        new AssessmentResult.ConditionShift("diabetes", 0.153, 0.251),
                        new AssessmentResult.ConditionShift("copd", 0.069, 0.634),
                        new AssessmentResult.ConditionShift("heartFailure", 0.039, 0.0004)),
                worlds,
                new AssessmentResult.Split(-6.1, 2.41),
                new AssessmentResult.Split(-1.8, 1.31),
                warnings);
        return new Calculated(file, result, pack(), choices(), basis(), warnings);
    }

    static Basis basis() {
        return new Basis(
                "United States 2014, population",
                "ab".repeat(32),
                "sample",
                1,
                "Sample pack",
                "cd".repeat(32),
                "1.0.0");
    }

    /** A Gompertz life of age 64.7 with its hazard times {@code ratio}, cut at 120. */
    private static WorldResult world(String id, double ratio) {
        List<Double> monthly = new ArrayList<>();
        double cumulative = 0;
        for (int month = 0; month <= 55 * 12; month++) {
            monthly.add(Math.exp(-cumulative));
            cumulative += ratio * 0.0165 * Math.exp(0.098 * month / 12.0) / 12;
        }
        List<Double> yearly =
                IntStream.rangeClosed(1, 55).mapToObj(y -> monthly.get(12 * y)).toList();
        List<Double> deciles =
                IntStream.rangeClosed(1, 9).mapToObj(i -> by(monthly, i / 10.0)).toList();
        double curtate = yearly.stream().mapToDouble(s -> s).sum();
        return new WorldResult(
                id,
                curtate + 0.47,
                curtate,
                by(monthly, 0.5),
                by(monthly, 0.25),
                by(monthly, 0.75),
                deciles,
                15,
                ratio,
                (ratio - 1) * 17.5,
                ratio > 3 ? null : AGE + 6 * ratio - 6,
                yearly,
                monthly,
                id.equals("whatIf:Never smoked")
                        ? Double.valueOf(0.93)
                        : id.startsWith("whatIf:") ? Double.valueOf(1) : null);
    }

    private static double by(List<Double> monthly, double dead) {
        int month = 0;
        while (monthly.get(month) > 1 - dead) {
            month++;
        }
        return month / 12.0;
    }

    static CaseForms forms() {
        return new CaseForms(
                new PersonForm(
                        "male",
                        "1962-03-09",
                        "",
                        List.of(new PersonForm.BehaviourRow("smoking", "former", "2015", "current"))),
                new StatementsForm(
                        List.of(
                                new StatementsForm.StatementRow("diabetes", "true", "doctor", "", "2021-05"),
                                new StatementsForm.StatementRow("copd", "false", "applicant", "32.13.2019", "")),
                        List.of(
                                new StatementsForm.FindingRow("ntProBnp:raised", ""),
                                new StatementsForm.FindingRow("gone:level", ""))),
                new HistoryForm(List.of(
                        new HistoryForm.HistoryRow(
                                "respiratoryAdmission",
                                "2016-12-01",
                                "2026-12-01",
                                List.of(new HistoryForm.OccurrenceRow("2024-05-10", "ward"))),
                        new HistoryForm.HistoryRow("", "", "", List.of()))),
                new WhatIfsForm(List.of(
                        new WhatIfsForm.WhatIfRow(
                                "Everything at once",
                                List.of(
                                        change("remove", "respiratoryAdmission@2024-05-10", "", "", ""),
                                        change("move", "respiratoryAdmission@2024-05-10", "", "", ""),
                                        change("outcome", "respiratoryAdmission@2024-05-10", "intensive", "", ""),
                                        change("without", "", "", "copd", ""),
                                        change("behaviour", "", "", "", "smoking:never"),
                                        change("treat", "", "", "", ""),
                                        change("add", "", "", "", "")),
                                "treat"),
                        new WhatIfsForm.WhatIfRow("", List.of(), ""))),
                new CoverForm("term", "15", "100000", "EUR", "3"));
    }

    private static WhatIfsForm.ChangeRow change(
            String kind, String occurrence, String outcome, String condition, String pick) {
        boolean add = kind.equals("add");
        return new WhatIfsForm.ChangeRow(
                kind,
                occurrence,
                add ? "heartAttack" : "",
                outcome,
                condition,
                pick,
                kind.equals("treat") ? "statinTreatment" : "",
                add ? "2028-01" : "",
                "",
                kind.equals("move") ? "2020" : "");
    }

    static FieldFaults faults() {
        return new FieldFaults(List.of(
                new FieldFault(Section.PERSON, "sex", Fault.of("required", "$.applicant.sex")),
                new FieldFault(
                        Section.STATEMENTS,
                        "statements[1].on",
                        Fault.of("unknownDate", "$.statements[1].on", "value", "32.13.2019")),
                new FieldFault(Section.HISTORY, "history[1].event", Fault.of("required", "$.history[1].event")),
                new FieldFault(Section.WHAT_IFS, "whatIfs[1].name", Fault.of("required", "$.whatIfs[1].name"))));
    }

    static CaseView caseView(boolean mayEdit) {
        List<SectionState> sections = IntStream.range(0, 5)
                .mapToObj(i -> new SectionState(Section.values()[i], i, NOW, "ada"))
                .toList();
        return new CaseView(
                "SP-1042", CaseState.OPEN, ME, OTHER, TODAY, TODAY.plusDays(14), "BR/77-1", mayEdit, mayEdit, sections);
    }

    static Map<String, Long> versions() {
        return Map.of("person", 3L, "statements", 1L, "history", 2L, "whatIfs", 0L, "cover", 1L);
    }

    static CaseList caseList(CaseQuery query, boolean empty) {
        List<CaseRow> rows = new ArrayList<>();
        for (int i = 0; i < (empty ? 0 : 7); i++) {
            rows.add(new CaseRow(
                    "SP-10" + (42 + i),
                    CaseState.values()[i % 5],
                    ME,
                    i % 3 == 0 ? OTHER : null,
                    TODAY.minusDays(i),
                    NOW.minusSeconds(5000L * i),
                    i % 2 == 0 ? TODAY.plusDays(3L * i - 4) : null,
                    i == 6 ? null : "term",
                    i % 2 == 0 ? null : 1 + 0.37 * i,
                    i == 0));
        }
        return new CaseList(rows, query, 2, empty ? 1 : 3, rows.isEmpty() ? 0 : 57, List.of(ME, OTHER), true);
    }

    static List<AssessmentView> assessments() {
        return List.of(new AssessmentView(2, NOW, "ada", "United States 2014", "sample", 1, "1.0.0", 3.16, 8.1));
    }

    static List<TrailEntryView> trail() {
        List<TrailEntryView> entries = new ArrayList<>();
        String[] actions = {
            "person.signedIn",
            "person.signInRefused",
            "person.signedOut",
            "case.created",
            "case.viewed",
            "case.saved",
            "assessment.recorded",
            "assessment.viewed",
            "artefact.published",
            "person.created",
            "trail.verified"
        };
        for (int i = 0; i < actions.length; i++) {
            Map<String, String> details =
                    actions[i].equals("case.saved") ? Map.of("section", "history", "version", "3") : Map.of();
            entries.add(new TrailEntryView(
                    1200 - i,
                    NOW.minusSeconds(60L * i),
                    "ada",
                    actions[i],
                    actions[i].startsWith("case") ? "SP-1042" : null,
                    details,
                    "0f".repeat(32)));
        }
        return entries;
    }

    static List<ArtefactView> artefacts() {
        return List.of(
                new ArtefactView(
                        "table",
                        "us-2014",
                        1,
                        "United States 2014, population",
                        "published",
                        "ab".repeat(32),
                        NOW,
                        true),
                new ArtefactView("pack", "default", 2, "Default evidence pack", "draft", "cd".repeat(32), null, false));
    }
}
