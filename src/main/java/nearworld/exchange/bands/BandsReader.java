package nearworld.exchange.bands;

import java.util.List;
import java.util.Map;
import nearworld.engine.basics.Fault;
import nearworld.engine.network.EvidencePack;
import nearworld.exchange.documents.Document;
import nearworld.exchange.documents.FormatSchema;
import nearworld.exchange.documents.Sha256;
import nearworld.exchange.documents.Spot;
import nearworld.exchange.documents.YamlText;
import nearworld.exchange.faults.FaultList;
import nearworld.exchange.faults.Reading;
import org.jspecify.annotations.Nullable;
import tools.jackson.databind.JsonNode;

/** Reads decision bands, YAML 1.2 or JSON: the bands, or all of their faults. */
public final class BandsReader {
    public static final int MOST_BYTES = 1024 * 1024;

    private static final List<String> KINDS = List.of("term", "wholeOfLife", "endowment", "lifeAnnuity");

    /** The fields that an item needs for its terms; an item has no other field of these. */
    private static final Map<String, List<String>> NEEDED = Map.of(
            "standard", List.of(),
            "rated", List.of("stepPercent"),
            "flatExtra", List.of("stepPerMille", "firstYears"),
            "postpone", List.of(),
            "decline", List.of());

    private static final List<String> OPTIONAL = List.of("stepPercent", "stepPerMille", "firstYears");

    private final FaultList faults;
    private final @Nullable EvidencePack pack;

    private BandsReader(FaultList faults, @Nullable EvidencePack pack) {
        this.faults = faults;
        this.pack = pack;
    }

    /** @param pack whose events the rules of postponement name; null: names are not looked up */
    public static Reading<Bands> read(byte[] bytes, @Nullable EvidencePack pack) {
        Document document = YamlText.read(bytes, MOST_BYTES);
        JsonNode root = document.root();
        if (root == null) {
            return Reading.refused(document.faults().sorted());
        }
        FormatSchema.BANDS.validate(root, document.faults());
        new BandsReader(document.faults(), pack).check(document.spot());
        if (!document.faults().isEmpty()) {
            return Reading.refused(document.faults().sorted());
        }
        JsonNode head = root.path("bands");
        return Reading.accepted(
                new Bands(head.path("id").asString(), head.path("version").intValue(), root, Sha256.hex(bytes)));
    }

    private void check(Spot root) {
        for (String kind : KINDS) {
            List<Spot> items = root.at(kind).items();
            for (int i = 0; i < items.size(); i++) {
                item(items.get(i), i == items.size() - 1);
            }
        }
        root.at("postpone").items().forEach(this::postpone);
    }

    /** Every list ends with an item without bounds, so that something always fits, and only there. */
    private void item(Spot item, boolean last) {
        boolean bounded = item.has("upToRatio") || item.has("upToPerMille");
        if (item.isObject() && bounded == last) {
            faults.add(Fault.of(last ? "lastBandBounded" : "bandUnbounded", item.path()));
        }
        String terms = item.at("terms").shown();
        List<String> needed = NEEDED.get(terms);
        if (needed == null) {
            return;
        }
        for (String field : OPTIONAL) {
            if (needed.contains(field) && !item.has(field)) {
                faults.add(Fault.of("missingField", item.at(field).path(), "field", field));
            } else if (!needed.contains(field) && item.has(field)) {
                faults.add(Fault.of("notOfTerms", item.at(field).path(), "field", field, "terms", terms));
            }
        }
    }

    private void postpone(Spot rule) {
        String event = rule.at("event").text();
        if (pack == null || event == null) {
            return;
        }
        int index = pack.eventIndex(event);
        if (index < 0) {
            faults.add(Fault.of("unknownEvent", rule.at("event").path(), "name", event));
            return;
        }
        String outcome = rule.at("outcome").text();
        if (outcome != null && pack.events().get(index).outcomeIndex(outcome) < 0) {
            faults.add(Fault.of("unknownOutcome", rule.at("outcome").path(), "name", outcome, "of", event));
        }
    }
}
