package nearworld.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Files that are no cases at all, and faults that name a place within a file: one line each, and the others still run. */
class BadFilesTest {
    private static final Path WORKED = Path.of("src/test/resources/oracles/worked");
    private static final String TABLE = WORKED.resolve("table.csv").toString();
    private static final Path PACK = WORKED.resolve("pack-1.yaml");
    private static final Path CASE = WORKED.resolve("case-1.json");
    private static final int HUGE = 50 * 1024 * 1024;

    @TempDir
    Path folder;

    @Test
    void refusesHugeFilesAndJunkInOneLineEach() throws IOException {
        byte[] huge = new byte[HUGE];
        Arrays.fill(huge, (byte) ' ');
        huge[0] = '{';
        Path big = Files.write(folder.resolve("big.json"), huge);
        Path bigLine = Files.write(folder.resolve("big.jsonl"), huge);
        byte[] picture = {(byte) 0x89, 'P', 'N', 'G', 0, 1, 2, (byte) 0xFF};
        Path junk = Files.write(folder.resolve("junk.json"), picture);

        Run run =
                Run.of("--table", TABLE, "--pack", PACK.toString(), big + "", bigLine + "", junk + "", CASE.toString());

        assertThat(run.status()).isEqualTo(1);
        assertThat(run.out()).hasSize(1);
        assertThat(run.err()).hasSize(3);
        assertThat(run.err().get(0)).startsWith(big.toString()).contains("tooLarge", "bound=1048576");
        assertThat(run.err().get(1)).startsWith(bigLine + ":1:").contains("tooLarge");
        assertThat(run.err().get(2)).startsWith(junk.toString()).contains("notUtf8", "0x89");
    }

    @Test
    void namesTheLineWithinACaseOfManyLines() throws IOException {
        String late = Files.readString(CASE).replace("\"2024-05-10\", \"outcome\"", "\"2031-05-10\", \"outcome\"");
        Path bad = Files.writeString(folder.resolve("bad.json"), late);

        Run run = Run.of("--table", TABLE, "--pack", PACK.toString(), bad.toString());

        assertThat(run.err()).hasSize(1);
        assertThat(run.err().get(0))
                .startsWith(bad + ":7:")
                .contains("$.history[0].occurrences[0].on: dateAfterAssessment")
                .contains("value=2031-05-10")
                .contains("2031-05-10 is after the assessment day (2026-12-01)");
    }

    @Test
    void namesThePlaceInThePackWhereTheCalculationRefusesIt() throws IOException {
        String text = Files.readString(PACK).replace("coronaryDisease: 0.12", "coronaryDisease: 0.99");
        Path pack = Files.writeString(folder.resolve("p.yaml"), text);

        Run run = Run.of("--table", TABLE, "--pack", pack.toString(), CASE.toString());

        assertThat(run.status()).isEqualTo(1);
        assertThat(run.err()).hasSize(1);
        assertThat(run.err().get(0))
                .startsWith(CASE + ":1: " + pack + ":13:")
                .contains("$.conditions.heartFailure", "linksExceedPrevalence");
    }
}
