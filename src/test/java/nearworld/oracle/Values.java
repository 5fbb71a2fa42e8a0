package nearworld.oracle;

import java.time.LocalDate;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.List;
import java.util.TreeMap;
import tools.jackson.databind.JsonNode;

/** Reads numbers, curves over age and dates from the trees of the exchange format. */
final class Values {
    static final double DAYS_PER_YEAR = 365.25;

    private Values() {}

    /** How a curve runs between the ages it is given at. */
    enum Scale {
        LOG {
            @Override
            double to(double v) {
                return Math.log(v);
            }

            @Override
            double from(double v) {
                return Math.exp(v);
            }
        },
        LOGIT {
            @Override
            double to(double v) {
                return Math.log(v) - Math.log1p(-v);
            }

            @Override
            double from(double v) {
                return 1 / (1 + Math.exp(-v));
            }
        };

        abstract double to(double v);

        abstract double from(double v);
    }

    /** Knots and values; a scalar is one knot. Flat beyond both ends. */
    record Curve(Scale scale, double[] at, double[] values) {
        double value(double a) {
            int n = at.length;
            if (a <= at[0]) {
                return values[0];
            }
            if (a >= at[n - 1]) {
                return values[n - 1];
            }
            int i = 0;
            while (a >= at[i + 1]) {
                i++;
            }
            double part = (a - at[i]) / (at[i + 1] - at[i]);
            return scale.from((1 - part) * scale.to(values[i]) + part * scale.to(values[i + 1]));
        }
    }

    /** A plain number, or the {@code value} of a number with its interval. */
    static double number(JsonNode node) {
        JsonNode value = node.isObject() ? node.path("value") : node;
        if (!value.isNumber()) {
            throw new IllegalArgumentException("not a number: " + node);
        }
        return value.doubleValue();
    }

    static double number(JsonNode parent, String field, double fallback) {
        return parent.has(field) ? number(parent.get(field)) : fallback;
    }

    /** A curve over age, given for this sex or for both, as a scalar or by age. */
    static Curve curve(JsonNode node, String sex, Scale scale) {
        JsonNode own = node.has("male") || node.has("female") ? node.get(sex) : node;
        if (!own.isObject() || own.has("value")) {
            return new Curve(scale, new double[] {0}, new double[] {number(own)});
        }
        TreeMap<Double, Double> knots = new TreeMap<>();
        own.properties().forEach(e -> knots.put(Double.valueOf(e.getKey()), number(e.getValue())));
        return curve(knots, scale);
    }

    static Curve curve(TreeMap<Double, Double> knots, Scale scale) {
        return new Curve(
                scale,
                knots.keySet().stream().mapToDouble(Double::doubleValue).toArray(),
                knots.values().stream().mapToDouble(Double::doubleValue).toArray());
    }

    /** A date; a year stands for its 1 July, a month for its 16th. */
    static LocalDate date(JsonNode node) {
        String text = node.asString();
        return switch (text.length()) {
            case 4 -> LocalDate.parse(text + "-07-01");
            case 7 -> LocalDate.parse(text + "-16");
            default -> LocalDate.parse(text);
        };
    }

    static double years(LocalDate from, LocalDate to) {
        return ChronoUnit.DAYS.between(from, to) / DAYS_PER_YEAR;
    }

    static boolean given(JsonNode parent, String field) {
        return parent.has(field) && !parent.get(field).isNull();
    }

    static List<String> names(JsonNode object) {
        return new ArrayList<>(object.propertyNames());
    }
}
