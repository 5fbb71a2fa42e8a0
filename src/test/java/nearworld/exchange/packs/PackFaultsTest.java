package nearworld.exchange.packs;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import nearworld.exchange.faults.LocatedFault;
import nearworld.exchange.faults.Reading;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Every kind of bad pack: a good one with one thing changed, the rule that refuses it, and the place. */
class PackFaultsTest {
    private static final String GOOD = read("src/test/resources/oracles/worked/pack-1.yaml");
    private static final String GOOD_2 = read("src/test/resources/oracles/worked/pack-2.yaml");

    private static String read(String file) {
        try {
            return Files.readString(Path.of(file));
        } catch (IOException e) {
            throw new IllegalStateException(e);
        }
    }

    private static Reading<Pack> reading(String text) {
        return PackReader.read(text.getBytes(StandardCharsets.UTF_8));
    }

    private static void refuses(String good, String found, String instead, String code, String path) {
        assertThat(good).contains(found);
        String text = good.replace(found, instead.replace("\\n", "\n"));
        List<LocatedFault> faults = reading(text).located();
        assertThat(faults).as(instead).isNotEmpty();
        assertThat(faults).as(instead).anySatisfy(f -> {
            assertThat(f.fault().code()).isEqualTo(code);
            assertThat(f.fault().path()).isEqualTo(path);
            assertThat(f.place().line()).isPositive();
        });
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "ratio: 0.92|ratio: -1|notAbove|$.interactions[0].ratio",
                "ratio: 0.92|ratio: .nan|notFinite|$.interactions[0].ratio",
                "ratio: 0.92|ratio: .inf|notFinite|$.interactions[0].ratio",
                "ratio: 0.92|ratio: 1e999|notFinite|$.interactions[0].ratio",
                "ratio: 0.92|ratio: yes|wrongType|$.interactions[0].ratio",
                "ratio: 0.92|ratio: 0.92, strength: 2|unknownField|$.interactions[0].strength",
                "ratio: 0.92|ratio: 0.92, ratio: 0.93|duplicateKey|$.interactions[0].ratio",
                "of: [diabetes, coronaryDisease]|of: [diabetes, coronary]|unknownCondition|$.interactions[0].of[1]",
                "smoking.former: 0.01|smoking.sometimes: 0.01|unknownConditionOrLevel|$.conditions.copd.causedBy['smoking.sometimes']",
                "smoking.former: 0.01|smoking.former: 1|notBelow|$.conditions.copd.causedBy['smoking.former']",
                "copd: 4.0|copdd: 4.0|unknownConditionOrLevel|$.events.respiratoryAdmission.rateRatios.copdd",
                "oddsRatios: {copd: 1.6}|oddsRatios: {smoking.current: 1.6}|unknownCondition|$.events.respiratoryAdmission.outcomes.intensive.oddsRatios['smoking.current']",
                "frailtyPower: 1.0|bringsOn: {gout: 0.2}|unknownCondition|$.events.respiratoryAdmission.bringsOn.gout",
                "frailtyPower: 1.0|bringsOn: {copd: 1.2}|aboveMaximum|$.events.respiratoryAdmission.bringsOn.copd",
                "frailtyPower: 1.0|episodeDays: -1|belowMinimum|$.events.respiratoryAdmission.episodeDays",
                "onlyWith: coronaryDisease|onlyWith: gout|unknownCondition|$.treatments.statin.onlyWith",
                "of: heartFailure|of: gout|unknownCondition|$.findings.ntProBnp.of",
                "present: 0.1|present: 0.2|levelsSum|$.findings.ntProBnp.levels",
                "absent: 0.85|absent: 0.8|levelsSum|$.findings.ntProBnp.levels",
                "present: 0.9|present: 1.9|aboveMaximum|$.findings.ntProBnp.levels.raised.present",
                "taper: {from: 40, pivot: 65, to: 105}|taper: {from: 70, pivot: 65, to: 105}|taperOrder|$.pack.taper.pivot",
                "taper: {from: 40, pivot: 65, to: 105}|taper: {from: 40, pivot: 65, to: 65}|taperOrder|$.pack.taper.to",
                "atAge: 70|atAge: 105|atAgeBeyondTaper|$.conditions.heartFailure.hazardRatio.atAge",
                "low: 2.1, high: 3.2|low: 2.7, high: 3.2|intervalMissesValue|$.conditions.heartFailure.hazardRatio",
                "low: 2.1, high: 3.2|low: 2.1|missingField|$.conditions.heartFailure.hazardRatio.high",
                "male: {40: 0.04, 60: 0.14, 80: 0.2}|male: {40: 0, 60: 0.14, 80: 0.2}|notAbove|$.conditions.diabetes.prevalence.male['40']",
                "male: {40: 0.04, 60: 0.14, 80: 0.2}|male: {40: 1, 60: 0.14, 80: 0.2}|notBelow|$.conditions.diabetes.prevalence.male['40']",
                "male: {40: 0.04, 60: 0.14, 80: 0.2}|male: {40: 0.1, 40.0: 0.14}|repeatedAge|$.conditions.diabetes.prevalence.male['40.0']",
                "male: {40: 0.04, 60: 0.14, 80: 0.2}|male: {young: 0.1}|unknownField|$.conditions.diabetes.prevalence.male.young",
                "male: {40: 0.04, 60: 0.14, 80: 0.2}, female|man: 0.1, female|missingField|$.conditions.diabetes.prevalence.male",
                "ratePerYear: {male: {40: 0.002|ratePerYear: {male: {40: 0|notAbove|$.events.respiratoryAdmission.ratePerYear.male['40']",
                "ward: {share: {40: 0.93|ward: {share: {40: 0|notAbove|$.events.respiratoryAdmission.outcomes.ward.share['40']",
                "intensive: {share|intensive: {fatal: true, share|severalFatalOutcomes|$.events.respiratoryAdmission.outcomes.died.fatal",
                "hazardRatio: 1.3, halfLifeYears: 8|hazardRatio: 1.3, longRun: 1.1|longRunWithoutHalfLife|$.behaviours.smoking.levels.former.longRun",
                "hazardRatio: 1.3, halfLifeYears: 8|hazardRatio: 0, halfLifeYears: 8|notAbove|$.behaviours.smoking.levels.former.hazardRatio",
                "variance: 0.3|variance: -0.3|belowMinimum|$.frailty.variance",
                "points: 9|points: 0|belowMinimum|$.frailty.points",
                "points: 9|points: 201|aboveMaximum|$.frailty.points",
                "points: 9|points: 9.5|wrongType|$.frailty.points",
                "points: 9|points: 1e300|numberTooLarge|$.frailty.points",
                "version: 1|version: one|wrongType|$.pack.version",
                "hazardRatio: 1.8}|hazardRatio: 1.8, excessPerMille: {0: 10, 5: 2}}|missingField|$.conditions.diabetes.excessPerMille.unknown",
                "hazardRatio: 1.8}|hazardRatio: 1.8, excessPerMille: -3}|belowMinimum|$.conditions.diabetes.excessPerMille",
                "hazardRatio: 1.8}|hazardRatio: 1.8, provenance: guessed}|notAllowed|$.conditions.diabetes.provenance",
                "sensitivity: 0.85|sensitivity: 1.01|aboveMaximum|$.sources.applicant.sensitivity",
                "byCondition: {heartFailure|byCondition: {gout|unknownCondition|$.sources.applicant.byCondition.gout",
                "specificity: 0.99|specificity: 0.99, sees: everything|notAllowed|$.sources.applicant.sees",
                "hazardRatio: 0.9, only|hazardRatio: &x 0.9, low: *x, only|aliasRefused|$.treatments.statin.low",
                "hazardRatio: 0.9, only|hazardRatio: !!str 0.9, only|tagRefused|$.treatments.statin.hazardRatio",
                "of: heartFailure, levels|of: heartFailure levels|notYaml|$",
            })
    void refusesOneWrongThing(String found, String instead, String code, String path) {
        refuses(GOOD, found, instead, code, path);
    }

    @Test
    void readsTheGoodOnes() {
        assertThat(reading(GOOD).located()).isEmpty();
        assertThat(reading(GOOD_2).located()).isEmpty();
    }

    @Test
    void remarksSharesThatDoNotSumToOneAndLeavesThemToBeScaled() {
        Pack pack = reading(GOOD.replace("ward: {share: {40: 0.93", "ward: {share: {40: 0.63"))
                .value();

        assertThat(pack.remarks()).extracting(f -> f.code()).containsExactly("sharesFarFromOne", "sharesFarFromOne");
        assertThat(reading(GOOD).value().remarks()).isEmpty();
    }

    @Test
    void namesTheConditionsOfACycle() {
        String text = GOOD.replace("hazardRatio: 1.8}", "hazardRatio: 1.8, causedBy: {heartFailure: 0.1}}");

        List<LocatedFault> faults = reading(text).located();

        assertThat(faults).hasSize(1);
        assertThat(faults.get(0).fault().code()).isEqualTo("conditionCycle");
        assertThat(faults.get(0).fault().values().get("cycle")).contains("diabetes", "coronaryDisease", "heartFailure");
    }

    @Test
    void tellsAllFaultsAtOnceInTheOrderOfTheText() {
        String text = GOOD.replace("ratio: 0.92", "ratio: -1")
                .replace("copd: 4.0", "copdd: 4.0")
                .replace("pivot: 65", "pivot: 200");

        List<String> paths = reading(text).faults().stream().map(f -> f.path()).toList();

        assertThat(paths)
                .containsSubsequence(
                        "$.pack.taper.pivot",
                        "$.interactions[0].ratio",
                        "$.events.respiratoryAdmission.rateRatios.copdd");
    }

    @Test
    void refusesMoreConditionsThanTheEngineHolds() {
        StringBuilder more = new StringBuilder("conditions:\n");
        for (int i = 0; i < 60; i++) {
            more.append("  extra").append(i).append(": {prevalence: 0.1}\n");
        }

        refuses(GOOD, "conditions:\n", more.toString(), "tooMany", "$.conditions");
    }

    @Test
    void refusesAnAliasThatWouldExplode() {
        StringBuilder text = new StringBuilder("a0: &a0 [x,x,x,x,x,x,x,x,x]\n");
        for (int i = 1; i < 12; i++) {
            text.append("a").append(i).append(": &a").append(i).append(" [");
            text.append(String.join(",", java.util.Collections.nCopies(9, "*a" + (i - 1))))
                    .append("]\n");
        }

        assertThat(reading(text.toString()).faults()).extracting(f -> f.code()).contains("aliasRefused");
    }

    @Test
    void refusesDeepNestingHugeFilesAndJunk() {
        assertThat(reading("a: " + "[".repeat(5000)).faults().get(0).code()).isEqualTo("tooDeep");
        assertThat(PackReader.read(new byte[50 * 1024 * 1024]).faults().get(0).code())
                .isEqualTo("tooLarge");
        assertThat(PackReader.read(new byte[] {(byte) 0xFE, (byte) 0xFF, 0, 'a'})
                        .faults()
                        .get(0)
                        .code())
                .isEqualTo("notUtf8");
        assertThat(reading("pack: \0").faults().get(0).code()).isEqualTo("controlCharacter");
        assertThat(reading("").faults().get(0).code()).isEqualTo("emptyDocument");
    }

    @Test
    void takesAByteOrderMark() {
        assertThat(reading("\uFEFF" + GOOD).located()).isEmpty();
    }

    @Test
    void leavesTheSecondLevelOfACombinedFindingToBeTheComplement() {
        String combined = "findings:\n  effort: {of: [heartFailure, copd], levels: {"
                + "poor: {present: {heartFailure: 0.6, copd: 0.5}, absent: 0.1}, good: {}}}\n";
        Pack pack = reading(GOOD.replace("findings:\n", combined)).value();

        assertThat(pack.evidence().findings().get(0).levels().get(1).absent().value())
                .isEqualTo(0.9);
        assertThat(pack.evidence()
                        .findings()
                        .get(0)
                        .levels()
                        .get(1)
                        .present()
                        .get(1)
                        .value())
                .isEqualTo(0.5);
    }

    @Test
    void findsTitlesInTheLanguageAskedThenInEnglishThenTheName() {
        String text = GOOD.replace("diabetes: {prev", "diabetes: {title: {en: Diabetes, de: Zuckerkrankheit}, prev")
                .replace("hypertension: {prev", "hypertension: {title: High blood pressure, prev");
        PackTexts texts = reading(text).value().texts();

        assertThat(texts.condition("diabetes", Locale.GERMAN)).isEqualTo("Zuckerkrankheit");
        assertThat(texts.condition("diabetes", Locale.FRENCH)).isEqualTo("Diabetes");
        assertThat(texts.condition("hypertension", Locale.GERMAN)).isEqualTo("High blood pressure");
        assertThat(texts.condition("heartFailure", Locale.GERMAN)).isEqualTo("heartFailure");
    }

    @Test
    void readsTheDefaultPackAsShipped() {
        Reading<Pack> reading = reading(read("seed-data/packs/default-1.yaml"));

        assertThat(reading.located()).isEmpty();
        assertThat(reading.value().texts().origins()).isNotEmpty();
    }
}
