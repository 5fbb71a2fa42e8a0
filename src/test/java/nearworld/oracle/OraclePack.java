package nearworld.oracle;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import nearworld.oracle.Values.Curve;
import nearworld.oracle.Values.Scale;
import org.jspecify.annotations.Nullable;
import tools.jackson.databind.JsonNode;

/** A pack's numbers for one sex. Conditions are bits of a mask, in the pack's order. */
final class OraclePack {
    /** A behaviour level; the scores are logarithms of ratios, divided by the taper at the age they speak for. */
    record Level(String id, Curve share, double ratio, double score, double longRunScore, double halfLife) {}

    record Behaviour(String id, List<Level> levels) {
        int indexOf(String level) {
            for (int i = 0; i < levels.size(); i++) {
                if (levels.get(i).id().equals(level)) {
                    return i;
                }
            }
            throw new IllegalArgumentException("no level " + level + " of " + id);
        }
    }

    /** A rate of death on top, per year: by years since onset where that is known, else {@code unknown}. */
    record Excess(double unknown, @Nullable Curve byYears) {}

    /** {@code linkOfCondition[j]} is the weight of condition j's link, {@code linkOfLevel[b][l]} of a level's; 0 is none. */
    record Condition(
            String id,
            Curve prevalence,
            double score,
            Excess excess,
            Curve diagnosedShare,
            double[] linkOfCondition,
            double[][] linkOfLevel) {}

    record Interaction(int conditions, double logRatio) {}

    /** What stays behind: logarithm of the ratio, deaths per year, half-life in years (infinite if it stays). */
    record AfterEffect(double logRatio, double excess, double halfLife) {}

    record Outcome(String id, Curve share, double[] oddsRatios, AfterEffect afterEffect, boolean fatal) {}

    record Event(
            String id,
            double frailtyPower,
            int episodeDays,
            Curve rate,
            double[] ratioOfCondition,
            double[][] ratioOfLevel,
            double[] bringsOn,
            List<Outcome> outcomes) {
        int indexOf(String outcome) {
            for (int i = 0; i < outcomes.size(); i++) {
                if (outcomes.get(i).id().equals(outcome)) {
                    return i;
                }
            }
            throw new IllegalArgumentException("no outcome " + outcome + " of " + id);
        }
    }

    /** Probability of each level where a condition is present and where none is; {@code present[level][k]} for of[k]. */
    record Finding(List<String> levels, int[] of, double[][] present, double[] absent) {}

    record Source(double[] sensitivity, double[] specificity, boolean seesDiagnosed) {}

    record Treatment(double logRatio, int onlyWith) {}

    final double from;
    final double pivot;
    final double to;
    final double[] frailty;
    final List<Behaviour> behaviours = new ArrayList<>();
    final List<String> conditionIds;
    final List<Condition> conditions = new ArrayList<>();
    final int[] parentsFirst;
    final List<Interaction> interactions = new ArrayList<>();
    final Map<String, Event> events = new LinkedHashMap<>();
    final Map<String, Finding> findings = new HashMap<>();
    final Map<String, Source> sources = new HashMap<>();
    final Map<String, Treatment> treatments = new HashMap<>();

    OraclePack(JsonNode root, String sex) {
        JsonNode taper = root.get("pack").get("taper");
        from = number(taper, "from");
        pivot = number(taper, "pivot");
        to = number(taper, "to");
        JsonNode spread = root.get("frailty");
        frailty = FrailtyBins.of(number(spread, "variance"), (int) Values.number(spread, "points", 9));
        conditionIds = Values.names(root.get("conditions"));
        root.path("behaviours").properties().forEach(e -> behaviours.add(behaviour(e.getKey(), e.getValue(), sex)));
        root.get("conditions").properties().forEach(e -> conditions.add(condition(e.getKey(), e.getValue(), sex)));
        parentsFirst = parentsFirst();
        for (JsonNode node : root.path("interactions")) {
            int mask = 0;
            for (JsonNode name : node.get("of")) {
                mask |= 1 << conditionIndex(name.asString());
            }
            interactions.add(new Interaction(mask, Math.log(number(node, "ratio"))));
        }
        root.path("events").properties().forEach(e -> events.put(e.getKey(), event(e.getKey(), e.getValue(), sex)));
        root.path("findings").properties().forEach(e -> findings.put(e.getKey(), finding(e.getValue())));
        root.path("sources").properties().forEach(e -> sources.put(e.getKey(), source(e.getValue())));
        root.path("treatments").properties().forEach(e -> {
            JsonNode node = e.getValue();
            int only =
                    node.has("onlyWith") ? conditionIndex(node.get("onlyWith").asString()) : -1;
            treatments.put(e.getKey(), new Treatment(Math.log(number(node, "hazardRatio")), only));
        });
    }

