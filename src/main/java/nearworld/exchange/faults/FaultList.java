package nearworld.exchange.faults;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import nearworld.engine.basics.Fault;

/**
 * Gathers the faults of one input. Reading goes in stages (text, structure, meaning): what an earlier stage has found at
 * a path, a later one does not report again.
 */
public final class FaultList {
    /** Nobody reads more; an input with so many faults is of another kind altogether. */
    private static final int MOST = 500;

    private final Map<String, Place> places = new HashMap<>();
    private final Set<LocatedFault> faults = new LinkedHashSet<>();
    private final Set<String> settled = new HashSet<>();
    private int left;

    /** Remembers where the text has a path; the first place counts. */
    public void place(String path, Place place) {
        places.putIfAbsent(path, place);
    }

    /** Gives another list the places that this one knows. */
    public void copyPlacesTo(FaultList other) {
        places.forEach(other::place);
    }

    /** Where the text has a path, or the nearest one above it. */
    public Place placeOf(String path) {
        String at = path;
        while (!places.containsKey(at) && !at.equals(JsonPath.ROOT)) {
            at = JsonPath.parent(at);
        }
        return places.getOrDefault(at, Place.NOWHERE);
    }

    public void add(Fault fault) {
        add(fault, placeOf(fault.path()));
    }

    public void add(Fault fault, Place place) {
        if (settled.contains(fault.path())) {
            return;
        }
        if (faults.size() < MOST) {
            faults.add(new LocatedFault(fault, place));
        } else {
            left++;
        }
    }

    /** Ends a stage: paths with a fault are settled. */
    public void endStage() {
        faults.forEach(f -> settled.add(f.fault().path()));
    }

    public boolean isEmpty() {
        return faults.isEmpty();
    }

    /** The faults in the order of their places. */
    public List<LocatedFault> sorted() {
        List<LocatedFault> result = new ArrayList<>(faults);
        result.sort(Comparator.comparing(LocatedFault::place));
        if (left > 0) {
            result.add(new LocatedFault(Fault.of("moreFaults", JsonPath.ROOT, "count", left), Place.NOWHERE));
        }
        return result;
    }
}
