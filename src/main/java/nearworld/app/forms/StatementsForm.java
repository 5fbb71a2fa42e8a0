package nearworld.app.forms;

import java.util.List;

/** The section of statements and findings, as typed. */
public record StatementsForm(List<StatementRow> statements, List<FindingRow> findings) {
    public StatementsForm {
        statements = Typed.rows(statements);
        findings = Typed.rows(findings);
    }

    /** A form in which nothing is typed. */
    public static StatementsForm empty() {
        return new StatementsForm(List.of(), List.of());
    }

    /** Who said what about a condition: {@code present} is {@code true} or {@code false}. */
    public record StatementRow(String condition, String present, String source, String on, String onset) {
        public StatementRow {
            condition = Typed.text(condition);
            present = Typed.text(present);
            source = Typed.text(source);
            on = Typed.text(on);
            onset = Typed.text(onset);
        }

        boolean isBlank() {
            return Typed.allBlank(condition, present, source, on, onset);
        }
    }

    /** A finding and its level in one, {@code finding:level}, and the day it speaks of. */
    public record FindingRow(String pick, String on) {
        public FindingRow {
            pick = Typed.text(pick);
            on = Typed.text(on);
        }

        boolean isBlank() {
            return Typed.allBlank(pick, on);
        }
    }
}
