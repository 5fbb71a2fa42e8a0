package nearworld.engine.inference;

import java.util.ArrayList;
import java.util.List;
import nearworld.engine.network.EvidencePack;
import nearworld.engine.network.EvidencePack.Behaviour;
import nearworld.engine.network.EvidencePack.Interaction;
import nearworld.engine.network.EvidencePack.Level;
import org.jspecify.annotations.Nullable;

/**
 * The score B(u) = ln z + Σ c_i·ln HR_i/g(atAge_i) + Σ interactions + Σ ln HR(level)/g(atAge), by parts. Relative hazard at
 * age a is exp(g(a)·B).
 *
 * <p>Sets of conditions are bit sets over the pack's conditions.
 */
public final class Scores {
    private final EvidencePack pack;
    private final double[] conditions;
    private final long[] interactionMembers;
    private final double[] interactions;
    private final double[][] levels;
    private final double[][] longRun;

    public Scores(EvidencePack pack) {
        this.pack = pack;
        this.conditions = pack.conditions().stream()
                .mapToDouble(c ->
                        score(c.hazardRatio().ratio().value(), c.hazardRatio().atAge()))
                .toArray();
        this.interactionMembers = pack.interactions().stream()
                .mapToLong(i -> i.of().stream().mapToLong(c -> 1L << c).sum())
                .toArray();
        this.interactions = pack.interactions().stream()
                .map(Interaction::ratio)
                .mapToDouble(r -> StrictMath.log(r.value()))
                .toArray();
        this.levels = new double[pack.behaviours().size()][];
        this.longRun = new double[levels.length][];
        for (int b = 0; b < levels.length; b++) {
            List<Level> all = pack.behaviours().get(b).levels();
            levels[b] = all.stream()
                    .mapToDouble(l -> score(
                            l.hazardRatio().ratio().value(), l.hazardRatio().atAge()))
                    .toArray();
            longRun[b] = all.stream().mapToDouble(this::longRunScore).toArray();
        }
    }

    private double longRunScore(Level level) {
        EvidencePack.@Nullable Ratio ratio = level.longRun() == null ? level.hazardRatio() : level.longRun();
        return score(ratio.ratio().value(), ratio.atAge());
    }

    /** ln HR / g(atAge). */
    private double score(double ratio, double atAge) {
        return StrictMath.log(ratio) / pack.taper().at(atAge);
    }

    public double condition(int condition) {
        return conditions[condition];
    }

    /** The least that a condition's coming can add to the score, whatever else is present. */
    double leastOf(int condition) {
        double sum = conditions[condition];
        for (int k = 0; k < interactions.length; k++) {
            sum += (interactionMembers[k] >> condition & 1) != 0 ? Math.min(0, interactions[k]) : 0;
        }
        return sum;
    }

    /** The level's own score. */
    public double level(int behaviour, int level) {
        return levels[behaviour][level];
    }

    /** The score that those who change to a level tend to. */
    public double longRun(int behaviour, int level) {
        return longRun[behaviour][level];
    }

    /** The level with the highest own ratio of a behaviour. */
    public int highestLevel(Behaviour behaviour) {
        int best = 0;
        for (int l = 1; l < behaviour.levels().size(); l++) {
            if (behaviour.levels().get(l).hazardRatio().ratio().value()
                    > behaviour.levels().get(best).hazardRatio().ratio().value()) {
                best = l;
            }
        }
        return best;
    }

    /** The part of the score that a set of present conditions gives: their own and those of interactions within the set. */
    public double of(long present) {
        double sum = 0;
        for (int i = 0; i < conditions.length; i++) {
            sum += (present >> i & 1) != 0 ? conditions[i] : 0;
        }
        for (int k = 0; k < interactions.length; k++) {
            sum += (present & interactionMembers[k]) == interactionMembers[k] ? interactions[k] : 0;
        }
        return sum;
    }

    /** A set of conditions and all that interact with one of them. */
    public long withPartners(long set) {
        long wider = set;
        for (long members : interactionMembers) {
            wider |= (members & set) != 0 ? members : 0;
        }
        return wider;
    }

    /** The score's parts as tables to be added up: of the state before all occurrences, without the frailty. */
    public List<Factor> terms(PopulationPrior prior, ConditionStates states, int[] cards) {
        List<Factor> terms = new ArrayList<>();
        for (int b = 0; b < levels.length; b++) {
            double[] own = levels[b];
            terms.add(Factor.of(new int[] {b}, cards, s -> own[s[0]]));
        }
        for (int i = 0; i < conditions.length; i++) {
            int condition = i;
            terms.add(Factor.of(
                    new int[] {prior.conditionVariable(i)},
                    cards,
                    s -> states.before(condition, s[0]) ? conditions[condition] : 0));
        }
        for (int k = 0; k < interactions.length; k++) {
            List<Integer> of = pack.interactions().get(k).of();
            double value = interactions[k];
            terms.add(Factor.of(of.stream().mapToInt(prior::conditionVariable).toArray(), cards, s -> {
                for (int m = 0; m < s.length; m++) {
                    if (!states.before(of.get(m), s[m])) {
                        return 0;
                    }
                }
                return value;
            }));
        }
        return terms;
    }

    /** A grid that holds every score that can occur, what treatments add included. */
    ScoreGrid grid(PopulationPrior prior, double steepest, boolean fine) {
        double[] range = {0, 0};
        for (double c : conditions) {
            widen(range, c);
        }
        for (double i : interactions) {
            widen(range, i);
        }
        for (EvidencePack.Treatment t : pack.treatments()) {
            widen(range, StrictMath.log(t.hazardRatio().value()));
        }
        for (double[] own : levels) {
            range[0] += java.util.Arrays.stream(own).min().orElse(0);
            range[1] += java.util.Arrays.stream(own).max().orElse(0);
        }
        double[] z = prior.frailty();
        range[0] += StrictMath.log(z[0]);
        range[1] += StrictMath.log(z[z.length - 1]);
        return new ScoreGrid(range[0], range[1], steepest, fine);
    }

    private static void widen(double[] range, double value) {
        range[0] += Math.min(0, value);
        range[1] += Math.max(0, value);
    }
}
