package nearworld.exchange.documents;

import com.networknt.schema.Error;
import com.networknt.schema.Schema;
import com.networknt.schema.SchemaRegistry;
import com.networknt.schema.SpecificationVersion;
import com.networknt.schema.path.NodePath;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.math.BigDecimal;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Set;
import java.util.stream.Collectors;
import nearworld.engine.basics.Fault;
import nearworld.exchange.faults.FaultList;
import nearworld.exchange.faults.JsonPath;
import org.jspecify.annotations.Nullable;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/** The published JSON Schemas (draft 2020-12), and validation by them. */
public enum FormatSchema {
    TABLE_HEAD("table-head-1"),
    PACK("pack-1"),
    BANDS("bands-1"),
    CASE("case-1"),
    RESULT("result-1");

    private static final String WRONG_TYPE = "wrongType";
    private static final int LONGEST_VALUE = 120;

    private final String id;
    private @Nullable Schema schema;

    FormatSchema(String id) {
        this.id = id;
    }

    /** The schema's name, for example {@code case-1}. */
    public String id() {
        return id;
    }

    /** The schema as it is published. */
    public byte[] bytes() {
        try (InputStream in = FormatSchema.class.getResourceAsStream("/schemas/" + id + ".json")) {
            return Objects.requireNonNull(in, id).readAllBytes();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** Validates a tree; each broken rule becomes a fault. */
    public void validate(JsonNode root, FaultList faults) {
        List<Fault> found =
                schema().validate(root).stream().map(FormatSchema::fault).toList();
        Set<String> mistyped = found.stream()
                .filter(f -> f.code().equals(WRONG_TYPE))
                .map(Fault::path)
                .collect(Collectors.toSet());
        // What is of the wrong type breaks other rules as well; only the type is worth reporting.
        found.stream()
                .filter(f -> f.code().equals(WRONG_TYPE) || !mistyped.contains(f.path()))
                .forEach(faults::add);
        faults.endStage();
    }

    private synchronized Schema schema() {
        if (schema == null) {
            JsonNode tree = JsonMapper.shared().readTree(bytes());
            schema = SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12)
                    .getSchema(tree);
        }
        return schema;
    }

    private static Fault fault(Error error) {
        String path = path(error.getInstanceLocation());
        String keyword = String.valueOf(error.getKeyword());
        String field = error.getProperty();
        Map<String, String> values = new LinkedHashMap<>();
        switch (keyword) {
            case "additionalProperties" -> {
                return Fault.of("unknownField", JsonPath.field(path, field), "field", field);
            }
            case "required" -> {
                return Fault.of("missingField", JsonPath.field(path, field), "field", field);
            }
            case "dependentRequired" -> {
                Object missing = error.getArguments()[0];
                return Fault.of("missingField", JsonPath.field(path, missing.toString()), "field", missing);
            }
            case "type" -> {
                values.put("expected", text(error.getSchemaNode()));
                values.put("value", text(error.getInstanceNode()));
            }
            case "enum", "const" -> {
                values.put("allowed", text(error.getSchemaNode()));
                values.put("value", text(error.getInstanceNode()));
            }
            default -> {
                values.put("bound", text(error.getSchemaNode()));
                values.put("value", text(error.getInstanceNode()));
            }
        }
        return new Fault(code(keyword, error), path, values);
    }

    private static String code(String keyword, Error error) {
        return switch (keyword) {
            case "type" -> WRONG_TYPE;
            case "enum", "const" -> "notAllowed";
            case "minimum" -> "belowMinimum";
            case "exclusiveMinimum" -> "notAbove";
            case "maximum" -> "aboveMaximum";
            case "exclusiveMaximum" -> "notBelow";
            case "minLength" -> "emptyText";
            case "maxLength" -> "textTooLong";
            case "minItems", "minProperties" -> "tooFew";
            case "maxItems", "maxProperties" -> "tooMany";
            case "uniqueItems" -> "repeatedItem";
            case "not" -> "reservedName";
            case "pattern" -> pattern(String.valueOf(error.getSchemaLocation()));
            default -> "notInFormat";
        };
    }

    private static String pattern(String rule) {
        if (rule.endsWith("/date/pattern")) {
            return "notADate";
        }
        if (rule.endsWith("/day/pattern")) {
            return "notADay";
        }
        return "wrongForm";
    }

    private static String path(NodePath location) {
        String path = JsonPath.ROOT;
        for (int i = 0; i < location.getNameCount(); i++) {
            Object step = location.getElement(i);
            path = step instanceof Integer index
                    ? JsonPath.item(path, index)
                    : JsonPath.field(path, String.valueOf(step));
        }
        return path;
    }

    private static String text(@Nullable JsonNode node) {
        if (node == null) {
            return "";
        }
        if (node.isArray() && node.values().stream().allMatch(JsonNode::isString)) {
            return String.join(
                    ", ", node.values().stream().map(JsonNode::asString).toList());
        }
        String text = node.isString() ? node.asString() : node.isNumber() ? number(node) : node.toString();
        return text.length() <= LONGEST_VALUE ? text : text.substring(0, LONGEST_VALUE) + "…";
    }

    private static String number(JsonNode node) {
        BigDecimal value = node.decimalValue();
        return Math.abs(value.scale()) > LONGEST_VALUE ? value.toString() : value.toPlainString();
    }
}
