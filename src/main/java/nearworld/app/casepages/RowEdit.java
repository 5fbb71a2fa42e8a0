package nearworld.app.casepages;

import java.util.ArrayList;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import nearworld.app.forms.HistoryForm;
import nearworld.app.forms.StatementsForm;
import nearworld.app.forms.WhatIfsForm;
import org.jspecify.annotations.Nullable;

/** Adds a row to a form, or takes one away, for the buttons that do so without saving anything. */
final class RowEdit {
    private static final Pattern PLACE =
            Pattern.compile("([a-zA-Z]+)(?:\\[([0-9]{1,4})])?(?:\\.([a-zA-Z]+)(?:\\[([0-9]{1,4})])?)?");
    private static final int NONE = -1;

    private final String list;
    private final int row;
    private final String inner;
    private final int innerRow;
    private final boolean add;

    private RowEdit(Matcher place, boolean add) {
        this.list = place.group(1);
        this.row = number(place.group(2));
        this.inner = place.group(3) == null ? "" : place.group(3);
        this.innerRow = number(place.group(4));
        this.add = add;
    }

    private static int number(@Nullable String digits) {
        return digits == null ? NONE : Integer.parseInt(digits);
    }

    /** The edit that a button asks for; null where none was pressed or its value makes no sense. */
    static @Nullable RowEdit of(@Nullable String add, @Nullable String remove) {
        String place = add != null ? add : remove;
        if (place == null) {
            return null;
        }
        Matcher matcher = PLACE.matcher(place);
        return matcher.matches() ? new RowEdit(matcher, add != null) : null;
    }

    /** The form with the edit made; a form that cannot be edited so is returned as it is. */
    Object apply(Object form) {
        if (form instanceof StatementsForm statements) {
            return statements(statements);
        }
        if (form instanceof HistoryForm history) {
            return new HistoryForm(
                    list.equals("history")
                            ? edited(history.history(), this::history, newHistory())
                            : history.history());
        }
        if (form instanceof WhatIfsForm whatIfs) {
            return new WhatIfsForm(
                    list.equals("whatIfs") ? edited(whatIfs.whatIfs(), this::whatIf, newWhatIf()) : whatIfs.whatIfs());
        }
        return form;
    }

    private StatementsForm statements(StatementsForm form) {
        return switch (list) {
            case "statements" ->
                new StatementsForm(
                        changed(form.statements(), row, new StatementsForm.StatementRow("", "", "", "", "")),
                        form.findings());
            case "findings" ->
                new StatementsForm(
                        form.statements(), changed(form.findings(), row, new StatementsForm.FindingRow("", "")));
            default -> form;
        };
    }

    private HistoryForm.HistoryRow history(HistoryForm.HistoryRow old) {
        if (!inner.equals("occurrences")) {
            return old;
        }
        return new HistoryForm.HistoryRow(
                old.event(),
                old.from(),
                old.to(),
                changed(old.occurrences(), innerRow, new HistoryForm.OccurrenceRow("", "")));
    }

    private WhatIfsForm.WhatIfRow whatIf(WhatIfsForm.WhatIfRow old) {
        if (!inner.equals("changes") || (add && old.addKind().isBlank())) {
            return old;
        }
        return new WhatIfsForm.WhatIfRow(
                old.name(), changed(old.changes(), innerRow, WhatIfsForm.ChangeRow.ofKind(old.addKind())), "");
    }

    private static HistoryForm.HistoryRow newHistory() {
        return new HistoryForm.HistoryRow("", "", "", List.of());
    }

    private static WhatIfsForm.WhatIfRow newWhatIf() {
        return new WhatIfsForm.WhatIfRow("", List.of(), "");
    }

    /** Edits the outer list, or one of its rows where the edit is about an inner list. */
    private <T> List<T> edited(List<T> rows, java.util.function.UnaryOperator<T> insideRow, T fresh) {
        if (inner.isEmpty()) {
            return changed(rows, row, fresh);
        }
        List<T> copy = new ArrayList<>(rows);
        if (row >= 0 && row < copy.size()) {
            copy.set(row, insideRow.apply(copy.get(row)));
        }
        return copy;
    }

    private <T> List<T> changed(List<T> rows, int index, T fresh) {
        List<T> copy = new ArrayList<>(rows);
        if (add) {
            copy.add(fresh);
        } else if (index >= 0 && index < copy.size()) {
            copy.remove(index);
        }
        return copy;
    }
}
