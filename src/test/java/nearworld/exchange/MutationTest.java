package nearworld.exchange;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatCode;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Random;
import nearworld.engine.assessment.AssessmentOutcome;
import nearworld.engine.assessment.Assessor;
import nearworld.engine.assessment.CaseFile;
import nearworld.engine.mortality.MortalityTable;
import nearworld.engine.network.EvidencePack;
import nearworld.exchange.cases.CaseReader;
import nearworld.exchange.documents.YamlText;
import nearworld.exchange.faults.FaultSentences;
import nearworld.exchange.faults.LocatedFault;
import nearworld.exchange.faults.Reading;
import nearworld.exchange.packs.Pack;
import nearworld.exchange.packs.PackReader;
import nearworld.exchange.tables.TableReader;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import tools.jackson.databind.JsonNode;

/** Whatever is done to a good input: it is read, or it is refused with faults. Nothing is thrown. The seed is in each message. */
class MutationTest {
    private static final Path WORKED = Path.of("src/test/resources/oracles/worked");
    private static final int ROUNDS = 400;
    private static final FaultSentences WORDS = new FaultSentences(java.util.Locale.ENGLISH);

    @ParameterizedTest
    @ValueSource(strings = {"case-1", "case-2", "case-4"})
    void aChangedCaseIsReadOrRefused(String name) throws IOException {
        EvidencePack pack = PackReader.read(bytes(name.equals("case-4") ? "pack-2.yaml" : "pack-1.yaml"))
                .value()
                .evidence();
        MortalityTable table = TableReader.read(bytes("table.csv")).value().rates();
        CaseReader reader = new CaseReader(pack, table);
        Assessor assessor = new Assessor(table, pack);
        int read = 0;
        for (int seed = 0; seed < ROUNDS; seed++) {
            JsonNode tree = tree(name + ".json", seed);
            Reading<CaseFile> reading = answer(seed, tree, () -> reader.read(tree));
            if (reading.isAccepted()) {
                read++;
                if (seed % 8 == 0) {
                    AssessmentOutcome outcome = answer(seed, tree, () -> assessor.assess(reading.value()));
                    assertThat(outcome).isNotNull();
                }
            }
        }
        assertThat(read).as("some changes do no harm").isBetween(1, ROUNDS - 1);
    }

    @ParameterizedTest
    @ValueSource(strings = {"pack-1.yaml", "pack-2.yaml"})
    void aChangedPackIsReadOrRefused(String name) throws IOException {
        int read = 0;
        for (int seed = 0; seed < ROUNDS; seed++) {
            JsonNode tree = tree(name, seed);
            byte[] text = tree.toString().getBytes(StandardCharsets.UTF_8);
            Reading<Pack> reading = answer(seed, tree, () -> PackReader.read(text));
            read += reading.isAccepted() ? 1 : 0;
        }
        assertThat(read).as("some changes do no harm").isBetween(1, ROUNDS - 1);
    }

    @ParameterizedTest
    @ValueSource(strings = {"case-1.json", "pack-1.yaml", "table.csv"})
    void changedBytesAreReadOrRefused(String name) throws IOException {
        byte[] good = bytes(name);
        CaseReader reader =
                new CaseReader(PackReader.read(bytes("pack-1.yaml")).value().evidence(), null);
        for (int seed = 0; seed < ROUNDS; seed++) {
            Random random = new Random(seed);
            byte[] text = good.clone();
            for (int i = 0; i <= random.nextInt(3); i++) {
                byte[] with = "{}[]\":,-0 9e.#&*!|>\n\t\\\0\u00ff".getBytes(StandardCharsets.ISO_8859_1);
                text[random.nextInt(Math.min(text.length, 4000))] = with[random.nextInt(with.length)];
            }
            answer(
                    seed,
                    name,
                    () -> name.endsWith(".csv")
                            ? TableReader.read(text)
                            : name.endsWith(".yaml") ? PackReader.read(text) : reader.read(text));
        }
    }

    private interface Answer<T> {
        T get();
    }

    private static <T> T answer(int seed, Object input, Answer<T> answer) {
        java.util.concurrent.atomic.AtomicReference<T> result = new java.util.concurrent.atomic.AtomicReference<>();
        assertThatCode(() -> result.set(answer.get()))
                .as("seed %d: %s", seed, input)
                .doesNotThrowAnyException();
        if (result.get() instanceof Reading<?> reading && !reading.isAccepted()) {
            for (LocatedFault f : reading.located()) {
                assertThat(WORDS.sentence(f.fault()))
                        .as("seed %d: %s", seed, f)
                        .doesNotContain("{" + f.fault().code())
                        .doesNotStartWith(f.fault().code());
            }
        }
        return result.get();
    }

    private static JsonNode tree(String name, int seed) throws IOException {
        JsonNode tree = YamlText.read(bytes(name), 1 << 20).root();
        assertThat(tree).isNotNull();
        new Mutations(new Random(seed)).apply(tree);
        return tree;
    }

    private static byte[] bytes(String name) throws IOException {
        return Files.readAllBytes(WORKED.resolve(name));
    }
}