    /** Section 4's taper: 1 at the pivot, 0 from {@code to} on, flat below {@code from}. */
    double taper(double age) {
        return (to - Math.min(Math.max(age, from), to)) / (to - pivot);
    }

    int conditionIndex(String id) {
        int index = conditionIds.indexOf(id);
        if (index < 0) {
            throw new IllegalArgumentException("no condition " + id);
        }
        return index;
    }

    int behaviourIndex(String id) {
        for (int i = 0; i < behaviours.size(); i++) {
            if (behaviours.get(i).id().equals(id)) {
                return i;
            }
        }
        throw new IllegalArgumentException("no behaviour " + id);
    }

    private static double number(JsonNode parent, String field) {
        return Values.number(parent.get(field));
    }

    /** ln of a ratio over the taper at the age it speaks for. */
    private double score(JsonNode ratio) {
        double atAge = ratio.isObject() ? Values.number(ratio, "atAge", pivot) : pivot;
        return Math.log(Values.number(ratio)) / taper(atAge);
    }

    private Behaviour behaviour(String id, JsonNode node, String sex) {
        List<Level> levels = new ArrayList<>();
        node.get("levels").properties().forEach(e -> {
            JsonNode level = e.getValue();
            JsonNode ratio = level.get("hazardRatio");
            levels.add(new Level(
                    e.getKey(),
                    Values.curve(level.get("share"), sex, Scale.LOG),
                    Values.number(ratio),
                    score(ratio),
                    score(level.has("longRun") ? level.get("longRun") : ratio),
                    Values.number(level, "halfLifeYears", Double.NaN)));
        });
        return new Behaviour(id, levels);
    }

    private Condition condition(String id, JsonNode node, String sex) {
        double[] ofCondition = new double[conditionIds.size()];
        double[][] ofLevel = perLevel(0);
        node.path("causedBy")
                .properties()
                .forEach(e -> put(e.getKey(), Values.number(e.getValue()), ofCondition, ofLevel));
        return new Condition(
                id,
                Values.curve(node.get("prevalence"), sex, Scale.LOGIT),
                node.has("hazardRatio") ? score(node.get("hazardRatio")) : 0,
                excess(node.path("excessPerMille")),
                node.has("diagnosedShare")
                        ? Values.curve(node.get("diagnosedShare"), sex, Scale.LOGIT)
                        : new Curve(Scale.LOGIT, new double[] {0}, new double[] {1}),
                ofCondition,
                ofLevel);
    }

    private static Excess excess(JsonNode node) {
        if (node.isMissingNode()) {
            return new Excess(0, null);
        }
        if (!node.has("unknown")) {
            return new Excess(Values.number(node) / 1000, null);
        }
        TreeMap<Double, Double> knots = new TreeMap<>();
        for (var e : node.properties()) {
            if (!e.getKey().equals("unknown")) {
                knots.put(Double.valueOf(e.getKey()), Values.number(e.getValue()) / 1000);
            }
        }
        return new Excess(number(node, "unknown") / 1000, knots.isEmpty() ? null : Values.curve(knots, Scale.LOG));
    }

