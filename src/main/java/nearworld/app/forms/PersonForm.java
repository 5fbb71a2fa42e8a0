package nearworld.app.forms;

import java.util.List;

/**
 * The section about the person, as typed.
 *
 * @param sex {@code male} or {@code female}
 * @param bornOn a date, a month or a year
 * @param assessedOn the day that the case speaks of; empty: the day of the calculation
 * @param behaviours a row for each behaviour of the pack
 */
public record PersonForm(String sex, String bornOn, String assessedOn, List<BehaviourRow> behaviours) {
    public PersonForm {
        sex = Typed.text(sex);
        bornOn = Typed.text(bornOn);
        assessedOn = Typed.text(assessedOn);
        behaviours = Typed.rows(behaviours);
    }

    /** A form in which nothing is typed. */
    public static PersonForm empty() {
        return new PersonForm("", "", "", List.of());
    }

    /** A behaviour's level ({@code level} empty: not known), since when a habit is given up, and the level left. */
    public record BehaviourRow(String behaviour, String level, String since, String left) {
        public BehaviourRow {
            behaviour = Typed.text(behaviour);
            level = Typed.text(level);
            since = Typed.text(since);
            left = Typed.text(left);
        }

        boolean isBlank() {
            return Typed.allBlank(level, since, left);
        }
    }
}
