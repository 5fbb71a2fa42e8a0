package nearworld.exchange.documents;

import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import nearworld.exchange.faults.JsonPath;
import org.jspecify.annotations.Nullable;
import tools.jackson.databind.JsonNode;

/**
 * A value of a document together with its path. Answers null, or nothing, where the value is of another type: the schema has
 * reported that already.
 */
public record Spot(String path, @Nullable JsonNode node) {
    /** The field of an object. */
    public Spot at(String field) {
        return new Spot(JsonPath.field(path, field), node != null && node.isObject() ? node.get(field) : null);
    }

    /** True where there is a value and it is not null. */
    public boolean isGiven() {
        return node != null && !node.isNull();
    }

    public boolean isObject() {
        return node != null && node.isObject();
    }

    public boolean has(String field) {
        return node != null && node.isObject() && node.has(field);
    }

    public @Nullable String text() {
        return node != null && node.isString() ? node.asString() : null;
    }

    /** The text as a fault shows it; empty where there is none. */
    public String shown() {
        String text = text();
        return text == null ? "" : text;
    }

    public @Nullable Double number() {
        return node != null && node.isNumber() ? Double.valueOf(node.doubleValue()) : null;
    }

    public @Nullable BigDecimal decimal() {
        return node != null && node.isNumber() ? node.decimalValue() : null;
    }

    public @Nullable Integer whole() {
        return node != null && node.isNumber() && node.doubleValue() == (int) node.doubleValue()
                ? Integer.valueOf((int) node.doubleValue())
                : null;
    }

    /** The value of a boolean; false for everything else. */
    public boolean isTrue() {
        return node != null && node.isBoolean() && node.booleanValue();
    }

    public boolean isBoolean() {
        return node != null && node.isBoolean();
    }

    /** The items of an array. */
    public List<Spot> items() {
        List<Spot> items = new ArrayList<>();
        if (node != null && node.isArray()) {
            for (int i = 0; i < node.size(); i++) {
                items.add(new Spot(JsonPath.item(path, i), node.get(i)));
            }
        }
        return items;
    }

    /** The names of an object's fields, in the order of the text. */
    public List<String> names() {
        List<String> names = new ArrayList<>();
        if (node != null && node.isObject()) {
            for (Map.Entry<String, JsonNode> field : node.properties()) {
                names.add(field.getKey());
            }
        }
        return names;
    }
}
