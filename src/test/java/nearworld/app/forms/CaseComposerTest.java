package nearworld.app.forms;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import nearworld.engine.basics.Fault;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/** What is typed becomes case/1; what cannot be read is left out row by row and named at its field. */
class CaseComposerTest {
    private static final LocalDate TODAY = LocalDate.of(2026, 12, 1);

    /** The case of the model's section 9, without its death. */
    private static final String CASE = """
            {"format": "case/1", "caseRef": "C-1042", "assessedOn": "2026-12-01",
             "applicant": {"sex": "male", "bornOn": "1959-11-30",
                           "behaviours": {"smoking": {"level": "former", "since": "2015-06-01"}}},
             "statements": [{"condition": "heartFailure", "present": false, "source": "applicant"},
                            {"condition": "diabetes", "present": true, "source": "doctor", "onset": "2012-01-15"}],
             "findings": [{"finding": "ntProBnp", "level": "raised"}],
             "history": [{"event": "respiratoryAdmission", "from": "2016-12-01", "to": "2026-12-01",
                          "occurrences": [{"on": "2024-05-10", "outcome": "ward"}]}],
             "cover": {"kind": "term", "years": 20, "sumAssured": 250000, "currency": "EUR", "interest": 0.03},
             "whatIfs": [{"name": "Never admitted", "changes": [{"remove": {"event": "respiratoryAdmission", "on": "2024-05-10"}}]},
                         {"name": "No hypertension", "changes": [{"without": {"condition": "hypertension"}}]},
                         {"name": "Intensive care instead", "changes": [{"outcome": {"event": "respiratoryAdmission", "on": "2024-05-10", "to": "intensive"}}]},
                         {"name": "Earlier", "changes": [{"move": {"event": "respiratoryAdmission", "on": "2024-05-10", "to": "2019"}}]},
                         {"name": "On a statin", "changes": [{"treat": {"treatment": "statin"}}]},
                         {"name": "Stops smoking", "changes": [{"behaviour": {"smoking": "former", "from": "2026-12-01"}}]},
                         {"name": "Caught again", "changes": [{"add": {"event": "respiratoryAdmission", "on": "2027-02-01"}}]}]}
            """;

    /** Takes every case but those with a date of the year 1066, whose path it names. */
    private static final CaseCheck NO_1066 = input -> {
        List<Fault> faults = new ArrayList<>();
        find(input, "$", faults);
        return new CaseCheck.Checked(null, faults);
    };

    private static void find(JsonNode node, String path, List<Fault> faults) {
        if (node.isString() && node.asString("").startsWith("1066")) {
            faults.add(Fault.of("tooEarly", path));
        }
        node.properties().forEach(e -> find(e.getValue(), path + "." + e.getKey(), faults));
        if (node.isArray()) {
            for (int i = 0; i < node.size(); i++) {
                find(node.path(i), path + "[" + i + "]", faults);
            }
        }
    }

    private static CaseForms forms() {
        return FormsOfCase.of(JsonMapper.shared().readTree(CASE));
    }

    private static Composition compose(CaseForms forms) {
        return CaseComposer.compose("C-1042", TODAY, forms, NO_1066);
    }

    private static List<String> keys(Composition composition) {
        return composition.faults().all().stream().map(FieldFault::key).toList();
    }

    @Test
    void formsOfACaseComeToTheSameCase() {
        Composition composition = compose(forms());
        assertThat(composition.faults().any()).isFalse();
        assertThat(composition.input().toString())
                .isEqualTo(JsonMapper.shared().readTree(CASE).toString());
        assertThat(composition.coverKind()).isEqualTo("term");
    }

    @Test
    void whatIsStoredAsTypedReadsBackAsTyped() {
        for (Section section : Section.values()) {
            Object form = forms().of(section);
            assertThat(FormJson.read(section, FormJson.write(form))).isEqualTo(form);
        }
    }

    @Test
    void aHistoryWithABadOccurrenceIsLeftOutAsAWhole() {
        HistoryForm.HistoryRow row = forms().history().history().get(0);
        List<HistoryForm.OccurrenceRow> occurrences =
                List.of(row.occurrences().get(0), new HistoryForm.OccurrenceRow("1066-10-14", "ward"));
        HistoryForm form =
                new HistoryForm(List.of(new HistoryForm.HistoryRow(row.event(), row.from(), row.to(), occurrences)));
        Composition composition = compose(forms().with(Section.HISTORY, form));
        assertThat(keys(composition)).containsExactly("history.history[0].occurrences[1].on");
        assertThat(composition.input().path("history").size()).isZero();
        assertThat(composition.validParts().get(Section.HISTORY)).isEqualTo("{\"history\":[]}");
        assertThat(composition.validParts().get(Section.STATEMENTS)).contains("heartFailure");
    }

    @Test
    void aHalfFilledRowNamesWhatIsMissingAndLeavesTheOthersIn() {
        List<StatementsForm.StatementRow> rows =
                new ArrayList<>(forms().statements().statements());
        rows.add(0, new StatementsForm.StatementRow("copd", "", "", "", ""));
        rows.add(1, new StatementsForm.StatementRow("", "", "", "", ""));
        Composition composition = compose(forms().with(
                        Section.STATEMENTS,
                        new StatementsForm(rows, forms().statements().findings())));
        assertThat(keys(composition))
                .containsExactly("statements.statements[0].present", "statements.statements[0].source");
        assertThat(composition.input().path("statements").size()).isEqualTo(2);
    }

