package nearworld.engine.counterfactual;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.TreeSet;
import nearworld.engine.inference.ConditionStates;
import nearworld.engine.inference.EvidenceFactors;
import nearworld.engine.inference.Factor;
import nearworld.engine.inference.Person;
import nearworld.engine.inference.PopulationPrior;
import nearworld.engine.network.EvidencePack.Link;

/**
 * The conditions of a what-if world beside those of the recorded one, sharing the hidden switches of the noisy-OR (Balke and
 * Pearl 1994): what was never there, or a behaviour that was always another, runs through the network to its descendants, and
 * only through its own links.
 *
 * <p>Each descendant has a variable of its own for the what-if world; all other conditions are the same in both.
 */
final class TwinNetwork {
    private final Person person;
    private final WhatIfPlan plan;
    private final ConditionStates states;
    private final long affected;
    private final int[] twinVariable;
    private final int[] cards;
    private final int[] inOrder;
    private final Map<Integer, Factor> transitions = new TreeMap<>();

    TwinNetwork(Person person, WhatIfPlan plan, ConditionStates states, EvidenceFactors evidence) {
        this.person = person;
        this.plan = plan;
        this.states = states;
        this.affected = affected(person, plan);
        int variables = evidence.cards().length;
        this.twinVariable = new int[person.pack().conditions().size()];
        for (int i = 0; i < twinVariable.length; i++) {
            twinVariable[i] = isAffected(i) ? variables++ : -1;
        }
        this.cards = Arrays.copyOf(evidence.cards(), variables);
        Arrays.fill(cards, evidence.cards().length, variables, 2);
        this.inOrder = Arrays.stream(person.prior().topological())
                .filter(this::isAffected)
                .toArray();
        for (int i = 0; i < twinVariable.length; i++) {
            if (isAffected(i)) {
                transitions.put(i, transition(i, evidence));
            }
        }
    }

    /** The descendants of what is changed without a date, those that never were excepted; as a bit set. */
    static long affected(Person person, WhatIfPlan plan) {
        long set = 0;
        for (int i : person.prior().topological()) {
            for (Link l : person.pack().conditions().get(i).causedBy()) {
                boolean changed = l.fromBehaviour()
                        ? plan.always().containsKey(l.behaviour())
                        : ((set | plan.never()) >> l.parent() & 1) != 0;
                set |= changed && (plan.never() >> i & 1) == 0 ? 1L << i : 0;
            }
        }
        return set;
    }

    private boolean isAffected(int condition) {
        return (affected >> condition & 1) != 0;
    }

    /** The recorded world's variables that the what-if world's conditions depend on. */
    TreeSet<Integer> dependsOn() {
        TreeSet<Integer> variables = new TreeSet<>();
        int recorded = cards.length - inOrder.length;
        for (Factor f : transitions.values()) {
            Arrays.stream(f.scope()).filter(v -> v < recorded).forEach(variables::add);
        }
        return variables;
    }

    /** What is done with a state of the what-if world's conditions and its probability given the recorded state. */
    interface Visitor {
        void visit(int[] stateOfVariable, double probability);
    }

    /**
     * Visits the what-if world's states that go with a recorded state.
     *
     * @param recorded states by variable, read where {@link #dependsOn()} says
     * @param negligible states of a probability up to this are left out
     */
    void forEach(int[] recorded, double negligible, Visitor visitor) {
        descend(0, Arrays.copyOf(recorded, cards.length), 1, negligible, visitor);
    }

    private void descend(int at, int[] states, double probability, double negligible, Visitor visitor) {
        if (at == inOrder.length) {
            visitor.visit(states, probability);
            return;
        }
        int condition = inOrder[at];
        Factor transition = java.util.Objects.requireNonNull(transitions.get(condition));
        for (int s = 0; s < 2; s++) {
            states[twinVariable[condition]] = s;
            double reached = probability * transition.at(states);
            if (reached > negligible) {
                descend(at + 1, states, reached, negligible, visitor);
            }
        }
    }

    /** Whether a condition is present before all occurrences in the what-if world. */
    boolean before(int condition, int[] stateOfVariable) {
        if ((plan.never() >> condition & 1) != 0) {
            return false;
        }
        return isAffected(condition)
                ? stateOfVariable[twinVariable[condition]] == 1
                : states.before(condition, stateOfVariable[person.prior().conditionVariable(condition)]);
    }

    /**
     * P(c′ | c, pa, pa′): with c present it is lost only if leak and remaining links were off and a lost link was on; with c
     * absent it appears only by a new link.
     */
    private Factor transition(int condition, EvidenceFactors evidence) {
        PopulationPrior prior = person.prior();
        List<Integer> scope = new ArrayList<>();
        scope.add(prior.conditionVariable(condition));
        scope.add(twinVariable[condition]);
        for (Link l : person.pack().conditions().get(condition).causedBy()) {
            scope.add(prior.parentVariable(l));
            if (!l.fromBehaviour() && isAffected(l.parent())) {
                scope.add(twinVariable[l.parent()]);
            }
        }
        int[] variables = scope.stream().mapToInt(Integer::intValue).distinct().toArray();
        int[] all = new int[cards.length];
        return Factor.of(variables, cards, s -> {
            for (int k = 0; k < variables.length; k++) {
                all[variables[k]] = s[k];
            }
            boolean present = states.before(condition, s[0]);
            double presentThen = present ? 1 - lost(condition, evidence, all) : gained(condition, all);
            return s[1] == 1 ? presentThen : 1 - presentThen;
        });
    }

    private double lost(int condition, EvidenceFactors evidence, int[] all) {
        double absentThen = evidence.absentGiven(condition, l -> activeThen(l, all));
        double absent = evidence.absentGiven(condition, l -> active(l, all));
        double lostLinksOff = linksOff(condition, l -> active(l, all) && !activeThen(l, all));
        return absent == 1 ? 0 : absentThen * (1 - lostLinksOff) / (1 - absent);
    }

    private double gained(int condition, int[] all) {
        return 1 - linksOff(condition, l -> activeThen(l, all) && !active(l, all));
    }

    private double linksOff(int condition, java.util.function.Predicate<Link> counted) {
        double off = 1;
        List<Link> links = person.pack().conditions().get(condition).causedBy();
        for (int l = 0; l < links.size(); l++) {
            off *= counted.test(links.get(l)) ? 1 - person.prior().link(condition, l) : 1;
        }
        return off;
    }

    private boolean active(Link link, int[] all) {
        int state = all[person.prior().parentVariable(link)];
        return link.fromBehaviour() ? state == link.parent() : states.before(link.parent(), state);
    }

    private boolean activeThen(Link link, int[] all) {
        Map<Integer, Integer> always = plan.always();
        if (link.fromBehaviour()) {
            int level = always.getOrDefault(link.behaviour(), all[link.behaviour()]);
            return level == link.parent();
        }
        return before(link.parent(), all);
    }
}
