package nearworld.engine.inference;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeSet;
import nearworld.engine.network.EvidencePack;
import nearworld.engine.network.EvidencePack.Excess;

/** The distribution of score and added rates in the population that the table describes: what the baseline is solved for. */
final class Population {
    private final List<ScoreMeasure> classes = new ArrayList<>();
    private final double[] excess;

    /**
     * @param smoking index of the behaviour that the table is split by, or -1
     * @param smokingLevels its levels in the table's class
     */
    Population(PopulationPrior prior, Scores scores, ScoreGrid grid, int smoking, List<Integer> smokingLevels) {
        EvidencePack pack = prior.pack();
        ConditionStates states = new ConditionStates(pack, List.of(), false);
        int[] cards = prior.cards();
        List<Factor> factors = new ArrayList<>(prior.factors());
        if (smoking >= 0) {
            double share = smokingLevels.stream()
                    .mapToDouble(l -> prior.share(smoking, l))
                    .sum();
            factors.add(Factor.of(new int[] {smoking}, cards, s -> smokingLevels.contains(s[0]) ? 1 / share : 0));
        }
        TreeSet<Integer> withExcess = new TreeSet<>();
        TreeSet<Integer> loose = new TreeSet<>();
        for (int b = 0; b < pack.behaviours().size(); b++) {
            loose.add(b);
        }
        for (int i = 0; i < pack.conditions().size(); i++) {
            (pack.conditions().get(i).excess() == null ? loose : withExcess).add(prior.conditionVariable(i));
        }
        Map<Double, ScoreMeasure> byRate = new LinkedHashMap<>();
        new HiddenStates(
                        factors,
                        scores.terms(prior, states, cards),
                        List.of(),
                        prior.frailtyWeights(),
                        1,
                        cards,
                        grid,
                        withExcess,
                        loose)
                .forEach((state, measure) -> {
                    double rate = 0;
                    for (int v : withExcess) {
                        Excess e = pack.conditions()
                                .get(v - pack.behaviours().size())
                                .excess();
                        rate += state[v] == 1 && e != null ? e.unknown().value() / 1000 : 0;
                    }
                    byRate.computeIfAbsent(rate, r -> new ScoreMeasure(grid)).addShifted(measure, 0, 1);
                });
        this.excess = byRate.keySet().stream().mapToDouble(Double::doubleValue).toArray();
        classes.addAll(byRate.values());
        classes.forEach(ScoreMeasure::trim);
    }

    /** The population by its added rate. */
    List<ScoreMeasure> classes() {
        return classes;
    }

    /** The added rate of death of each class, a year. */
    double[] excess() {
        return excess;
    }
}
