package nearworld.engine.inference;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import nearworld.engine.basics.AgeCurve;
import nearworld.engine.basics.Fault;
import nearworld.engine.basics.GammaBins;
import nearworld.engine.basics.Sex;
import nearworld.engine.network.EvidencePack;
import nearworld.engine.network.EvidencePack.Behaviour;
import nearworld.engine.network.EvidencePack.Condition;
import nearworld.engine.network.EvidencePack.Link;

/**
 * The prior P(u) of a sex at an age: shares of behaviours, the noisy-OR network of the conditions with its solved leaks, the
 * bins of the frailty.
 *
 * <p>Variables are numbered: behaviours first, then conditions. The frailty is no variable of its own: its bins are taken together.
 */
public final class PopulationPrior {
    private final EvidencePack pack;
    private final Sex sex;
    private final double age;
    private final int[] cards;
    private final double[][] shares;
    private final double[] prevalences;
    private final double[] withoutLeak;
    private final double[][] links;
    private final int[] topological;
    private final double[] frailty;
    private final List<Factor> factors = new ArrayList<>();
    private final List<Fault> faults = new ArrayList<>();

    /** Solves the leaks; {@link #faults()} says where that is not possible. */
    public PopulationPrior(EvidencePack pack, Sex sex, double age) {
        this.pack = pack;
        this.sex = sex;
        this.age = age;
        int behaviours = pack.behaviours().size();
        int conditions = pack.conditions().size();
        this.frailty = GammaBins.means(
                pack.frailty().variance().value(), pack.frailty().points());
        this.cards = new int[behaviours + conditions];
        this.shares = new double[behaviours][];
        for (int b = 0; b < behaviours; b++) {
            cards[b] = pack.behaviours().get(b).levels().size();
            shares[b] = shares(pack.behaviours().get(b));
            double[] share = shares[b];
            factors.add(Factor.of(new int[] {b}, cards, s -> share[s[0]]));
        }
        Arrays.fill(cards, behaviours, behaviours + conditions, 2);
        this.prevalences = new double[conditions];
        this.withoutLeak = new double[conditions];
        this.links = new double[conditions][];
        this.topological = topologicalOrder(pack);
        for (int i : topological) {
            solveLeak(i);
        }
    }

    private double[] shares(Behaviour behaviour) {
        List<AgeCurve> curves =
                behaviour.levels().stream().map(l -> l.share().get(sex)).toList();
        return sharesAt(curves, age);
    }

    /** Shares interpolated in the logarithm and made to sum to 1. */
    static double[] sharesAt(List<AgeCurve> curves, double age) {
        double[] share = new double[curves.size()];
        double sum = 0;
        for (int l = 0; l < share.length; l++) {
            share[l] = curves.get(l).at(age);
            sum += share[l];
        }
        for (int l = 0; l < share.length; l++) {
            share[l] /= sum;
        }
        return share;
    }

    private void solveLeak(int i) {
        Condition condition = pack.conditions().get(i);
        prevalences[i] = condition.prevalence().get(sex).at(age);
        List<Link> causes = condition.causedBy();
        links[i] = new double[causes.size()];
        List<Factor> expectation = new ArrayList<>(factors);
        for (int l = 0; l < causes.size(); l++) {
            Link link = causes.get(l);
            links[i][l] = link.probability().value();
            double w = links[i][l];
            int variable = parentVariable(link);
            int active = activeState(link);
            expectation.add(Factor.of(new int[] {variable}, cards, s -> s[0] == active ? 1 - w : 1));
        }
        double unlinked = causes.isEmpty() ? 1 : Elimination.total(relevant(expectation), cards);
        withoutLeak[i] = (1 - prevalences[i]) / unlinked;
        if (!(withoutLeak[i] <= 1)) {
            faults.add(new Fault(
                    "linksExceedPrevalence",
                    "$.conditions." + condition.id() + ".causedBy",
                    java.util.Map.of(
                            "condition", condition.id(),
                            "sex", sex.name().toLowerCase(java.util.Locale.ROOT),
                            "age", String.valueOf(age),
                            "prevalence", String.valueOf(prevalences[i]),
                            "explained", String.valueOf(1 - unlinked))));
            withoutLeak[i] = 1;
        }
        factors.add(conditionFactor(i));
    }

