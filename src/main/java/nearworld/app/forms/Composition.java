package nearworld.app.forms;

import java.util.List;
import java.util.Map;
import nearworld.engine.assessment.CaseFile;
import nearworld.engine.basics.Fault;
import org.jspecify.annotations.Nullable;
import tools.jackson.databind.node.ObjectNode;

/**
 * What the typed sections of a case come to.
 *
 * @param input the case in the exchange format, without the rows that have faults
 * @param file the case for the engine; null where it cannot be calculated
 * @param faults of the rows left out, field by field
 * @param general what stands in the way of a calculation and belongs to no field
 * @param validParts the valid part of {@code case/1} of each section, as JSON
 */
public record Composition(
        ObjectNode input,
        @Nullable CaseFile file,
        FieldFaults faults,
        List<Fault> general,
        Map<Section, String> validParts) {
    public Composition {
        general = List.copyOf(general);
        validParts = Map.copyOf(validParts);
    }

    /** The kind of the cover; null where there is no valid one. */
    public @Nullable String coverKind() {
        return input.path("cover").path("kind").stringValue(null);
    }
}