    @Test
    void aFaultBehindLeftOutRowsIsStillNamedAtItsOwnRow() {
        List<StatementsForm.StatementRow> rows = List.of(
                new StatementsForm.StatementRow("copd", "", "", "", ""),
                new StatementsForm.StatementRow("copd", "true", "doctor", "", "1066"));
        Composition composition = compose(forms().with(Section.STATEMENTS, new StatementsForm(rows, List.of())));
        assertThat(keys(composition)).contains("statements.statements[1].onset");
    }

    @Test
    void aWhatIfWithABadChangeIsLeftOutAsAWhole() {
        WhatIfsForm.WhatIfRow row = new WhatIfsForm.WhatIfRow(
                "Two",
                List.of(
                        WhatIfsForm.ChangeRow.ofKind("treat"),
                        new WhatIfsForm.ChangeRow("without", "", "", "", "copd", "", "", "", "1066", "")),
                "");
        Composition composition = compose(forms().with(Section.WHAT_IFS, new WhatIfsForm(List.of(row))));
        assertThat(keys(composition)).containsExactly("whatIfs.whatIfs[0].changes[0].treatment");
        assertThat(composition.input().path("whatIfs").size()).isZero();
    }

    @Test
    void anUntouchedCaseHasNoFaultsButNoCalculationEither() {
        Composition composition = compose(CaseForms.empty());
        assertThat(composition.faults().any()).isFalse();
        assertThat(composition.file()).isNull();
        assertThat(composition.general()).extracting(Fault::code).containsExactly("personIncomplete");
        assertThat(composition.validParts().keySet()).isEqualTo(Set.of(Section.values()));
    }

    @Test
    void aHalfFilledPersonNamesTheRest() {
        PersonForm person = new PersonForm("male", "", "", List.of());
        assertThat(keys(compose(forms().with(Section.PERSON, person)))).containsExactly("person.bornOn");
    }

    @Test
    void aBadBirthDateIsNamedAndNothingIsCalculated() {
        PersonForm person = new PersonForm("male", "1066-10-14", "", List.of());
        Composition composition = compose(forms().with(Section.PERSON, person));
        assertThat(keys(composition)).containsExactly("person.bornOn");
        assertThat(composition.file()).isNull();
    }

    @Test
    void theDayOfTheCalculationStandsInWhereNoneIsTyped() {
        PersonForm person = new PersonForm("male", "1959-11-30", "", List.of());
        Composition composition = compose(forms().with(Section.PERSON, person));
        assertThat(composition.input().path("assessedOn").asString("")).isEqualTo("2026-12-01");
        assertThat(composition.validParts().get(Section.PERSON)).doesNotContain("assessedOn");
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "250000|250000",
                "250 000|250000",
                "250'000|250000",
                "1234.5|1234.5",
                "1234,5|1234.5",
                "0.125|0.125",
                "-5|-5"
            })
    void numbersAreReadAsPeopleTypeThem(String typed, String number) {
        Composition composition = compose(forms().with(Section.COVER, new CoverForm("term", "20", typed, "EUR", "3")));
        assertThat(composition.faults().any()).isFalse();
        assertThat(composition.input().path("cover").path("sumAssured").decimalValue())
                .isEqualByComparingTo(number);
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "250,000|ambiguousNumber",
                "250.000|ambiguousNumber",
                "1.250.000,50|ambiguousNumber",
                "much|notANumber",
                "1e9|notANumber",
                "NaN|notANumber"
            })
    void whatMayMeanTwoNumbersIsAskedAbout(String typed, String code) {
        Composition composition = compose(forms().with(Section.COVER, new CoverForm("term", "20", typed, "EUR", "3")));
        assertThat(keys(composition)).containsExactly("cover.sumAssured");
        Fault fault = composition.faults().of("cover.sumAssured").get(0);
        assertThat(fault.code()).isEqualTo(code);
        assertThat(fault.values()).containsEntry("value", typed);
        assertThat(composition.input().has("cover")).isFalse();
    }

    @Test
    void everyFieldOfEveryKindOfChangeIsRemembered() {
        CaseDraft draft = CaseDraft.of("C-1", TODAY, forms(), Set.of());
        assertThat(draft.place("$.whatIfs[3].changes[0].move.to").orElseThrow().field())
                .isEqualTo("whatIfs[3].changes[0].to");
        assertThat(draft.place("$.whatIfs[5].changes[0].behaviour.smoking")
                        .orElseThrow()
                        .field())
                .isEqualTo("whatIfs[5].changes[0].pick");
        assertThat(draft.place("$.whatIfs[0].changes[0].remove.on")
                        .orElseThrow()
                        .field())
                .isEqualTo("whatIfs[0].changes[0].occurrence");
        assertThat(draft.place("$.history[0].occurrences[0].outcome")
                        .orElseThrow()
                        .field())
                .isEqualTo("history[0].occurrences[0].outcome");
        assertThat(draft.place("$.cover.interest").orElseThrow().field()).isEqualTo("interestPercent");
        assertThat(draft.place("$.nowhere")).isEmpty();
    }
}
