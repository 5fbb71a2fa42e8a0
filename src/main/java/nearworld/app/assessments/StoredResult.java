package nearworld.app.assessments;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import nearworld.engine.assessment.AssessmentResult;
import nearworld.engine.assessment.AssessmentResult.ConditionShift;
import nearworld.engine.assessment.AssessmentResult.Split;
import nearworld.engine.assessment.AssessmentResult.WorldResult;
import nearworld.engine.basics.Fault;
import org.jspecify.annotations.Nullable;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;
import tools.jackson.databind.node.ArrayNode;
import tools.jackson.databind.node.ObjectNode;

/**
 * The stored form of a result: {@code result/1} of the exchange format, and beside it the monthly curves
 * ({@code curves/1}: of each world the survival at months 0, 1, 2, …, the deciles and the years that its ratio speaks
 * of). Doubles are written so that the same doubles are read.
 */
final class StoredResult {
    private static final JsonMapper MAPPER = JsonMapper.shared();
    private static final int LOWER = 0;
    private static final int UPPER = 1;

    private StoredResult() {}

    static String curves(AssessmentResult result) {
        ObjectNode root = MAPPER.createObjectNode();
        root.put("format", "curves/1");
        ArrayNode worlds = root.putArray("worlds");
        for (WorldResult world : result.worlds()) {
            ObjectNode node = worlds.addObject();
            node.put("id", world.id());
            node.put("termYears", world.termYears());
            ArrayNode deciles = node.putArray("deciles");
            world.deciles().forEach(deciles::add);
            ArrayNode monthly = node.putArray("monthly");
            world.monthly().forEach(monthly::add);
        }
        return root.toString();
    }

    static AssessmentResult read(String result, String curves) {
        JsonNode root = MAPPER.readTree(result);
        Map<String, JsonNode> curvesById = new HashMap<>();
        MAPPER.readTree(curves)
                .required("worlds")
                .forEach(w -> curvesById.put(w.required("id").asString(), w));
        List<ConditionShift> conditions = new ArrayList<>();
        root.path("conditions")
                .forEach(c -> conditions.add(
                        new ConditionShift(c.required("id").asString(), number(c, "prior"), number(c, "posterior"))));
        List<WorldResult> worlds = new ArrayList<>();
        root.required("worlds")
                .forEach(
                        w -> worlds.add(world(w, curvesById.get(w.required("id").asString()))));
        List<Fault> warnings = new ArrayList<>();
        root.path("warnings").forEach(w -> warnings.add(warning(w)));
        return new AssessmentResult(
                number(root, "age"),
                number(root, "logEvidence"),
                conditions,
                worlds,
                split(root.required("revealed")),
                split(root.required("caused")),
                warnings);
    }

    private static WorldResult world(JsonNode world, @Nullable JsonNode curve) {
        String id = world.required("id").asString();
        if (curve == null) {
            throw new IllegalArgumentException("no curve is stored for the world " + id);
        }
        List<Double> quartiles = numbers(world.required("quartiles"));
        return new WorldResult(
                id,
                number(world, "expectation"),
                number(world, "curtate"),
                number(world, "median"),
                quartiles.get(LOWER),
                quartiles.get(UPPER),
                numbers(curve.required("deciles")),
                curve.required("termYears").asInt(),
                number(world, "mortalityRatio"),
                number(world, "extraPerMille"),
                optional(world, "ratedAge"),
                numbers(world.required("survival")),
                numbers(curve.required("monthly")),
                optional(world, "aliveToday"));
    }

    private static Split split(JsonNode node) {
        return new Split(number(node, "years"), number(node, "ratio"));
    }

    private static Fault warning(JsonNode node) {
        Map<String, String> values = new TreeMap<>();
        node.path("values")
                .properties()
                .forEach(e -> values.put(e.getKey(), e.getValue().asString()));
        return new Fault(node.required("code").asString(), node.required("path").asString(), values);
    }

    private static double number(JsonNode node, String name) {
        return node.required(name).asDouble();
    }

    private static @Nullable Double optional(JsonNode node, String name) {
        JsonNode value = node.path(name);
        return value.isNumber() ? (Double) value.asDouble() : null;
    }

    private static List<Double> numbers(JsonNode array) {
        List<Double> numbers = new ArrayList<>();
        array.forEach(n -> numbers.add(n.asDouble()));
        return numbers;
    }
}
