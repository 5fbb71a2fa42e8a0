package nearworld.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import nearworld.exchange.documents.FormatSchema;
import nearworld.exchange.faults.FaultList;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/** The command line from file to line of result. */
class AssessCommandTest {
    /** Worked by an independent enumeration of every hidden state; see the README beside them. */
    private static final Path WORKED = Path.of("src/test/resources/oracles/worked");

    private static final String TABLE = WORKED.resolve("table.csv").toString();
    private static final String PACK = WORKED.resolve("pack-1.yaml").toString();

    @TempDir
    Path folder;

    private record Run(int status, List<String> out, List<String> err) {}

    private static Run run(String input, String... args) {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        ByteArrayOutputStream err = new ByteArrayOutputStream();
        Console console = new Console(
                new ByteArrayInputStream(input.getBytes(StandardCharsets.UTF_8)),
                new PrintStream(out, true, StandardCharsets.UTF_8),
                new PrintStream(err, true, StandardCharsets.UTF_8),
                Locale.ENGLISH);
        int status = Main.run(List.of(args), console);
        return new Run(
                status,
                out.toString(StandardCharsets.UTF_8).lines().toList(),
                err.toString(StandardCharsets.UTF_8).lines().toList());
    }

    private static Run assess(String input, String... cases) {
        List<String> args = new ArrayList<>(List.of("assess", "--table", TABLE, "--pack", PACK));
        args.addAll(List.of(cases));
        return run(input, args.toArray(new String[0]));
    }

    private static String worked(int number) {
        return WORKED.resolve("case-" + number + ".json").toString();
    }

    private static String line(int number) throws IOException {
        return JsonMapper.shared()
                .readTree(Files.readString(Path.of(worked(number))))
                .toString();
    }

    private static JsonNode tree(String text) {
        return JsonMapper.shared().readTree(text);
    }

    /** Tolerances of section 10 of the model: posteriors 1e-9, survival 1e-7, expectation 1e-5 years. */
    @ParameterizedTest
    @CsvSource({"1,1", "2,1", "4,2"})
    void givesTheNumbersOfTheWorkedCases(int number, int pack) throws IOException {
        Run run = run(
                "",
                "--table",
                TABLE,
                "--pack",
                WORKED.resolve("pack-" + pack + ".yaml").toString(),
                worked(number));

        assertThat(run.err).isEmpty();
        assertThat(run.status).isZero();
        JsonNode result = tree(run.out.get(0));
        JsonNode expected = tree(Files.readString(WORKED.resolve("case-" + number + ".expected.json")));
        assertThat(result.path("logEvidence").doubleValue())
                .isCloseTo(expected.path("logEvidence").doubleValue(), within(1e-9));
        for (int i = 0; i < expected.path("conditions").size(); i++) {
            JsonNode condition = expected.path("conditions").get(i);
            JsonNode found = result.path("conditions").get(i);
            assertThat(found.path("id")).isEqualTo(condition.path("id"));
            for (String field : List.of("prior", "posterior")) {
                assertThat(found.path(field).doubleValue())
                        .isCloseTo(condition.path(field).doubleValue(), within(1e-9));
            }
        }
        assertThat(result.path("worlds")).hasSameSizeAs(expected.path("worlds"));
        for (int i = 0; i < expected.path("worlds").size(); i++) {
            compareWorld(result.path("worlds").get(i), expected.path("worlds").get(i));
        }
        FaultList faults = new FaultList();
        FormatSchema.RESULT.validate(result, faults);
        assertThat(faults.sorted()).isEmpty();
    }

    private static void compareWorld(JsonNode found, JsonNode expected) {
        assertThat(found.path("id")).isEqualTo(expected.path("id"));
        for (String field : List.of("expectation", "median", "mortalityRatio", "extraPerMille")) {
            assertThat(found.path(field).doubleValue())
                    .as("%s of %s", field, found.path("id"))
                    .isCloseTo(expected.path(field).doubleValue(), within(1e-5));
        }
        assertThat(found.path("survival")).hasSameSizeAs(expected.path("survival"));
        for (int y = 0; y < expected.path("survival").size(); y++) {
            assertThat(found.path("survival").get(y).doubleValue())
                    .isCloseTo(expected.path("survival").get(y).doubleValue(), within(1e-7));
        }
        if (expected.has("aliveToday")) {
            assertThat(found.path("aliveToday").doubleValue())
                    .isCloseTo(expected.path("aliveToday").doubleValue(), within(1e-9));
        }
    }

    @Test
    void keepsTheOrderAndGoesOnBehindABadCase() throws IOException {
        Path bad = Files.writeString(folder.resolve("bad.json"), line(1).replace("2024-05-10", "1950-05-10"));

        Run run = assess("", worked(2), bad.toString(), worked(1), "--threads", "3");

        assertThat(run.status).isEqualTo(1);
        assertThat(run.out).hasSize(2);
        assertThat(tree(run.out.get(0)).path("caseRef").asString()).isEqualTo("C-2");
        assertThat(tree(run.out.get(1)).path("caseRef").asString()).isEqualTo("C-1042");
        assertThat(run.err).hasSize(1);
        assertThat(run.err.get(0))
                .startsWith(bad + ":1:")
                .contains(": $.history[0].occurrences[0].on: dateBeforeBirth (bornOn=1959-11-30, value=1950-05-10): "
                        + "1950-05-10 is before birth (1959-11-30).");
    }

