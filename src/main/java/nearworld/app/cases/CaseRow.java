package nearworld.app.cases;

import java.time.Instant;
import java.time.LocalDate;
import nearworld.app.people.PersonView;
import org.jspecify.annotations.Nullable;

/**
 * One case in a list.
 *
 * @param mortalityRatio of the assessment recorded last, 1 = table; null: none yet
 * @param overdue due before today and not decided or closed
 */
public record CaseRow(
        String ref,
        CaseState state,
        PersonView owner,
        @Nullable PersonView assignee,
        LocalDate createdOn,
        Instant updatedAt,
        @Nullable LocalDate dueOn,
        @Nullable String coverKind,
        @Nullable Double mortalityRatio,
        boolean overdue) {}
