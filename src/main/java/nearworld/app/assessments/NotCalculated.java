package nearworld.app.assessments;

import java.util.List;
import nearworld.engine.basics.Fault;

/** The case cannot be calculated as it stands, and why. */
public record NotCalculated(List<Fault> faults) implements Calculation {
    public NotCalculated {
        faults = List.copyOf(faults);
    }
}
