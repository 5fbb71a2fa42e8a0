package nearworld.exchange.packs;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeSet;
import nearworld.engine.basics.Fault;
import nearworld.exchange.documents.Spot;
import nearworld.exchange.faults.FaultList;
import org.jspecify.annotations.Nullable;

/** Rules about events and their outcomes. */
final class EventRules {
    /** Shares are renormalised; a sum further from one than this was hardly meant. */
    private static final double SHARE_TOLERANCE = 0.01;

    private final PackNames names;
    private final FaultList faults;
    private final List<Fault> remarks;

    EventRules(PackNames names, FaultList faults, List<Fault> remarks) {
        this.names = names;
        this.faults = faults;
        this.remarks = remarks;
    }

    void check(Spot root) {
        Spot events = root.at("events");
        for (String e : events.names()) {
            Spot event = events.at(e);
            Spot ratios = event.at("rateRatios");
            ratios.names()
                    .forEach(n -> names.checkConditionOrLevel(n, ratios.at(n).path(), faults));
            Spot brings = event.at("bringsOn");
            brings.names().forEach(n -> names.checkCondition(n, brings.at(n).path(), faults));
            outcomes(event.at("outcomes"));
        }
        Spot behaviours = root.at("behaviours");
        behaviours.names().forEach(b -> shares(behaviours.at(b).at("levels")));
    }

    private void outcomes(Spot outcomes) {
        String fatal = null;
        int others = 0;
        for (String o : outcomes.names()) {
            Spot outcome = outcomes.at(o);
            Spot odds = outcome.at("oddsRatios");
            odds.names().forEach(n -> names.checkCondition(n, odds.at(n).path(), faults));
            if (!outcome.at("fatal").isTrue()) {
                others++;
            } else if (fatal != null) {
                faults.add(Fault.of("severalFatalOutcomes", outcome.at("fatal").path(), "first", fatal));
            } else {
                fatal = o;
            }
        }
        if (fatal != null && others == 0) {
            faults.add(Fault.of("onlyFatalOutcomes", outcomes.path()));
        }
        shares(outcomes);
    }

    /** Remarks where the shares of exclusive items do not sum to about one at an age that all of them give. */
    private void shares(Spot items) {
        for (String sex : List.of("male", "female")) {
            List<Map<Double, Double>> curves = new ArrayList<>();
            TreeSet<Double> ages = new TreeSet<>();
            for (String name : items.names()) {
                Map<Double, Double> curve = ShareCurves.points(items.at(name).at("share"), sex);
                if (curve == null) {
                    return;
                }
                curves.add(curve);
                ages.addAll(curve.keySet());
            }
            ages.remove(ShareCurves.ALWAYS);
            if (ages.isEmpty() && !curves.isEmpty()) {
                ages.add(ShareCurves.ALWAYS);
            }
            ages.forEach(age -> sum(items, sex, age, curves));
        }
    }

    private void sum(Spot items, String sex, double age, List<Map<Double, Double>> curves) {
        double sum = 0;
        for (Map<Double, Double> curve : curves) {
            Double share = given(curve, age);
            if (share == null) {
                return;
            }
            sum += share;
        }
        if (Math.abs(sum - 1) > SHARE_TOLERANCE) {
            remarks.add(new Fault(
                    "sharesFarFromOne",
                    items.path(),
                    Map.of(
                            "sum",
                            String.valueOf(Math.round(sum * 1e6) / 1e6),
                            "sex",
                            sex,
                            "age",
                            age == ShareCurves.ALWAYS ? "–" : NumberRules.plain(age))));
        }
    }

    private static @Nullable Double given(Map<Double, Double> curve, double age) {
        Double share = curve.get(age);
        return share != null ? share : curve.get(ShareCurves.ALWAYS);
    }
}
