package nearworld.app.forms;

import nearworld.app.forms.CaseDraft.Place;
import tools.jackson.databind.node.ArrayNode;
import tools.jackson.databind.node.ObjectNode;

/** Writes statements and findings into a draft. */
final class StatementsDraft {
    private StatementsDraft() {}

    static void write(CaseDraft draft, StatementsForm form) {
        ArrayNode statements = draft.json().putArray("statements");
        for (int i = 0; i < form.statements().size(); i++) {
            statement(draft, statements, form.statements().get(i), "statements[" + i + "]");
        }
        ArrayNode findings = draft.json().putArray("findings");
        for (int i = 0; i < form.findings().size(); i++) {
            finding(draft, findings, form.findings().get(i), "findings[" + i + "]");
        }
    }

    private static void statement(CaseDraft draft, ArrayNode array, StatementsForm.StatementRow row, String field) {
        Place place = new Place(Section.STATEMENTS, field, field + ".condition", true);
        if (row.isBlank() || !draft.keeps(place)) {
            return;
        }
        Place present = place.at(field + ".present");
        Place source = place.at(field + ".source");
        draft.require(row.condition(), place);
        draft.require(row.present(), present);
        draft.require(row.source(), source);
        String path = "$.statements[" + array.size() + "]";
        ObjectNode node = draft.append(array, "$.statements", place);
        draft.put(node, path, "condition", row.condition(), place);
        draft.remember(path + ".present", present);
        switch (row.present()) {
            case "true" -> node.put("present", true);
            case "false" -> node.put("present", false);
            default -> node.put("present", row.present());
        }
        draft.put(node, path, "source", row.source(), source);
        draft.put(node, path, "on", row.on(), place.at(field + ".on"));
        draft.put(node, path, "onset", row.onset(), place.at(field + ".onset"));
    }

    private static void finding(CaseDraft draft, ArrayNode array, StatementsForm.FindingRow row, String field) {
        Place place = new Place(Section.STATEMENTS, field, field + ".pick", true);
        if (row.isBlank() || !draft.keeps(place)) {
            return;
        }
        draft.require(row.pick(), place);
        String path = "$.findings[" + array.size() + "]";
        ObjectNode node = draft.append(array, "$.findings", place);
        int colon = row.pick().indexOf(':');
        String finding = colon < 0 ? row.pick() : row.pick().substring(0, colon);
        draft.put(node, path, "finding", finding, place);
        draft.put(node, path, "level", colon < 0 ? "" : row.pick().substring(colon + 1), place);
        draft.put(node, path, "on", row.on(), place.at(field + ".on"));
    }
}