    @Test
    void givesTheSameBytesWithAnyNumberOfThreads() throws IOException {
        Path lines = folder.resolve("cases.jsonl");
        Files.writeString(lines, (line(1) + "\n" + line(2) + "\n\n").repeat(4));

        Run one = assess("", lines.toString(), "--threads=1");
        Run four = assess("", lines.toString(), "--threads=4");

        assertThat(one.out).hasSize(8).isEqualTo(four.out);
    }

    @Test
    void namesTheLineOfABadCaseInALongFile() throws IOException {
        Path lines = Files.writeString(
                folder.resolve("c.jsonl"), line(1) + "\n\n{\"format\": \"case/1\", oops}\n" + line(2));

        Run run = assess("", lines.toString());

        assertThat(run.out).hasSize(2);
        assertThat(run.err).singleElement().asString().startsWith(lines + ":3:").contains(": $: notJson (");
    }

    @Test
    void readsStandardInputAsOneDocumentOrAsLines() throws IOException {
        String document = Files.readString(Path.of(worked(1)));

        assertThat(assess(document, "-").out).hasSize(1);
        assertThat(assess(line(1) + "\n" + line(2) + "\n", "-").out).hasSize(2);
        assertThat(assess("", "-").err).singleElement().asString().contains("emptyDocument");
    }

    @Test
    void stopsAtABadTableOrPackWithAllOfTheirFaults() throws IOException {
        Path table = Files.writeString(folder.resolve("t.csv"), "#name: T\nsex,age,qx\nmale,0,1.5\nmale,2,-0.1\n");
        Path pack = Files.writeString(folder.resolve("p.yaml"), "pack: {id: p, version: 1}\n");

        Run run = run("", "--table", table.toString(), "--pack", pack.toString(), worked(1));

        assertThat(run.status).isEqualTo(2);
        assertThat(run.out).isEmpty();
        assertThat(run.err)
                .anyMatch(l -> l.startsWith(table + ":3:1: $.qx: aboveMaximum (bound=1, value=1.5): "))
                .anyMatch(l -> l.startsWith(table + ":4:1: $.qx: belowMinimum"))
                .anyMatch(l -> l.startsWith(table + ":4:1: $.age: ageGap"))
                .anyMatch(l -> l.startsWith(pack + ":1:1: $.pack.taper: missingField")
                        || l.contains("$.pack.taper: missingField"));
    }

    @Test
    void refusesArgumentsThatItDoesNotKnow() {
        assertThat(run("", "--tabel", "x").err.get(0)).isEqualTo("nearworld assess: unknown option --tabel");
        assertThat(run("", "--table", TABLE, worked(1)).err.get(0)).contains("--pack is missing");
        assertThat(run("", "--table", TABLE, "--pack", PACK).err.get(0)).contains("no case is named");
        assertThat(run("", "--table", TABLE, "--pack", PACK, "--threads", "0", "-")
                        .err
                        .get(0))
                .contains("--threads must be a whole number from 1 to 256, is 0");
        assertThat(run("", "--table", TABLE, "--table", TABLE).err.get(0)).contains("--table is given twice");
        assertThat(run("", "--tabel", "x").status).isEqualTo(2);
        assertThat(run("", "help").out.get(0)).startsWith("nearworld assess --table");
    }

    @Test
    void saysWhichFileIsNotThere() {
        Run run = assess("", folder.resolve("none.json").toString());

        assertThat(run.status).isEqualTo(1);
        assertThat(run.err).singleElement().asString().contains("none.json: $: unreadable (detail=no such file)");
    }

    @Test
    void namesCaseAndPackWhereThePackDoesNotFit() throws IOException {
        Path pack = Files.writeString(
                folder.resolve("links.yaml"),
                Files.readString(Path.of(PACK)).replace("hypertension: 0.02", "hypertension: 0.9"));

        Run run = run("", "--table", TABLE, "--pack", pack.toString(), worked(1));

        assertThat(run.status).isEqualTo(1);
        assertThat(run.err)
                .singleElement()
                .asString()
                .startsWith(worked(1) + ":1: " + pack + ":12:")
                .contains("$.conditions.coronaryDisease.causedBy: linksExceedPrevalence (")
                .contains("sex=male");
    }

    @Test
    void refusesAPersonWhoDied() {
        Run run = assess("", worked(3));

        assertThat(run.err)
                .singleElement()
                .asString()
                .startsWith(worked(3) + ":")
                .contains(": $.death: notSupported: ")
                .doesNotContain("missingField");
    }

    @Test
    void tellsBinaryJunkOnce() throws IOException {
        byte[] junk = new byte[2_000_000];
        new java.util.Random(20261201).nextBytes(junk);
        Path file = Files.write(folder.resolve("junk.bin"), junk);

        Run run = assess("", file.toString(), worked(1));

        assertThat(run.out).hasSize(1);
        assertThat(run.err).singleElement().asString().contains("junk.bin: $: tooLarge (bound=1048576)");
    }

    @Test
    void refusesMoreOccurrencesThanTheCalculationCanHold() throws IOException {
        StringBuilder occurrences = new StringBuilder();
        for (int i = 0; i < 61; i++) {
            occurrences.append(i == 0 ? "" : ",").append("{\"on\": \"" + (1963 + i) + "\", \"outcome\": \"ward\"}");
        }
        String text = Files.readString(Path.of(worked(1)))
                .replace("{\"on\": \"2024-05-10\", \"outcome\": \"ward\"}", occurrences);
        Path file = Files.writeString(folder.resolve("many.json"), text);

        assertThat(assess("", file.toString()).err)
                .singleElement()
                .asString()
                .contains(": $.history: tooManyOccurrences (bound=60, value=61): ");
    }
}
