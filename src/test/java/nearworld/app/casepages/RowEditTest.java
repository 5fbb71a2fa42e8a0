package nearworld.app.casepages;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Objects;
import nearworld.app.forms.CoverForm;
import nearworld.app.forms.HistoryForm;
import nearworld.app.forms.StatementsForm;
import nearworld.app.forms.WhatIfsForm;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The buttons that add and remove rows. */
class RowEditTest {
    private static final HistoryForm HISTORY = new HistoryForm(List.of(row("a", "1", "2"), row("b", "3", "4")));

    private static HistoryForm.HistoryRow row(String event, String... days) {
        return new HistoryForm.HistoryRow(
                event,
                "",
                "",
                List.of(days).stream()
                        .map(d -> new HistoryForm.OccurrenceRow(d, ""))
                        .toList());
    }

    private static Object add(String place, Object form) {
        return Objects.requireNonNull(RowEdit.of(place, null)).apply(form);
    }

    private static Object remove(String place, Object form) {
        return Objects.requireNonNull(RowEdit.of(null, place)).apply(form);
    }

    @Test
    void aRowIsAddedAtTheEnd() {
        HistoryForm edited = (HistoryForm) add("history", HISTORY);
        assertThat(edited.history()).extracting(HistoryForm.HistoryRow::event).containsExactly("a", "b", "");
    }

    @Test
    void anInnerRowIsAddedToItsOwnRow() {
        HistoryForm edited = (HistoryForm) add("history[1].occurrences", HISTORY);
        assertThat(edited).isEqualTo(new HistoryForm(List.of(row("a", "1", "2"), row("b", "3", "4", ""))));
    }

    @Test
    void theRowNamedIsRemoved() {
        assertThat(remove("history[0]", HISTORY)).isEqualTo(new HistoryForm(List.of(row("b", "3", "4"))));
        assertThat(remove("history[0].occurrences[1]", HISTORY))
                .isEqualTo(new HistoryForm(List.of(row("a", "1"), row("b", "3", "4"))));
    }

    @Test
    void statementsAndFindingsAreEditedApart() {
        StatementsForm form = new StatementsForm(List.of(), List.of(new StatementsForm.FindingRow("x:y", "")));
        assertThat(((StatementsForm) add("statements", form)).statements()).hasSize(1);
        assertThat(((StatementsForm) add("statements", form)).findings()).isEqualTo(form.findings());
        assertThat(((StatementsForm) remove("findings[0]", form)).findings()).isEmpty();
    }

    @Test
    void aChangeIsAddedOfTheKindChosen() {
        WhatIfsForm form = new WhatIfsForm(List.of(new WhatIfsForm.WhatIfRow("w", List.of(), "treat")));
        WhatIfsForm edited = (WhatIfsForm) add("whatIfs[0].changes", form);
        assertThat(edited.whatIfs().get(0).changes()).containsExactly(WhatIfsForm.ChangeRow.ofKind("treat"));
        assertThat(edited.whatIfs().get(0).addKind()).isEmpty();
        WhatIfsForm none = new WhatIfsForm(List.of(new WhatIfsForm.WhatIfRow("w", List.of(), "")));
        assertThat(add("whatIfs[0].changes", none)).isEqualTo(none);
    }

    @ParameterizedTest
    @ValueSource(
            strings = {"history[7]", "history[7].occurrences[0]", "history[0].occurrences[9]", "statements[0]", "other"
            })
    void whatIsNotThereIsNotRemoved(String place) {
        assertThat(remove(place, HISTORY)).isEqualTo(HISTORY);
    }

    @Test
    void aSectionWithoutRowsStaysAsItIs() {
        CoverForm cover = new CoverForm("term", "20", "", "", "");
        assertThat(add("cover", cover)).isEqualTo(cover);
    }

    @ParameterizedTest
    @ValueSource(strings = {"", "history[", "history[-1]", "history[99999]", "a.b.c", "history[0]x"})
    void nonsenseIsNoEdit(String place) {
        assertThat(RowEdit.of(place, null)).isNull();
        assertThat(RowEdit.of(null, place)).isNull();
        assertThat(RowEdit.of(null, null)).isNull();
    }
}
