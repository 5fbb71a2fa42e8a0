package nearworld.engine.inference;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import nearworld.engine.basics.Exponential;
import nearworld.engine.network.EvidencePack;
import nearworld.engine.network.EvidencePack.AfterEffect;
import org.jspecify.annotations.Nullable;

/**
 * What it says of a person to have survived, from the first occurrence to today, the hazard over and above that of the state
 * before: exp(−∫ [M ρ_{u⁺} − ρ_u] h + A + x_{u⁺} − x_u da).
 *
 * <p>Between two occurrences u⁺ is constant, and the integral is J(B + Δ) − J0(B) with J(B) = ∫ M e^{gB} h da: one function
 * of the score for each stretch, whatever was brought on. Gauss and Legendre's rule with ten points on every smooth piece.
 */
public final class Aftermath {
    /** Abscissae and weights of the ten-point rule on [−1, 1], positive half (Abramowitz and Stegun, table 25.4). */
    private static final double[] ABSCISSAE = {
        0.148874338981631210884826001129720, 0.433395394129247190799265943165784,
        0.679409568299024406234327365114874, 0.865063366688984510732096688423493,
        0.973906528517171720077964012084452
    };

    private static final double[] WEIGHTS = {
        0.295524224714752870173815619188769, 0.269266719309996355091226921569469,
        0.219086362515982043995534934228163, 0.149451349150580593145863397657697,
        0.066671344308688137593568809893332
    };

    /** Keeps the factor finite at scores that nobody has. */
    private static final double LARGEST_EXPONENT = 300;

    private final Baseline baseline;
    private final Evidence evidence;
    private final EvidencePack pack;
    private final Scores scores;
    private final ScoreGrid grid;
    private final List<Stretch> stretches = new ArrayList<>();
    private final Map<List<Double>, double[]> cache = new HashMap<>();
    private final List<@Nullable ExcessRate> excess;
    private final boolean isNeutral;
    private double addedHazard;

    /** From an occurrence to the next, or to today: J and J0 at the nodes. */
    private record Stretch(long day, double[] with, double[] without) {}

    /** @param excess by condition, null where it adds no rate */
    Aftermath(
            Baseline baseline, Evidence evidence, EvidencePack pack, Scores scores, List<@Nullable ExcessRate> excess) {
        this.baseline = baseline;
        this.evidence = evidence;
        this.pack = pack;
        this.scores = scores;
        this.grid = baseline.grid();
        this.excess = excess;
        List<Evidence.Occurrence> occurrences = evidence.occurrences();
        this.isNeutral = occurrences.stream()
                .allMatch(o -> afterEffect(o) == null
                        && pack.events().get(o.event()).bringsOn().isEmpty());
        if (isNeutral) {
            return;
        }
        for (int j = 0; j < occurrences.size(); j++) {
            long from = occurrences.get(j).day();
            long to = j + 1 < occurrences.size() ? occurrences.get(j + 1).day() : evidence.today();
            if (to > from) {
                stretches.add(stretch(from, to));
            }
        }
    }

    private @Nullable AfterEffect afterEffect(Evidence.Occurrence o) {
        return pack.events().get(o.event()).outcomes().get(o.outcome()).afterEffect();
    }

    private Stretch stretch(long from, long to) {
        double[] with = new double[grid.size()];
        double[] without = new double[grid.size()];
        List<Double> breaks = breaks(from, to);
        for (int b = 0; b + 1 < breaks.size(); b++) {
            double middle = (breaks.get(b) + breaks.get(b + 1)) / 2;
            double half = (breaks.get(b + 1) - breaks.get(b)) / 2;
            for (int p = 0; p < ABSCISSAE.length; p++) {
                addPoint(middle - half * ABSCISSAE[p], half * WEIGHTS[p], with, without);
                addPoint(middle + half * ABSCISSAE[p], half * WEIGHTS[p], with, without);
            }
        }
        return new Stretch(from, with, without);
    }

    private void addPoint(double atAge, double weight, double[] with, double[] without) {
        Baseline.Past past = baseline.past(atAge);
        double logRatio = 0;
        for (Evidence.Occurrence o : evidence.occurrences()) {
            double since = atAge - evidence.age(o.lastDay());
            AfterEffect effect = afterEffect(o);
            if (effect != null && since > 0) {
                double left = decay(effect, since);
                logRatio += effect.hazardRatio() == null
                        ? 0
                        : StrictMath.log(effect.hazardRatio().value()) * left;
                addedHazard += effect.excessPerMille() == null
                        ? 0
                        : weight * effect.excessPerMille().value() / 1000 * left;
            }
        }
        double scale = weight * past.hazardPerYear();
        double multiplier = scale * Exponential.exp(past.g() * logRatio);
        double[] rho = past.relative();
        for (int n = 0; n < rho.length; n++) {
            with[n] += multiplier * rho[n];
            without[n] += scale * rho[n];
        }
    }

