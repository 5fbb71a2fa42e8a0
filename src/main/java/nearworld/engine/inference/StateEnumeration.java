package nearworld.engine.inference;

import java.util.List;

/**
 * Runs through every state of some variables, outer ones first, and hands on what the inner ones add up to.
 *
 * <p>A factor is multiplied in, and a part of the score added, as soon as its last variable has a state, so that what states
 * share is computed once. Impossible states are left at once.
 */
public final class StateEnumeration {
    private final Level[] levels;
    private final int outerCount;
    private final ScoreGrid grid;
    private final int[] stateOfVariable;
    private final double[] stencil = new double[ScoreGrid.POINTS];

    /** What is done with the states of the outer variables. */
    public interface Visitor {
        /**
         * @param stateOfVariable states by variable number; those of the inner variables are without meaning
         * @param inner measure of the inner variables' states, with their weights; to be read at once, not kept
         */
        void visit(int[] stateOfVariable, ScoreMeasure inner);
    }

    /** A function of the score to be integrated over the inner variables, by the state of the outer ones. */
    public interface Integrand {
        /** The function at the grid's nodes. */
        double[] at(int[] stateOfVariable);
    }

    private static final class Level {
        final int variable;
        final int card;
        final Part[] factors;
        final Part[] scores;
        final double[] weight;
        final double[] score;
        final double[] mass;

        Level(int variable, int card, Part[] factors, Part[] scores) {
            this.variable = variable;
            this.card = card;
            this.factors = factors;
            this.scores = scores;
            this.weight = new double[card];
            this.score = new double[card];
            this.mass = new double[card];
        }
    }

    /** A factor that closes at a level: where its other variables' states are found, and how far each moves its index. */
    private record Part(double[] values, int[] variables, int[] strides, int ownStride) {}

    StateEnumeration(int[] outer, int[] inner, List<Factor> factors, List<Factor> scores, int[] cards, ScoreGrid grid) {
        this.grid = grid;
        this.outerCount = outer.length;
        this.stateOfVariable = new int[cards.length];
        int[] order = new int[outer.length + inner.length];
        System.arraycopy(outer, 0, order, 0, outer.length);
        System.arraycopy(inner, 0, order, outer.length, inner.length);
        int[] position = new int[cards.length];
        java.util.Arrays.fill(position, -1);
        for (int i = 0; i < order.length; i++) {
            position[order[i]] = i;
        }
        levels = new Level[order.length];
        for (int i = 0; i < order.length; i++) {
            levels[i] = new Level(
                    order[i],
                    cards[order[i]],
                    closing(factors, i, order[i], position),
                    closing(scores, i, order[i], position));
        }
    }

    private static Part[] closing(List<Factor> factors, int level, int variable, int[] position) {
        return factors.stream()
                .filter(f -> f.has(variable) && lastPosition(f, position) == level)
                .map(f -> part(f, variable))
                .toArray(Part[]::new);
    }

    private static int lastPosition(Factor f, int[] position) {
        int last = -1;
        for (int v : f.scope()) {
            if (position[v] < 0) {
                throw new IllegalArgumentException("variable " + v + " of a factor is not enumerated");
            }
            last = Math.max(last, position[v]);
        }
        return last;
    }

    private static Part part(Factor f, int variable) {
        int n = f.scope().length - 1;
        int[] variables = new int[n];
        int[] strides = new int[n];
        int k = 0;
        for (int v : f.scope()) {
            if (v != variable) {
                variables[k] = v;
                strides[k++] = f.stride(v);
            }
        }
        return new Part(f.values(), variables, strides, f.stride(variable));
    }

    /** Visits every possible state of the outer variables. */
    void forEach(Visitor visitor) {
        outer(0, 1, 0, visitor, new ScoreMeasure(grid));
    }

    private void outer(int at, double weight, double score, Visitor visitor, ScoreMeasure measure) {
        if (at == outerCount) {
            measure.clear();
            scatter(at, weight, score, measure);
            if (!measure.isEmpty()) {
                visitor.visit(stateOfVariable, measure);
            }
            return;
        }
        Level level = open(at);
        for (int s = 0; s < level.card; s++) {
            if (level.weight[s] != 0) {
                stateOfVariable[level.variable] = s;
                outer(at + 1, weight * level.weight[s], score + level.score[s], visitor, measure);
            }
        }
    }

    private void scatter(int at, double weight, double score, ScoreMeasure measure) {
        if (at == levels.length) {
            measure.add(score, weight);
            return;
        }
        Level level = open(at);
        for (int s = 0; s < level.card; s++) {
            if (level.weight[s] != 0) {
                stateOfVariable[level.variable] = s;
                scatter(at + 1, weight * level.weight[s], score + level.score[s], measure);
            }
        }
    }

    /**
     * Integrates a function of the score over all states.
     *
     * @return by variable number and state, the integral over the states in which the variable has that state
     */
    double[][] marginals(Integrand integrand) {
        for (Level level : levels) {
            java.util.Arrays.fill(level.mass, 0);
        }
        integrate(0, 1, 0, integrand, null);
        double[][] result = new double[stateOfVariable.length][];
        for (Level level : levels) {
            result[level.variable] = level.mass.clone();
        }
        return result;
    }

    private double integrate(
            int at,
            double weight,
            double score,
            Integrand integrand,
            double @org.jspecify.annotations.Nullable [] given) {
        double[] function = given == null && at == outerCount ? integrand.at(stateOfVariable) : given;
        if (at == levels.length) {
            if (function == null) {
                throw new IllegalArgumentException("more outer variables than variables");
            }
            int first = grid.stencil(score, stencil);
            double sum = 0;
            for (int j = 0; j < ScoreGrid.POINTS; j++) {
                sum += stencil[j] * function[first + j];
            }
            return weight * sum;
        }
        Level level = open(at);
        double total = 0;
        for (int s = 0; s < level.card; s++) {
            if (level.weight[s] != 0) {
                stateOfVariable[level.variable] = s;
                double mass = integrate(at + 1, weight * level.weight[s], score + level.score[s], integrand, function);
                level.mass[s] += mass;
                total += mass;
            }
        }
        return total;
    }

    /** Computes the weights and scores that the states of this level add, given the states of the levels before. */
    private Level open(int at) {
        Level level = levels[at];
        java.util.Arrays.fill(level.weight, 1);
        java.util.Arrays.fill(level.score, 0);
        for (Part part : level.factors) {
            int index = index(part);
            for (int s = 0; s < level.card; s++) {
                level.weight[s] *= part.values[index + s * part.ownStride];
            }
        }
        for (Part part : level.scores) {
            int index = index(part);
            for (int s = 0; s < level.card; s++) {
                level.score[s] += part.values[index + s * part.ownStride];
            }
        }
        return level;
    }

    private int index(Part part) {
        int index = 0;
        for (int i = 0; i < part.variables.length; i++) {
            index += part.strides[i] * stateOfVariable[part.variables[i]];
        }
        return index;
    }
}
