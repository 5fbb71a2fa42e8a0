package nearworld.exchange.packs;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import nearworld.engine.basics.AgeCurve;
import nearworld.engine.basics.AgeCurve.Scale;
import nearworld.engine.basics.BySex;
import nearworld.engine.basics.Estimate;
import nearworld.engine.network.EvidencePack;
import org.jspecify.annotations.Nullable;
import tools.jackson.databind.JsonNode;

/** Numbers of a pack without fault, in every form that the format gives them. */
final class Quantities {
    private final double pivot;

    /** @param pivot the age in years that a ratio without {@code atAge} speaks for */
    Quantities(double pivot) {
        this.pivot = pivot;
    }

    static Estimate estimate(JsonNode node) {
        if (node.isNumber()) {
            return Estimate.of(node.doubleValue());
        }
        double value = node.path("value").doubleValue();
        return node.has("low")
                ? new Estimate(
                        value, node.path("low").doubleValue(), node.path("high").doubleValue())
                : Estimate.of(value);
    }

    static @Nullable Estimate estimateOrNull(JsonNode node) {
        return node.isMissingNode() ? null : estimate(node);
    }

    /** 1 − p. */
    static Estimate complement(Estimate p) {
        return p.hasInterval() ? new Estimate(1 - p.value(), 1 - p.high(), 1 - p.low()) : Estimate.of(1 - p.value());
    }

    EvidencePack.Ratio ratio(JsonNode node) {
        return new EvidencePack.Ratio(estimate(node), node.path("atAge").doubleValue(pivot));
    }

    EvidencePack.Ratio ratioOrOne(JsonNode node) {
        return node.isMissingNode() ? new EvidencePack.Ratio(Estimate.of(1), pivot) : ratio(node);
    }

    BySex<AgeCurve> bySex(Scale scale, JsonNode node) {
        return node.has("male")
                ? new BySex<>(curve(scale, node.path("male")), curve(scale, node.path("female")))
                : BySex.both(curve(scale, node));
    }

    static AgeCurve curve(Scale scale, JsonNode node) {
        if (node.isNumber() || node.has("value")) {
            return AgeCurve.constant(scale, estimate(node));
        }
        TreeMap<Double, Estimate> points = points(node);
        double[] ages =
                points.keySet().stream().mapToDouble(Double::doubleValue).toArray();
        return AgeCurve.of(scale, ages, List.copyOf(points.values()));
    }

    private static TreeMap<Double, Estimate> points(JsonNode node) {
        TreeMap<Double, Estimate> points = new TreeMap<>();
        for (Map.Entry<String, JsonNode> e : node.properties()) {
            if (!e.getKey().equals("unknown")) {
                points.put(Double.valueOf(e.getKey()), estimate(e.getValue()));
            }
        }
        return points;
    }

    static EvidencePack.@Nullable Excess excess(JsonNode node) {
        if (node.isMissingNode()) {
            return null;
        }
        if (node.isNumber() || node.has("value")) {
            return new EvidencePack.Excess(estimate(node), List.of(), List.of());
        }
        TreeMap<Double, Estimate> points = points(node);
        return new EvidencePack.Excess(
                estimate(node.path("unknown")), new ArrayList<>(points.keySet()), new ArrayList<>(points.values()));
    }
}
