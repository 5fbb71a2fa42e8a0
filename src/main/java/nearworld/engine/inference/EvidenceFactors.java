package nearworld.engine.inference;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.TreeSet;
import nearworld.engine.basics.AgeCurve;
import nearworld.engine.network.EvidencePack;
import nearworld.engine.network.EvidencePack.ConditionFactor;
import nearworld.engine.network.EvidencePack.EventType;
import nearworld.engine.network.EvidencePack.Finding;
import nearworld.engine.network.EvidencePack.FindingLevel;
import nearworld.engine.network.EvidencePack.LevelFactor;
import nearworld.engine.network.EvidencePack.Link;
import nearworld.engine.network.EvidencePack.Source;

/**
 * The prior and the likelihood of the evidence as tables over the hidden state: behaviours, conditions with their switches,
 * frailty. What the aftermath of occurrences adds is no table but a function of the score: see {@link Aftermath}.
 */
public final class EvidenceFactors {
    private final PopulationPrior prior;
    private final EvidencePack pack;
    private final Evidence evidence;
    private final ConditionStates states;
    private final int[] cards;
    private final List<Factor> factors = new ArrayList<>();
    private final List<Exposure> exposures = new ArrayList<>();
    private final FrailtyWeights frailtyWeights;
    private final int priorFactors;
    private final double[][] presentAtOccurrence;
    private final long[] earlier;

    /**
     * @param learned false: the prior alone, with the switches of the occurrences
     * @param moments the moment of each occurrence, in their order
     * @param windows the moment in the middle of each window, in their order
     */
    public EvidenceFactors(
            PopulationPrior prior,
            Evidence evidence,
            ConditionStates states,
            List<EventMoment> moments,
            List<EventMoment> windows,
            boolean learned) {
        this.prior = prior;
        this.pack = prior.pack();
        this.evidence = evidence;
        this.states = states;
        this.cards = prior.cards().clone();
        for (int i = 0; i < pack.conditions().size(); i++) {
            cards[prior.conditionVariable(i)] = states.states(i);
        }
        this.frailtyWeights = prior.frailtyWeights();
        int occurrences = evidence.occurrences().size();
        this.presentAtOccurrence = new double[occurrences][pack.conditions().size()];
        this.earlier = new long[occurrences];
        for (int j = 0; j < occurrences; j++) {
            long day = evidence.occurrences().get(j).day();
            earlier[j] = states.occurrencesBefore(day, false);
            for (int i = 0; i < pack.conditions().size(); i++) {
                presentAtOccurrence[j][i] = presentOn(i, day);
            }
        }
        addPrior(learned);
        this.priorFactors = factors.size();
        if (learned) {
            addStatements();
            addFindings();
            for (int w = 0; w < windows.size(); w++) {
                addWindow(evidence.windows().get(w), windows.get(w));
            }
            for (int j = 0; j < moments.size(); j++) {
                addOccurrence(j, moments.get(j));
            }
        }
    }

    /** The tables, those of the prior first. */
    public List<Factor> factors() {
        return factors;
    }

    /** The exposures of the observed windows. */
    public List<Exposure> exposures() {
        return exposures;
    }

    /** The bins of the frailty with what the occurrences say of them. */
    public FrailtyWeights frailty() {
        return frailtyWeights;
    }

    /** The number of states of each variable. */
    public int[] cards() {
        return cards;
    }

    /** The variables that the evidence ties to others. */
    public TreeSet<Integer> coupled() {
        TreeSet<Integer> coupled = new TreeSet<>();
        for (Factor f : factors.subList(priorFactors, factors.size())) {
            if (f.scope().length > 1) {
                Arrays.stream(f.scope()).forEach(coupled::add);
            }
        }
        exposures.forEach(e -> coupled.addAll(e.rates().keySet()));
        return coupled;
    }

    private void addPrior(boolean learned) {
        for (int b = 0; b < pack.behaviours().size(); b++) {
            int behaviour = b;
            int known = learned ? evidence.levels().get(b) : -1;
            add(new int[] {b}, s -> known < 0 || s[0] == known ? prior.share(behaviour, s[0]) : 0);
        }
        for (int i = 0; i < pack.conditions().size(); i++) {
            int condition = i;
            add(new int[] {prior.conditionVariable(i)}, s -> states.probability(condition, s[0]));
            int[] scope = prior.factorScope(i);
            add(scope, s -> noisyOr(condition, scope, s));
        }
    }

