package nearworld.engine.counterfactual;

import java.util.List;

/**
 * Survival in one world.
 *
 * @param survival S at months 0, 1, 2, … from the start; the last is 0
 * @param expectation ∫ S, in years, hazards constant within a month
 * @param aliveToday the part of the world's people whom no recorded occurrence killed before today
 * @param newOccurrences whether occurrences would have been more frequent in this world than in the recorded one, which the
 *     calculation does not invent
 */
public record WorldCurve(List<Double> survival, double expectation, double aliveToday, boolean newOccurrences) {
    public WorldCurve {
        survival = List.copyOf(survival);
    }
}
