package nearworld.app.forms;

import java.util.List;
import nearworld.app.forms.CaseDraft.Place;
import tools.jackson.databind.node.ArrayNode;
import tools.jackson.databind.node.ObjectNode;

/** Writes events and windows into a draft. */
final class HistoryDraft {
    private HistoryDraft() {}

    static void write(CaseDraft draft, HistoryForm form) {
        ArrayNode history = draft.json().putArray("history");
        for (int i = 0; i < form.history().size(); i++) {
            HistoryForm.HistoryRow row = form.history().get(i);
            Place place = new Place(Section.HISTORY, "history[" + i + "]", "history[" + i + "].event", true);
            if (!row.isBlank() && draft.keeps(place)) {
                row(draft, history, row, place);
            }
        }
    }

    private static void row(CaseDraft draft, ArrayNode history, HistoryForm.HistoryRow row, Place place) {
        String path = "$.history[" + history.size() + "]";
        ObjectNode node = draft.append(history, "$.history", place);
        Place from = place.at(place.row() + ".from");
        draft.require(row.event(), place);
        draft.put(node, path, "event", row.event(), place);
        draft.put(node, path, "from", row.from(), from);
        draft.put(node, path, "to", row.to(), place.at(place.row() + ".to"));
        ArrayNode occurrences = node.putArray("occurrences");
        List<HistoryForm.OccurrenceRow> rows = row.occurrences();
        for (int j = 0; j < rows.size(); j++) {
            if (!rows.get(j).isBlank()) {
                String field = place.row() + ".occurrences[" + j + "]";
                occurrence(draft, occurrences, path + ".occurrences", rows.get(j), place.at(field + ".on"), field);
            }
        }
        if (occurrences.isEmpty() && Typed.allBlank(row.from(), row.to())) {
            draft.require("", from);
        }
    }

    private static void occurrence(
            CaseDraft draft, ArrayNode array, String arrayPath, HistoryForm.OccurrenceRow row, Place on, String field) {
        String path = arrayPath + "[" + array.size() + "]";
        ObjectNode node = draft.append(array, arrayPath, on);
        Place outcome = on.at(field + ".outcome");
        draft.require(row.on(), on);
        draft.require(row.outcome(), outcome);
        draft.put(node, path, "on", row.on(), on);
        draft.put(node, path, "outcome", row.outcome(), outcome);
    }
}
