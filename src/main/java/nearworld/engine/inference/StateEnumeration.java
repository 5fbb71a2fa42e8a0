package nearworld.engine.inference;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;

/**
 * Runs through every state of some variables, outer ones first, and hands on what the inner ones add up to.
 *
 * <p>A factor is multiplied in, and a part of the score added, as soon as its last variable has a state, so that what states
 * share is computed once. The frailty's bins are taken together at the end of each branch. Impossible states, and branches
 * that cannot weigh anything, are left at once.
 */
public final class StateEnumeration {
    /** Up to so many states of the inner variables their bins are spread one by one, beyond that bin by bin afterwards. */
    private static final double FEW_INNER_STATES = 16;

    private final Level[] levels;
    private final int outerCount;
    private final ScoreGrid grid;
    private final FrailtyWeights frailty;
    private final double[][] exposureByFrailty;
    private final double[][] rates;
    private final int[] stateOfVariable;
    private final double[] stencil = new double[ScoreGrid.POINTS];
    private final double[] binWeight;
    private final ScoreMeasure[] byBin;
    private final boolean binByBin;
    private final double negligible;

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
        /** The function at the grid's nodes; null: 1. */
        double @Nullable [] at(int[] stateOfVariable);
    }

    private static final class Level {
        final int variable;
        final int card;
        final Part[] factors;
        final Part[] scores;
        final int[] exposures;
        final double[][] exposureRates;
        final double[] weight;
        final double[] score;
        final double[] mass;
        double largestBelow = 1;

        Level(int variable, int card, Part[] factors, Part[] scores, List<Exposure> exposures) {
            this.variable = variable;
            this.card = card;
            this.factors = factors;
            this.scores = scores;
            this.weight = new double[card];
            this.score = new double[card];
            this.mass = new double[card];
            List<Integer> own = new ArrayList<>();
            for (int e = 0; e < exposures.size(); e++) {
                if (exposures.get(e).rates().containsKey(variable)) {
                    own.add(e);
                }
            }
            this.exposures = own.stream().mapToInt(Integer::intValue).toArray();
            this.exposureRates = new double[this.exposures.length][];
            for (int k = 0; k < this.exposures.length; k++) {
                exposureRates[k] = exposures.get(this.exposures[k]).rates().get(variable);
            }
        }
    }

    /** A factor that closes at a level: where its other variables' states are found, and how far each moves its index. */
    private record Part(double[] values, int[] variables, int[] strides, int ownStride) {}

    /** @param negligible branches that cannot weigh more than this are left out */
    StateEnumeration(
            int[] outer,
            int[] inner,
            List<Factor> factors,
            List<Factor> scores,
            List<Exposure> exposures,
            FrailtyWeights frailty,
            int[] cards,
            ScoreGrid grid,
            double negligible) {
        this.grid = grid;
        this.frailty = frailty;
        this.negligible = negligible;
        this.outerCount = outer.length;
        this.stateOfVariable = new int[cards.length];
        int[] order = Arrays.copyOf(outer, outer.length + inner.length);
        System.arraycopy(inner, 0, order, outer.length, inner.length);
        int[] position = new int[cards.length];
        Arrays.fill(position, -1);
        for (int i = 0; i < order.length; i++) {
            position[order[i]] = i;
        }
        levels = new Level[order.length];
        for (int i = 0; i < order.length; i++) {
            levels[i] = new Level(
                    order[i],
                    cards[order[i]],
                    closing(factors, i, order[i], position),
                    closing(scores, i, order[i], position),
                    exposures);
        }
        bound();
        this.exposureByFrailty = exposures.stream().map(Exposure::byFrailty).toArray(double[][]::new);
        this.rates = new double[levels.length + 1][exposures.size()];
        Arrays.fill(rates[0], 1);
        this.binWeight = new double[frailty.bins()];
        double innerStates = 1;
        for (int v : inner) {
            innerStates *= cards[v];
        }
        this.binByBin = innerStates > FEW_INNER_STATES;
        this.byBin = new ScoreMeasure[binByBin ? frailty.bins() : 0];
        for (int z = 0; z < byBin.length; z++) {
            byBin[z] = new ScoreMeasure(grid);
        }
    }

    /** For each level the most that all states below it can multiply a weight by. */
    private void bound() {
        double below = frailty.total();
        for (int i = levels.length - 1; i >= 0; i--) {
            levels[i].largestBelow = below;
            double largest = levels[i].card;
            for (Part part : levels[i].factors) {
                largest *= Arrays.stream(part.values).max().orElse(0);
            }
            below *= largest;
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
            for (int z = 0; z < byBin.length; z++) {
                measure.addShifted(byBin[z], frailty.scores()[z], 1);
                byBin[z].clear();
            }
            if (!measure.isEmpty()) {
                visitor.visit(stateOfVariable, measure);
            }
            return;
        }
        Level level = open(at);
        for (int s = 0; s < level.card; s++) {
            if (descends(level, weight, s)) {
                take(at, level, s);
                outer(at + 1, weight * level.weight[s], score + level.score[s], visitor, measure);
            }
        }
    }

    private boolean descends(Level level, double weight, int state) {
        double w = level.weight[state];
        return w != 0 && Math.abs(weight * w) * level.largestBelow > negligible;
    }

    private void take(int at, Level level, int state) {
        stateOfVariable[level.variable] = state;
        System.arraycopy(rates[at], 0, rates[at + 1], 0, rates[at].length);
        for (int k = 0; k < level.exposures.length; k++) {
            rates[at + 1][level.exposures[k]] *= level.exposureRates[k][state];
        }
    }

    private void scatter(int at, double weight, double score, ScoreMeasure measure) {
        if (at == levels.length) {
            weighBins(at, weight);
            if (binByBin) {
                spreadByBin(score);
            } else {
                for (int z = 0; z < binWeight.length; z++) {
                    measure.add(score + frailty.scores()[z], binWeight[z]);
                }
            }
            return;
        }
        Level level = open(at);
        for (int s = 0; s < level.card; s++) {
            if (descends(level, weight, s)) {
                take(at, level, s);
                scatter(at + 1, weight * level.weight[s], score + level.score[s], measure);
            }
        }
    }

    private void spreadByBin(double score) {
        int first = grid.stencil(score, stencil);
        for (int z = 0; z < byBin.length; z++) {
            byBin[z].addAt(first, stencil, binWeight[z]);
        }
    }

    /** weight·P(z)·exp(−Σ exposures) for each bin. */
    private void weighBins(int at, double weight) {
        double[] rate = rates[at];
        for (int z = 0; z < binWeight.length; z++) {
            double exposed = 0;
            for (int e = 0; e < rate.length; e++) {
                exposed += exposureByFrailty[e][z] * rate[e];
            }
            binWeight[z] = weight
                    * frailty.weights()[z]
                    * (exposed == 0 ? 1 : nearworld.engine.basics.Exponential.exp(-exposed));
        }
    }

    /** The integral of a function of the score over all states, and by variable and state over those that have it. */
    record Marginals(double total, double[][] byState) {}

    Marginals marginals(Integrand integrand) {
        for (Level level : levels) {
            Arrays.fill(level.mass, 0);
        }
        Map<double[], double[][]> shifted = new IdentityHashMap<>();
        double total = integrate(0, 1, 0, integrand, shifted, null);
        double[][] result = new double[stateOfVariable.length][];
        for (Level level : levels) {
            result[level.variable] = level.mass.clone();
        }
        return new Marginals(total, result);
    }

    private double integrate(
            int at,
            double weight,
            double score,
            Integrand integrand,
            Map<double[], double[][]> shifted,
            double @Nullable [] @Nullable [] above) {
        double[][] function = above;
        if (at == outerCount) {
            double[] given = integrand.at(stateOfVariable);
            function = given == null ? null : shifted.computeIfAbsent(given, this::shiftedByBin);
        }
        if (at == levels.length) {
            weighBins(at, weight);
            return function == null ? Arrays.stream(binWeight).sum() : gathered(score, function);
        }
        Level level = open(at);
        double total = 0;
        for (int s = 0; s < level.card; s++) {
            if (descends(level, weight, s)) {
                take(at, level, s);
                double mass = integrate(
                        at + 1, weight * level.weight[s], score + level.score[s], integrand, shifted, function);
                level.mass[s] += mass;
                total += mass;
            }
        }
        return total;
    }

    private double gathered(double score, double[][] function) {
        int first = grid.stencil(score, stencil);
        double sum = 0;
        for (int z = 0; z < binWeight.length; z++) {
            double value = 0;
            double[] f = function[z];
            for (int j = 0; j < ScoreGrid.POINTS; j++) {
                value += stencil[j] * f[first + j];
            }
            sum += binWeight[z] * value;
        }
        return sum;
    }

    /** F(B + ln z) at the nodes, for each bin. */
    private double[][] shiftedByBin(double[] function) {
        double[][] result = new double[frailty.bins()][grid.size()];
        double[] w = new double[ScoreGrid.POINTS];
        for (int z = 0; z < result.length; z++) {
            for (int n = 0; n < grid.size(); n++) {
                int first = grid.stencil(grid.score(n) + frailty.scores()[z], w);
                for (int j = 0; j < ScoreGrid.POINTS; j++) {
                    result[z][n] += w[j] * function[first + j];
                }
            }
        }
        return result;
    }

    /** Computes the weights and scores that the states of this level add, given the states of the levels before. */
    private Level open(int at) {
        Level level = levels[at];
        double[] weight = level.weight;
        double[] score = level.score;
        Arrays.fill(weight, 1);
        Arrays.fill(score, 0);
        for (Part part : level.factors) {
            int index = index(part);
            for (int s = 0; s < level.card; s++) {
                weight[s] *= part.values[index + s * part.ownStride];
            }
        }
        for (Part part : level.scores) {
            int index = index(part);
            for (int s = 0; s < level.card; s++) {
                score[s] += part.values[index + s * part.ownStride];
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