    public static double decay(AfterEffect effect, double since) {
        return effect.halfLifeYears() == null
                ? 1
                : StrictMath.exp(
                        -StrictMath.log(2) * since / effect.halfLifeYears().value());
    }

    /** Ages between which everything is smooth. */
    private List<Double> breaks(long from, long to) {
        double start = evidence.age(from);
        double end = evidence.age(to);
        java.util.TreeSet<Double> breaks = new java.util.TreeSet<>();
        for (double a = baseline.table().nextBreak(start);
                a < end;
                a = baseline.table().nextBreak(a)) {
            breaks.add(a);
        }
        breaks.add(baseline.taper().from());
        breaks.add(baseline.taper().to());
        for (Evidence.Occurrence o : evidence.occurrences()) {
            double day = evidence.age(o.lastDay());
            breaks.add(day);
            AfterEffect effect = afterEffect(o);
            if (effect != null && effect.halfLifeYears() != null) {
                double step = effect.halfLifeYears().value();
                for (int i = 0; i < 60 && step < 1; i++) {
                    breaks.add(day + step);
                    step *= 2;
                }
            }
        }
        List<Double> inside = new ArrayList<>();
        inside.add(start);
        inside.addAll(breaks.subSet(start, false, end, false));
        inside.add(end);
        return inside;
    }

    /** True where nothing that happened left anything behind: the factor is 1. */
    public boolean isNeutral() {
        return isNeutral;
    }

    /** ∫ A da: the same for every state. */
    public double addedHazard() {
        return addedHazard;
    }

    /**
     * The factor at the grid's nodes.
     *
     * @param before the conditions present before all occurrences, of those that occurrences bring on and their partners
     * @param states where the switches are read
     * @param stateOfCondition states by condition, read where it may be brought on
     */
    public double[] factor(long before, ConditionStates states, java.util.function.IntUnaryOperator stateOfCondition) {
        List<Double> key = new ArrayList<>();
        double added = 0;
        for (Stretch s : stretches) {
            long upTo = states.occurrencesBefore(s.day(), true);
            long present = before;
            for (int i = 0; i < pack.conditions().size(); i++) {
                if (states.mayBeBroughtOn(i) && (states.switches(i, stateOfCondition.applyAsInt(i)) & upTo) != 0) {
                    present |= 1L << i;
                }
            }
            key.add(scores.of(present) - scores.of(before));
        }
        for (int i = 0; i < pack.conditions().size(); i++) {
            ExcessRate rate = excess.get(i);
            if (rate != null && states.mayBeBroughtOn(i) && (before >> i & 1) == 0) {
                long on = states.switches(i, stateOfCondition.applyAsInt(i));
                if (on != 0) {
                    long day = evidence.occurrences()
                            .get(Long.numberOfTrailingZeros(on))
                            .day();
                    added += rate.integral(evidence.yearsFromToday(day), 0);
                }
            }
        }
        key.add(added);
        return cache.computeIfAbsent(key, this::compute);
    }

    private double[] compute(List<Double> key) {
        double[] exponent = new double[grid.size()];
        java.util.Arrays.fill(exponent, key.get(stretches.size()));
        double[] stencil = new double[ScoreGrid.POINTS];
        for (int s = 0; s < stretches.size(); s++) {
            double[] with = stretches.get(s).with();
            double[] without = stretches.get(s).without();
            double shift = key.get(s);
            for (int n = 0; n < exponent.length; n++) {
                double j = with[n];
                if (shift != 0) {
                    int first = grid.stencil(grid.score(n) + shift, stencil);
                    j = 0;
                    for (int p = 0; p < ScoreGrid.POINTS; p++) {
                        j += stencil[p] * with[first + p];
                    }
                }
                exponent[n] += j - without[n];
            }
        }
        for (int n = 0; n < exponent.length; n++) {
            exponent[n] = Exponential.exp(Math.min(-exponent[n], LARGEST_EXPONENT));
        }
        return exponent;
    }
}
