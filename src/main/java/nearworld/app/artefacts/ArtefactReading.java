package nearworld.app.artefacts;

import java.nio.charset.StandardCharsets;
import java.util.List;
import nearworld.app.forms.CaseCheck;
import nearworld.engine.assessment.CaseFile;
import nearworld.engine.mortality.MortalityTable;
import nearworld.exchange.cases.CaseReader;
import nearworld.exchange.faults.Reading;
import nearworld.exchange.packs.Pack;
import nearworld.exchange.packs.PackReader;
import nearworld.exchange.tables.TableReader;

/** Reads the content of artefacts by the rules of the exchange format. */
final class ArtefactReading {
    private ArtefactReading() {}

    /** The table; content that breaks a rule is a programming mistake here, because publishing checks it first. */
    static MortalityTable table(String content) {
        return accepted(TableReader.read(bytes(content)), "table").rates();
    }

    /** The pack of that content. */
    static LoadedPack pack(String content, String sha256) {
        Pack pack = accepted(PackReader.read(bytes(content)), "pack");
        return new LoadedPack(
                pack.evidence(),
                locale -> pack.texts().title(locale),
                sha256,
                table -> check(new CaseReader(pack.evidence(), table)),
                locale -> PackWords.choices(pack, locale));
    }

    private static CaseCheck check(CaseReader reader) {
        return input -> {
            Reading<CaseFile> reading = reader.read(input);
            return reading.isAccepted()
                    ? new CaseCheck.Checked(reading.value(), List.of())
                    : new CaseCheck.Checked(null, reading.faults());
        };
    }

    private static <T> T accepted(Reading<T> reading, String kind) {
        if (!reading.isAccepted()) {
            throw new IllegalArgumentException("the " + kind + " has faults: " + reading.faults());
        }
        return reading.value();
    }

    private static byte[] bytes(String content) {
        return content.getBytes(StandardCharsets.UTF_8);
    }
}
