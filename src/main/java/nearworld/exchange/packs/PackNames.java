package nearworld.exchange.packs;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import nearworld.engine.basics.Fault;
import nearworld.exchange.documents.Spot;
import nearworld.exchange.faults.FaultList;

/** The names that a pack gives, in its order. */
final class PackNames {
    /** A level of a behaviour, by their indices. */
    record LevelName(int behaviour, int level) {}

    private final List<String> conditions;
    private final Map<String, LevelName> levels = new LinkedHashMap<>();

    PackNames(Spot root) {
        this.conditions = root.at("conditions").names();
        Spot behaviours = root.at("behaviours");
        List<String> ids = new ArrayList<>(behaviours.names());
        for (int b = 0; b < ids.size(); b++) {
            List<String> levelIds = behaviours.at(ids.get(b)).at("levels").names();
            for (int l = 0; l < levelIds.size(); l++) {
                levels.put(ids.get(b) + "." + levelIds.get(l), new LevelName(b, l));
            }
        }
    }

    List<String> conditions() {
        return conditions;
    }

    int condition(String id) {
        return conditions.indexOf(id);
    }

    boolean isLevel(String name) {
        return levels.containsKey(name);
    }

    /** The level that {@code behaviour.level} names; it must be there. */
    LevelName level(String name) {
        LevelName level = levels.get(name);
        if (level == null) {
            throw new IllegalArgumentException("no level " + name);
        }
        return level;
    }

    /** Reports a name that is no condition's. */
    void checkCondition(String name, String path, FaultList faults) {
        if (!conditions.contains(name)) {
            faults.add(Fault.of("unknownCondition", path, "name", name));
        }
    }

    /** Reports a name that is neither a condition's nor a level's. */
    void checkConditionOrLevel(String name, String path, FaultList faults) {
        if (!conditions.contains(name) && !levels.containsKey(name)) {
            faults.add(Fault.of("unknownConditionOrLevel", path, "name", name));
        }
    }
}
