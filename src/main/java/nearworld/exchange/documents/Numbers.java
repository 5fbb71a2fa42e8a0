package nearworld.exchange.documents;

import java.math.BigDecimal;
import java.math.BigInteger;
import nearworld.engine.basics.Fault;
import nearworld.exchange.faults.FaultList;
import nearworld.exchange.faults.Place;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.node.JsonNodeFactory;

/** Numbers as typed: exact decimals, within what a double can hold. */
final class Numbers {
    private static final JsonNodeFactory NODES = JsonNodeFactory.instance;
    private static final int LONGEST = 60;
    private static final int LONGEST_LONG = 15;
    /** Below it whole numbers are told apart by a double; no quantity of ours comes near. */
    private static final double GREATEST = 1e15;

    private Numbers() {}

    static boolean isWithinBounds(double value) {
        return Math.abs(value) <= GREATEST;
    }

    static Fault outOfBounds(String value, String path) {
        return Fault.of(
                "numberTooLarge",
                path,
                "value",
                value,
                "bound",
                BigDecimal.valueOf(GREATEST).toBigInteger());
    }

    /** @param text a decimal number; a null node where a fault was added */
    static JsonNode of(String text, String path, Place place, FaultList faults) {
        if (text.length() > LONGEST) {
            faults.add(Fault.of("numberTooLong", path, "digits", text.length(), "bound", LONGEST), place);
            return NODES.nullNode();
        }
        double value = Double.parseDouble(text);
        boolean zero = text.chars().takeWhile(c -> c != 'e' && c != 'E').noneMatch(c -> c >= '1' && c <= '9');
        if (!Double.isFinite(value) || (value == 0 && !zero)) {
            faults.add(Fault.of("notFinite", path, "value", text), place);
            return NODES.nullNode();
        }
        if (!isWithinBounds(value)) {
            faults.add(outOfBounds(text, path), place);
            return NODES.nullNode();
        }
        boolean whole = text.chars().allMatch(c -> (c >= '0' && c <= '9') || c == '-' || c == '+');
        if (!whole) {
            return NODES.numberNode(new BigDecimal(text));
        }
        return text.length() <= LONGEST_LONG
                ? NODES.numberNode(Long.parseLong(text))
                : NODES.numberNode(new BigInteger(text));
    }
}
