package nearworld.engine.inference;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.TreeSet;
import org.jspecify.annotations.Nullable;

/**
 * Sums variables out of a product of tables while keeping the distribution of the score that they add up to.
 *
 * <p>One frontier of variables moves through the network: a variable comes alive with the first factor that names it, and is
 * summed out when its last factor has been multiplied in; every state of the frontier carries a {@link ScoreMeasure}. The
 * cost grows with the frontier, not with the number of variables.
 */
final class ScoreElimination {
    private final List<Factor> factors;
    private final List<Factor> scores;
    private final int[] cards;
    private final ScoreGrid grid;

    ScoreElimination(List<Factor> factors, List<Factor> scores, int[] cards, ScoreGrid grid) {
        this.factors = factors;
        this.scores = scores;
        this.cards = cards;
        this.grid = grid;
    }

    /** An order of the variables in which the frontier stays small, greedily. */
    List<Integer> order(TreeSet<Integer> variables) {
        TreeSet<Integer> left = new TreeSet<>(variables);
        TreeSet<Integer> alive = new TreeSet<>();
        TreeSet<Integer> done = new TreeSet<>();
        List<Integer> order = new ArrayList<>();
        while (!left.isEmpty()) {
            int best = -1;
            double bestSize = Double.POSITIVE_INFINITY;
            for (int v : left) {
                double size = size(widened(alive, v, done));
                if (size < bestSize) {
                    bestSize = size;
                    best = v;
                }
            }
            alive = widened(alive, best, done);
            alive.remove(best);
            done.add(best);
            left.remove(best);
            order.add(best);
        }
        return order;
    }

    /** How many states of the frontier are met in all, in a given order. */
    double cost(List<Integer> order) {
        TreeSet<Integer> alive = new TreeSet<>();
        TreeSet<Integer> done = new TreeSet<>();
        double cost = 0;
        for (int v : order) {
            alive = widened(alive, v, done);
            cost += size(alive);
            alive.remove(v);
            done.add(v);
        }
        return cost;
    }

    /** The frontier with a variable's neighbours; the factors of those that are done have been multiplied in already. */
    private TreeSet<Integer> widened(TreeSet<Integer> alive, int variable, TreeSet<Integer> done) {
        TreeSet<Integer> wider = new TreeSet<>(alive);
        wider.add(variable);
        for (List<Factor> some : List.of(factors, scores)) {
            for (Factor f : some) {
                if (f.has(variable)) {
                    for (int v : f.scope()) {
                        wider.add(v);
                    }
                }
            }
        }
        wider.removeAll(done);
        return wider;
    }

    private double size(TreeSet<Integer> variables) {
        double size = 1;
        for (int v : variables) {
            size *= cards[v];
        }
        return size;
    }

    /** Sums the variables out in that order; what remains is a table over the others that their factors name. */
    ScoreTable sumOut(List<Integer> order) {
        List<Factor> openFactors = new ArrayList<>(factors);
        List<Factor> openScores = new ArrayList<>(scores);
        ScoreMeasure one = new ScoreMeasure(grid);
        one.add(0, 1);
        ScoreTable table = new ScoreTable(new int[0], new int[0], new ScoreMeasure[] {one});
        for (int v : order) {
            table = step(table, v, take(openFactors, v), take(openScores, v));
        }
        return table;
    }

    private static List<Factor> take(List<Factor> open, int variable) {
        List<Factor> taken = new ArrayList<>();
        for (Factor f : open) {
            if (f.has(variable)) {
                taken.add(f);
            }
        }
        open.removeAll(taken);
        return taken;
    }

    private ScoreTable step(ScoreTable table, int variable, List<Factor> some, List<Factor> shifts) {
        TreeSet<Integer> union = new TreeSet<>();
        Arrays.stream(table.scope()).forEach(union::add);
        some.forEach(f -> Arrays.stream(f.scope()).forEach(union::add));
        shifts.forEach(f -> Arrays.stream(f.scope()).forEach(union::add));
        union.remove(variable);
        int[] scope = union.stream().mapToInt(Integer::intValue).toArray();
        int[] scopeCards = Arrays.stream(scope).map(v -> cards[v]).toArray();
        int size = (int) size(union);
        @Nullable ScoreMeasure[] entries = new ScoreMeasure[size];
        int[] all = new int[cards.length];
        int[] states = new int[scope.length];
        for (int at = 0; at < size; at++) {
            for (int i = 0; i < scope.length; i++) {
                all[scope[i]] = states[i];
            }
            for (int s = 0; s < cards[variable]; s++) {
                all[variable] = s;
                entries[at] = added(entries[at], table.at(all), all, some, shifts);
            }
            ScoreMeasure entry = entries[at];
            if (entry != null) {
                entry.trim();
            }
            Factor.next(states, scopeCards);
        }
        return new ScoreTable(scope, scopeCards, entries);
    }

    private @Nullable ScoreMeasure added(
            @Nullable ScoreMeasure sum,
            @Nullable ScoreMeasure source,
            int[] all,
            List<Factor> some,
            List<Factor> shifts) {
        double weight = 1;
        for (Factor f : some) {
            weight *= f.at(all);
        }
        if (source == null || weight == 0) {
            return sum;
        }
        double shift = 0;
        for (Factor f : shifts) {
            shift += f.at(all);
        }
        ScoreMeasure target = sum == null ? new ScoreMeasure(grid) : sum;
        target.addShifted(source, shift, weight);
        return target;
    }
}