    private double noisyOr(int condition, int[] scope, int[] s) {
        double absent = absentGiven(condition, link -> {
            int state = s[PopulationPrior.placeOf(scope, prior.parentVariable(link))];
            return link.fromBehaviour() ? state == link.parent() : states.before(link.parent(), state);
        });
        return states.before(condition, s[0]) ? 1 - absent : absent;
    }

    /** (1 − leak)·Π (1 − w) over the active links. */
    public double absentGiven(int condition, java.util.function.Predicate<Link> active) {
        double absent = prior.withoutLeak(condition);
        List<Link> links = pack.conditions().get(condition).causedBy();
        for (int l = 0; l < links.size(); l++) {
            absent *= active.test(links.get(l)) ? 1 - prior.link(condition, l) : 1;
        }
        return absent;
    }

    private void add(int[] scope, java.util.function.ToDoubleFunction<int[]> function) {
        factors.add(Factor.of(scope, cards, function));
    }

    /** ω of this person: 0 or 1 where the onset is dated. */
    public double presentOn(int condition, long day) {
        long onset = evidence.onsetDay().get(condition);
        if (onset != Evidence.NO_DAY) {
            return day >= onset ? 1 : 0;
        }
        double age = evidence.age(day);
        return age >= prior.age() ? 1 : prior.presentAt(condition, age);
    }

    /** The probability that a condition was there on a day, what that day's occurrences brought on included. */
    private double presence(int condition, int state, long day) {
        long upTo = states.occurrencesBefore(day, true);
        if ((states.switches(condition, state) & upTo) != 0) {
            return 1;
        }
        return states.before(condition, state) ? presentOn(condition, day) : 0;
    }

    private void addStatements() {
        for (int i = 0; i < pack.conditions().size(); i++) {
            int condition = i;
            List<Evidence.Said> said = evidence.statements().stream()
                    .filter(s -> s.condition() == condition)
                    .toList();
            if (!said.isEmpty()) {
                AgeCurve curve = pack.conditions().get(i).diagnosedShare();
                double diagnosed = curve == null ? 1 : curve.at(prior.age());
                add(
                        new int[] {prior.conditionVariable(i)},
                        s -> diagnosed * likelihood(said, condition, s[0], true)
                                + (1 - diagnosed) * likelihood(said, condition, s[0], false));
            }
        }
    }

    private double likelihood(List<Evidence.Said> said, int condition, int state, boolean diagnosed) {
        double product = 1;
        for (Evidence.Said statement : said) {
            Source source = pack.sources().get(statement.source());
            double yesIfAbsent = 1 - source.specificity(condition).value();
            boolean seen = diagnosed || !source.seesDiagnosed();
            double yesIfPresent = seen ? source.sensitivity(condition).value() : yesIfAbsent;
            double present = presence(condition, state, statement.day());
            double yes = present * yesIfPresent + (1 - present) * yesIfAbsent;
            product *= statement.present() ? yes : 1 - yes;
        }
        return product;
    }

    private void addFindings() {
        for (Evidence.Found found : evidence.findings()) {
            Finding finding = pack.findings().get(found.finding());
            FindingLevel level = finding.levels().get(found.level());
            if (finding.of().size() == 1) {
                int condition = finding.of().get(0);
                add(new int[] {prior.conditionVariable(condition)}, s -> {
                    double present = presence(condition, s[0], found.day());
                    return present * level.present().get(0).value()
                            + (1 - present) * level.absent().value();
                });
            } else {
                addJointFinding(finding, found);
            }
        }
    }

    /** A finding of several conditions: a noisy-OR of its first level. */
    private void addJointFinding(Finding finding, Evidence.Found found) {
        int[] scope = finding.of().stream().mapToInt(prior::conditionVariable).toArray();
        FindingLevel first = finding.levels().get(0);
        double absent = first.absent().value();
        add(scope, s -> {
            double none = 1 - absent;
            for (int k = 0; k < scope.length; k++) {
                double present = presence(finding.of().get(k), s[k], found.day());
                double kept = (1 - first.present().get(k).value()) / (1 - absent);
                none *= present * kept + (1 - present);
            }
            return found.level() == 0 ? 1 - none : none;
        });
    }

