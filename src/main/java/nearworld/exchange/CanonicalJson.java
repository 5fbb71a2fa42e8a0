package nearworld.exchange;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import tools.jackson.databind.JsonNode;

/**
 * JSON in canonical form (RFC 8785, JSON Canonicalization Scheme): no white space, names of an object sorted by their
 * UTF-16 code units, texts with the shortest escapes, numbers as ECMAScript writes an IEEE 754 double.
 */
public final class CanonicalJson {
    /** Every double is told apart by at most so many decimal digits. */
    private static final int MOST_DIGITS = 17;

    /** ECMAScript writes exponents from 10^21 up and below 10^-6. */
    private static final int LARGEST_PLAIN_POINT = 21;

    private static final int SMALLEST_PLAIN_POINT = -6;

    private CanonicalJson() {}

    /** The canonical text of a JSON value. */
    public static String of(JsonNode node) {
        StringBuilder out = new StringBuilder();
        write(node, out);
        return out.toString();
    }

    private static void write(JsonNode node, StringBuilder out) {
        if (node.isObject()) {
            writeObject(node, out);
        } else if (node.isArray()) {
            out.append('[');
            for (int i = 0; i < node.size(); i++) {
                if (i > 0) {
                    out.append(',');
                }
                write(node.path(i), out);
            }
            out.append(']');
        } else if (node.isString()) {
            writeText(node.stringValue(), out);
        } else if (node.isNumber()) {
            out.append(number(node.doubleValue()));
        } else if (node.isBoolean()) {
            out.append(node.booleanValue());
        } else if (node.isNull()) {
            out.append("null");
        } else {
            throw new IllegalArgumentException("JSON has no value of the type " + node.getNodeType());
        }
    }

    private static void writeObject(JsonNode node, StringBuilder out) {
        List<String> names = new ArrayList<>(node.propertyNames());
        Collections.sort(names);
        out.append('{');
        boolean first = true;
        for (String name : names) {
            if (!first) {
                out.append(',');
            }
            first = false;
            writeText(name, out);
            out.append(':');
            write(node.path(name), out);
        }
        out.append('}');
    }

    private static void writeText(String text, StringBuilder out) {
        out.append('"');
        for (int i = 0; i < text.length(); i++) {
            char c = text.charAt(i);
            switch (c) {
                case '"' -> out.append("\\\"");
                case '\\' -> out.append("\\\\");
                case '\b' -> out.append("\\b");
                case '\t' -> out.append("\\t");
                case '\n' -> out.append("\\n");
                case '\f' -> out.append("\\f");
                case '\r' -> out.append("\\r");
                default -> {
                    refuseLoneSurrogate(text, i);
                    if (c < ' ') {
                        out.append(String.format("\\u%04x", (int) c));
                    } else {
                        out.append(c);
                    }
                }
            }
        }
        out.append('"');
    }

    private static void refuseLoneSurrogate(String text, int i) {
        char c = text.charAt(i);
        boolean lone = Character.isHighSurrogate(c)
                ? i + 1 == text.length() || !Character.isLowSurrogate(text.charAt(i + 1))
                : Character.isLowSurrogate(c) && (i == 0 || !Character.isHighSurrogate(text.charAt(i - 1)));
        if (lone) {
            throw new IllegalArgumentException("half a surrogate pair at character " + i + " has no canonical form");
        }
    }

    /** A double as ECMAScript's Number::toString writes it: the shortest digits that read back as the same double. */
    static String number(double value) {
        if (!Double.isFinite(value)) {
            throw new IllegalArgumentException("JSON has no number " + value);
        }
        if (value == 0) {
            return "0";
        }
        BigDecimal shortest = shortest(Math.abs(value));
        String digits = shortest.unscaledValue().toString();
        int point = digits.length() - shortest.scale();
        return (value < 0 ? "-" : "") + layOut(digits, point);
    }

    private static BigDecimal shortest(double value) {
        BigDecimal exact = new BigDecimal(value);
        for (int digits = 1; digits < MOST_DIGITS; digits++) {
            BigDecimal rounded = exact.round(new MathContext(digits, RoundingMode.HALF_EVEN));
            if (rounded.doubleValue() == value) {
                return rounded.stripTrailingZeros();
            }
        }
        return exact.round(new MathContext(MOST_DIGITS, RoundingMode.HALF_EVEN)).stripTrailingZeros();
    }

    /** @param point how many of the digits stand before the decimal point; may lie outside of them */
    private static String layOut(String digits, int point) {
        int count = digits.length();
        if (point > LARGEST_PLAIN_POINT || point <= SMALLEST_PLAIN_POINT) {
            String fraction = count == 1 ? "" : "." + digits.substring(1);
            return digits.charAt(0) + fraction + "e" + (point > 0 ? "+" : "-") + Math.abs(point - 1);
        }
        if (point <= 0) {
            return "0." + "0".repeat(-point) + digits;
        }
        return point >= count
                ? digits + "0".repeat(point - count)
                : digits.substring(0, point) + "." + digits.substring(point);
    }
}
