package nearworld.app.forms;

import java.util.List;
import nearworld.engine.basics.Fault;

/** The faults of a case's forms, to be shown beside their fields and in a summary. */
public record FieldFaults(List<FieldFault> all) {
    public FieldFaults {
        all = List.copyOf(all);
    }

    /** No faults. */
    public static FieldFaults none() {
        return new FieldFaults(List.of());
    }

    /** The faults of one field, by {@code section.field}. */
    public List<Fault> of(String key) {
        return all.stream()
                .filter(f -> f.key().equals(key))
                .map(FieldFault::fault)
                .toList();
    }

    /** True where there is a fault. */
    public boolean any() {
        return !all.isEmpty();
    }

    /** True where a section, by its id, has a fault. */
    public boolean in(String sectionId) {
        return all.stream().anyMatch(f -> f.section().id().equals(sectionId));
    }

    /** The faults of a section, by its id. */
    public List<FieldFault> list(String sectionId) {
        return all.stream().filter(f -> f.section().id().equals(sectionId)).toList();
    }
}
