package nearworld.engine.counterfactual;

import nearworld.engine.network.EvidencePack.AfterEffect;
import org.jspecify.annotations.Nullable;

/**
 * The after-effect of one occurrence on a person's hazard.
 *
 * @param start years from today at which it began, negative in the past
 * @param logRatio ln HR at the start and at the pivot
 * @param excessPerYear added rate of death at the start, a year
 * @param halfLifeYears in which both halve; infinite: they stay
 */
record Effect(double start, double logRatio, double excessPerYear, double halfLifeYears) {
    private static final double PER_MILLE = 1000;

    /** The effect as a pack gives it; null where there is none. */
    static @Nullable Effect of(@Nullable AfterEffect effect, double start) {
        if (effect == null) {
            return null;
        }
        return new Effect(
                start,
                effect.hazardRatio() == null
                        ? 0
                        : StrictMath.log(effect.hazardRatio().value()),
                effect.excessPerMille() == null ? 0 : effect.excessPerMille().value() / PER_MILLE,
                effect.halfLifeYears() == null
                        ? Double.POSITIVE_INFINITY
                        : effect.halfLifeYears().value());
    }

    /** The part that is left at a time; read no earlier than the start. */
    double left(double time) {
        return StrictMath.exp(-StrictMath.log(2) * Math.max(0, time - start) / halfLifeYears);
    }
}