    private Event event(String id, JsonNode node, String sex) {
        double[] ofCondition = ones();
        double[][] ofLevel = perLevel(1);
        node.path("rateRatios")
                .properties()
                .forEach(e -> put(e.getKey(), Values.number(e.getValue()), ofCondition, ofLevel));
        double[] bringsOn = new double[conditionIds.size()];
        node.path("bringsOn")
                .properties()
                .forEach(e -> bringsOn[conditionIndex(e.getKey())] = Values.number(e.getValue()));
        List<Outcome> outcomes = new ArrayList<>();
        node.get("outcomes").properties().forEach(e -> {
            JsonNode outcome = e.getValue();
            double[] odds = ones();
            outcome.path("oddsRatios")
                    .properties()
                    .forEach(o -> odds[conditionIndex(o.getKey())] = Values.number(o.getValue()));
            outcomes.add(new Outcome(
                    e.getKey(),
                    Values.curve(outcome.get("share"), sex, Scale.LOG),
                    odds,
                    afterEffect(outcome.path("afterEffect")),
                    outcome.path("fatal").asBoolean(false)));
        });
        return new Event(
                id,
                Values.number(node, "frailtyPower", 0),
                (int) Values.number(node, "episodeDays", 0),
                Values.curve(node.get("ratePerYear"), sex, Scale.LOG),
                ofCondition,
                ofLevel,
                bringsOn,
                outcomes);
    }

    private static AfterEffect afterEffect(JsonNode node) {
        return new AfterEffect(
                Math.log(Values.number(node, "hazardRatio", 1)),
                Values.number(node, "excessPerMille", 0) / 1000,
                Values.number(node, "halfLifeYears", Double.POSITIVE_INFINITY));
    }

    private Finding finding(JsonNode node) {
        List<String> of = new ArrayList<>();
        if (node.get("of").isArray()) {
            node.get("of").forEach(n -> of.add(n.asString()));
        } else {
            of.add(node.get("of").asString());
        }
        List<String> levels = Values.names(node.get("levels"));
        double[][] present = new double[levels.size()][of.size()];
        double[] absent = new double[levels.size()];
        for (int l = 0; l < levels.size(); l++) {
            JsonNode level = node.get("levels").get(levels.get(l));
            boolean second = of.size() > 1 && l == 1;
            for (int k = 0; k < of.size(); k++) {
                JsonNode p = second ? null : level.get("present");
                present[l][k] = p == null ? 1 - present[0][k] : Values.number(p.has(of.get(k)) ? p.get(of.get(k)) : p);
            }
            absent[l] = second ? 1 - absent[0] : number(level, "absent");
        }
        return new Finding(levels, of.stream().mapToInt(this::conditionIndex).toArray(), present, absent);
    }

    private Source source(JsonNode node) {
        int n = conditionIds.size();
        double[] sensitivity = new double[n];
        double[] specificity = new double[n];
        for (int i = 0; i < n; i++) {
            JsonNode own = node.path("byCondition").path(conditionIds.get(i));
            sensitivity[i] = Values.number(own.has("sensitivity") ? own.get("sensitivity") : node.get("sensitivity"));
            specificity[i] = Values.number(own.has("specificity") ? own.get("specificity") : node.get("specificity"));
        }
        return new Source(
                sensitivity, specificity, node.path("sees").asString("").equals("diagnosed"));
    }

    private void put(String name, double value, double[] ofCondition, double[][] ofLevel) {
        int dot = name.indexOf('.');
        if (dot < 0) {
            ofCondition[conditionIndex(name)] = value;
        } else {
            int b = behaviourIndex(name.substring(0, dot));
            ofLevel[b][behaviours.get(b).indexOf(name.substring(dot + 1))] = value;
        }
    }

    private double[] ones() {
        double[] result = new double[conditionIds.size()];
        java.util.Arrays.fill(result, 1);
        return result;
    }

    private double[][] perLevel(double value) {
        double[][] result = new double[behaviours.size()][];
        for (int b = 0; b < result.length; b++) {
            result[b] = new double[behaviours.get(b).levels().size()];
            java.util.Arrays.fill(result[b], value);
        }
        return result;
    }

    private int[] parentsFirst() {
        int n = conditionIds.size();
        int[] order = new int[n];
        int done = 0;
        for (int placed = 0; placed < n; placed++) {
            int next = -1;
            for (int i = 0; i < n && next < 0; i++) {
                next = (done & 1 << i) == 0 && parentsOf(i, done) ? i : -1;
            }
            if (next < 0) {
                throw new IllegalArgumentException("a cycle among conditions");
            }
            order[placed] = next;
            done |= 1 << next;
        }
        return order;
    }

    private boolean parentsOf(int i, int within) {
        double[] links = conditions.get(i).linkOfCondition();
        for (int j = 0; j < links.length; j++) {
            if (links[j] > 0 && (within & 1 << j) == 0) {
                return false;
            }
        }
        return true;
    }
}
