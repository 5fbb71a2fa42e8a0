package nearworld.exchange.packs;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import nearworld.engine.basics.Fault;
import nearworld.exchange.documents.Spot;
import nearworld.exchange.faults.FaultList;

/** Rules about behaviours, conditions, their links and interactions, sources and treatments. */
final class NetworkRules {
    /** Many times what the schema lets pass; longer chains are not followed. */
    private static final int MOST_FOLLOWED = 500;

    private final PackNames names;
    private final FaultList faults;

    NetworkRules(PackNames names, FaultList faults) {
        this.names = names;
        this.faults = faults;
    }

    void check(Spot root) {
        Spot behaviours = root.at("behaviours");
        behaviours.names().forEach(b -> levels(behaviours.at(b).at("levels")));
        Spot conditions = root.at("conditions");
        for (String c : conditions.names()) {
            Spot links = conditions.at(c).at("causedBy");
            links.names()
                    .forEach(n -> names.checkConditionOrLevel(n, links.at(n).path(), faults));
        }
        if (names.conditions().size() <= MOST_FOLLOWED) {
            cycles(conditions);
        }
        for (Spot interaction : root.at("interactions").items()) {
            interaction.at("of").items().forEach(this::condition);
        }
        Spot sources = root.at("sources");
        for (String s : sources.names()) {
            Spot by = sources.at(s).at("byCondition");
            by.names().forEach(n -> names.checkCondition(n, by.at(n).path(), faults));
        }
        Spot treatments = root.at("treatments");
        treatments.names().forEach(t -> condition(treatments.at(t).at("onlyWith")));
    }

    private void condition(Spot name) {
        String id = name.text();
        if (id != null) {
            names.checkCondition(id, name.path(), faults);
        }
    }

    private void levels(Spot levels) {
        for (String l : levels.names()) {
            Spot level = levels.at(l);
            if (level.has("longRun") && !level.has("halfLifeYears")) {
                faults.add(
                        Fault.of("longRunWithoutHalfLife", level.at("longRun").path(), "level", l));
            }
        }
    }

    /** Reports each cycle of links among conditions once, at the link that closes it. */
    private void cycles(Spot conditions) {
        Set<String> done = new HashSet<>();
        for (String c : conditions.names()) {
            visit(c, conditions, new ArrayList<>(), done);
        }
    }

    private void visit(String id, Spot conditions, List<String> trail, Set<String> done) {
        if (done.contains(id)) {
            return;
        }
        trail.add(id);
        Spot links = conditions.at(id).at("causedBy");
        for (String parent : links.names()) {
            int at = trail.indexOf(parent);
            if (at >= 0) {
                List<String> cycle = new ArrayList<>(trail.subList(at, trail.size()));
                cycle.add(parent);
                faults.add(Fault.of("conditionCycle", links.at(parent).path(), "cycle", String.join(" ← ", cycle)));
            } else if (conditions.has(parent)) {
                visit(parent, conditions, trail, done);
            }
        }
        trail.remove(trail.size() - 1);
        done.add(id);
    }
}
