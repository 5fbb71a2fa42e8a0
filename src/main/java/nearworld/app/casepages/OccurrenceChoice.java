package nearworld.app.casepages;

import java.util.List;
import nearworld.app.forms.HistoryForm;

/** A typed occurrence that a what-if can change; {@code value} names it in the form. */
record OccurrenceChoice(String value, String event, String on, String outcome) {
    static List<OccurrenceChoice> of(HistoryForm form) {
        return form.history().stream()
                .filter(h -> !h.event().isBlank())
                .flatMap(h -> h.occurrences().stream()
                        .filter(o -> !o.on().isBlank())
                        .map(o -> new OccurrenceChoice(
                                h.event() + "@" + o.on().strip(), h.event(), o.on().strip(), o.outcome())))
                .toList();
    }
}
