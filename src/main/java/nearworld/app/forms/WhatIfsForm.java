package nearworld.app.forms;

import java.util.List;

/** The section of what-ifs, as typed. */
public record WhatIfsForm(List<WhatIfRow> whatIfs) {
    public WhatIfsForm {
        whatIfs = Typed.rows(whatIfs);
    }

    /** A form in which nothing is typed. */
    public static WhatIfsForm empty() {
        return new WhatIfsForm(List.of());
    }

    /** A named list of changes; {@code addKind} is the kind that the next added change would have. */
    public record WhatIfRow(String name, List<ChangeRow> changes, String addKind) {
        public WhatIfRow {
            name = Typed.text(name);
            changes = Typed.rows(changes);
            addKind = Typed.text(addKind);
        }

        boolean isBlank() {
            return Typed.allBlank(name) && changes.isEmpty();
        }
    }

    /**
     * One change; which of the fields count depends on the kind.
     *
     * @param kind remove, move, outcome, without, behaviour, treat or add
     * @param occurrence a recorded occurrence, {@code event@date}
     * @param event the event added
     * @param outcome the outcome of the event added, or the other outcome of the occurrence
     * @param condition the condition that is absent
     * @param pick behaviour and level in one, {@code behaviour:level}
     * @param treatment the treatment started
     * @param on the date of the event added
     * @param from the day from which the change acts; empty: always
     * @param to the date that the occurrence is moved to
     */
    public record ChangeRow(
            String kind,
            String occurrence,
            String event,
            String outcome,
            String condition,
            String pick,
            String treatment,
            String on,
            String from,
            String to) {
        public ChangeRow {
            kind = Typed.text(kind);
            occurrence = Typed.text(occurrence);
            event = Typed.text(event);
            outcome = Typed.text(outcome);
            condition = Typed.text(condition);
            pick = Typed.text(pick);
            treatment = Typed.text(treatment);
            on = Typed.text(on);
            from = Typed.text(from);
            to = Typed.text(to);
        }

        /** A change of a kind in which nothing else is typed. */
        public static ChangeRow ofKind(String kind) {
            return new ChangeRow(kind, "", "", "", "", "", "", "", "", "");
        }
    }
}
