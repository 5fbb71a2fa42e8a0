package nearworld.engine.counterfactual;

import java.util.List;
import java.util.Map;

/**
 * The changes of one what-if, resolved: occurrences by their index in the evidence, times in years from today.
 *
 * @param removed occurrences that did not happen, as a bit set
 * @param outcomes another outcome by occurrence
 * @param moved another start of the after-effect by occurrence
 * @param never conditions that never were, as a bit set
 * @param cured conditions absent from a time on
 * @param always behaviours that have always been at a level
 * @param habits behaviours changed from a time on
 * @param treatments started
 * @param added future events, by time
 */
public record WhatIfPlan(
        String name,
        long removed,
        Map<Integer, Integer> outcomes,
        Map<Integer, Double> moved,
        long never,
        Map<Integer, Double> cured,
        Map<Integer, Integer> always,
        Map<Integer, Habit> habits,
        List<Treated> treatments,
        List<Added> added) {

    public WhatIfPlan {
        outcomes = sorted(outcomes);
        moved = sorted(moved);
        cured = sorted(cured);
        always = sorted(always);
        habits = sorted(habits);
        treatments = List.copyOf(treatments);
        added = List.copyOf(added);
    }

    private static <T> Map<Integer, T> sorted(Map<Integer, T> map) {
        return java.util.Collections.unmodifiableMap(new java.util.TreeMap<>(map));
    }

    /** Those at a worse level move to a level from a time on. */
    public record Habit(int level, double from) {}

    /** A treatment from a time on. */
    public record Treated(int treatment, double from) {}

    /** An event at a time; outcome -1: its shares follow from the conditions then present. */
    public record Added(int event, double at, int outcome) {}

    /** True where every recorded occurrence stays as it was or as the plan itself says. */
    public boolean undoesNothing() {
        return removed == 0 && never == 0 && always.isEmpty();
    }

    /** The recorded world: nothing is changed. */
    static WhatIfPlan none(String name) {
        return new WhatIfPlan(name, 0, Map.of(), Map.of(), 0, Map.of(), Map.of(), Map.of(), List.of(), List.of());
    }
}
