package nearworld.exchange.documents;

import java.util.Map;
import nearworld.engine.basics.Fault;
import nearworld.exchange.faults.FaultList;
import nearworld.exchange.faults.JsonPath;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.node.ArrayNode;
import tools.jackson.databind.node.JsonNodeFactory;
import tools.jackson.databind.node.ObjectNode;

/** A tree that a program hands in, under the rules that hold for a text: finite numbers within bounds, nesting. */
final class GivenTree {
    private static final JsonNodeFactory NODES = JsonNodeFactory.instance;

    private GivenTree() {}

    /** The tree with a null in place of every number that is refused; null where it is nested too deeply. */
    static Document document(JsonNode root) {
        FaultList faults = new FaultList();
        Document document = new Document(copy(root, JsonPath.ROOT, 0, faults), faults);
        faults.endStage();
        return document;
    }

    private static JsonNode copy(JsonNode node, String path, int depth, FaultList faults) {
        if (depth > TreeBuilder.DEEPEST) {
            faults.add(Fault.of("tooDeep", path, "bound", TreeBuilder.DEEPEST));
            return NODES.nullNode();
        }
        if (node.isObject()) {
            ObjectNode object = NODES.objectNode();
            for (Map.Entry<String, JsonNode> e : node.properties()) {
                object.set(e.getKey(), copy(e.getValue(), JsonPath.field(path, e.getKey()), depth + 1, faults));
            }
            return object;
        }
        if (node.isArray()) {
            ArrayNode array = NODES.arrayNode();
            for (int i = 0; i < node.size(); i++) {
                array.add(copy(node.get(i), JsonPath.item(path, i), depth + 1, faults));
            }
            return array;
        }
        return node.isNumber() ? number(node, path, faults) : node;
    }

    private static JsonNode number(JsonNode node, String path, FaultList faults) {
        boolean binary = node.isDouble() || node.isFloat();
        double value = binary ? node.doubleValue() : node.decimalValue().doubleValue();
        if (binary && !Double.isFinite(value)) {
            faults.add(Fault.of("notFinite", path, "value", value));
        } else if (!Numbers.isWithinBounds(value)) {
            faults.add(Numbers.outOfBounds(node.asString(), path));
        } else {
            return node;
        }
        return NODES.nullNode();
    }
}
