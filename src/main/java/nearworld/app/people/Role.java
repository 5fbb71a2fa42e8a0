package nearworld.app.people;

import java.util.Arrays;

/** The five roles. */
public enum Role {
    UNDERWRITER("underwriter"),
    MEDICAL_OFFICER("medicalOfficer"),
    MANAGER("manager"),
    ADMIN("admin"),
    AUDITOR("auditor");

    private final String id;

    Role(String id) {
        this.id = id;
    }

    /** The name in the database, in the permission matrix and in message keys. */
    public String id() {
        return id;
    }

    /** The role of that name. */
    public static Role ofId(String id) {
        return Arrays.stream(values())
                .filter(r -> r.id.equals(id))
                .findFirst()
                .orElseThrow(() -> new IllegalArgumentException("no role " + id));
    }
}
