package nearworld.exchange.documents;

import nearworld.exchange.faults.FaultList;
import org.jspecify.annotations.Nullable;
import tools.jackson.databind.JsonNode;

/**
 * A text as a tree.
 *
 * @param root null where the text is no tree at all
 * @param faults what is wrong so far; knows the places of the text
 */
public record Document(@Nullable JsonNode root, FaultList faults) {
    /** A tree that did not come from a text. */
    public static Document of(JsonNode root) {
        return GivenTree.document(root);
    }

    /** The root as the place where reading starts. */
    public Spot spot() {
        return new Spot("$", root);
    }
}
