package nearworld.app.web;

import java.util.Locale;
import java.util.Map;
import nearworld.engine.basics.Fault;
import org.springframework.context.MessageSource;
import org.springframework.stereotype.Component;

/** The sentence that tells a fault or a warning. Templates know it as {@code faultWords}. */
@Component
public class FaultWords {
    private final MessageSource words;

    FaultWords(MessageSource words) {
        this.words = words;
    }

    /** The sentence {@code fault.<code>} with the fault's values in place of their names in braces. */
    public String sentence(Fault fault, Locale locale) {
        String unknown = words.getMessage("fault.unknownCode", new Object[] {fault.code(), fault.path()}, locale);
        String sentence = words.getMessage("fault." + fault.code(), null, unknown, locale);
        if (sentence == null) {
            return unknown;
        }
        for (Map.Entry<String, String> value : fault.values().entrySet()) {
            sentence = sentence.replace("{" + value.getKey() + "}", value.getValue());
        }
        return sentence.replace("{path}", fault.path());
    }
}
