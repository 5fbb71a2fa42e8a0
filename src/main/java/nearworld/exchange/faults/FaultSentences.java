package nearworld.exchange.faults;

import java.util.Locale;
import java.util.Map;
import java.util.MissingResourceException;
import java.util.ResourceBundle;
import java.util.stream.Collectors;
import nearworld.engine.basics.Fault;

/** The sentence that tells a fault, from {@code messages/faults*.properties}: {@code fault.<code>} with values in braces. */
public final class FaultSentences {
    private final ResourceBundle words;

    public FaultSentences(Locale locale) {
        this.words = ResourceBundle.getBundle(
                "messages.faults",
                locale,
                ResourceBundle.Control.getNoFallbackControl(ResourceBundle.Control.FORMAT_PROPERTIES));
    }

    /** The sentence; for a code without one, the code with its values. */
    public String sentence(Fault fault) {
        String sentence;
        try {
            sentence = words.getString("fault." + fault.code());
        } catch (MissingResourceException e) {
            return fault.code() + " (" + values(fault) + ")";
        }
        for (Map.Entry<String, String> value : fault.values().entrySet()) {
            sentence = sentence.replace("{" + value.getKey() + "}", value.getValue());
        }
        return sentence.replace("{path}", fault.path());
    }

    /** The fault's values as {@code name=value}. */
    public static String values(Fault fault) {
        return fault.values().entrySet().stream()
                .map(e -> e.getKey() + "=" + e.getValue())
                .collect(Collectors.joining(", "));
    }
}
