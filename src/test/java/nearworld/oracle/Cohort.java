package nearworld.oracle;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import nearworld.oracle.OraclePack.AfterEffect;

/** Weights over (conditions now, behaviours, frailty) of those who carry the same after-effects. */
record Cohort(List<Carried> effects, double[] weights) {

    /** An after-effect that runs from an age. */
    record Carried(AfterEffect effect, double fromAge) {
        double left(double atAge) {
            return Math.pow(2, -Math.max(0, atAge - fromAge) / effect.halfLife());
        }
    }

    /** Ratio of the after-effects, each read no earlier than the age it runs from. */
    double ratio(OraclePack pack, double atAge) {
        double sum = 0;
        for (Carried carried : effects) {
            double taper = pack.taper(Math.max(atAge, carried.fromAge()));
            sum += taper * carried.effect().logRatio() * carried.left(atAge);
        }
        return Math.exp(sum);
    }

    /** Deaths per year on top. */
    double excess(double atAge) {
        double sum = 0;
        for (Carried carried : effects) {
            sum += carried.effect().excess() * carried.left(atAge);
        }
        return sum;
    }

    /** Gathers weights of the same after-effects. */
    static final class Collector {
        private final Map<List<Carried>, Cohort> cohorts = new LinkedHashMap<>();
        private final int size;

        Collector(int size) {
            this.size = size;
        }

        double[] weights(List<Carried> effects) {
            return cohorts.computeIfAbsent(List.copyOf(effects), e -> new Cohort(e, new double[size]))
                    .weights();
        }

        double total() {
            double sum = 0;
            for (Cohort cohort : cohorts.values()) {
                for (double w : cohort.weights()) {
                    sum += w;
                }
            }
            return sum;
        }

        List<Cohort> dividedBy(double total) {
            List<Cohort> result = new ArrayList<>();
            for (Cohort cohort : cohorts.values()) {
                double[] scaled = cohort.weights().clone();
                for (int m = 0; m < scaled.length; m++) {
                    scaled[m] /= total;
                }
                result.add(new Cohort(cohort.effects(), scaled));
            }
            return result;
        }
    }
}
