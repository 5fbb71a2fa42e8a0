package nearworld.app.fields;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Stream;
import nearworld.app.artefacts.PackChoices;
import nearworld.app.artefacts.PackChoices.Choice;
import nearworld.app.artefacts.PackChoices.EventChoice;
import nearworld.app.artefacts.PackChoices.OutcomeChoice;
import nearworld.app.fields.OptionGroup.Option;
import nearworld.app.forms.HistoryForm;
import org.springframework.context.MessageSource;
import org.springframework.stereotype.Component;

/** What the selects of the pages offer. Templates know it as {@code options}. */
@Component
public class Options {
    private final MessageSource words;

    Options(MessageSource words) {
        this.words = words;
    }

    /** Things of the pack, by title. */
    public List<OptionGroup> choices(List<Choice> choices) {
        return plain(choices.stream().map(c -> new Option(c.id(), c.title())));
    }

    /** Codes whose words are messages: {@code prefix.code}. */
    public List<OptionGroup> coded(String prefix, String codes, Locale locale) {
        return plain(Stream.of(codes.split(","))
                .map(code -> new Option(code, words.getMessage(prefix + "." + code, null, locale))));
    }

    /** Types of events. */
    public List<OptionGroup> events(PackChoices choices) {
        return plain(choices.events().stream().map(e -> new Option(e.id(), e.title())));
    }

    /** The levels of one behaviour of the pack; none where the pack does not know it. */
    public List<OptionGroup> levels(PackChoices choices, String behaviour) {
        return choices.behaviours().stream()
                .filter(b -> b.id().equals(behaviour))
                .findFirst()
                .map(b -> choices(b.levels()))
                .orElse(List.of());
    }

    /** The title of a behaviour; its id where the pack does not know it. */
    public String behaviourTitle(PackChoices choices, String behaviour) {
        return choices.behaviours().stream()
                .filter(b -> b.id().equals(behaviour))
                .map(PackChoices.BehaviourChoice::title)
                .findFirst()
                .orElse(behaviour);
    }

    /** All findings with their units, and under each its levels; the value is {@code finding:level}. */
    public List<OptionGroup> findings(PackChoices choices) {
        return choices.findings().stream()
                .map(f -> new OptionGroup(
                        f.unit().isEmpty() ? f.title() : f.title() + " (" + f.unit() + ")",
                        f.levels().stream()
                                .map(l -> new Option(f.id() + ":" + l.id(), f.title() + ": " + l.title()))
                                .toList()))
                .toList();
    }

    /** All behaviours, and under each its levels; the value is {@code behaviour:level}. */
    public List<OptionGroup> behaviours(PackChoices choices) {
        return choices.behaviours().stream()
                .map(b -> new OptionGroup(
                        b.title(),
                        b.levels().stream()
                                .map(l -> new Option(b.id() + ":" + l.id(), b.title() + ": " + l.title()))
                                .toList()))
                .toList();
    }

    /**
     * The outcomes of an event that a person survives; of every event, under its title, where none is picked yet.
     */
    public List<OptionGroup> outcomes(PackChoices choices, String event) {
        return choices.events().stream()
                .filter(e -> event.isEmpty() || e.id().equals(event))
                .map(e -> new OptionGroup(event.isEmpty() ? e.title() : "", outcomes(e)))
                .toList();
    }

    private static List<Option> outcomes(EventChoice event) {
        return event.outcomes().stream()
                .filter(o -> !o.fatal())
                .map((OutcomeChoice o) -> new Option(o.id(), o.title()))
                .toList();
    }

    /** The occurrences typed in the history; the value is {@code event@date}. */
    public List<OptionGroup> occurrences(HistoryForm history, PackChoices choices) {
        return plain(history.history().stream()
                .flatMap(row -> row.occurrences().stream()
                        .filter(o -> !o.on().isBlank() && !row.event().isBlank())
                        .map(o -> new Option(
                                row.event() + "@" + o.on().strip(),
                                label(choices, row.event(), o.on(), o.outcome())))));
    }

    private static String label(PackChoices choices, String event, String on, String outcome) {
        Optional<EventChoice> known =
                choices.events().stream().filter(e -> e.id().equals(event)).findFirst();
        String title = known.map(EventChoice::title).orElse(event);
        String ended = known.stream()
                .flatMap(e -> e.outcomes().stream())
                .filter(o -> o.id().equals(outcome))
                .map(o -> ", " + o.title())
                .findFirst()
                .orElse("");
        return title + ", " + on.strip() + ended;
    }

    /** The event of a recorded occurrence {@code event@date}; empty where none is picked yet. */
    public String eventOf(String occurrence) {
        int at = occurrence.indexOf('@');
        return at < 0 ? "" : occurrence.substring(0, at);
    }

    /** Whether a value can be picked; what was typed once and is no longer offered is shown all the same. */
    public boolean offers(List<OptionGroup> groups, String value) {
        return OptionGroup.offers(groups, value);
    }

    private static List<OptionGroup> plain(Stream<Option> options) {
        return List.of(new OptionGroup("", options.toList()));
    }
}
