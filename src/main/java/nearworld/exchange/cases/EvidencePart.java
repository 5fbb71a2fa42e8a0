package nearworld.exchange.cases;

import java.util.ArrayList;
import java.util.List;
import nearworld.engine.assessment.CaseFile;
import nearworld.engine.basics.Fault;
import nearworld.engine.basics.PartialDate;
import nearworld.engine.network.EvidencePack;
import nearworld.exchange.documents.Spot;
import nearworld.exchange.faults.FaultList;

/** The behaviours, statements and findings of a case. */
final class EvidencePart {
    private final PackIndex index;
    private final Dates dates;
    private final FaultList faults;

    EvidencePart(PackIndex index, Dates dates, FaultList faults) {
        this.index = index;
        this.dates = dates;
        this.faults = faults;
    }

    List<CaseFile.BehaviourReport> behaviours(Spot behaviours) {
        List<CaseFile.BehaviourReport> reports = new ArrayList<>();
        for (String name : behaviours.names()) {
            Spot spot = behaviours.at(name);
            int behaviour = index.behaviour(name, spot);
            int level = index.level(behaviour, spot.at("level"));
            PartialDate since = dates.past(spot.at("since"));
            int left = index.level(behaviour, spot.at("left"));
            if (spot.has("left") && !spot.has("since")) {
                faults.add(Fault.of("leftWithoutSince", spot.at("left").path(), "behaviour", name));
            }
            if (left >= 0 && left == level) {
                faults.add(Fault.of(
                        "leftIsLevel",
                        spot.at("left").path(),
                        "name",
                        spot.at("left").shown()));
            }
            if (level >= 0) {
                EvidencePack.Level of =
                        index.pack().behaviours().get(behaviour).levels().get(level);
                if (spot.has("since") && of.halfLifeYears() == null) {
                    faults.add(Fault.of("sinceWithoutHalfLife", spot.at("since").path(), "level", of.id()));
                }
                reports.add(new CaseFile.BehaviourReport(behaviour, level, since, left));
            }
        }
        return reports;
    }

    List<CaseFile.Statement> statements(Spot statements) {
        List<CaseFile.Statement> result = new ArrayList<>();
        for (Spot spot : statements.items()) {
            int condition = index.condition(spot.at("condition"));
            int source = index.source(spot.at("source"));
            PartialDate on = dates.past(spot.at("on"));
            PartialDate onset = dates.past(spot.at("onset"));
            boolean present = spot.at("present").isTrue();
            if (spot.has("onset") && spot.at("present").isBoolean() && !present) {
                faults.add(Fault.of(
                        "onsetOfAbsent",
                        spot.at("onset").path(),
                        "condition",
                        spot.at("condition").shown()));
            }
            result.add(new CaseFile.Statement(condition, present, source, on, onset));
        }
        return result;
    }

    List<CaseFile.FindingReport> findings(Spot findings) {
        List<CaseFile.FindingReport> result = new ArrayList<>();
        for (Spot spot : findings.items()) {
            int finding = index.finding(spot.at("finding"));
            int level = index.findingLevel(finding, spot.at("level"));
            result.add(new CaseFile.FindingReport(finding, level, dates.past(spot.at("on"))));
        }
        return result;
    }
}
