package nearworld.app.artefacts;

import java.util.Locale;
import java.util.function.Function;
import nearworld.app.forms.CaseCheck;
import nearworld.engine.mortality.MortalityTable;
import nearworld.engine.network.EvidencePack;
import org.jspecify.annotations.Nullable;

/**
 * An evidence pack ready for use.
 *
 * @param titleIn its title in a language
 * @param sha256 of its content, hexadecimal
 * @param checkWith reads cases against it, and against the ages and sexes of a table where one is given
 * @param choicesIn what a person can pick from it, in a language
 */
public record LoadedPack(
        EvidencePack pack,
        Function<Locale, String> titleIn,
        String sha256,
        Function<@Nullable MortalityTable, CaseCheck> checkWith,
        Function<Locale, PackChoices> choicesIn) {
    /** Its title in a language. */
    public String title(Locale locale) {
        return titleIn.apply(locale);
    }

    /** Reads cases against the pack, which must lie within the table's ages; null: whatever their age. */
    public CaseCheck check(@Nullable MortalityTable table) {
        return checkWith.apply(table);
    }

    /** What a person can pick from it, in a language. */
    public PackChoices choices(Locale locale) {
        return choicesIn.apply(locale);
    }
}
