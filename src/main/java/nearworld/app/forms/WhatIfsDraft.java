package nearworld.app.forms;

import nearworld.app.forms.CaseDraft.Place;
import nearworld.engine.basics.Fault;
import tools.jackson.databind.node.ArrayNode;
import tools.jackson.databind.node.ObjectNode;

/** Writes what-ifs into a draft. */
final class WhatIfsDraft {
    private final CaseDraft draft;

    private WhatIfsDraft(CaseDraft draft) {
        this.draft = draft;
    }

    static void write(CaseDraft draft, WhatIfsForm form) {
        WhatIfsDraft writer = new WhatIfsDraft(draft);
        ArrayNode whatIfs = draft.json().putArray("whatIfs");
        for (int i = 0; i < form.whatIfs().size(); i++) {
            WhatIfsForm.WhatIfRow row = form.whatIfs().get(i);
            Place place = new Place(Section.WHAT_IFS, "whatIfs[" + i + "]", "whatIfs[" + i + "].name", true);
            if (!row.isBlank() && draft.keeps(place)) {
                writer.whatIf(whatIfs, row, place);
            }
        }
    }

    private void whatIf(ArrayNode whatIfs, WhatIfsForm.WhatIfRow row, Place place) {
        String path = "$.whatIfs[" + whatIfs.size() + "]";
        ObjectNode node = draft.append(whatIfs, "$.whatIfs", place);
        draft.require(row.name(), place);
        draft.put(node, path, "name", row.name(), place);
        ArrayNode changes = node.putArray("changes");
        if (row.changes().isEmpty()) {
            draft.require("", place.at(place.row() + ".addKind"));
        }
        for (int j = 0; j < row.changes().size(); j++) {
            String field = place.row() + ".changes[" + j + "]";
            Place kind = place.at(field + ".kind");
            String changePath = path + ".changes[" + j + "]";
            ObjectNode change = draft.append(changes, path + ".changes", kind);
            change(change, changePath, row.changes().get(j), new Field(kind, field));
        }
    }

    private void change(ObjectNode change, String changePath, WhatIfsForm.ChangeRow row, Field field) {
        String kind = row.kind();
        ObjectNode node = change.putObject(kind);
        String path = changePath + "." + kind;
        draft.remember(path, field.first(kind));
        switch (kind) {
            case "remove" -> occurrence(node, path, row, field);
            case "move" -> {
                occurrence(node, path, row, field);
                required(node, path, "to", row.to(), field.of("to"));
            }
            case "outcome" -> {
                occurrence(node, path, row, field);
                required(node, path, "to", row.outcome(), field.of("outcome"));
            }
            case "without" -> {
                required(node, path, "condition", row.condition(), field.of("condition"));
                draft.put(node, path, "from", row.from(), field.of("from"));
            }
            case "behaviour" -> behaviour(node, path, row, field);
            case "treat" -> {
                required(node, path, "treatment", row.treatment(), field.of("treatment"));
                draft.put(node, path, "from", row.from(), field.of("from"));
            }
            case "add" -> {
                required(node, path, "event", row.event(), field.of("event"));
                required(node, path, "on", row.on(), field.of("on"));
                draft.put(node, path, "outcome", row.outcome(), field.of("outcome"));
            }
            default -> draft.fault(field.of("kind"), Fault.of("unknownKind", path, "value", kind));
        }
    }

    private void occurrence(ObjectNode node, String path, WhatIfsForm.ChangeRow row, Field field) {
        Place place = field.of("occurrence");
        draft.require(row.occurrence(), place);
        int at = row.occurrence().indexOf('@');
        String event = at < 0 ? row.occurrence() : row.occurrence().substring(0, at);
        draft.put(node, path, "event", event, place);
        draft.put(node, path, "on", at < 0 ? "" : row.occurrence().substring(at + 1), place);
    }

    private void behaviour(ObjectNode node, String path, WhatIfsForm.ChangeRow row, Field field) {
        Place place = field.of("pick");
        draft.require(row.pick(), place);
        int colon = row.pick().indexOf(':');
        if (colon > 0) {
            draft.put(node, path, row.pick().substring(0, colon), row.pick().substring(colon + 1), place);
        }
        draft.put(node, path, "from", row.from(), field.of("from"));
    }

    private void required(ObjectNode node, String path, String name, String typed, Place place) {
        draft.require(typed, place);
        draft.put(node, path, name, typed, place);
    }

    /** The fields of one change. */
    private record Field(Place kind, String prefix) {
        Place of(String name) {
            return kind.at(prefix + "." + name);
        }

        /** The field that a person fills first. */
        Place first(String kindName) {
            return switch (kindName) {
                case "remove", "move", "outcome" -> of("occurrence");
                case "without" -> of("condition");
                case "behaviour" -> of("pick");
                case "treat" -> of("treatment");
                default -> of("event");
            };
        }
    }
}
