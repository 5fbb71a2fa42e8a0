package nearworld.app.drawing;

import java.util.List;

/**
 * What a plot of survival curves shows, in the reader's words.
 *
 * @param startAge exact age today, in years
 * @param yearsFromToday the words under the axis of time
 * @param alive the words over the axis of probability
 * @param curves from the one drawn first, at the back
 */
public record SurvivalCurves(
        String title,
        String description,
        double startAge,
        String yearsFromToday,
        String age,
        String alive,
        List<Curve> curves) {
    public SurvivalCurves {
        curves = List.copyOf(curves);
    }

    /**
     * One world's curve.
     *
     * @param letter what marks the curve beside its line; empty: nothing
     * @param monthly the probability of being alive after 0, 1, 2, … months
     */
    public record Curve(Lifeline.Kind kind, String letter, String name, List<Double> monthly) {
        public Curve {
            monthly = List.copyOf(monthly);
        }
    }
}
