package nearworld.exchange.documents;

import java.util.ArrayDeque;
import java.util.Deque;
import nearworld.engine.basics.Fault;
import nearworld.exchange.faults.FaultList;
import nearworld.exchange.faults.JsonPath;
import nearworld.exchange.faults.Place;
import org.jspecify.annotations.Nullable;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.node.ArrayNode;
import tools.jackson.databind.node.JsonNodeFactory;
import tools.jackson.databind.node.ObjectNode;

/** Builds a tree from a parser's steps, notes places, and finds duplicate keys and nesting that is too deep. */
final class TreeBuilder {
    static final int DEEPEST = 32;
    private static final JsonNodeFactory NODES = JsonNodeFactory.instance;

    /** The text is nested deeper than any format of ours. */
    static final class TooDeepException extends RuntimeException {
        private static final long serialVersionUID = 1L;
        final transient Place place;

        TooDeepException(Place place) {
            super("nested too deeply", null, false, false);
            this.place = place;
        }
    }

    private static final class Frame {
        final JsonNode node;
        final String path;

        @Nullable
        String key;

        boolean duplicate;

        Frame(JsonNode node, String path) {
            this.node = node;
            this.path = path;
        }
    }

    private final FaultList faults;
    private final Deque<Frame> frames = new ArrayDeque<>();
    private @Nullable JsonNode root;

    TreeBuilder(FaultList faults) {
        this.faults = faults;
    }

    @Nullable
    JsonNode root() {
        return root;
    }

    /** True where the root is there and nothing is open. */
    boolean isComplete() {
        return root != null && frames.isEmpty();
    }

    /** True where an object waits for its next key. */
    boolean awaitsKey() {
        Frame top = frames.peek();
        return top != null && top.node.isObject() && top.key == null;
    }

    void key(String key, Place place) {
        Frame top = frames.element();
        String path = JsonPath.field(top.path, key);
        top.key = key;
        top.duplicate = top.node.has(key);
        if (top.duplicate) {
            faults.add(
                    Fault.of(
                            "duplicateKey",
                            path,
                            "field",
                            key,
                            "firstLine",
                            faults.placeOf(path).line()),
                    place);
        }
        faults.place(path, place);
    }

    void startObject(Place place) {
        push(NODES.objectNode(), place);
    }

    void startArray(Place place) {
        push(NODES.arrayNode(), place);
    }

    void end() {
        frames.pop();
    }

    void value(JsonNode node, Place place) {
        put(node, place);
    }

    /** The path of the value that comes next. */
    String nextPath() {
        Frame top = frames.peek();
        if (top == null) {
            return JsonPath.ROOT;
        }
        return top.key != null ? JsonPath.field(top.path, top.key) : JsonPath.item(top.path, top.node.size());
    }

    private void push(JsonNode node, Place place) {
        if (frames.size() >= DEEPEST) {
            throw new TooDeepException(place);
        }
        String path = nextPath();
        put(node, place);
        frames.push(new Frame(node, path));
    }

    private void put(JsonNode node, Place place) {
        faults.place(nextPath(), place);
        Frame top = frames.peek();
        if (top == null) {
            root = node;
        } else if (top.node instanceof ArrayNode array) {
            array.add(node);
        } else if (top.node instanceof ObjectNode object && top.key != null) {
            // The first of two values stays; what hangs below the second is looked at and dropped.
            if (!top.duplicate) {
                object.set(top.key, node);
            }
            top.key = null;
        }
    }
}
