package nearworld.app.trail;

import java.util.Map;
import java.util.TreeMap;
import org.jspecify.annotations.Nullable;

/**
 * What is to be appended to the trail.
 *
 * @param person sign-in name of who acts; {@link #SYSTEM} where nobody does
 * @param action what is done, for example {@code case.saved}
 * @param caseRef the case that it is done to; null: none
 * @param details further facts by name, nothing personal
 * @param sealed what is personal, encrypted; null: nothing
 */
public record NewEntry(
        String person, String action, @Nullable String caseRef, Map<String, String> details, byte @Nullable [] sealed) {
    /** Who acts where no person does. */
    public static final String SYSTEM = "system";

    public NewEntry {
        details = Map.copyOf(new TreeMap<>(details));
        sealed = sealed == null ? null : sealed.clone();
    }

    /** An entry about the installation as a whole. */
    public static NewEntry of(String person, String action, Map<String, String> details) {
        return new NewEntry(person, action, null, details, null);
    }

    /** An entry about a case. */
    public static NewEntry ofCase(String person, String action, String caseRef, Map<String, String> details) {
        return new NewEntry(person, action, caseRef, details, null);
    }

    /** The same with something personal, encrypted, beside it. */
    public NewEntry withSealed(byte[] ciphertext) {
        return new NewEntry(person, action, caseRef, details, ciphertext);
    }

    @Override
    public byte @Nullable [] sealed() {
        return sealed == null ? null : sealed.clone();
    }
}
