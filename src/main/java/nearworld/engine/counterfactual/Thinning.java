package nearworld.engine.counterfactual;

import java.util.ArrayList;
import java.util.List;
import nearworld.engine.inference.ConditionStates;
import nearworld.engine.inference.EventMoment;
import nearworld.engine.inference.Evidence;
import nearworld.engine.inference.EvidenceFactors;
import nearworld.engine.inference.Person;
import nearworld.engine.network.EvidencePack.ConditionFactor;
import nearworld.engine.network.EvidencePack.EventType;
import org.jspecify.annotations.Nullable;

/**
 * Which recorded occurrences stay in a what-if world, by thinning: each with probability min(1, R′/R), its outcome with
 * probability min(1, P′(o)/P(o)), else another one drawn ∝ (P′(o′) − P(o′))⁺. R′ and P′ count what the kept earlier
 * occurrences brought on.
 */
final class Thinning {
    /** R′/R above 1 by no more than this is rounding. */
    private static final double ROUNDING = 1e-12;

    private final Person person;
    private final WhatIfPlan plan;
    private final ConditionStates states;
    private final EvidenceFactors evidence;
    private final TwinNetwork twin;
    private final long[] earlierOccurrences;
    private final Effects root = Effects.none();
    private final @Nullable Effect[][] effects;
    private final int[] alwaysBehaviours;
    private final double[][][] alwaysRatios;
    private final @Nullable List<Course> onlyCourse;
    private boolean newOccurrences;

    /**
     * One way in which the occurrences may have gone.
     *
     * @param kept occurrences that stay, as a bit set
     * @param effects their after-effects, in their order
     */
    record Course(double probability, long kept, Effects effects) {}

    Thinning(Person person, WhatIfPlan plan, ConditionStates states, EvidenceFactors evidence, TwinNetwork twin) {
        this.person = person;
        this.plan = plan;
        this.states = states;
        this.evidence = evidence;
        this.twin = twin;
        this.earlierOccurrences = person.evidence().occurrences().stream()
                .mapToLong(o -> states.occurrencesBefore(o.day(), false))
                .toArray();
        this.effects = effects();
        this.alwaysBehaviours = plan.always().keySet().stream()
                .mapToInt(Integer::intValue)
                .sorted()
                .toArray();
        this.alwaysRatios = alwaysRatios();
        this.onlyCourse = plan.undoesNothing() ? List.of(nothingUndone()) : null;
    }

    /** All occurrences stay, with the outcomes and starts that the plan gives. */
    private Course nothingUndone() {
        List<Course> course = List.of(new Course(1, 0, root));
        for (int j = 0; j < person.evidence().occurrences().size(); j++) {
            List<Course> next = new ArrayList<>();
            int recorded = person.evidence().occurrences().get(j).outcome();
            add(j, course.get(0), 1, plan.outcomes().getOrDefault(j, recorded), next);
            course = next;
        }
        return course.get(0);
    }

    /** Whether some occurrence would have been more frequent than recorded. */
    boolean newOccurrences() {
        return newOccurrences;
    }

    /** The courses that leave the person alive today; their probabilities sum to at most 1. */
    List<Course> courses(int[] stateOfVariable) {
        if (onlyCourse != null) {
            return onlyCourse;
        }
        List<Course> courses = List.of(new Course(1, 0, root));
        for (int j = 0; j < person.evidence().occurrences().size(); j++) {
            List<Course> next = new ArrayList<>();
            for (Course c : courses) {
                extend(j, c, stateOfVariable, next);
            }
            courses = next;
        }
        return courses;
    }

    private void extend(int j, Course course, int[] s, List<Course> next) {
        if ((plan.removed() >> j & 1) != 0) {
            next.add(course);
            return;
        }
        double ratio = rateRatio(j, course.kept(), s);
        newOccurrences |= ratio > 1 + ROUNDING;
        double keep = Math.min(1, ratio);
        if (keep < 1) {
            next.add(new Course(course.probability() * (1 - keep), course.kept(), course.effects()));
        }
        if (keep > 0) {
            outcomes(j, course, course.probability() * keep, s, next);
        }
    }

