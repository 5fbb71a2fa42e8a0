package nearworld.exchange.packs;

import java.util.ArrayList;
import java.util.List;
import nearworld.engine.basics.Fault;
import nearworld.exchange.documents.Document;
import nearworld.exchange.documents.FormatSchema;
import nearworld.exchange.documents.Sha256;
import nearworld.exchange.documents.Spot;
import nearworld.exchange.documents.YamlText;
import nearworld.exchange.faults.FaultList;
import nearworld.exchange.faults.JsonPath;
import nearworld.exchange.faults.Reading;
import tools.jackson.databind.JsonNode;

/** Reads an evidence pack, YAML 1.2 or JSON: the pack, or all of its faults. */
public final class PackReader {
    /** Fifty times the default pack. */
    public static final int MOST_BYTES = 8 * 1024 * 1024;

    private PackReader() {}

    public static Reading<Pack> read(byte[] bytes) {
        Document document = YamlText.read(bytes, MOST_BYTES);
        JsonNode root = document.root();
        FaultList faults = document.faults();
        if (root == null) {
            return Reading.refused(faults.sorted());
        }
        FormatSchema.PACK.validate(root, faults);
        Spot spot = new Spot(JsonPath.ROOT, root);
        List<Fault> remarks = new ArrayList<>();
        PackNames names = new PackNames(spot);
        new NumberRules(faults).check(spot);
        new NetworkRules(names, faults).check(spot);
        new EventRules(names, faults, remarks).check(spot);
        new FindingRules(names, faults).check(spot);
        if (!faults.isEmpty()) {
            return Reading.refused(faults.sorted());
        }
        return Reading.accepted(
                new Pack(new PackConversion(names, root).pack(), new PackTexts(root), remarks, Sha256.hex(bytes)));
    }
}
