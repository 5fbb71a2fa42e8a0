package nearworld.engine.inference;

import java.util.TreeSet;

/** What the evidence makes of the prior: its probability, and that of each condition. */
public final class Posterior {
    private final Person person;
    private final ConditionStates states;
    private final EvidenceFactors factors;
    private final HiddenStates hidden;
    private final long rows;
    private final double[] conditions;
    private final double evidence;

    public Posterior(Person person) {
        this.person = person;
        this.states = new ConditionStates(person.pack(), person.evidence().occurrences(), false);
        this.factors = person.factors(states, true);
        this.rows = person.scores().withPartners(person.mayBeBroughtOn()) | person.withExcess();
        TreeSet<Integer> outer = person.variables(rows);
        TreeSet<Integer> loose = person.variables(~rows);
        loose.removeAll(factors.coupled());
        this.hidden = new HiddenStates(
                factors.factors(),
                person.scores().terms(person.prior(), states, factors.cards()),
                factors.exposures(),
                factors.frailty(),
                0,
                factors.cards(),
                person.baseline().grid(),
                outer,
                loose);
        HiddenStates.Marginals marginals =
                hidden.marginals(s -> person.aftermath().isNeutral() ? null : aftermath(person, states, rows, s));
        this.evidence = marginals.total();
        this.conditions = new double[person.pack().conditions().size()];
        for (int i = 0; i < conditions.length; i++) {
            double[] mass = marginals.byState()[person.prior().conditionVariable(i)];
            for (int s = 0; s < mass.length; s++) {
                conditions[i] += states.before(i, s) || states.switches(i, s) != 0 ? mass[s] / evidence : 0;
            }
        }
    }

    /** The aftermath's factor for the states of the conditions that are told apart. */
    public static double[] aftermath(Person person, ConditionStates states, long told, int[] stateOfVariable) {
        long before = 0;
        for (int i = 0; i < person.pack().conditions().size(); i++) {
            boolean present = (told >> i & 1) != 0
                    && states.before(i, stateOfVariable[person.prior().conditionVariable(i)]);
            before |= present ? 1L << i : 0;
        }
        return person.aftermath()
                .factor(before, states, i -> stateOfVariable[person.prior().conditionVariable(i)]);
    }

    /** Whether the evidence can be at all. */
    public boolean isPossible() {
        return evidence > 0 && evidence < Double.POSITIVE_INFINITY;
    }

    /** ln P(evidence). */
    public double logEvidence() {
        return StrictMath.log(evidence) - person.aftermath().addedHazard();
    }

    /** P(evidence) without the added hazards, which are the same for every state: the mass that worlds start with. */
    public double mass() {
        return evidence;
    }

    /** The probability of a condition today, what occurrences brought on included. */
    public double condition(int condition) {
        return conditions[condition];
    }

    /** The hidden states told apart by those conditions that worlds look at. */
    public HiddenStates hidden() {
        return hidden;
    }

    public ConditionStates states() {
        return states;
    }

    /** The conditions whose states {@link #hidden()} tells apart, as a bit set. */
    public long rows() {
        return rows;
    }

    /** The evidence's tables over {@link #states()}. */
    public EvidenceFactors factors() {
        return factors;
    }
}
