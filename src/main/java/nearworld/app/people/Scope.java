package nearworld.app.people;

import java.util.Arrays;

/** Whose cases a permission reaches. */
public enum Scope {
    /** Every case; for an action that is not about a case: allowed. */
    ALL("all"),
    /** Cases that the person owns. */
    OWN("own"),
    /** Cases assigned to the person. */
    ASSIGNED("assigned"),
    /** Cases assigned to nobody. */
    UNASSIGNED("unassigned"),
    /** Cases referred to the person. */
    REFERRED("referred");

    private final String id;

    Scope(String id) {
        this.id = id;
    }

    /** The word in the permission matrix. */
    public String id() {
        return id;
    }

    static Scope ofId(String id) {
        return Arrays.stream(values())
                .filter(s -> s.id.equals(id))
                .findFirst()
                .orElseThrow(() -> new IllegalArgumentException("no scope " + id));
    }
}