    /** Factors of ancestors only: a network's factor sums to 1 over a child that nothing asks for. */
    private List<Factor> relevant(List<Factor> all) {
        int networkSize = factors.size();
        boolean[] asked = new boolean[cards.length];
        for (Factor f : all.subList(networkSize, all.size())) {
            for (int v : f.scope()) {
                asked[v] = true;
            }
        }
        List<Factor> kept = new ArrayList<>(all.subList(networkSize, all.size()));
        for (int f = networkSize - 1; f >= 0; f--) {
            int child = f < shares.length ? f : conditionVariable(topological[f - shares.length]);
            if (asked[child]) {
                kept.add(all.get(f));
                for (int v : all.get(f).scope()) {
                    asked[v] = true;
                }
            }
        }
        return kept;
    }

    private Factor conditionFactor(int i) {
        List<Link> causes = pack.conditions().get(i).causedBy();
        int[] scope = factorScope(i);
        return Factor.of(scope, cards, s -> {
            double absent = withoutLeak[i];
            for (int l = 0; l < causes.size(); l++) {
                int place = placeOf(scope, parentVariable(causes.get(l)));
                absent *= s[place] == activeState(causes.get(l)) ? 1 - links[i][l] : 1;
            }
            return s[0] == 1 ? 1 - absent : absent;
        });
    }

    /** The condition's variable first, then its parents'. */
    public int[] factorScope(int i) {
        return java.util.stream.IntStream.concat(
                        java.util.stream.IntStream.of(conditionVariable(i)),
                        pack.conditions().get(i).causedBy().stream().mapToInt(this::parentVariable))
                .distinct()
                .toArray();
    }

    public static int placeOf(int[] scope, int variable) {
        for (int p = 0; p < scope.length; p++) {
            if (scope[p] == variable) {
                return p;
            }
        }
        throw new IllegalArgumentException("variable " + variable + " is not in the scope");
    }

    private static int[] topologicalOrder(EvidencePack pack) {
        int n = pack.conditions().size();
        int[] order = new int[n];
        boolean[] done = new boolean[n];
        int at = 0;
        while (at < n) {
            int before = at;
            for (int i = 0; i < n; i++) {
                if (!done[i]
                        && pack.conditions().get(i).causedBy().stream()
                                .allMatch(l -> l.fromBehaviour() || done[l.parent()])) {
                    done[i] = true;
                    order[at++] = i;
                }
            }
            if (at == before) {
                throw new IllegalArgumentException("conditions must not cause each other in a circle");
            }
        }
        return order;
    }

    /** E_P of a product of factors over single variables, P the population's prior. */
    double expectation(List<Factor> unary) {
        List<Factor> all = new ArrayList<>(factors);
        all.addAll(unary);
        return Elimination.total(relevant(all), cards);
    }

    /** The prior weighted by factors over single variables, as a table over the kept variables. */
    Factor weighted(List<Factor> unary, int[] keep) {
        List<Factor> all = new ArrayList<>(factors);
        all.addAll(unary);
        for (int v : keep) {
            all.add(Factor.of(new int[] {v}, cards, s -> 1));
        }
        return Elimination.marginal(relevant(all), keep, cards);
    }

    /** The network's tables: shares of behaviours, conditions given their parents. */
    List<Factor> factors() {
        return factors;
    }

    public List<Fault> faults() {
        return faults;
    }

    public EvidencePack pack() {
        return pack;
    }

    public Sex sex() {
        return sex;
    }

    /** x, the age in years that the prior speaks for. */
    public double age() {
        return age;
    }

    public int[] cards() {
        return cards;
    }

    public double share(int behaviour, int level) {
        return shares[behaviour][level];
    }

    public double prevalence(int condition) {
        return prevalences[condition];
    }

    /** 1 − leak of a condition. */
    double withoutLeak(int condition) {
        return withoutLeak[condition];
    }

    public double link(int condition, int link) {
        return links[condition][link];
    }

    /** The frailty's bins, each of the same probability. */
    public double[] frailty() {
        return frailty;
    }

    public int[] topological() {
        return topological;
    }

    public int conditionVariable(int condition) {
        return shares.length + condition;
    }

    /** The bins without any evidence. */
    public FrailtyWeights frailtyWeights() {
        double[] weights = new double[frailty.length];
        Arrays.fill(weights, 1.0 / frailty.length);
        return new FrailtyWeights(
                weights, Arrays.stream(frailty).map(StrictMath::log).toArray());
    }

    public int parentVariable(Link link) {
        return link.fromBehaviour() ? link.behaviour() : conditionVariable(link.parent());
    }

    public int activeState(Link link) {
        return link.fromBehaviour() ? link.parent() : 1;
    }

    /** ω: the probability that what is there now was there at an age. */
    double presentAt(int condition, double atAge) {
        return Math.min(
                1, pack.conditions().get(condition).prevalence().get(sex).at(atAge) / prevalences[condition]);
    }
}
