package nearworld.app.trail;

import org.jspecify.annotations.Nullable;

/**
 * What comes of walking the whole chain.
 *
 * @param intact true where every entry and everything that the entries vouch for is unchanged
 * @param entries how many entries were walked
 * @param brokenAt number of the first entry that does not hold; null where all do
 * @param reason {@code gap}, {@code hash}, {@code predecessor}, {@code content}, {@code assessment}, {@code artefact} or
 *     {@code missingEntry}; null where intact
 * @param assessments how many stored assessments were checked
 */
public record Verification(
        boolean intact,
        long entries,
        @Nullable Long brokenAt,
        @Nullable String reason,
        long assessments) {}
