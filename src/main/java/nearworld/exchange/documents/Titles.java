package nearworld.exchange.documents;

import java.util.Locale;
import tools.jackson.databind.JsonNode;

/** Titles of things that a person picks from: one text, or one per language. */
public final class Titles {
    private static final String FALLBACK = "en";

    private Titles() {}

    /** The title in a language; without one in English, without that the identifier. */
    public static String of(JsonNode item, String id, Locale locale) {
        JsonNode title = item.path("title");
        if (title.isString()) {
            return title.asString();
        }
        for (String language : new String[] {locale.toLanguageTag(), locale.getLanguage(), FALLBACK}) {
            if (title.path(language).isString()) {
                return title.path(language).asString();
            }
        }
        return id;
    }
}
