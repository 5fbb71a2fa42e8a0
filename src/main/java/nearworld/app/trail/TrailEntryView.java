package nearworld.app.trail;

import java.time.Instant;
import java.util.Map;
import org.jspecify.annotations.Nullable;

/**
 * One entry of the trail.
 *
 * @param seq its place in the chain, from 1 without gaps
 * @param person sign-in name of who acted; {@code system} where nobody did
 * @param action what was done, for example {@code case.saved}
 * @param caseRef the case that it was done to; null: none
 * @param details further facts by name, nothing personal
 * @param sha256 checksum of the entry, which covers the one of the entry before
 */
public record TrailEntryView(
        long seq,
        Instant at,
        String person,
        String action,
        @Nullable String caseRef,
        Map<String, String> details,
        String sha256) {
    public TrailEntryView {
        details = Map.copyOf(details);
    }
}
