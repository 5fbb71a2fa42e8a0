package nearworld.exchange.faults;

import java.util.regex.Pattern;

/** Paths as faults name them: {@code $.history[0].from}; names that are no words in quotes, {@code $.share['40']}. */
public final class JsonPath {
    /** The whole document. */
    public static final String ROOT = "$";

    private static final Pattern WORD = Pattern.compile("[A-Za-z_][A-Za-z0-9_]*");
    private static final int LONGEST_NAME = 80;

    private JsonPath() {}

    /** The path of a field. */
    public static String field(String path, String name) {
        if (WORD.matcher(name).matches() && name.length() <= LONGEST_NAME) {
            return path + "." + name;
        }
        String shown = name.length() > LONGEST_NAME ? name.substring(0, LONGEST_NAME) + "…" : name;
        return path + "['" + shown.replace("\\", "\\\\").replace("'", "\\'") + "']";
    }

    /** The path of an item. */
    public static String item(String path, int index) {
        return path + "[" + index + "]";
    }

    /** The path one step up; the root's is the root. */
    public static String parent(String path) {
        int end = path.endsWith("']") ? path.lastIndexOf("['") : Math.max(path.lastIndexOf('.'), path.lastIndexOf('['));
        return end <= 0 ? ROOT : path.substring(0, end);
    }
}
