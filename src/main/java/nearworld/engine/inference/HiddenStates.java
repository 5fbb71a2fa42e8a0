package nearworld.engine.inference;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeSet;
import org.jspecify.annotations.Nullable;

/**
 * A product of tables over hidden variables, run through with the distribution of the score.
 *
 * <p>What the evidence couples is enumerated; variables that only hang on through the network are summed out first by
 * {@link ScoreElimination} and come back as a distribution of their part of the score, given the variables that they hang on.
 */
public final class HiddenStates {
    /** Up to so many states it does not pay to split. */
    private static final double SMALL = 30_000;
    /** How many enumerated states cost as much as one state of the frontier, roughly: measured. */
    private static final double STATES_PER_FRONTIER = 30;

    /** Branches below this part of the whole are left out: there are far fewer than a million of them. */
    private static final double NEGLIGIBLE = 1e-18;

    private final ScoreGrid grid;
    private final int[] cards;
    private final List<Factor> factors = new ArrayList<>();
    private final List<Factor> scores = new ArrayList<>();
    private final List<Exposure> exposures;
    private final FrailtyWeights frailty;
    private final double negligible;
    private final double constant;
    private final TreeSet<Integer> rest;
    private final List<Factor> restFactors = new ArrayList<>();
    private final List<Factor> restScores = new ArrayList<>();
    private final @Nullable ScoreTable restTable;
    private final int[] outer;
    private final int[] inner;

    /**
     * @param exposures of the observed windows
     * @param frailty the bins' weights and scores
     * @param mass what the whole is known to weigh, so that what is below rounding can be left out; 0: not known
     * @param outerWanted variables whose states the visitor needs to see
     * @param loose variables that may be summed out beforehand: seen by no factor of the evidence but their own
     */
    public HiddenStates(
            List<Factor> allFactors,
            List<Factor> allScores,
            List<Exposure> exposures,
            FrailtyWeights frailty,
            double mass,
            int[] cards,
            ScoreGrid grid,
            TreeSet<Integer> outerWanted,
            TreeSet<Integer> loose) {
        this.grid = grid;
        this.cards = cards;
        this.exposures = exposures;
        this.frailty = frailty;
        TreeSet<Integer> all = new TreeSet<>(outerWanted);
        exposures.forEach(e -> all.addAll(e.rates().keySet()));
        for (List<Factor> some : List.of(allFactors, allScores)) {
            for (Factor f : some) {
                Arrays.stream(f.scope()).forEach(all::add);
            }
        }
        this.rest = chooseRest(allFactors, allScores, all, outerWanted, loose);
        split(allFactors, factors, restFactors);
        split(allScores, scores, restScores);
        this.constant = takeConstant();
        this.negligible = mass * NEGLIGIBLE / constant;
        ScoreElimination elimination = new ScoreElimination(restFactors, restScores, cards, grid);
        this.restTable = rest.isEmpty() ? null : elimination.sumOut(elimination.order(rest));
        TreeSet<Integer> outerSet = new TreeSet<>(outerWanted);
        if (restTable != null) {
            Arrays.stream(restTable.scope()).forEach(outerSet::add);
        }
        all.removeAll(rest);
        all.removeAll(outerSet);
        this.outer = outerSet.stream().mapToInt(Integer::intValue).toArray();
        this.inner = all.stream().mapToInt(Integer::intValue).toArray();
    }

    private TreeSet<Integer> chooseRest(
            List<Factor> allFactors,
            List<Factor> allScores,
            TreeSet<Integer> all,
            TreeSet<Integer> outerWanted,
            TreeSet<Integer> loose) {
        TreeSet<Integer> candidates = new TreeSet<>(loose);
        candidates.retainAll(all);
        candidates.removeAll(outerWanted);
        double whole = 1;
        double core = 1;
        for (int v : all) {
            whole *= possibleStates(allFactors, v);
            core *= candidates.contains(v) ? 1 : possibleStates(allFactors, v);
        }
        if (candidates.isEmpty() || whole <= SMALL) {
            return new TreeSet<>();
        }
        ScoreElimination elimination = new ScoreElimination(
                mentioning(allFactors, candidates), mentioning(allScores, candidates), cards, grid);
        double cost = elimination.cost(elimination.order(candidates)) * STATES_PER_FRONTIER + core;
        return cost < whole ? candidates : new TreeSet<>();
    }

    private double possibleStates(List<Factor> allFactors, int variable) {
        int possible = cards[variable];
        for (Factor f : allFactors) {
            if (f.scope().length == 1 && f.scope()[0] == variable) {
                possible = Math.min(possible, (int)
                        Arrays.stream(f.values()).filter(v -> v != 0).count());
            }
        }
        return possible;
    }

    private static List<Factor> mentioning(List<Factor> some, TreeSet<Integer> variables) {
        return some.stream()
                .filter(f -> Arrays.stream(f.scope()).anyMatch(variables::contains))
                .toList();
    }

    private void split(List<Factor> all, List<Factor> core, List<Factor> loose) {
        for (Factor f : all) {
            (Arrays.stream(f.scope()).anyMatch(rest::contains) ? loose : core).add(f);
        }
    }

