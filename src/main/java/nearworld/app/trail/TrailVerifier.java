package nearworld.app.trail;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Isolation;
import org.springframework.transaction.annotation.Transactional;
import tools.jackson.core.JacksonException;
import tools.jackson.databind.JsonNode;

/** Walks the whole chain and checks every entry and everything that entries vouch for. */
@Service
public class TrailVerifier {
    private static final int BATCH = 500;

    private final TrailRows rows;
    private final Map<String, Vouched> vouched = new HashMap<>();

    TrailVerifier(TrailRows rows, List<Vouched> vouched) {
        this.rows = rows;
        vouched.forEach(v -> this.vouched.put(v.action(), v));
    }

    /** The first thing that does not hold, or that all is intact, as of one moment. */
    @Transactional(readOnly = true, isolation = Isolation.REPEATABLE_READ)
    public Verification verify() {
        Walk walk = new Walk();
        List<TrailRows.Row> batch = rows.after(0, BATCH);
        while (!batch.isEmpty()) {
            for (TrailRows.Row row : batch) {
                String fault = walk.step(row);
                if (fault != null) {
                    return new Verification(false, walk.entries, walk.entries + 1, fault, walk.checked());
                }
            }
            batch = rows.after(walk.entries, BATCH);
        }
        for (Vouched kind : vouched.values()) {
            if (kind.stored() != walk.counts.getOrDefault(kind.action(), 0L)) {
                return new Verification(false, walk.entries, walk.entries + 1, "missingEntry", walk.checked());
            }
        }
        return new Verification(true, walk.entries, null, null, walk.checked());
    }

    /** The state of one walk: how far it came, and what it counted. */
    private final class Walk {
        private long entries;
        private String previous = EntryCodec.NO_PREDECESSOR;
        private final Map<String, Long> counts = new HashMap<>();

        @Nullable
        String step(TrailRows.Row row) {
            if (row.seq() != entries + 1) {
                return "gap";
            }
            if (!EntryCodec.sha256(row.entry()).equals(row.sha256())) {
                return "hash";
            }
            String fault = chainFault(row);
            if (fault != null) {
                return fault;
            }
            Vouched kind = vouched.get(row.action());
            if (kind != null) {
                String wrong = kind.faultOf(EntryCodec.read(row));
                if (wrong != null) {
                    return wrong;
                }
                counts.merge(kind.action(), 1L, Long::sum);
            }
            entries = row.seq();
            previous = row.sha256();
            return null;
        }

        private @Nullable String chainFault(TrailRows.Row row) {
            JsonNode node;
            try {
                node = EntryCodec.parse(row.entry());
            } catch (JacksonException e) {
                return "hash";
            }
            if (node.path("seq").asLong(-1) != row.seq()) {
                return "gap";
            }
            if (!previous.equals(node.path("previous").asString(""))) {
                return "predecessor";
            }
            byte[] sealed = row.sealed();
            String stored = sealed == null ? null : EntryCodec.sha256(sealed);
            String named = node.has("sealedSha256") ? node.path("sealedSha256").asString("") : null;
            return Objects.equals(stored, named) ? null : "content";
        }

        long checked() {
            return counts.values().stream().mapToLong(Long::longValue).sum();
        }
    }
}
