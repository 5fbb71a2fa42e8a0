package nearworld.app.casepages;

import jakarta.servlet.http.HttpServletResponse;
import java.util.Locale;
import org.jspecify.annotations.Nullable;

/**
 * What comes with a section beside its fields.
 *
 * @param version the version that was edited, as typed in the hidden field
 * @param edit the row to add or to take away; null: save
 */
record Posted(@Nullable String version, @Nullable RowEdit edit, HttpServletResponse response, Locale locale) {
    private static final long NO_VERSION = -1;

    /** The version edited; one that no section has where none is given, so that nothing is overwritten unseen. */
    long versionNumber() {
        return version != null && version.matches("[0-9]{1,18}") ? Long.parseLong(version) : NO_VERSION;
    }
}
