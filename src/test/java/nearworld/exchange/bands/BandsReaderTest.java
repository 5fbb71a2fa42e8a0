package nearworld.exchange.bands;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import nearworld.engine.network.EvidencePack;
import nearworld.exchange.faults.Reading;
import nearworld.exchange.packs.PackReader;
import org.junit.jupiter.api.Test;

class BandsReaderTest {
    private static final String GOOD = """
            bands: {id: house, version: 1}
            term:
              - {upToRatio: 1.30, terms: standard}
              - {upToRatio: 4.00, upToPerMille: 8, terms: rated, stepPercent: 25}
              - {upToRatio: 6.00, upToPerMille: 20, terms: flatExtra, stepPerMille: 1, firstYears: 5}
              - {terms: decline}
            postpone: [{event: respiratoryAdmission, outcome: intensive, withinMonths: 3}]
            """;

    private static List<String> faults(String text) throws IOException {
        EvidencePack pack = PackReader.read(
                        Files.readAllBytes(Path.of("src/test/resources/oracles/worked/pack-1.yaml")))
                .value()
                .evidence();
        return BandsReader.read(text.getBytes(StandardCharsets.UTF_8), pack).faults().stream()
                .map(f -> f.path() + " " + f.code())
                .toList();
    }

    @Test
    void readsBands() {
        Reading<Bands> reading = BandsReader.read(GOOD.getBytes(StandardCharsets.UTF_8), null);

        assertThat(reading.faults()).isEmpty();
        assertThat(reading.value().id()).isEqualTo("house");
        assertThat(reading.value().version()).isEqualTo(1);
    }

    @Test
    void somethingAlwaysFitsAndNothingIsOutOfReach() throws IOException {
        assertThat(faults(GOOD.replace("  - {terms: decline}\n", ""))).containsExactly("$.term[2] lastBandBounded");
        assertThat(faults(GOOD.replace("upToRatio: 1.30, ", ""))).containsExactly("$.term[0] bandUnbounded");
    }

    @Test
    void fieldsBelongToTheirTerms() throws IOException {
        assertThat(faults(GOOD.replace(", stepPercent: 25", ""))).containsExactly("$.term[1].stepPercent missingField");
        assertThat(faults(GOOD.replace("{terms: decline}", "{terms: decline, firstYears: 5}")))
                .containsExactly("$.term[3].firstYears notOfTerms");
        assertThat(faults(GOOD.replace("terms: rated", "terms: loaded"))).containsExactly("$.term[1].terms notAllowed");
        assertThat(faults(GOOD.replace("upToRatio: 4.00", "upToRatio: -4")))
                .containsExactly("$.term[1].upToRatio notAbove");
        assertThat(faults(GOOD.replace("stepPercent", "step"))).contains("$.term[1].step unknownField");
    }

    @Test
    void postponesForEventsThatThePackKnows() throws IOException {
        assertThat(faults(GOOD.replace("outcome: intensive", "outcome: gone")))
                .containsExactly("$.postpone[0].outcome unknownOutcome");
        assertThat(faults(GOOD.replace("event: respiratoryAdmission", "event: fall")))
                .containsExactly("$.postpone[0].event unknownEvent");
    }
}
