package nearworld.app.cases;

import java.time.LocalDate;
import org.jspecify.annotations.Nullable;

/**
 * A case to be made.
 *
 * @param ref the case reference; empty: the next number
 * @param externalRef the reference that others know the applicant's case by; empty: none
 * @param dueOn null: no day
 */
public record NewCase(
        String ref, String externalRef, @Nullable LocalDate dueOn) {
    /** What a case reference looks like. */
    public static final String REF_PATTERN = "[A-Za-z0-9][A-Za-z0-9._-]{0,39}";
}
