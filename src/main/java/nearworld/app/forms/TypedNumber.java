package nearworld.app.forms;

import java.math.BigDecimal;
import java.util.regex.Pattern;
import nearworld.engine.basics.Fault;
import org.jspecify.annotations.Nullable;

/**
 * A number as people type it: spaces and apostrophes group digits, a point or a comma parts the decimals. A comma before
 * exactly three digits may mean either, so it is asked about rather than guessed.
 *
 * @param value null where there is a fault
 * @param fault null where there is a value
 */
record TypedNumber(@Nullable BigDecimal value, @Nullable Fault fault) {
    private static final Pattern GROUPING = Pattern.compile("[\\s\\u00a0\\u202f'\\u2019]");
    private static final Pattern PLAIN = Pattern.compile("-?[0-9]{1,15}(\\.[0-9]{1,10})?");
    private static final Pattern DECIMAL_COMMA = Pattern.compile("-?[0-9]{1,15},([0-9]{1,2}|[0-9]{4,10})");
    private static final Pattern GROUPS = Pattern.compile("-?[0-9]{1,3}([.,][0-9]{3})+([.,][0-9]+)?");
    private static final Pattern POINT_AND_THREE = Pattern.compile("-?[0-9]{1,3}\\.[0-9]{3}");

    static TypedNumber parse(String typed, String path) {
        String text = GROUPING.matcher(typed).replaceAll("");
        if (GROUPS.matcher(text).matches() && !(POINT_AND_THREE.matcher(text).matches() && text.startsWith("0."))) {
            return new TypedNumber(null, Fault.of("ambiguousNumber", path, "value", typed));
        }
        if (PLAIN.matcher(text).matches()) {
            return new TypedNumber(new BigDecimal(text), null);
        }
        if (DECIMAL_COMMA.matcher(text).matches()) {
            return new TypedNumber(new BigDecimal(text.replace(',', '.')), null);
        }
        return new TypedNumber(null, Fault.of("notANumber", path, "value", typed));
    }
}
