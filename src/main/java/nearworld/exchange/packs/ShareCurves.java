package nearworld.exchange.packs;

import java.util.Map;
import java.util.TreeMap;
import nearworld.exchange.documents.Spot;
import org.jspecify.annotations.Nullable;

/** The points of a quantity by age, for one sex, from any of the forms that a pack may give it in. */
final class ShareCurves {
    /** Stands for every age where one number is given. */
    static final double ALWAYS = -1;

    private ShareCurves() {}

    /** Values by age; null where the pack has no numbers there. */
    static @Nullable Map<Double, Double> points(Spot spot, String sex) {
        Spot own = spot.has(sex) ? spot.at(sex) : spot;
        Double single = value(own);
        if (single != null) {
            return Map.of(ALWAYS, single);
        }
        Map<Double, Double> points = new TreeMap<>();
        for (String age : own.names()) {
            Double value = value(own.at(age));
            if (value == null || !NumberRules.isAge(age)) {
                return null;
            }
            points.put(Double.valueOf(age), value);
        }
        return points.isEmpty() ? null : points;
    }

    /** A number, or the value of one with its interval. */
    static @Nullable Double value(Spot spot) {
        Double number = spot.number();
        return number != null ? number : spot.at("value").number();
    }
}
