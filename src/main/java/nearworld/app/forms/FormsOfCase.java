package nearworld.app.forms;

import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import tools.jackson.databind.JsonNode;

/** Turns a case in the exchange format into forms, as if a person had typed it. */
public final class FormsOfCase {
    private static final int PER_CENT_DIGITS = 2;

    private FormsOfCase() {}

    /** The forms that come to this case. */
    public static CaseForms of(JsonNode input) {
        return new CaseForms(
                person(input), statements(input), history(input), whatIfs(input), cover(input.path("cover")));
    }

    private static PersonForm person(JsonNode input) {
        JsonNode applicant = input.path("applicant");
        List<PersonForm.BehaviourRow> behaviours = new ArrayList<>();
        applicant
                .path("behaviours")
                .properties()
                .forEach(e -> behaviours.add(new PersonForm.BehaviourRow(
                        e.getKey(),
                        text(e.getValue(), "level"),
                        text(e.getValue(), "since"),
                        text(e.getValue(), "left"))));
        return new PersonForm(text(applicant, "sex"), text(applicant, "bornOn"), text(input, "assessedOn"), behaviours);
    }

    private static StatementsForm statements(JsonNode input) {
        List<StatementsForm.StatementRow> statements = new ArrayList<>();
        input.path("statements")
                .forEach(s -> statements.add(new StatementsForm.StatementRow(
                        text(s, "condition"), text(s, "present"), text(s, "source"), text(s, "on"), text(s, "onset"))));
        List<StatementsForm.FindingRow> findings = new ArrayList<>();
        input.path("findings")
                .forEach(f -> findings.add(
                        new StatementsForm.FindingRow(text(f, "finding") + ":" + text(f, "level"), text(f, "on"))));
        return new StatementsForm(statements, findings);
    }

    private static HistoryForm history(JsonNode input) {
        List<HistoryForm.HistoryRow> rows = new ArrayList<>();
        for (JsonNode event : input.path("history")) {
            List<HistoryForm.OccurrenceRow> occurrences = new ArrayList<>();
            event.path("occurrences")
                    .forEach(o -> occurrences.add(new HistoryForm.OccurrenceRow(text(o, "on"), text(o, "outcome"))));
            rows.add(new HistoryForm.HistoryRow(
                    text(event, "event"), text(event, "from"), text(event, "to"), occurrences));
        }
        return new HistoryForm(rows);
    }

    private static WhatIfsForm whatIfs(JsonNode input) {
        List<WhatIfsForm.WhatIfRow> rows = new ArrayList<>();
        for (JsonNode whatIf : input.path("whatIfs")) {
            List<WhatIfsForm.ChangeRow> changes = new ArrayList<>();
            whatIf.path("changes")
                    .forEach(c -> c.properties().forEach(e -> changes.add(change(e.getKey(), e.getValue()))));
            rows.add(new WhatIfsForm.WhatIfRow(text(whatIf, "name"), changes, ""));
        }
        return new WhatIfsForm(rows);
    }

    private static WhatIfsForm.ChangeRow change(String kind, JsonNode node) {
        boolean recorded = kind.equals("remove") || kind.equals("move") || kind.equals("outcome");
        boolean added = kind.equals("add");
        return new WhatIfsForm.ChangeRow(
                kind,
                recorded ? text(node, "event") + "@" + text(node, "on") : "",
                added ? text(node, "event") : "",
                kind.equals("outcome") ? text(node, "to") : text(node, "outcome"),
                text(node, "condition"),
                kind.equals("behaviour") ? pick(node) : "",
                text(node, "treatment"),
                added ? text(node, "on") : "",
                text(node, "from"),
                kind.equals("move") ? text(node, "to") : "");
    }

    private static String pick(JsonNode node) {
        return node.properties().stream()
                .filter(e -> !e.getKey().equals("from"))
                .map(e -> e.getKey() + ":" + e.getValue().asString(""))
                .findFirst()
                .orElse("");
    }

    private static CoverForm cover(JsonNode cover) {
        JsonNode interest = cover.path("interest");
        BigDecimal percent = interest.isNumber() ? interest.decimalValue().movePointRight(PER_CENT_DIGITS) : null;
        return new CoverForm(
                text(cover, "kind"),
                text(cover, "years"),
                text(cover, "sumAssured"),
                text(cover, "currency"),
                percent == null ? "" : percent.stripTrailingZeros().toPlainString());
    }

    private static String text(JsonNode node, String name) {
        JsonNode value = node.path(name);
        return value.isNumber() ? value.decimalValue().toPlainString() : value.asString("");
    }
}
