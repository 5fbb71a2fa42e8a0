package nearworld.exchange.cases;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import nearworld.engine.assessment.CaseFile;
import nearworld.engine.network.EvidencePack;
import nearworld.exchange.faults.LocatedFault;
import nearworld.exchange.faults.Reading;
import nearworld.exchange.packs.PackReader;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Every kind of bad case: a good one with one thing changed, the rule that refuses it, and the place. */
class CaseFaultsTest {
    private static final Path WORKED = Path.of("src/test/resources/oracles/worked");
    private static final String GOOD = text("case-1.json");
    private static final EvidencePack PACK = PackReader.read(text("pack-1.yaml").getBytes(StandardCharsets.UTF_8))
            .value()
            .evidence();
    private static final String ADMISSION = "\"event\": \"respiratoryAdmission\", \"on\": \"2024-05-10\"";
    private static final String WHAT_IFS = GOOD.substring(GOOD.indexOf("\"whatIfs\""));

    private static String text(String name) {
        try {
            return Files.readString(WORKED.resolve(name));
        } catch (IOException e) {
            throw new IllegalStateException(e);
        }
    }

    private static Reading<CaseFile> reading(String text) {
        return new CaseReader(PACK, null).read(text.getBytes(StandardCharsets.UTF_8));
    }

