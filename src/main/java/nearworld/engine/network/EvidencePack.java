package nearworld.engine.network;

import java.util.List;
import nearworld.engine.basics.AgeCurve;
import nearworld.engine.basics.BySex;
import nearworld.engine.basics.Estimate;
import org.jspecify.annotations.Nullable;

/**
 * The numbers of an evidence pack: what is published about conditions, behaviours, events, findings, sources and
 * treatments. Lists keep the pack's order; an item's place in its list is its index everywhere in the engine. Words
 * (titles, sources, notes) stay outside the engine.
 */
public record EvidencePack(
        String id,
        int version,
        String population,
        Taper taper,
        Frailty frailty,
        List<Behaviour> behaviours,
        List<Condition> conditions,
        List<Interaction> interactions,
        List<EventType> events,
        List<Finding> findings,
        List<Source> sources,
        List<Treatment> treatments) {

    public EvidencePack {
        behaviours = List.copyOf(behaviours);
        conditions = List.copyOf(conditions);
        interactions = List.copyOf(interactions);
        events = List.copyOf(events);
        findings = List.copyOf(findings);
        sources = List.copyOf(sources);
        treatments = List.copyOf(treatments);
    }

    /**
     * How relative hazards fade with age: g(a) = (to − min(max(a, from), to)) / (to − pivot).
     *
     * @param from age in years below which g is flat
     * @param pivot age at which g = 1; {@code from <= pivot < to}
     * @param to age at which all ratios have become 1
     */
    public record Taper(double from, double pivot, double to) {
        public Taper {
            if (!(from <= pivot && pivot < to)) {
                throw new IllegalArgumentException(
                        "taper needs from <= pivot < to, is " + from + ", " + pivot + ", " + to);
            }
        }

        /** g at an exact age in years. */
        public double at(double age) {
            return (to - Math.min(Math.max(age, from), to)) / (to - pivot);
        }
    }

    /** Gamma frailty of mean 1: its variance, and the number of equally probable bins that stand for it. */
    public record Frailty(Estimate variance, int points) {}

    /**
     * A hazard ratio that speaks for an age.
     *
     * @param ratio above 0
     * @param atAge the age in years that the published ratio speaks for; the taper's pivot where none is given
     */
    public record Ratio(Estimate ratio, double atAge) {}

    /** A behaviour with exclusive levels. */
    public record Behaviour(String id, List<Level> levels) {
        public Behaviour {
            levels = List.copyOf(levels);
        }

        public int levelIndex(String levelId) {
            return indexOf(levels.stream().map(Level::id).toList(), levelId);
        }
    }

    /**
     * A level of a behaviour.
     *
     * @param share of the population at this level, by sex and age
     * @param hazardRatio the level's own ratio (of those who gave up, whenever: their average)
     * @param longRun the ratio that a person who changes to this level tends to (its own {@code atAge}, by default the
     *     pivot); null: the level's own
     * @param halfLifeYears in which the log ratio moves halfway there; null: no half-life
     */
    public record Level(
            String id,
            BySex<AgeCurve> share,
            Ratio hazardRatio,
            @Nullable Ratio longRun,
            @Nullable Estimate halfLifeYears) {}

    /** A hidden condition, present or absent. Links name parents: conditions, or levels of behaviours. */
    public record Condition(
            String id,
            BySex<AgeCurve> prevalence,
            Ratio hazardRatio,
            @Nullable Excess excess,
            @Nullable AgeCurve diagnosedShare,
            List<Link> causedBy) {
        public Condition {
            causedBy = List.copyOf(causedBy);
        }
    }

    /**
     * A rate of death added by a condition, per 1000 a year.
     *
     * @param unknown where the onset is not dated, and for the population
     * @param years since onset, rising; empty: {@code unknown} always
     * @param values at these years, above 0; in log between, flat beyond, 0 before the onset
     */
    public record Excess(Estimate unknown, List<Double> years, List<Estimate> values) {
        public Excess {
            years = List.copyOf(years);
            values = List.copyOf(values);
        }
    }

    /**
     * A parent that can bring a condition on.
     *
     * @param behaviour index of a behaviour, or -1 where the parent is a condition
     * @param parent index of the condition, or of the level within the behaviour
     * @param probability w of the noisy-OR, within [0, 1)
     */
    public record Link(int behaviour, int parent, Estimate probability) {
        public boolean fromBehaviour() {
            return behaviour >= 0;
        }
    }

    /** A ratio at the pivot where all of the listed conditions are present. */
    public record Interaction(List<Integer> of, Estimate ratio) {
        public Interaction {
            of = List.copyOf(of);
        }
    }

    /** A type of event that can happen to a person. */
    public record EventType(
            String id,
            Estimate frailtyPower,
            double episodeDays,
            BySex<AgeCurve> ratePerYear,
            List<ConditionFactor> conditionRates,
            List<LevelFactor> behaviourRates,
            List<Outcome> outcomes,
            List<ConditionFactor> bringsOn) {
        public EventType {
            conditionRates = List.copyOf(conditionRates);
            behaviourRates = List.copyOf(behaviourRates);
            outcomes = List.copyOf(outcomes);
            bringsOn = List.copyOf(bringsOn);
        }

        public int outcomeIndex(String outcomeId) {
            return indexOf(outcomes.stream().map(Outcome::id).toList(), outcomeId);
        }
    }

    /** A factor (rate ratio, odds ratio, or probability of being brought on) that a condition carries. */
    public record ConditionFactor(int condition, Estimate factor) {}

    /** A rate ratio that a level of a behaviour carries. */
    public record LevelFactor(int behaviour, int level, Estimate factor) {}

    /** One of the exclusive outcomes of an event. */
    public record Outcome(
            String id,
            BySex<AgeCurve> share,
            List<ConditionFactor> oddsRatios,
            @Nullable AfterEffect afterEffect,
            boolean fatal) {
        public Outcome {
            oddsRatios = List.copyOf(oddsRatios);
        }
    }

    /**
     * What an outcome does to the hazard afterwards: M(a) = exp(g(a)·ln HR·2^(−s/halfLife)) and
     * A(a) = excessPerMille/1000·2^(−s/halfLife), s years since.
     *
     * @param hazardRatio null: 1
     * @param excessPerMille null: 0
     * @param halfLifeYears null: it stays
     */
    public record AfterEffect(
            @Nullable Estimate hazardRatio,
            @Nullable Estimate excessPerMille,
            @Nullable Estimate halfLifeYears) {}

    /**
     * A test, measurement or medicine.
     *
     * @param of the conditions it speaks about
     * @param levels P(level | present) by condition in the order of {@code of}, and P(level | absent)
     * @param cost in house currency, null where none is given
     * @param days of waiting, null where none are given
     */
    public record Finding(
            String id,
            List<Integer> of,
            List<FindingLevel> levels,
            @Nullable Double cost,
            @Nullable Double days) {
        public Finding {
            of = List.copyOf(of);
            levels = List.copyOf(levels);
        }

        public int levelIndex(String levelId) {
            return indexOf(levels.stream().map(FindingLevel::id).toList(), levelId);
        }
    }

    /** The second level of a finding of several conditions has the complement of the first one's probabilities. */
    public record FindingLevel(String id, List<Estimate> present, Estimate absent) {
        public FindingLevel {
            present = List.copyOf(present);
        }
    }

    /** Who speaks: sensitivity and specificity, overridable by condition. */
    public record Source(
            String id,
            Estimate sensitivity,
            Estimate specificity,
            boolean seesDiagnosed,
            List<SourceOverride> byCondition,
            @Nullable Double cost,
            @Nullable Double days) {
        public Source {
            byCondition = List.copyOf(byCondition);
        }

        public Estimate sensitivity(int condition) {
            for (SourceOverride o : byCondition) {
                if (o.condition() == condition && o.sensitivity() != null) {
                    return o.sensitivity();
                }
            }
            return sensitivity;
        }

        public Estimate specificity(int condition) {
            for (SourceOverride o : byCondition) {
                if (o.condition() == condition && o.specificity() != null) {
                    return o.specificity();
                }
            }
            return specificity;
        }
    }

    /** What a source's sensitivity and specificity are for one condition; null: the source's own. */
    public record SourceOverride(
            int condition,
            @Nullable Estimate sensitivity,
            @Nullable Estimate specificity) {}

    /**
     * A treatment: a ratio at the pivot.
     *
     * @param onlyWith index of the condition without which it does nothing, or -1
     */
    public record Treatment(String id, Estimate hazardRatio, int onlyWith) {}

    public int conditionIndex(String conditionId) {
        return indexOf(conditions.stream().map(Condition::id).toList(), conditionId);
    }

    public int behaviourIndex(String behaviourId) {
        return indexOf(behaviours.stream().map(Behaviour::id).toList(), behaviourId);
    }

    public int eventIndex(String eventId) {
        return indexOf(events.stream().map(EventType::id).toList(), eventId);
    }

    public int findingIndex(String findingId) {
        return indexOf(findings.stream().map(Finding::id).toList(), findingId);
    }

    public int sourceIndex(String sourceId) {
        return indexOf(sources.stream().map(Source::id).toList(), sourceId);
    }

    public int treatmentIndex(String treatmentId) {
        return indexOf(treatments.stream().map(Treatment::id).toList(), treatmentId);
    }

    private static int indexOf(List<String> ids, String id) {
        return ids.indexOf(id);
    }
}