    private void outcomes(int j, Course course, double probability, int[] s, List<Course> next) {
        EventMoment moment = person.moments().get(j);
        int recorded = person.evidence().occurrences().get(j).outcome();
        @Nullable Integer given = plan.outcomes().get(j);
        if (given != null) {
            add(j, course, probability, given, next);
            return;
        }
        int[] conditions = moment.outcomeConditions();
        double[] weights = new double[conditions.length];
        double[] weightsThen = new double[conditions.length];
        for (int k = 0; k < conditions.length; k++) {
            weights[k] = evidence.weightAt(conditions[k], state(conditions[k], s), j);
            weightsThen[k] = weightThen(conditions[k], j, course.kept(), s);
        }
        if (java.util.Arrays.equals(weights, weightsThen)) {
            add(j, course, probability, recorded, next);
            return;
        }
        double[] before = moment.outcomeProbabilities(weights);
        double[] after = moment.outcomeProbabilities(weightsThen);
        double stays = Math.min(1, after[recorded] / before[recorded]);
        add(j, course, probability * stays, recorded, next);
        double rising = 0;
        for (int o = 0; o < after.length; o++) {
            rising += Math.max(0, after[o] - before[o]);
        }
        for (int o = 0; o < after.length && stays < 1; o++) {
            double rise = Math.max(0, after[o] - before[o]);
            if (rise > 0 && !moment.event().outcomes().get(o).fatal()) {
                add(j, course, probability * (1 - stays) * rise / rising, o, next);
            }
        }
    }

    private void add(int j, Course course, double probability, int outcome, List<Course> next) {
        if (probability <= 0) {
            return;
        }
        next.add(new Course(
                probability, course.kept() | 1L << j, course.effects().and(effects[j][outcome])));
    }

    /** The after-effect of each outcome of each occurrence. */
    private @Nullable Effect[][] effects() {
        List<Evidence.Occurrence> occurrences = person.evidence().occurrences();
        @Nullable Effect[][] all = new Effect[occurrences.size()][];
        for (int j = 0; j < all.length; j++) {
            Evidence.Occurrence o = occurrences.get(j);
            double start = plan.moved().getOrDefault(j, person.evidence().yearsFromToday(o.lastDay()));
            all[j] = person.pack().events().get(o.event()).outcomes().stream()
                    .map(outcome -> Effect.of(outcome.afterEffect(), start))
                    .toArray(Effect[]::new);
        }
        return all;
    }

    /** What the behaviours that have always been another make of R, by occurrence, behaviour and recorded level. */
    private double[][][] alwaysRatios() {
        List<Evidence.Occurrence> occurrences = person.evidence().occurrences();
        double[][][] ratios = new double[occurrences.size()][alwaysBehaviours.length][];
        for (int j = 0; j < ratios.length; j++) {
            EventType event = person.pack().events().get(occurrences.get(j).event());
            for (int k = 0; k < alwaysBehaviours.length; k++) {
                int b = alwaysBehaviours[k];
                int level = java.util.Objects.requireNonNull(plan.always().get(b));
                ratios[j][k] = java.util.stream.IntStream.range(
                                0, person.pack().behaviours().get(b).levels().size())
                        .mapToDouble(l ->
                                EvidenceFactors.levelRate(event, b, level) / EvidenceFactors.levelRate(event, b, l))
                        .toArray();
            }
        }
        return ratios;
    }

    /** R′/R of an occurrence. */
    private double rateRatio(int j, long kept, int[] s) {
        EventType event = person.pack()
                .events()
                .get(person.evidence().occurrences().get(j).event());
        double ratio = 1;
        for (ConditionFactor r : event.conditionRates()) {
            int i = r.condition();
            double then = weightThen(i, j, kept, s);
            double recorded = evidence.weightAt(i, state(i, s), j);
            if (then != recorded) {
                ratio *= (1 + then * (r.factor().value() - 1))
                        / (1 + recorded * (r.factor().value() - 1));
            }
        }
        for (int k = 0; k < alwaysBehaviours.length; k++) {
            ratio *= alwaysRatios[j][k][s[alwaysBehaviours[k]]];
        }
        return ratio;
    }

    /** The weight with which a condition acts on an occurrence in the what-if world. */
    private double weightThen(int condition, int j, long kept, int[] s) {
        if ((plan.never() >> condition & 1) != 0) {
            return 0;
        }
        long earlier = earlierOccurrences[j] & kept;
        if ((states.switches(condition, state(condition, s)) & earlier) != 0) {
            return 1;
        }
        return twin.before(condition, s) ? evidence.presentAtOccurrence(condition, j) : 0;
    }

    private int state(int condition, int[] s) {
        return s[person.prior().conditionVariable(condition)];
    }
}
