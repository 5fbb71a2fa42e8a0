package nearworld.exchange.cases;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import nearworld.engine.assessment.CaseFile;
import nearworld.engine.basics.Fault;
import nearworld.engine.basics.PartialDate;
import nearworld.exchange.documents.Spot;
import nearworld.exchange.faults.FaultList;
import org.jspecify.annotations.Nullable;

/** The what-ifs of a case. */
final class WhatIfPart {
    private static final String FROM = "from";

    private final PackIndex index;
    private final Dates dates;
    private final HistoryPart history;
    private final FaultList faults;
    /** What the what-if at hand has changed, with the path of the change. */
    private Map<String, String> changed = new HashMap<>();

    WhatIfPart(PackIndex index, Dates dates, HistoryPart history, FaultList faults) {
        this.index = index;
        this.dates = dates;
        this.history = history;
        this.faults = faults;
    }

    List<CaseFile.WhatIf> read(Spot whatIfs) {
        List<CaseFile.WhatIf> result = new ArrayList<>();
        Set<String> names = new HashSet<>();
        for (Spot spot : whatIfs.items()) {
            String name = spot.at("name").text();
            if (name != null && !names.add(name)) {
                faults.add(Fault.of("repeatedName", spot.at("name").path(), "name", name));
            }
            changed = new HashMap<>();
            List<CaseFile.Change> changes = new ArrayList<>();
            for (Spot change : spot.at("changes").items()) {
                for (String kind : change.names()) {
                    CaseFile.Change one = change(kind, change.at(kind));
                    if (one != null) {
                        changes.add(one);
                    }
                }
            }
            result.add(new CaseFile.WhatIf(String.valueOf(name), changes));
        }
        return result;
    }

    private CaseFile.@Nullable Change change(String kind, Spot spot) {
        return switch (kind) {
            case "remove" -> {
                HistoryPart.Named of = occurrence(spot);
                yield of == null ? null : new CaseFile.Remove(of.event(), of.on());
            }
            case "move" -> {
                HistoryPart.Named of = occurrence(spot);
                PartialDate to = dates.past(spot.at("to"));
                yield of == null || to == null ? null : new CaseFile.Move(of.event(), of.on(), to);
            }
            case "outcome" -> otherOutcome(spot);
            case "without" -> {
                int condition = index.condition(spot.at("condition"));
                once("condition " + condition, spot, condition >= 0);
                yield new CaseFile.Without(condition, dates.ahead(spot.at(FROM)));
            }
            case "behaviour" -> behaviour(spot);
            case "treat" -> {
                int treatment = index.treatment(spot.at("treatment"));
                once("treatment " + treatment, spot, treatment >= 0);
                yield new CaseFile.Treat(treatment, dates.ahead(spot.at(FROM)));
            }
            case "add" -> add(spot);
            default -> null;
        };
    }

    /** Two changes of one thing in one what-if are refused. */
    private void once(String thing, Spot spot, boolean isKnown) {
        String before = isKnown ? changed.putIfAbsent(thing, spot.path()) : null;
        if (before != null) {
            faults.add(Fault.of("changedTwice", spot.path(), "first", before));
        }
    }

    private HistoryPart.@Nullable Named occurrence(Spot spot) {
        int event = index.event(spot.at("event"));
        PartialDate on = Dates.read(spot.at("on"), faults);
        if (event < 0 || on == null) {
            return null;
        }
        HistoryPart.Named of = new HistoryPart.Named(event, on);
        if (!history.has(of)) {
            faults.add(Fault.of(
                    "noSuchOccurrence",
                    spot.path(),
                    "event",
                    spot.at("event").shown(),
                    "on",
                    spot.at("on").shown()));
            return null;
        }
        once("occurrence " + event + " " + history.episode(of), spot, true);
        return of;
    }

    private CaseFile.@Nullable Change otherOutcome(Spot spot) {
        HistoryPart.Named of = occurrence(spot);
        int event = of != null ? of.event() : index.event(spot.at("event"));
        int to = outcome(event, spot.at("to"));
        return of == null ? null : new CaseFile.OtherOutcome(of.event(), of.on(), to);
    }

    private int outcome(int event, Spot spot) {
        int outcome = index.outcome(event, spot);
        if (outcome >= 0
                && index.pack().events().get(event).outcomes().get(outcome).fatal()) {
            faults.add(Fault.of("fatalOutcomeGiven", spot.path(), "outcome", spot.shown()));
        }
        return outcome;
    }

    private CaseFile.@Nullable Change behaviour(Spot spot) {
        List<String> names = new ArrayList<>(spot.names());
        names.remove(FROM);
        if (spot.isObject() && names.size() != 1) {
            faults.add(Fault.of("oneBehaviourAChange", spot.path(), "found", names.size()));
        }
        if (names.size() != 1) {
            return null;
        }
        Spot level = spot.at(names.get(0));
        int behaviour = index.behaviour(names.get(0), level);
        int to = index.level(behaviour, level);
        once("behaviour " + behaviour, spot, behaviour >= 0);
        return new CaseFile.ChangedBehaviour(behaviour, to, dates.ahead(spot.at(FROM)));
    }

    private CaseFile.@Nullable Change add(Spot spot) {
        String before = changed.putIfAbsent("add", spot.path());
        if (before != null) {
            faults.add(Fault.of("severalAdded", spot.path(), "first", before));
        }
        int event = index.event(spot.at("event"));
        int outcome = outcome(event, spot.at("outcome"));
        PartialDate on = dates.ahead(spot.at("on"));
        return on == null ? null : new CaseFile.Add(event, on, outcome);
    }
}
