package nearworld.app.forms;

import java.util.List;

/** The section of events and observed windows, as typed. */
public record HistoryForm(List<HistoryRow> history) {
    public HistoryForm {
        history = Typed.rows(history);
    }

    /** A form in which nothing is typed. */
    public static HistoryForm empty() {
        return new HistoryForm(List.of());
    }

    /** A type of event, the window in which all of its occurrences are known, and the occurrences. */
    public record HistoryRow(String event, String from, String to, List<OccurrenceRow> occurrences) {
        public HistoryRow {
            event = Typed.text(event);
            from = Typed.text(from);
            to = Typed.text(to);
            occurrences = Typed.rows(occurrences);
        }

        boolean isBlank() {
            return Typed.allBlank(event, from, to) && occurrences.stream().allMatch(OccurrenceRow::isBlank);
        }
    }

    /** An occurrence: its date and its outcome. */
    public record OccurrenceRow(String on, String outcome) {
        public OccurrenceRow {
            on = Typed.text(on);
            outcome = Typed.text(outcome);
        }

        boolean isBlank() {
            return Typed.allBlank(on, outcome);
        }
    }
}
