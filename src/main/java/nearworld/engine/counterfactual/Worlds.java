package nearworld.engine.counterfactual;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.TreeSet;
import nearworld.engine.inference.Baseline;
import nearworld.engine.inference.ConditionStates;
import nearworld.engine.inference.Evidence;
import nearworld.engine.inference.EvidenceFactors;
import nearworld.engine.inference.HiddenStates;
import nearworld.engine.inference.Person;
import nearworld.engine.inference.Posterior;
import nearworld.engine.inference.ScoreMeasure;
import nearworld.engine.network.EvidencePack.ConditionFactor;
import nearworld.engine.network.EvidencePack.Outcome;
import org.jspecify.annotations.Nullable;

/** The worlds of a living person: who the people in them are today, and how long they live from there. */
public final class Worlds {
    /** Joint states of both worlds below this part of the whole are left out: a hundred thousand stay within 1e-8. */
    private static final double NEGLIGIBLE = 1e-13;

    private final Person person;
    private final Posterior posterior;
    private final Effects noEffects = Effects.none();

    public Worlds(Person person, Posterior posterior) {
        this.person = person;
        this.posterior = posterior;
    }

    /** The table itself. */
    public WorldCurve table() {
        Baseline baseline = person.baseline();
        List<Double> survival = new ArrayList<>();
        double lived = 0;
        for (int k = 0; k < baseline.months(); k++) {
            double s = baseline.tableSurvival(k);
            survival.add(s);
            double hazard = Double.isInfinite(baseline.hazard(k)) ? Double.NaN : baseline.tableHazard(k);
            lived += s * baseline.length(k) * (Double.isNaN(hazard) ? 0.5 : -expm1OverMinus(hazard));
        }
        survival.add(0.0);
        return new WorldCurve(survival, lived, 1, false);
    }

    private static double expm1OverMinus(double hazard) {
        return hazard < 1e-8 ? -1 + hazard / 2 : StrictMath.expm1(-hazard) / hazard;
    }

    /** The recorded world, and that of the events removed. */
    public record Revealed(WorldCurve recorded, WorldCurve eventsRemoved) {}

    /**
     * The posterior with all after-effects and switches on, and with no after-effects and all switches off: both from one run
     * through the hidden states.
     */
    public Revealed posteriorWorlds() {
        Strands recorded = new Strands(person.baseline().grid());
        Strands removed = new Strands(person.baseline().grid());
        Effects effects = recordedEffects();
        posterior.hidden().forEach((s, measure) -> {
            if (!person.aftermath().isNeutral()) {
                measure.multiply(Posterior.aftermath(person, posterior.states(), posterior.rows(), s));
            }
            add(recorded, posterior.states(), posterior.rows(), s, measure, true, effects);
            add(removed, posterior.states(), posterior.rows(), s, measure, false, noEffects);
        });
        return new Revealed(run(recorded), run(removed));
    }

    private WorldCurve run(Strands strands) {
        strands.trim();
        Habits habits = new Habits(
                person.pack(), person.scores(), person.evidence(), habits(person.evidence(), null), Map.of());
        return new Future(person, WhatIfPlan.none(""), habits, strands).run(1, false);
    }

    private void add(
            Strands strands,
            ConditionStates states,
            long told,
            int[] s,
            ScoreMeasure measure,
            boolean withEvents,
            Effects effects) {
        long before = 0;
        long present = 0;
        for (int i = 0; i < person.pack().conditions().size(); i++) {
            if ((told >> i & 1) != 0) {
                int state = s[person.prior().conditionVariable(i)];
                boolean was = states.before(i, state);
                before |= was ? 1L << i : 0;
                present |= was || (withEvents && states.switches(i, state) != 0) ? 1L << i : 0;
            }
        }
        double shift = person.scores().of(present) - person.scores().of(before);
        strands.at(new Strands.Key(present & person.withExcess(), 0, effects)).addShifted(measure, shift, 1);
    }

    private Effects recordedEffects() {
        Effects effects = noEffects;
        for (Evidence.Occurrence o : person.evidence().occurrences()) {
            Outcome outcome = person.pack().events().get(o.event()).outcomes().get(o.outcome());
            effects = effects.and(
                    Effect.of(outcome.afterEffect(), person.evidence().yearsFromToday(o.lastDay())));
        }
        return effects;
    }

    /** The prior with after-effects and switches on: what learns nothing from the history. */
    public WorldCurve unlearned() {
        ConditionStates states = posterior.states();
        EvidenceFactors prior = person.factors(states, false);
        Strands strands = new Strands(person.baseline().grid());
        Effects effects = recordedEffects();
        new HiddenStates(
                        prior.factors(),
                        person.scores().terms(person.prior(), states, prior.cards()),
                        prior.exposures(),
                        prior.frailty(),
                        1,
                        prior.cards(),
                        person.baseline().grid(),
                        person.variables(posterior.rows()),
                        person.variables(~posterior.rows()))
                .forEach((s, measure) -> add(strands, states, posterior.rows(), s, measure, true, effects));
        strands.trim();
        Habits none = new Habits(person.pack(), person.scores(), person.evidence(), List.of(), Map.of());
        return new Future(person, WhatIfPlan.none(""), none, strands).run(1, false);
    }

