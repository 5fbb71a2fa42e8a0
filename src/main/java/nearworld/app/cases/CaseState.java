package nearworld.app.cases;

import java.util.Arrays;

/** Where a case stands. */
public enum CaseState {
    OPEN("open"),
    ASSESSED("assessed"),
    REFERRED("referred"),
    DECIDED("decided"),
    CLOSED("closed");

    private final String id;

    CaseState(String id) {
        this.id = id;
    }

    /** The name in the database and in message keys. */
    public String id() {
        return id;
    }

    /** The state of that name. */
    public static CaseState ofId(String id) {
        return Arrays.stream(values())
                .filter(s -> s.id.equals(id))
                .findFirst()
                .orElseThrow(() -> new IllegalArgumentException("no state " + id));
    }
}
