package nearworld.engine.counterfactual;

import java.util.List;
import java.util.Map;
import nearworld.engine.basics.Estimate;
import nearworld.engine.inference.Evidence;
import nearworld.engine.inference.Scores;
import nearworld.engine.network.EvidencePack;
import nearworld.engine.network.EvidencePack.Level;
import org.jspecify.annotations.Nullable;

/**
 * How the scores of behaviours move over a person's time: a habit given up decays, with the level's half-life, from the score
 * of the level left to the long-run score of the level come to.
 *
 * <p>The key of a state numbers the levels of those behaviours that a what-if changes from a day on.
 */
final class Habits {
    private final EvidencePack pack;
    private final Scores scores;
    private final List<Evidence.GivenUp> givenUp;
    private final Evidence evidence;
    private final Map<Integer, Change> changes;

    /** From {@code time} (years from today) on those at a worse level of the behaviour move to another. */
    record Change(int level, double time) {}

    /**
     * @param givenUp the habits that were given up, as recorded
     * @param changes dated changes by behaviour
     */
    Habits(
            EvidencePack pack,
            Scores scores,
            Evidence evidence,
            List<Evidence.GivenUp> givenUp,
            Map<Integer, Change> changes) {
        this.pack = pack;
        this.scores = scores;
        this.evidence = evidence;
        this.givenUp = givenUp;
        this.changes = new java.util.TreeMap<>(changes);
    }

    int key(int[] stateOfVariable) {
        int key = 0;
        for (int b : changes.keySet()) {
            key = key * pack.behaviours().get(b).levels().size() + stateOfVariable[b];
        }
        return key;
    }

    /** What the score at a time is above that of the levels' own ratios. */
    double shift(int key, double time) {
        double sum = 0;
        int rest = key;
        List<Integer> behaviours = List.copyOf(changes.keySet());
        for (int k = behaviours.size() - 1; k >= 0; k--) {
            int b = behaviours.get(k);
            int levels = pack.behaviours().get(b).levels().size();
            int level = rest % levels;
            rest /= levels;
            sum += changed(b, level, time) - scores.level(b, level);
        }
        for (Evidence.GivenUp g : givenUp) {
            if (!changes.containsKey(g.behaviour())) {
                int level = evidence.levels().get(g.behaviour());
                sum += recorded(g.behaviour(), level, time) - scores.level(g.behaviour(), level);
            }
        }
        return sum;
    }

    private double changed(int behaviour, int level, double time) {
        Change change = java.util.Objects.requireNonNull(changes.get(behaviour));
        boolean applies = ratio(behaviour, level) > ratio(behaviour, change.level());
        if (!applies || time < change.time()) {
            return recorded(behaviour, level, time);
        }
        double atChange = recorded(behaviour, level, change.time());
        return decayed(behaviour, change.level(), atChange, time - change.time());
    }

    private double ratio(int behaviour, int level) {
        return pack.behaviours()
                .get(behaviour)
                .levels()
                .get(level)
                .hazardRatio()
                .ratio()
                .value();
    }

    private double recorded(int behaviour, int level, double time) {
        for (Evidence.GivenUp g : givenUp) {
            if (g.behaviour() == behaviour && evidence.levels().get(behaviour) == level) {
                double since = time - evidence.yearsFromToday(g.since());
                return decayed(behaviour, level, scores.level(behaviour, g.left()), since);
            }
        }
        return scores.level(behaviour, level);
    }

    private double decayed(int behaviour, int level, double from, double years) {
        Level to = pack.behaviours().get(behaviour).levels().get(level);
        double end = scores.longRun(behaviour, level);
        @Nullable Estimate halfLife = to.halfLifeYears();
        return halfLife == null
                ? end
                : end + (from - end) * StrictMath.exp(-StrictMath.log(2) * years / halfLife.value());
    }
}
