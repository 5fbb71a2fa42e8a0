package nearworld.exchange.documents;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Objects;
import nearworld.exchange.faults.LocatedFault;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Texts into trees: what is accepted, and where what is not is found. */
class DocumentTextsTest {
    private static final int MOST = 10_000;

    private static Document yaml(String text) {
        return YamlText.read(text.getBytes(StandardCharsets.UTF_8), MOST);
    }

    private static Document json(String text) {
        return JsonText.read(text.getBytes(StandardCharsets.UTF_8), MOST, 1);
    }

    private static List<String> codes(Document document) {
        return document.faults().sorted().stream()
                .map(f -> f.place().line() + ":" + f.place().column() + " "
                        + f.fault().path() + " " + f.fault().code())
                .toList();
    }

    /** Types of plain scalars: the core schema of YAML 1.2.2, section 10.3.2 (the first ten are its own examples, from memory). */
    @ParameterizedTest
    @CsvSource(
            value = {
                "~|NULL", "null|NULL", "true|BOOLEAN", "False|BOOLEAN", "0|NUMBER", "0o7|NUMBER", "0x3A|NUMBER",
                "-19|NUMBER", "+12e03|NUMBER", "-2E+05|NUMBER", "0.|NUMBER", ".5|NUMBER", "yes|STRING", "no|STRING",
                "on|STRING", "off|STRING", "y|STRING", "1_000|STRING", "12:30:45|STRING", "2026-12-01|STRING",
                        "1e|STRING"
            },
            delimiter = '|')
    void typesOfYamlScalars(String text, String type) {
        Document document = yaml("a: " + text);

        assertThat(document.faults().sorted()).isEmpty();
        assertThat(Objects.requireNonNull(document.spot().at("a").node()).getNodeType())
                .hasToString(type);
    }

    @Test
    void valuesOfYamlNumbers() {
        assertThat(yaml("a: 0o17").spot().at("a").number()).isEqualTo(15);
        assertThat(yaml("a: 0x1F").spot().at("a").number()).isEqualTo(31);
        assertThat(yaml("a: 010").spot().at("a").number()).isEqualTo(10);
        assertThat(yaml("a: 0.1").spot().at("a").number()).isEqualTo(0.1);
    }

    @Test
    void keepsTheOrderAndThePlacesOfFields() {
        Document document = yaml("b:\n  - x\n  - {c: 1}\na: 2\n");

        assertThat(document.spot().names()).containsExactly("b", "a");
        assertThat(document.faults().placeOf("$.b[1].c")).hasToString("Place[line=3, column=6]");
        assertThat(document.faults().placeOf("$.a")).hasToString("Place[line=4, column=1]");
        assertThat(document.faults().placeOf("$.a.none['x y']")).hasToString("Place[line=4, column=1]");
    }

    @Test
    void passesOverAByteOrderMark() {
        assertThat(yaml("\uFEFFa: 1").spot().at("a").number()).isEqualTo(1);
        assertThat(json("\uFEFF{\"a\": 1}").spot().at("a").number()).isEqualTo(1);
    }

    @Test
    void readsJsonAsYamlToo() {
        Document document = yaml("{\"a\": \"\\ud83d\\ude00\", \"b\":\n [1]}");

        assertThat(document.spot().at("a").text()).isEqualTo("😀");
        assertThat(document.faults().placeOf("$.b[0]").line()).isEqualTo(2);
        assertThat(yaml("{a: 1, b: yes}").spot().at("b").text()).isEqualTo("yes");
    }

    @Test
    void findsEveryDuplicateKey() {
        assertThat(codes(yaml("a: 1\nb: {c: 1, c: 2}\na: {d: 1}\n")))
                .containsExactly("2:11 $.b.c duplicateKey", "3:1 $.a duplicateKey");
        assertThat(codes(json("{\"a\": 1,\n \"a\": [2]}"))).containsExactly("2:2 $.a duplicateKey");
        LocatedFault fault = yaml("a: 1\nb: 2\na: 3").faults().sorted().get(0);
        assertThat(fault.fault().values()).containsEntry("firstLine", "1").containsEntry("field", "a");
    }

    @Test
    void refusesAliasesHoweverTheyExplode() {
        StringBuilder text = new StringBuilder("a0: &a0 [x, x]\n");
        for (int i = 1; i < 40; i++) {
            text.append("a%d: &a%d [*a%d, *a%d]\n".formatted(i, i, i - 1, i - 1));
        }

        assertThat(codes(yaml(text.toString()))).containsExactly("2:10 $.a1[0] aliasRefused");
        assertThat(codes(yaml("base: &b {x: 1}\nc:\n  <<: *b\n"))).containsExactly("3:7 $.c['<<'] aliasRefused");
    }

