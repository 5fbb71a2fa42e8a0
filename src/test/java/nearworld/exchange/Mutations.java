package nearworld.exchange;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Random;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.node.ArrayNode;
import tools.jackson.databind.node.JsonNodeFactory;
import tools.jackson.databind.node.ObjectNode;

/** Changes one thing of a tree, at random: drops, doubles, renames or exchanges a value for one that is seldom right. */
final class Mutations {
    private static final JsonNodeFactory NODES = JsonNodeFactory.instance;

    private record Slot(JsonNode parent, String name, int index) {}

    private final Random random;

    Mutations(Random random) {
        this.random = random;
    }

    /** Changes the tree in one to three places. */
    void apply(JsonNode root) {
        int count = 1 + random.nextInt(3);
        for (int i = 0; i < count; i++) {
            List<Slot> slots = new ArrayList<>();
            collect(root, slots);
            if (!slots.isEmpty()) {
                change(slots.get(random.nextInt(slots.size())));
            }
        }
    }

    private static void collect(JsonNode node, List<Slot> slots) {
        if (node instanceof ObjectNode object) {
            for (Map.Entry<String, JsonNode> e : object.properties()) {
                slots.add(new Slot(object, e.getKey(), -1));
                collect(e.getValue(), slots);
            }
        } else if (node instanceof ArrayNode array) {
            for (int i = 0; i < array.size(); i++) {
                slots.add(new Slot(array, "", i));
                collect(array.get(i), slots);
            }
        }
    }

    private void change(Slot slot) {
        if (slot.parent instanceof ObjectNode object) {
            JsonNode old = object.get(slot.name);
            switch (random.nextInt(4)) {
                case 0 -> object.remove(slot.name);
                case 1 -> {
                    object.remove(slot.name);
                    object.set(name(), old);
                }
                case 2 -> object.set(name(), value(old));
                default -> object.set(slot.name, value(old));
            }
        } else if (slot.parent instanceof ArrayNode array) {
            JsonNode old = array.get(slot.index);
            switch (random.nextInt(3)) {
                case 0 -> array.remove(slot.index);
                case 1 -> array.add(old.deepCopy());
                default -> array.set(slot.index, value(old));
            }
        }
    }

    private String name() {
        String[] names = {
            "value",
            "low",
            "high",
            "atAge",
            "male",
            "female",
            "40",
            "40.0",
            "1e3",
            "-1",
            "unknown",
            "",
            "title",
            "note",
            "from",
            "to",
            "on",
            "x",
            "copd",
            "smoking",
            "smoking.current",
            "present",
            "absent",
            "ü",
            "'",
            "$"
        };
        return names[random.nextInt(names.length)];
    }

    private JsonNode value(JsonNode old) {
        return switch (random.nextInt(16)) {
            case 0 -> NODES.nullNode();
            case 1 -> NODES.numberNode(-1);
            case 2 -> NODES.numberNode(0);
            case 3 -> NODES.numberNode(Double.NaN);
            case 4 -> NODES.numberNode(1e300);
            case 5 -> NODES.numberNode(Long.MAX_VALUE);
            case 6 -> NODES.stringNode("");
            case 7 -> NODES.stringNode("copd");
            case 8 -> NODES.stringNode("2026-02-30");
            case 9 -> NODES.stringNode("0000");
            case 10 -> NODES.stringNode("9999-12-31");
            case 11 -> NODES.booleanNode(true);
            case 12 -> NODES.objectNode();
            case 13 -> NODES.arrayNode().add(1);
            case 14 ->
                old.isNumber() ? NODES.numberNode(old.doubleValue() * random.nextInt(-2, 3)) : NODES.stringNode("2024");
            default -> NODES.objectNode().put("value", 0.5).put("low", 0.4);
        };
    }
}
