package nearworld.exchange.cases;

import nearworld.engine.basics.Fault;
import nearworld.engine.network.EvidencePack;
import nearworld.exchange.documents.Spot;
import nearworld.exchange.faults.FaultList;

/** Finds what a case names in the pack. Answers −1, and reports the name, where the pack has no such thing. */
final class PackIndex {
    private final EvidencePack pack;
    private final FaultList faults;

    PackIndex(EvidencePack pack, FaultList faults) {
        this.pack = pack;
        this.faults = faults;
    }

    EvidencePack pack() {
        return pack;
    }

    int condition(Spot spot) {
        String name = spot.text();
        return name == null ? -1 : found(pack.conditionIndex(name), "unknownCondition", spot);
    }

    int event(Spot spot) {
        String name = spot.text();
        return name == null ? -1 : found(pack.eventIndex(name), "unknownEvent", spot);
    }

    int source(Spot spot) {
        String name = spot.text();
        return name == null ? -1 : found(pack.sourceIndex(name), "unknownSource", spot);
    }

    int finding(Spot spot) {
        String name = spot.text();
        return name == null ? -1 : found(pack.findingIndex(name), "unknownFinding", spot);
    }

    int treatment(Spot spot) {
        String name = spot.text();
        return name == null ? -1 : found(pack.treatmentIndex(name), "unknownTreatment", spot);
    }

    /** The behaviour that a field is named after. */
    int behaviour(String name, Spot field) {
        int index = pack.behaviourIndex(name);
        if (index < 0) {
            faults.add(Fault.of("unknownBehaviour", field.path(), "name", name));
        }
        return index;
    }

    /** A level of a behaviour that is known. */
    int level(int behaviour, Spot spot) {
        String name = spot.text();
        if (behaviour < 0 || name == null) {
            return -1;
        }
        EvidencePack.Behaviour of = pack.behaviours().get(behaviour);
        int index = of.levelIndex(name);
        if (index < 0) {
            faults.add(Fault.of("unknownLevel", spot.path(), "name", name, "of", of.id()));
        }
        return index;
    }

    /** An outcome of an event that is known. */
    int outcome(int event, Spot spot) {
        String name = spot.text();
        if (event < 0 || name == null) {
            return -1;
        }
        EvidencePack.EventType of = pack.events().get(event);
        int index = of.outcomeIndex(name);
        if (index < 0) {
            faults.add(Fault.of("unknownOutcome", spot.path(), "name", name, "of", of.id()));
        }
        return index;
    }

    /** A level of a finding that is known. */
    int findingLevel(int finding, Spot spot) {
        String name = spot.text();
        if (finding < 0 || name == null) {
            return -1;
        }
        EvidencePack.Finding of = pack.findings().get(finding);
        int index = of.levelIndex(name);
        if (index < 0) {
            faults.add(Fault.of("unknownLevel", spot.path(), "name", name, "of", of.id()));
        }
        return index;
    }

    private int found(int index, String code, Spot spot) {
        if (index < 0) {
            faults.add(Fault.of(code, spot.path(), "name", spot.shown()));
        }
        return index;
    }
}
