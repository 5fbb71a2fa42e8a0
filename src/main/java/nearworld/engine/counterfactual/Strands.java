package nearworld.engine.counterfactual;

import java.util.LinkedHashMap;
import java.util.Map;
import nearworld.engine.inference.ScoreGrid;
import nearworld.engine.inference.ScoreMeasure;

/**
 * The people of a world, told apart by what will bear on their hazard differently as time goes on; those alike are one
 * measure over the score.
 */
final class Strands {
    private final ScoreGrid grid;
    private final Map<Key, ScoreMeasure> measures = new LinkedHashMap<>();

    /**
     * What tells strands apart.
     *
     * @param present conditions present, of those that still matter by name, as a bit set
     * @param habit key of {@link Habits}
     * @param effects the after-effects at work, in the order of their occurrences
     */
    record Key(long present, int habit, Effects effects) {}

    Strands(ScoreGrid grid) {
        this.grid = grid;
    }

    ScoreMeasure at(Key key) {
        return measures.computeIfAbsent(key, k -> new ScoreMeasure(grid));
    }

    Map<Key, ScoreMeasure> measures() {
        return measures;
    }

    double total() {
        double sum = 0;
        for (ScoreMeasure m : measures.values()) {
            sum += m.total();
        }
        return sum;
    }

    void trim() {
        measures.values().forEach(ScoreMeasure::trim);
    }
}