    /** A what-if: the posterior carried over by the twin network and by thinning, then lived on. */
    public WorldCurve whatIf(WhatIfPlan plan) {
        boolean undoes = !plan.undoesNothing();
        ConditionStates states =
                undoes ? new ConditionStates(person.pack(), person.evidence().occurrences(), true) : posterior.states();
        EvidenceFactors evidence = undoes ? person.factors(states, true) : posterior.factors();
        TwinNetwork twin = new TwinNetwork(person, plan, states, evidence);
        Thinning thinning = new Thinning(person, plan, states, evidence, twin);
        long tracked = Future.tracked(person, plan);
        long told = told(plan, tracked);
        TreeSet<Integer> outer = person.variables(told);
        outer.addAll(twin.dependsOn());
        outer.addAll(plan.always().keySet());
        outer.addAll(plan.habits().keySet());
        TreeSet<Integer> loose = person.variables(~told);
        loose.removeAll(evidence.coupled());
        HiddenStates hidden = new HiddenStates(
                evidence.factors(),
                person.scores().terms(person.prior(), states, evidence.cards()),
                evidence.exposures(),
                evidence.frailty(),
                posterior.mass(),
                evidence.cards(),
                person.baseline().grid(),
                outer,
                loose);
        Map<Integer, Habits.Change> changes = new TreeMap<>();
        plan.habits().forEach((b, h) -> changes.put(b, new Habits.Change(h.level(), h.from())));
        Habits habits =
                new Habits(person.pack(), person.scores(), person.evidence(), habits(person.evidence(), plan), changes);
        Strands strands = new Strands(person.baseline().grid());
        hidden.forEach((s, measure) -> {
            if (measure.size() < NEGLIGIBLE * posterior.mass()) {
                return;
            }
            if (!person.aftermath().isNeutral()) {
                measure.multiply(Posterior.aftermath(person, states, told, s));
            }
            double negligible = NEGLIGIBLE * posterior.mass() / Math.max(measure.size(), Double.MIN_NORMAL);
            twin.forEach(
                    s,
                    negligible,
                    (both, probability) -> place(
                            strands, plan, states, twin, thinning, habits, told, tracked, both, measure, probability));
        });
        strands.trim();
        double alive = strands.total() / posterior.mass();
        return new Future(person, plan, habits, strands).run(alive, thinning.newOccurrences());
    }

    private void place(
            Strands strands,
            WhatIfPlan plan,
            ConditionStates states,
            TwinNetwork twin,
            Thinning thinning,
            Habits habits,
            long told,
            long tracked,
            int[] s,
            ScoreMeasure measure,
            double probability) {
        double levels = 0;
        for (Map.Entry<Integer, Integer> b : plan.always().entrySet()) {
            levels += person.scores().level(b.getKey(), b.getValue())
                    - person.scores().level(b.getKey(), s[b.getKey()]);
        }
        long before = 0;
        for (int i = 0; i < person.pack().conditions().size(); i++) {
            boolean was =
                    (told >> i & 1) != 0 && states.before(i, s[person.prior().conditionVariable(i)]);
            before |= was ? 1L << i : 0;
        }
        for (Thinning.Course course : thinning.courses(s)) {
            long present = 0;
            for (int i = 0; i < person.pack().conditions().size(); i++) {
                if ((told >> i & 1) != 0 && (plan.never() >> i & 1) == 0) {
                    int state = s[person.prior().conditionVariable(i)];
                    boolean on = (states.switches(i, state) & course.kept()) != 0;
                    present |= on || twin.before(i, s) ? 1L << i : 0;
                }
            }
            double shift =
                    levels + person.scores().of(present) - person.scores().of(before);
            strands.at(new Strands.Key(present & tracked, habits.key(s), course.effects()))
                    .addShifted(measure, shift, probability * course.probability());
        }
    }

    /** The conditions whose states a what-if must tell apart. */
    private long told(WhatIfPlan plan, long tracked) {
        long differing = person.mayBeBroughtOn() | TwinNetwork.affected(person, plan) | plan.never();
        long told = person.scores().withPartners(differing) | tracked | person.withExcess();
        for (Evidence.Occurrence o : person.evidence().occurrences()) {
            long odds = 0;
            for (Outcome outcome : person.pack().events().get(o.event()).outcomes()) {
                for (ConditionFactor r : outcome.oddsRatios()) {
                    odds |= 1L << r.condition();
                }
            }
            told |= (odds & differing) != 0 ? odds : 0;
        }
        return told;
    }

    /** The habits given up that a world still knows: not those of behaviours that have always been at a level. */
    private static List<Evidence.GivenUp> habits(Evidence evidence, @Nullable WhatIfPlan plan) {
        return evidence.habits().stream()
                .filter(h -> plan == null || !plan.always().containsKey(h.behaviour()))
                .toList();
    }
}
