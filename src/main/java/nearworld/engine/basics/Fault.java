package nearworld.engine.basics;

import java.util.Map;
import java.util.TreeMap;

/**
 * One thing that is wrong with an input: a code with parameters, never a sentence. Words live in message files.
 *
 * @param code the rule that is broken, camelCase, for example {@code linksExceedPrevalence}
 * @param path JSON path of the place in the case, pack or table, for example {@code $.history[0].from}
 * @param values the value found, the bound and whatever else the sentence needs, by name
 */
public record Fault(String code, String path, Map<String, String> values) {
    public Fault {
        values = java.util.Collections.unmodifiableMap(new TreeMap<>(values));
    }

    public static Fault of(String code, String path) {
        return new Fault(code, path, Map.of());
    }

    public static Fault of(String code, String path, String name, Object value) {
        return new Fault(code, path, Map.of(name, String.valueOf(value)));
    }

    public static Fault of(String code, String path, String name1, Object value1, String name2, Object value2) {
        return new Fault(code, path, Map.of(name1, String.valueOf(value1), name2, String.valueOf(value2)));
    }
}
