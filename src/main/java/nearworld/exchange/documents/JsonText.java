package nearworld.exchange.documents;

import java.util.Map;
import nearworld.engine.basics.Fault;
import nearworld.exchange.faults.FaultList;
import nearworld.exchange.faults.JsonPath;
import nearworld.exchange.faults.Place;
import org.jspecify.annotations.Nullable;
import tools.jackson.core.JacksonException;
import tools.jackson.core.JsonParser;
import tools.jackson.core.JsonToken;
import tools.jackson.core.ObjectReadContext;
import tools.jackson.core.StreamReadConstraints;
import tools.jackson.core.TokenStreamLocation;
import tools.jackson.core.json.JsonFactory;
import tools.jackson.core.json.JsonReadFeature;
import tools.jackson.databind.node.JsonNodeFactory;

/** Reads JSON (RFC 8259) as a document. NaN and infinities are read too, to be refused with their place. */
public final class JsonText {
    private static final JsonNodeFactory NODES = JsonNodeFactory.instance;
    private static final JsonFactory FACTORY = JsonFactory.builder()
            .enable(JsonReadFeature.ALLOW_NON_NUMERIC_NUMBERS)
            .streamReadConstraints(StreamReadConstraints.builder()
                    .maxNestingDepth(2 * TreeBuilder.DEEPEST)
                    .maxNumberLength(1000)
                    .maxNameLength(1000)
                    .maxStringLength(1_000_000)
                    .build())
            .build();

    private JsonText() {}

    /**
     * @param mostBytes the greatest size
     * @param firstLine number of the text's first line within its file
     */
    public static Document read(byte[] bytes, int mostBytes, int firstLine) {
        FaultList faults = new FaultList();
        String text = StrictText.decode(bytes, mostBytes, firstLine, faults);
        Document document = text == null ? new Document(null, faults) : read(text, firstLine, faults);
        faults.endStage();
        return document;
    }

    /** True where a text is the beginning of a JSON value that goes on. */
    public static boolean isUnfinished(String text) {
        try (JsonParser parser = FACTORY.createParser(ObjectReadContext.empty(), text)) {
            while (parser.nextToken() != null) {
                // Every token is looked at; the end decides.
            }
            return false;
        } catch (JacksonException e) {
            // The parser has a type of its own for this, but does not always use it.
            String message = e.getOriginalMessage();
            return message != null && message.startsWith("Unexpected end-of-input");
        }
    }

    static Document read(String text, int firstLine, FaultList faults) {
        TreeBuilder tree = new TreeBuilder(faults);
        try (JsonParser parser = FACTORY.createParser(ObjectReadContext.empty(), text)) {
            JsonToken token = parser.nextToken();
            if (token == null) {
                faults.add(Fault.of("emptyDocument", JsonPath.ROOT), new Place(firstLine, 1));
                return new Document(null, faults);
            }
            while (token != null) {
                step(token, parser, tree, firstLine, faults);
                token = parser.nextToken();
                if (tree.isComplete() && token != null) {
                    faults.add(
                            Fault.of("trailingContent", JsonPath.ROOT),
                            place(parser.currentTokenLocation(), firstLine));
                    return new Document(null, faults);
                }
            }
            return new Document(tree.root(), faults);
        } catch (TreeBuilder.TooDeepException e) {
            faults.add(Fault.of("tooDeep", JsonPath.ROOT, "bound", TreeBuilder.DEEPEST), e.place);
        } catch (JacksonException e) {
            faults.add(syntax(e), place(e.getLocation(), firstLine));
        }
        return new Document(null, faults);
    }

    private static Fault syntax(JacksonException e) {
        String message = e.getOriginalMessage();
        return new Fault("notJson", JsonPath.ROOT, Map.of("detail", message == null ? "" : firstLineOf(message)));
    }

    private static String firstLineOf(String message) {
        return message.lines().findFirst().orElse("");
    }

    private static void step(JsonToken token, JsonParser parser, TreeBuilder tree, int firstLine, FaultList faults) {
        Place place = place(parser.currentTokenLocation(), firstLine);
        switch (token) {
            case START_OBJECT -> tree.startObject(place);
            case START_ARRAY -> tree.startArray(place);
            case END_OBJECT, END_ARRAY -> tree.end();
            case PROPERTY_NAME -> tree.key(parser.currentName(), place);
            case VALUE_TRUE -> tree.value(NODES.booleanNode(true), place);
            case VALUE_FALSE -> tree.value(NODES.booleanNode(false), place);
            case VALUE_NULL -> tree.value(NODES.nullNode(), place);
            case VALUE_STRING -> tree.value(NODES.stringNode(parser.getString()), place);
            default -> number(parser, tree, place, faults);
        }
    }

    private static void number(JsonParser parser, TreeBuilder tree, Place place, FaultList faults) {
        String text = parser.getString();
        if (parser.currentToken() == JsonToken.VALUE_NUMBER_FLOAT && parser.isNaN()) {
            faults.add(Fault.of("notFinite", tree.nextPath(), "value", text), place);
            tree.value(NODES.nullNode(), place);
        } else {
            tree.value(Numbers.of(text, tree.nextPath(), place, faults), place);
        }
    }

    private static Place place(@Nullable TokenStreamLocation location, int firstLine) {
        return location == null
                ? Place.NOWHERE
                : new Place(location.getLineNr() + firstLine - 1, location.getColumnNr());
    }
}