    @Test
    void refusesTagsSeveralDocumentsAndKeysThatAreNoTexts() {
        assertThat(codes(yaml("a: !!binary R0lG\n"))).containsExactly("1:4 $.a tagRefused");
        assertThat(codes(yaml("a: 1\n---\nb: 2\n"))).containsExactly("2:1 $ severalDocuments");
        assertThat(codes(yaml("? [a, b]\n: 1\n"))).containsExactly("1:3 $ keyNotText");
    }

    @ParameterizedTest
    @ValueSource(strings = {"NaN", "Infinity", "-Infinity", "1e999", "1e-999"})
    void refusesJsonNumbersThatAreNotFinite(String number) {
        assertThat(codes(json("{\"a\": [1, " + number + "]}"))).containsExactly("1:11 $.a[1] notFinite");
    }

    @ParameterizedTest
    @ValueSource(strings = {".nan", ".inf", "-.INF", "1e999"})
    void refusesYamlNumbersThatAreNotFinite(String number) {
        assertThat(codes(yaml("a: " + number))).containsExactly("1:4 $.a notFinite");
    }

    @Test
    void refusesNumbersOfAnotherWorld() {
        assertThat(codes(json("{\"a\": 1e300}"))).containsExactly("1:7 $.a numberTooLarge");
        assertThat(codes(json("[" + "9".repeat(61) + "]"))).containsExactly("1:2 $[0] numberTooLong");
        assertThat(json("[1e300]").faults().sorted().get(0).fault().values())
                .containsEntry("bound", "1000000000000000");
    }

    @Test
    void refusesDeepNesting() {
        assertThat(codes(json("[".repeat(5000)))).singleElement().asString().endsWith(" $ tooDeep");
        assertThat(codes(yaml("[".repeat(5000)))).singleElement().asString().endsWith(" $ tooDeep");
        assertThat(codes(yaml("- ".repeat(4000) + "a")))
                .singleElement()
                .asString()
                .endsWith(" $ tooDeep");
        assertThat(codes(json("[".repeat(30) + "]".repeat(30)))).isEmpty();
    }

    @Test
    void saysWhereTheSyntaxBreaks() {
        assertThat(codes(json("{\"a\": 1,\n  \"b\" 2}")))
                .singleElement()
                .asString()
                .startsWith("2:")
                .endsWith(" $ notJson");
        assertThat(codes(yaml("a: 1\nb: [1, 2\nc: 3\n")))
                .singleElement()
                .asString()
                .startsWith("3:")
                .endsWith(" $ notYaml");
        assertThat(codes(json("{\"a\": 1} x"))).singleElement().asString().endsWith("notJson");
        assertThat(codes(json("{\"a\": 1} {}"))).containsExactly("1:10 $ trailingContent");
        assertThat(codes(json("  "))).containsExactly("1:1 $ emptyDocument");
        assertThat(codes(yaml("# nothing\n"))).containsExactly("1:1 $ emptyDocument");
    }

    @Test
    void refusesWhatIsNoUtf8AndNamesTheByte() {
        byte[] latin1 = "{\n\"name\": \"Müller\"}".getBytes(StandardCharsets.ISO_8859_1);

        LocatedFault fault = JsonText.read(latin1, MOST, 1).faults().sorted().get(0);

        assertThat(fault.fault().code()).isEqualTo("notUtf8");
        assertThat(fault.fault().values()).containsEntry("found", "0xFC").containsEntry("offset", "12");
        assertThat(fault.place()).hasToString("Place[line=2, column=11]");
        assertThat(codes(JsonText.read("{}".getBytes(StandardCharsets.UTF_16), MOST, 1)))
                .containsExactly("1:1 $ notUtf8");
        assertThat(codes(yaml("a: \u0000"))).containsExactly("1:4 $ controlCharacter");
        assertThat(codes(YamlText.read(new byte[] {'a', ':', ' ', (byte) 0xE2, (byte) 0x82}, MOST)))
                .containsExactly("1:4 $ notUtf8");
    }

    @Test
    void refusesWhatIsTooLarge() {
        LocatedFault fault =
                YamlText.read(new byte[MOST + 1], MOST).faults().sorted().get(0);

        assertThat(fault.fault().code()).isEqualTo("tooLarge");
        assertThat(fault.fault().values()).containsEntry("bound", "10000");
    }

    @ParameterizedTest
    @CsvSource(
            value = {"{|true", "{\"a\": 1,|true", "{\"a\"|true", "{\"a\": 1}|false", "{a}|false", "{\"a\": 1}}|false"},
            delimiter = '|')
    void tellsAnUnfinishedTextFromABrokenOne(String text, boolean unfinished) {
        assertThat(JsonText.isUnfinished(text)).isEqualTo(unfinished);
    }
}
