package nearworld.engine.assessment;

import java.util.List;
import nearworld.engine.basics.Fault;

/** The input cannot be assessed: at least one fault, each with its place. */
public record Refusal(List<Fault> faults) implements AssessmentOutcome {
    public Refusal {
        faults = List.copyOf(faults);
        if (faults.isEmpty()) {
            throw new IllegalArgumentException("a refusal needs a fault");
        }
    }

    @Override
    public boolean isResult() {
        return false;
    }
}
