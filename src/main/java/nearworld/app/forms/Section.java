package nearworld.app.forms;

import java.util.Arrays;
import java.util.Optional;

/** The five sections of a case, each with a version of its own. */
public enum Section {
    PERSON("person", "person"),
    STATEMENTS("statements", "statements"),
    HISTORY("history", "history"),
    WHAT_IFS("whatIfs", "what-ifs"),
    COVER("cover", "cover");

    private final String id;
    private final String path;

    Section(String id, String path) {
        this.id = id;
        this.path = path;
    }

    /** The name in the database, in field names and in message keys. */
    public String id() {
        return id;
    }

    /** The last part of the address that the section is posted to. */
    public String path() {
        return path;
    }

    /** The section of that address, if there is one. */
    public static Optional<Section> ofPath(String path) {
        return Arrays.stream(values()).filter(s -> s.path.equals(path)).findFirst();
    }

    /** The section of that name. */
    public static Section ofId(String id) {
        return Arrays.stream(values())
                .filter(s -> s.id.equals(id))
                .findFirst()
                .orElseThrow(() -> new IllegalArgumentException("no section " + id));
    }
}