    private static void refused(String text, String code, String path) {
        List<LocatedFault> faults = reading(text).located();
        assertThat(faults).as(text).anySatisfy(f -> {
            assertThat(f.fault().code()).isEqualTo(code);
            assertThat(f.fault().path()).isEqualTo(path);
            assertThat(f.place().line()).isPositive();
        });
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "\"case/1\"|\"case/2\"|notAllowed|$.format",
                "\"caseRef\": \"C-1042\", | |missingField|$.caseRef",
                "\"caseRef\": \"C-1042\"|\"caseRef\": \"C-1042\", \"caseRef\": \"C-1\"|duplicateKey|$.caseRef",
                "\"caseRef\": \"C-1042\"|\"caseRef\": \"C-1042\", \"colour\": 1|unknownField|$.colour",
                "\"sex\": \"male\"|\"sex\": \"man\"|notAllowed|$.applicant.sex",
                "\"1959-11-30\"|\"30.11.1959\"|notADate|$.applicant.bornOn",
                "\"1959-11-30\"|\"1959-02-30\"|noSuchDay|$.applicant.bornOn",
                "\"1959-11-30\"|\"1959-13\"|noSuchDay|$.applicant.bornOn",
                "\"1959-11-30\"|1959|wrongType|$.applicant.bornOn",
                "\"1959-11-30\"|\"2027-01-01\"|dateAfterAssessment|$.applicant.bornOn",
                "\"assessedOn\": \"2026-12-01\"|\"assessedOn\": \"2026-12\"|notADay|$.assessedOn",
                "\"smoking\": {|\"drinking\": {|unknownBehaviour|$.applicant.behaviours.drinking",
                "\"level\": \"former\"|\"level\": \"sometimes\"|unknownLevel|$.applicant.behaviours.smoking.level",
                "\"level\": \"former\"|\"level\": \"current\"|sinceWithoutHalfLife|$.applicant.behaviours.smoking.since",
                "\"since\": \"2015-06-01\"|\"left\": \"current\"|leftWithoutSince|$.applicant.behaviours.smoking.left",
                "\"since\": \"2015-06-01\"|\"since\": \"2015\", \"left\": \"former\"|leftIsLevel|$.applicant.behaviours.smoking.left",
                "\"since\": \"2015-06-01\"|\"since\": \"1950\"|dateBeforeBirth|$.applicant.behaviours.smoking.since",
                "\"since\": \"2015-06-01\"|\"since\": \"2027-01\"|dateAfterAssessment|$.applicant.behaviours.smoking.since",
                "\"condition\": \"diabetes\"|\"condition\": \"gout\"|unknownCondition|$.statements[1].condition",
                "\"source\": \"doctor\"|\"source\": \"neighbour\"|unknownSource|$.statements[1].source",
                "\"present\": true|\"present\": false|onsetOfAbsent|$.statements[1].onset",
                "\"present\": true|\"present\": \"yes\"|wrongType|$.statements[1].present",
                "\"onset\": \"2012-01-15\"|\"onset\": \"1900\"|dateBeforeBirth|$.statements[1].onset",
                "\"onset\": \"2012-01-15\"|\"on\": \"2026-12-02\"|dateAfterAssessment|$.statements[1].on",
                "\"finding\": \"ntProBnp\"|\"finding\": \"ecg\"|unknownFinding|$.findings[0].finding",
                "\"level\": \"raised\"|\"level\": \"high\"|unknownLevel|$.findings[0].level",
                "{\"event\": \"respiratoryAdmission\", \"from\"|{\"event\": \"fall\", \"from\"|unknownEvent|$.history[0].event",
                "\"from\": \"2016-12-01\", \"to\"|\"to\"|missingField|$.history[0].from",
                "\"from\": \"2016-12-01\", \"to\": \"2026-12-01\"|\"from\": \"2026-12-01\", \"to\": \"2016-12-01\"|windowReversed|$.history[0].to",
                "\"from\": \"2016-12-01\"|\"from\": \"1916-12-01\"|dateBeforeBirth|$.history[0].from",
                "\"to\": \"2026-12-01\",|\"to\": \"2026-12-02\",|dateAfterAssessment|$.history[0].to",
                "\"outcome\": \"ward\"}|\"outcome\": \"home\"}|unknownOutcome|$.history[0].occurrences[0].outcome",
                "\"outcome\": \"ward\"}|\"outcome\": \"died\"}|fatalOutcomeOfLiving|$.history[0].occurrences[0].outcome",
                ", \"outcome\": \"ward\"}|}|missingField|$.history[0].occurrences[0].outcome",
                "\"death\": null|\"death\": {\"on\": \"2026-01-01\", \"cause\": \"other\"}|notSupported|$.death",
                "\"years\": 20, | |missingField|$.cover.years",
                "\"years\": 20|\"years\": 0|belowMinimum|$.cover.years",
                "\"years\": 20|\"years\": 101|aboveMaximum|$.cover.years",
                "\"years\": 20|\"years\": 1e300|numberTooLarge|$.cover.years",
                "\"years\": 20|\"years\": NaN|notFinite|$.cover.years",
                "\"kind\": \"term\"|\"kind\": \"wholeOfLife\"|yearsOfWholeLife|$.cover.years",
                "\"kind\": \"term\"|\"kind\": \"lifeAnnuity\"|yearsOfWholeLife|$.cover.years",
                "\"kind\": \"term\"|\"kind\": \"pension\"|notAllowed|$.cover.kind",
                "\"sumAssured\": 250000|\"sumAssured\": -1|belowMinimum|$.cover.sumAssured",
                "\"currency\": \"EUR\"|\"currency\": \"eur\"|wrongForm|$.cover.currency",
                "\"interest\": 0.03|\"interest\": -1|notAbove|$.cover.interest",
                "\"interest\": 0.03|\"interest\": 3|aboveMaximum|$.cover.interest",
                "\"interest\": 0.03|\"interest\": Infinity|notFinite|$.cover.interest",
                "\"death\": null,|\"death\": null,,|notJson|$",
            })
    void refusesOneWrongThing(String found, String instead, String code, String path) {
        assertThat(GOOD).contains(found);
        refused(GOOD.replace(found, instead == null ? "" : instead), code, path);
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "[{\"remove\": {ADM}}, {\"outcome\": {ADM, \"to\": \"intensive\"}}]|changedTwice|$.whatIfs[0].changes[1].outcome",
                "[{\"remove\": {\"event\": \"respiratoryAdmission\", \"on\": \"2024-05\"}}]|noSuchOccurrence|$.whatIfs[0].changes[0].remove",
                "[{\"remove\": {ADM}, \"treat\": {\"treatment\": \"statin\"}}]|tooMany|$.whatIfs[0].changes[0]",
                "[{}]|tooFew|$.whatIfs[0].changes[0]",
                "[]|tooFew|$.whatIfs[0].changes",
                "[{\"undo\": {ADM}}]|unknownField|$.whatIfs[0].changes[0].undo",
                "[{\"outcome\": {ADM, \"to\": \"died\"}}]|fatalOutcomeGiven|$.whatIfs[0].changes[0].outcome.to",
                "[{\"move\": {ADM, \"to\": \"2026-12-02\"}}]|dateAfterAssessment|$.whatIfs[0].changes[0].move.to",
                "[{\"move\": {ADM, \"to\": \"1950-01-01\"}}]|dateBeforeBirth|$.whatIfs[0].changes[0].move.to",
                "[{\"without\": {\"condition\": \"gout\"}}]|unknownCondition|$.whatIfs[0].changes[0].without.condition",
                "[{\"without\": {\"condition\": \"copd\", \"from\": \"2026-11-30\"}}]|dateBeforeAssessment|$.whatIfs[0].changes[0].without.from",
                "[{\"without\": {\"condition\": \"copd\"}}, {\"without\": {\"condition\": \"copd\", \"from\": \"2028\"}}]|changedTwice|$.whatIfs[0].changes[1].without",
                "[{\"behaviour\": {\"smoking\": \"never\", \"bodyMass\": \"obese\"}}]|oneBehaviourAChange|$.whatIfs[0].changes[0].behaviour",
                "[{\"behaviour\": {\"from\": \"2027-01-01\"}}]|oneBehaviourAChange|$.whatIfs[0].changes[0].behaviour",
                "[{\"behaviour\": {\"smoking\": \"rarely\"}}]|unknownLevel|$.whatIfs[0].changes[0].behaviour.smoking",
                "[{\"behaviour\": {\"smoking\": \"never\", \"from\": \"2020\"}}]|dateBeforeAssessment|$.whatIfs[0].changes[0].behaviour.from",
                "[{\"treat\": {\"treatment\": \"prayer\"}}]|unknownTreatment|$.whatIfs[0].changes[0].treat.treatment",
                "[{\"treat\": {\"treatment\": \"statin\"}}, {\"treat\": {\"treatment\": \"statin\", \"from\": \"2030\"}}]|changedTwice|$.whatIfs[0].changes[1].treat",
                "[{\"add\": {\"event\": \"respiratoryAdmission\", \"on\": \"2026-11-30\"}}]|dateBeforeAssessment|$.whatIfs[0].changes[0].add.on",
                "[{\"add\": {\"event\": \"respiratoryAdmission\", \"on\": \"2028\", \"outcome\": \"died\"}}]|fatalOutcomeGiven|$.whatIfs[0].changes[0].add.outcome",
                "[{\"add\": {\"event\": \"respiratoryAdmission\", \"on\": \"2028\"}}, {\"add\": {\"event\": \"respiratoryAdmission\", \"on\": \"2029\"}}]|severalAdded|$.whatIfs[0].changes[1].add",
            })
    void refusesOneWrongChange(String changes, String code, String path) {
        refused(whatIf(changes), code, path);
    }

    private static String whatIf(String changes) {
        return GOOD.replace(
                WHAT_IFS, "\"whatIfs\": [{\"name\": \"W\", \"changes\": " + changes.replace("ADM", ADMISSION) + "}]}");
    }

    @Test
    void readsEveryKindOfChange() {
        String changes =
                "[{\"move\": {ADM, \"to\": \"2020-05\"}}, {\"without\": {\"condition\": \"copd\", \"from\": \"2026-12-01\"}},"
                        + "{\"behaviour\": {\"smoking\": \"never\"}}, {\"treat\": {\"treatment\": \"statin\", \"from\": \"2027\"}},"
                        + "{\"add\": {\"event\": \"respiratoryAdmission\", \"on\": \"2029-02-01\", \"outcome\": \"ward\"}}]";

        CaseFile file = reading(whatIf(changes)).value();

        assertThat(file.whatIfs().get(0).changes())
                .extracting(CaseFile.Change::kind)
                .containsExactly("move", "without", "behaviour", "treat", "add");
    }

    @Test
    void refusesTwoWhatIfsOfOneName() {
        refused(GOOD.replace("No hypertension", "Never admitted"), "repeatedName", "$.whatIfs[1].name");
    }

    @Test
    void refusesOverlappingWindowsOfOneEventAndTheSameOccurrenceTwice() {
        String more = "{\"event\": \"respiratoryAdmission\", \"from\": \"2010\", \"to\": \"2017-01-01\","
                + " \"occurrences\": [{\"on\": \"2024-05-10\", \"outcome\": \"ward\"}]}]";

        String text = GOOD.replace("\"ward\"}]}]", "\"ward\"}]},\n" + more);

        refused(text, "windowsOverlap", "$.history[0].from");
        refused(text, "repeatedOccurrence", "$.history[1].occurrences[0].on");
    }

    @Test
    void letsWindowsTouchAndADateOfTheWholeYearReachBeyondToday() {
        String more = "{\"event\": \"respiratoryAdmission\", \"from\": \"2010-01-01\", \"to\": \"2016-12-01\"}]";
        String text = GOOD.replace("\"ward\"}]}]", "\"ward\"}, {\"on\": \"2026\", \"outcome\": \"ward\"}]},\n" + more);

        assertThat(reading(text).located()).isEmpty();
    }

    @Test
    void readsACaseOfTheLeastFields() {
        String least = "{\"format\": \"case/1\", \"caseRef\": \"C-0\", \"assessedOn\": \"2026-12-01\","
                + " \"applicant\": {\"sex\": \"female\", \"bornOn\": \"1970\"}}";

        CaseFile file = reading(least).value();

        assertThat(file.cover()).isNull();
        assertThat(file.history()).isEmpty();
        assertThat(reading(least.replace("}}", "}, \"cover\": null, \"death\": null}"))
                        .located())
                .isEmpty();
    }

    @Test
    void tellsAllFaultsAtOnceInTheOrderOfTheText() {
        String text = GOOD.replace("\"1959-11-30\"", "\"1959-11-31\"")
                .replace("\"source\": \"doctor\"", "\"source\": \"neighbour\"")
                .replace("\"EUR\"", "\"euro\"");

        assertThat(reading(text).faults())
                .extracting(f -> f.path())
                .containsExactly("$.applicant.bornOn", "$.statements[1].source", "$.cover.currency");
    }

    @Test
    void refusesDeepNestingHugeTextsAndJunk() {
        CaseReader reader = new CaseReader(PACK, null);

        assertThat(reading("[".repeat(50_000)).faults().get(0).code()).isEqualTo("tooDeep");
        assertThat(reader.read(new byte[50 * 1024 * 1024]).faults().get(0).code())
                .isEqualTo("tooLarge");
        assertThat(reader.read(new byte[] {'{', (byte) 0xFF}).faults().get(0).code())
                .isEqualTo("notUtf8");
        assertThat(reading("").faults().get(0).code()).isEqualTo("emptyDocument");
        assertThat(reading(GOOD + GOOD).faults().get(0).code()).isEqualTo("trailingContent");
        assertThat(reading("[]").faults().get(0).code()).isEqualTo("wrongType");
        assertThat(reading("\uFEFF" + GOOD).located()).isEmpty();
    }
}
