package nearworld.engine.inference;

import java.util.ArrayList;
import java.util.List;
import nearworld.engine.basics.AgeCurve;
import nearworld.engine.network.EvidencePack.ConditionFactor;
import nearworld.engine.network.EvidencePack.EventType;
import nearworld.engine.network.EvidencePack.LevelFactor;
import nearworld.engine.network.EvidencePack.Outcome;

/**
 * One type of event at one age, held against the population: the mean of R, and the weights θ of its outcomes.
 *
 * <p>R(u) = z^κ·Π (1 + ω_i(a)(r_i − 1))^{c_i}·Π r_b, and P(o | u) ∝ θ_o·Π (1 + ω_i(a)(OR_{o,i} − 1))^{c_i}, θ such that the
 * average over those who have the event is the published share.
 */
public final class EventMoment {
    private static final int MAX_ITERATIONS = 100_000;
    private static final double PRECISION = 1e-15;

    private final PopulationPrior prior;
    private final EventType event;
    private final double age;
    private final double meanRate;
    private final int[] outcomeConditions;
    private double[] theta = {};

    public EventMoment(PopulationPrior prior, int event, double age) {
        this.prior = prior;
        this.event = prior.pack().events().get(event);
        this.age = age;
        this.outcomeConditions = this.event.outcomes().stream()
                .flatMap(o -> o.oddsRatios().stream())
                .mapToInt(ConditionFactor::condition)
                .distinct()
                .sorted()
                .toArray();
        double frailtyMean = 0;
        for (double z : prior.frailty()) {
            frailtyMean += frailtyRate(z) / prior.frailty().length;
        }
        this.meanRate = frailtyMean * prior.expectation(rateFactors());
    }

    /** z^κ. */
    double frailtyRate(double z) {
        return StrictMath.exp(event.frailtyPower().value() * StrictMath.log(z));
    }

    /** E_P[R]. */
    double meanRate() {
        return meanRate;
    }

    public EventType event() {
        return event;
    }

    double age() {
        return age;
    }

    /** ω of the population at this age, past or to come. */
    private double presentAt(int condition) {
        return prior.presentAt(condition, age);
    }

    private List<Factor> rateFactors() {
        List<Factor> unary = new ArrayList<>();
        for (ConditionFactor r : event.conditionRates()) {
            double effective = 1 + presentAt(r.condition()) * (r.factor().value() - 1);
            unary.add(Factor.of(
                    new int[] {prior.conditionVariable(r.condition())}, prior.cards(), s -> s[0] == 1 ? effective : 1));
        }
        for (LevelFactor r : event.behaviourRates()) {
            unary.add(Factor.of(
                    new int[] {r.behaviour()},
                    prior.cards(),
                    s -> s[0] == r.level() ? r.factor().value() : 1));
        }
        return unary;
    }

    /** The conditions that move the odds of the outcomes, in the pack's order. */
    public int[] outcomeConditions() {
        return outcomeConditions;
    }

    /**
     * P(o | u) for each outcome.
     *
     * @param present for each of {@link #outcomeConditions()} the weight ω within [0, 1] with which its odds ratios act
     */
    public double[] outcomeProbabilities(double[] present) {
        double[] odds = odds(present);
        double[] weights = theta();
        double sum = 0;
        for (int o = 0; o < odds.length; o++) {
            odds[o] *= weights[o];
            sum += odds[o];
        }
        for (int o = 0; o < odds.length; o++) {
            odds[o] /= sum;
        }
        return odds;
    }

    private double[] odds(double[] present) {
        int[] conditions = outcomeConditions;
        double[] odds = new double[event.outcomes().size()];
        for (int o = 0; o < odds.length; o++) {
            odds[o] = 1;
            for (ConditionFactor r : event.outcomes().get(o).oddsRatios()) {
                double weight = present[java.util.Arrays.binarySearch(conditions, r.condition())];
                odds[o] *= 1 + weight * (r.factor().value() - 1);
            }
        }
        return odds;
    }

    private double[] theta() {
        if (theta.length == 0) {
            List<AgeCurve> curves = event.outcomes().stream()
                    .map(Outcome::share)
                    .map(s -> s.get(prior.sex()))
                    .toList();
            theta = solved(PopulationPrior.sharesAt(curves, age));
        }
        return theta;
    }

    /** Iterative proportional fitting of θ to the shares, θ starting as the shares. */
    private double[] solved(double[] share) {
        int[] conditions = outcomeConditions;
        if (conditions.length == 0) {
            return share;
        }
        int[] variables = java.util.Arrays.stream(conditions)
                .map(prior::conditionVariable)
                .toArray();
        Factor weights = prior.weighted(rateFactors(), variables);
        double[][] odds = new double[weights.values().length][];
        double whole = 0;
        int[] states = new int[conditions.length];
        for (int at = 0; at < odds.length; at++) {
            double[] present = new double[conditions.length];
            for (int i = 0; i < present.length; i++) {
                present[i] = states[i] * presentAt(conditions[i]);
            }
            odds[at] = odds(present);
            whole += weights.values()[at];
            Factor.next(states, weights.cards());
        }
        double[] fitted = share.clone();
        for (int round = 0; round < MAX_ITERATIONS; round++) {
            double[] mean = means(weights.values(), odds, fitted, whole);
            double worst = 0;
            for (int o = 0; o < fitted.length; o++) {
                double step = share[o] / mean[o];
                fitted[o] *= step;
                worst = Math.max(worst, Math.abs(step - 1));
            }
            if (worst < PRECISION * share.length * 4) {
                break;
            }
        }
        return fitted;
    }

    private static double[] means(double[] weights, double[][] odds, double[] theta, double whole) {
        double[] mean = new double[theta.length];
        for (int at = 0; at < weights.length; at++) {
            double sum = 0;
            for (int o = 0; o < theta.length; o++) {
                sum += theta[o] * odds[at][o];
            }
            for (int o = 0; o < theta.length; o++) {
                mean[o] += weights[at] / whole * theta[o] * odds[at][o] / sum;
            }
        }
        return mean;
    }
}