    /** exp(−R/E[R]·∫λ), R at the middle of the window, by the state before all occurrences. */
    private void addWindow(Evidence.Window window, EventMoment moment) {
        EventType event = moment.event();
        double fromAge = evidence.age(window.from());
        double toAge = evidence.age(window.to());
        double expected = event.ratePerYear().get(evidence.sex()).integral(fromAge, toAge) / moment.meanRate();
        Map<Integer, double[]> rates = new TreeMap<>();
        for (LevelFactor r : event.behaviourRates()) {
            int b = r.behaviour();
            rates.computeIfAbsent(b, k -> byState(b, s -> levelRate(event, b, s)));
        }
        for (ConditionFactor r : event.conditionRates()) {
            int i = r.condition();
            double raised = conditionRate(event, i, presentAtAge(i, moment.age()));
            int variable = prior.conditionVariable(i);
            rates.computeIfAbsent(variable, k -> byState(variable, s -> states.before(i, s) ? raised : 1));
        }
        double[] byFrailty = Arrays.stream(prior.frailty())
                .map(z -> expected * moment.frailtyRate(z))
                .toArray();
        exposures.add(new Exposure(byFrailty, rates));
    }

    private double[] byState(int variable, java.util.function.IntToDoubleFunction value) {
        return java.util.stream.IntStream.range(0, cards[variable])
                .mapToDouble(value)
                .toArray();
    }

    private double presentAtAge(int condition, double age) {
        long onset = evidence.onsetDay().get(condition);
        if (onset != Evidence.NO_DAY) {
            return age >= evidence.age(onset) ? 1 : 0;
        }
        return prior.presentAt(condition, age);
    }

    public static double levelRate(EventType event, int behaviour, int level) {
        double rate = 1;
        for (LevelFactor r : event.behaviourRates()) {
            rate *= r.behaviour() == behaviour && r.level() == level
                    ? r.factor().value()
                    : 1;
        }
        return rate;
    }

    /** 1 + ω(r − 1) of a condition's rate ratio; 1 where it has none. */
    public static double conditionRate(EventType event, int condition, double present) {
        double rate = 1;
        for (ConditionFactor r : event.conditionRates()) {
            rate *= r.condition() == condition ? 1 + present * (r.factor().value() - 1) : 1;
        }
        return rate;
    }

    /** ω of a condition at the j-th occurrence, for this person. */
    public double presentAtOccurrence(int condition, int j) {
        return presentAtOccurrence[j][condition];
    }

    /** The weight with which a condition acts on an occurrence: 1 where an earlier one brought it on, else ω. */
    public double weightAt(int condition, int state, int j) {
        if ((states.switches(condition, state) & earlier[j]) != 0) {
            return 1;
        }
        return states.before(condition, state) ? presentAtOccurrence[j][condition] : 0;
    }

    /** R/E[R]·P(o | u) of an occurrence. */
    private void addOccurrence(int j, EventMoment moment) {
        Evidence.Occurrence occurrence = evidence.occurrences().get(j);
        EventType event = moment.event();
        for (int i : event.conditionRates().stream()
                .mapToInt(ConditionFactor::condition)
                .distinct()
                .toArray()) {
            add(new int[] {prior.conditionVariable(i)}, s -> conditionRate(event, i, weightAt(i, s[0], j)));
        }
        for (int b : event.behaviourRates().stream()
                .mapToInt(LevelFactor::behaviour)
                .distinct()
                .toArray()) {
            add(new int[] {b}, s -> levelRate(event, b, s[0]));
        }
        for (int z = 0; z < frailtyWeights.weights().length; z++) {
            frailtyWeights.weights()[z] *= moment.frailtyRate(prior.frailty()[z]) / moment.meanRate();
        }
        int[] conditions = moment.outcomeConditions();
        int[] scope = Arrays.stream(conditions).map(prior::conditionVariable).toArray();
        add(scope, s -> {
            double[] present = new double[conditions.length];
            for (int k = 0; k < present.length; k++) {
                present[k] = weightAt(conditions[k], s[k], j);
            }
            return moment.outcomeProbabilities(present)[occurrence.outcome()];
        });
    }
}