    private double takeConstant() {
        double product = 1;
        for (Factor f : factors) {
            product *= f.scope().length == 0 ? f.values()[0] : 1;
        }
        factors.removeIf(f -> f.scope().length == 0);
        return product;
    }

    /**
     * Visits the possible states of the outer variables with the weighted measure of the score of all others. States of
     * variables that are not outer are without meaning to the visitor.
     */
    public void forEach(StateEnumeration.Visitor visitor) {
        StateEnumeration enumeration = enumeration();
        ScoreMeasure whole = new ScoreMeasure(grid);
        enumeration.forEach((states, measure) -> {
            ScoreMeasure restMeasure = restTable == null ? null : restTable.at(states);
            if (restTable != null && restMeasure == null) {
                return;
            }
            whole.clear();
            if (restMeasure == null) {
                whole.addShifted(measure, 0, constant);
            } else if (restMeasure.to - restMeasure.from < measure.to - measure.from) {
                whole.addConvolution(measure, restMeasure, constant);
            } else {
                whole.addConvolution(restMeasure, measure, constant);
            }
            visitor.visit(states, whole);
        });
    }

    private StateEnumeration enumeration() {
        return new StateEnumeration(
                outer, inner, factors, scores, exposures, frailty, cards, grid, restTable == null ? negligible : 0);
    }

    /** Integrates a function of the score over all states, and by variable and state over those that have it. */
    public Marginals marginals(StateEnumeration.Integrand integrand) {
        if (restTable == null) {
            return scaled(enumeration().marginals(integrand));
        }
        double[] one = new double[grid.size()];
        Arrays.fill(one, 1);
        StateEnumeration.Integrand given = states -> {
            double[] function = integrand.at(states);
            return function == null ? one : function;
        };
        Map<ScoreMeasure, Map<double[], double[]>> known = new IdentityHashMap<>();
        Marginals result = scaled(enumeration().marginals(states -> {
            ScoreMeasure restMeasure = restTable.at(states);
            double[] function = java.util.Objects.requireNonNull(given.at(states));
            return restMeasure == null
                    ? new double[grid.size()]
                    : known.computeIfAbsent(restMeasure, r -> new IdentityHashMap<>())
                            .computeIfAbsent(function, f -> correlated(f, restMeasure));
        }));
        List<ScoreMeasure> demand = restDemand(given);
        for (int v : rest) {
            result.byState()[v] = restMarginal(v, demand);
        }
        return result;
    }

    /** The integral over all states, and by variable and state over the states in which the variable has it. */
    public record Marginals(double total, double[][] byState) {}

    private Marginals scaled(StateEnumeration.Marginals marginals) {
        for (double[] m : marginals.byState()) {
            for (int s = 0; m != null && s < m.length; s++) {
                m[s] *= constant;
            }
        }
        return new Marginals(marginals.total() * constant, marginals.byState());
    }

    /** G(B) = Σ_r H(r)·F(B + r): what a function is worth at a score to which the rest is still to be added. */
    private double[] correlated(double[] function, ScoreMeasure restMeasure) {
        double[] result = new double[grid.size()];
        for (int r = restMeasure.from; r < restMeasure.to; r++) {
            double w = restMeasure.weight[r];
            int steps = grid.wholeSteps(r);
            for (int n = 0; n < result.length; n++) {
                result[n] += w * function[Math.max(0, Math.min(n + steps, result.length - 1))];
            }
        }
        return result;
    }

    /** For each entry of the rest's table: the function that the rest's score is integrated against, as weights. */
    private List<ScoreMeasure> restDemand(StateEnumeration.Integrand integrand) {
        ScoreTable table = java.util.Objects.requireNonNull(restTable);
        List<ScoreMeasure> demand = new ArrayList<>();
        for (int e = 0; e < table.entries().length; e++) {
            demand.add(new ScoreMeasure(grid));
        }
        enumeration().forEach((states, measure) -> {
            int index = 0;
            for (int i = 0; i < table.scope().length; i++) {
                index = index * table.cards()[i] + states[table.scope()[i]];
            }
            double[] function = java.util.Objects.requireNonNull(integrand.at(states));
            double[] target = demand.get(index).weight;
            for (int r = 0; r < target.length; r++) {
                int steps = grid.wholeSteps(r);
                double sum = 0;
                for (int n = measure.from; n < measure.to; n++) {
                    sum += measure.weight[n] * function[Math.max(0, Math.min(n + steps, target.length - 1))];
                }
                target[r] += constant * sum;
            }
        });
        return demand;
    }

    private double[] restMarginal(int variable, List<ScoreMeasure> demand) {
        double[] result = new double[cards[variable]];
        for (int s = 0; s < result.length; s++) {
            int state = s;
            List<Factor> given = new ArrayList<>(restFactors);
            given.add(Factor.of(new int[] {variable}, cards, x -> x[0] == state ? 1 : 0));
            ScoreElimination elimination = new ScoreElimination(given, restScores, cards, grid);
            ScoreTable table = elimination.sumOut(elimination.order(rest));
            for (int e = 0; e < demand.size(); e++) {
                ScoreMeasure entry = table.entries()[e];
                result[s] += entry == null ? 0 : entry.integral(demand.get(e).weight);
            }
        }
        return result;
    }
}
