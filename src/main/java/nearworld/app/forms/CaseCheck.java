package nearworld.app.forms;

import java.util.List;
import nearworld.engine.assessment.CaseFile;
import nearworld.engine.basics.Fault;
import org.jspecify.annotations.Nullable;
import tools.jackson.databind.node.ObjectNode;

/** Reads {@code case/1} against one evidence pack. */
@FunctionalInterface
public interface CaseCheck {
    /** The case, or what is wrong with it. */
    Checked check(ObjectNode input);

    /**
     * @param file null where there are faults
     * @param faults by JSON path; empty where there is a file
     */
    record Checked(@Nullable CaseFile file, List<Fault> faults) {
        public Checked {
            faults = List.copyOf(faults);
        }
    }
}
