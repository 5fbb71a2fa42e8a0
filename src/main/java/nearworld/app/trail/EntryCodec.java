package nearworld.app.trail;

import java.nio.charset.StandardCharsets;
import java.time.Instant;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.TreeMap;
import nearworld.exchange.CanonicalJson;
import nearworld.exchange.documents.Sha256;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;
import tools.jackson.databind.node.JsonNodeFactory;
import tools.jackson.databind.node.ObjectNode;

/** Entries as canonical JSON, and their checksums. */
final class EntryCodec {
    /** What stands for the predecessor of the first entry. */
    static final String NO_PREDECESSOR = "0".repeat(64);

    private static final JsonMapper MAPPER = JsonMapper.shared();

    private EntryCodec() {}

    /** The entry's canonical JSON (RFC 8785). */
    static String write(long seq, Instant at, String previousSha256, NewEntry entry) {
        ObjectNode node = JsonNodeFactory.instance.objectNode();
        node.put("seq", seq);
        node.put("at", at.toString());
        node.put("person", entry.person());
        node.put("action", entry.action());
        if (entry.caseRef() != null) {
            node.put("caseRef", entry.caseRef());
        }
        ObjectNode details = node.putObject("details");
        entry.details().forEach(details::put);
        byte[] sealed = entry.sealed();
        if (sealed != null) {
            node.put("sealedSha256", sha256(sealed));
        }
        node.put("previous", previousSha256);
        return CanonicalJson.of(node);
    }

    /** The stored text as a view; empty texts where a field is missing. */
    static TrailEntryView read(TrailRows.Row row) {
        JsonNode node = parse(row.entry());
        Map<String, String> details = new LinkedHashMap<>();
        node.path("details")
                .propertyStream()
                .sorted(Map.Entry.comparingByKey())
                .forEach(e -> details.put(e.getKey(), e.getValue().asString("")));
        return new TrailEntryView(
                row.seq(),
                Instant.parse(node.path("at").asString("1970-01-01T00:00:00Z")),
                node.path("person").asString(""),
                node.path("action").asString(""),
                row.caseRef(),
                new TreeMap<>(details),
                row.sha256());
    }

    static JsonNode parse(String entry) {
        return MAPPER.readTree(entry);
    }

    static String sha256(String text) {
        return sha256(text.getBytes(StandardCharsets.UTF_8));
    }

    static String sha256(byte[] bytes) {
        return Sha256.hex(bytes);
    }
}
