package nearworld.exchange.packs;

import java.util.HashMap;
import java.util.Map;
import java.util.regex.Pattern;
import nearworld.engine.basics.Fault;
import nearworld.exchange.documents.Spot;
import nearworld.exchange.faults.FaultList;

/** Rules that hold wherever a pack has a number: intervals hold their value, ages are told apart, the taper falls. */
final class NumberRules {
    private static final Pattern AGE = Pattern.compile("[0-9]{1,3}(\\.[0-9]{1,6})?");

    private final FaultList faults;
    private double taperEnd = Double.POSITIVE_INFINITY;

    NumberRules(FaultList faults) {
        this.faults = faults;
    }

    void check(Spot root) {
        taper(root.at("pack").at("taper"));
        walk(root);
    }

    private void taper(Spot taper) {
        Double from = taper.at("from").number();
        Double pivot = taper.at("pivot").number();
        Double to = taper.at("to").number();
        if (from != null && pivot != null && !(from <= pivot)) {
            faults.add(Fault.of("taperOrder", taper.at("pivot").path(), "value", plain(pivot), "bound", plain(from)));
        }
        if (pivot != null && to != null && !(pivot < to)) {
            faults.add(Fault.of("taperOrder", taper.at("to").path(), "value", plain(to), "bound", plain(pivot)));
        }
        taperEnd = to == null ? taperEnd : to;
    }

    private void walk(Spot spot) {
        Map<Double, String> ages = new HashMap<>();
        for (String name : spot.names()) {
            if (isAge(name)) {
                String same = ages.putIfAbsent(Double.valueOf(name), name);
                if (same != null) {
                    faults.add(Fault.of("repeatedAge", spot.at(name).path(), "value", name, "first", same));
                }
            }
            walk(spot.at(name));
        }
        spot.items().forEach(this::walk);
        if (spot.has("value")) {
            estimate(spot);
        }
    }

    private void estimate(Spot spot) {
        Double value = spot.at("value").number();
        Double low = spot.at("low").number();
        Double high = spot.at("high").number();
        if (value != null && low != null && high != null && !(low <= value && value <= high)) {
            faults.add(new Fault(
                    "intervalMissesValue",
                    spot.path(),
                    Map.of("value", plain(value), "low", plain(low), "high", plain(high))));
        }
        Double atAge = spot.at("atAge").number();
        if (atAge != null && !(atAge < taperEnd)) {
            faults.add(Fault.of(
                    "atAgeBeyondTaper", spot.at("atAge").path(), "value", plain(atAge), "bound", plain(taperEnd)));
        }
    }

    /** True for a name that is an age. */
    static boolean isAge(String name) {
        return AGE.matcher(name).matches();
    }

    static String plain(double value) {
        return value == (long) value ? String.valueOf((long) value) : String.valueOf(value);
    }
}
