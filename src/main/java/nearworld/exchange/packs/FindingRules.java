package nearworld.exchange.packs;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import nearworld.engine.basics.Fault;
import nearworld.exchange.documents.Spot;
import nearworld.exchange.faults.FaultList;
import org.jspecify.annotations.Nullable;

/** Rules about findings: what they are of, and that the probabilities of their levels sum to one. */
final class FindingRules {
    /** Rounding of a dozen decimal fractions. */
    private static final double SUM_TOLERANCE = 1e-9;

    private final PackNames names;
    private final FaultList faults;

    FindingRules(PackNames names, FaultList faults) {
        this.names = names;
        this.faults = faults;
    }

    void check(Spot root) {
        Spot findings = root.at("findings");
        findings.names().forEach(f -> finding(findings.at(f)));
    }

    /** The conditions that a finding is of. */
    static List<Spot> of(Spot finding) {
        Spot of = finding.at("of");
        return of.text() != null ? List.of(of) : of.items();
    }

    private void finding(Spot finding) {
        List<String> of = new ArrayList<>();
        for (Spot name : of(finding)) {
            String id = name.text();
            if (id != null) {
                names.checkCondition(id, name.path(), faults);
                of.add(id);
            }
        }
        Spot levels = finding.at("levels");
        if (of.size() > 1 && levels.names().size() > 2) {
            faults.add(Fault.of(
                    "levelsOfSeveral", levels.path(), "found", levels.names().size()));
        }
        List<String> given = new ArrayList<>();
        for (String l : levels.names()) {
            Spot level = levels.at(l);
            // The second level of several conditions is what the first one leaves.
            if (of.size() <= 1 || given.isEmpty() || level.has("present") || level.has("absent")) {
                given.add(l);
                required(level, "present");
                required(level, "absent");
                present(level.at("present"), of);
            }
        }
        if (of.size() > 1 && given.size() == 1 && levels.names().size() == 2) {
            combination(levels.at(given.get(0)), of);
            return;
        }
        for (String condition : of) {
            sum(levels, l -> ShareCurves.value(presentOf(levels.at(l).at("present"), condition)), "present", condition);
        }
        sum(levels, l -> ShareCurves.value(levels.at(l).at("absent")), "absent", "");
        if (of.size() > 1 && levels.names().size() == 2) {
            combination(levels.at(levels.names().get(0)), of);
        }
    }

    private void required(Spot level, String field) {
        if (level.isObject() && !level.has(field)) {
            faults.add(Fault.of("missingField", level.at(field).path(), "field", field));
        }
    }

    /** The probability for one condition: the number itself where there is only one. */
    static Spot presentOf(Spot present, String condition) {
        return present.has(condition) ? present.at(condition) : present;
    }

    private void present(Spot present, List<String> of) {
        boolean map = present.isObject() && !present.has("value");
        if (!map) {
            if (of.size() > 1 && present.isGiven()) {
                faults.add(Fault.of("presentNotByCondition", present.path(), "conditions", String.join(", ", of)));
            }
            return;
        }
        for (String name : present.names()) {
            if (!of.contains(name)) {
                faults.add(Fault.of("notOfFinding", present.at(name).path(), "name", name));
            }
        }
        for (String name : of) {
            if (!present.has(name)) {
                faults.add(Fault.of("missingField", present.at(name).path(), "field", name));
            }
        }
    }

    private interface LevelValue {
        @Nullable
        Double of(String level);
    }

    private void sum(Spot levels, LevelValue value, String field, String condition) {
        double sum = 0;
        for (String l : levels.names()) {
            Double p = value.of(l);
            if (p == null) {
                return;
            }
            sum += p;
        }
        if (levels.isObject() && Math.abs(sum - 1) > SUM_TOLERANCE) {
            faults.add(new Fault(
                    "levelsSum",
                    levels.path(),
                    Map.of("field", field, "condition", condition, "sum", String.valueOf(sum))));
        }
    }

    /** The noisy-OR of several conditions must leave a probability for the first level. */
    private void combination(Spot first, List<String> of) {
        Double absent = ShareCurves.value(first.at("absent"));
        if (absent == null) {
            return;
        }
        if (!(absent < 1)) {
            faults.add(Fault.of("notBelow", first.at("absent").path(), "value", NumberRules.plain(absent), "bound", 1));
            return;
        }
        double second = 1 - absent;
        for (String condition : of) {
            Double p = ShareCurves.value(presentOf(first.at("present"), condition));
            second *= p == null ? 1 : Math.max(1, (1 - p) / (1 - absent));
        }
        if (second > 1 + SUM_TOLERANCE) {
            faults.add(Fault.of("findingCombination", first.at("present").path(), "probability", second));
        }
    }
}
