package nearworld.app.fields;

import java.util.List;

/**
 * Options of a select that stand under one heading; without heading where the label is empty.
 *
 * @param options in the order shown
 */
public record OptionGroup(String label, List<Option> options) {
    public OptionGroup {
        options = List.copyOf(options);
    }

    /** One option: what is sent, and what is read. */
    public record Option(String value, String label) {}

    /** Whether a value can be picked in one of the groups. */
    public static boolean offers(List<OptionGroup> groups, String value) {
        return groups.stream()
                .flatMap(g -> g.options().stream())
                .anyMatch(o -> o.value().equals(value));
    }
}
