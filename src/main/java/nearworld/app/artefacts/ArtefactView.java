package nearworld.app.artefacts;

import java.time.Instant;
import org.jspecify.annotations.Nullable;

/**
 * A versioned artefact.
 *
 * @param kind {@code table}, {@code pack} or {@code bands}
 * @param name the table's name or the pack's id
 * @param state {@code draft} or {@code published}
 * @param sha256 of the content, hexadecimal
 * @param isDefault whether new calculations take it
 */
public record ArtefactView(
        String kind,
        String name,
        int version,
        String title,
        String state,
        String sha256,
        @Nullable Instant publishedAt,
        boolean isDefault) {}
