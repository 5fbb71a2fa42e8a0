package nearworld.exchange.packs;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import nearworld.exchange.documents.Titles;
import nearworld.exchange.faults.JsonPath;
import org.jspecify.annotations.Nullable;
import tools.jackson.databind.JsonNode;

/** The words of a pack: titles by language, codes, units, and where each number comes from. */
public final class PackTexts {
    /**
     * Where a number, or everything below a path, comes from.
     *
     * @param path JSON path
     * @param provenance seen, memory, memory_approx or demo
     */
    public record Origin(
            String path,
            @Nullable String source,
            @Nullable String provenance,
            @Nullable String note) {}

    private final JsonNode document;

    PackTexts(JsonNode document) {
        this.document = document;
    }

    /** The whole pack as a tree. It is not to be changed. */
    public JsonNode document() {
        return document;
    }

    /** The pack's own title. */
    public String title(Locale locale) {
        JsonNode head = document.path("pack");
        return Titles.of(head, head.path("id").asString(""), locale);
    }

    public String behaviour(String id, Locale locale) {
        return Titles.of(document.path("behaviours").path(id), id, locale);
    }

    public String level(String behaviour, String id, Locale locale) {
        return Titles.of(
                document.path("behaviours").path(behaviour).path("levels").path(id), id, locale);
    }

    public String condition(String id, Locale locale) {
        return Titles.of(document.path("conditions").path(id), id, locale);
    }

    public String event(String id, Locale locale) {
        return Titles.of(document.path("events").path(id), id, locale);
    }

    public String outcome(String event, String id, Locale locale) {
        return Titles.of(document.path("events").path(event).path("outcomes").path(id), id, locale);
    }

    public String finding(String id, Locale locale) {
        return Titles.of(document.path("findings").path(id), id, locale);
    }

    public String findingLevel(String finding, String id, Locale locale) {
        return Titles.of(document.path("findings").path(finding).path("levels").path(id), id, locale);
    }

    public String source(String id, Locale locale) {
        return Titles.of(document.path("sources").path(id), id, locale);
    }

    public String treatment(String id, Locale locale) {
        return Titles.of(document.path("treatments").path(id), id, locale);
    }

    /** A finding's unit, empty where it has none. */
    public String unit(String finding) {
        return document.path("findings").path(finding).path("unit").asString("");
    }

    /** ICD-10 codes of a condition. */
    public List<String> conditionCodes(String id) {
        return codes(document.path("conditions").path(id));
    }

    /** ICD-10 codes of an event. */
    public List<String> eventCodes(String id) {
        return codes(document.path("events").path(id));
    }

    private static List<String> codes(JsonNode item) {
        return item.path("codes").values().stream().map(JsonNode::asString).toList();
    }

    /** Every statement about where numbers come from, in the order of the document. */
    public List<Origin> origins() {
        List<Origin> origins = new ArrayList<>();
        collect(document, JsonPath.ROOT, origins);
        return origins;
    }

    private static void collect(JsonNode node, String path, List<Origin> origins) {
        if (node.isArray()) {
            for (int i = 0; i < node.size(); i++) {
                collect(node.get(i), JsonPath.item(path, i), origins);
            }
            return;
        }
        if (!node.isObject()) {
            return;
        }
        add(node, path, origins);
        for (Map.Entry<String, JsonNode> field : node.properties()) {
            String at = JsonPath.field(path, field.getKey());
            boolean ofFields = field.getKey().equals("sources") && !path.equals(JsonPath.ROOT);
            if (ofFields) {
                field.getValue()
                        .properties()
                        .forEach(e -> add(e.getValue(), JsonPath.field(path, e.getKey()), origins));
            } else {
                collect(field.getValue(), at, origins);
            }
        }
    }

    private static void add(JsonNode node, String path, List<Origin> origins) {
        String source = text(node, "source");
        String provenance = text(node, "provenance");
        String note = text(node, "note");
        if (source != null || provenance != null || note != null) {
            origins.add(new Origin(path, source, provenance, note));
        }
    }

    private static @Nullable String text(JsonNode node, String field) {
        JsonNode value = node.path(field);
        return value.isString() ? value.asString() : null;
    }
}
