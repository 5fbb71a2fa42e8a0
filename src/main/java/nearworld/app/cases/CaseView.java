package nearworld.app.cases;

import java.time.LocalDate;
import java.util.List;
import nearworld.app.people.PersonView;
import org.jspecify.annotations.Nullable;

/**
 * A case, apart from what is typed in its sections.
 *
 * @param externalRef the reference that others know the applicant's case by; empty: none
 * @param mayEdit whether the person who asked may save sections
 * @param mayRecord whether the person who asked may record an assessment
 */
public record CaseView(
        String ref,
        CaseState state,
        PersonView owner,
        @Nullable PersonView assignee,
        LocalDate createdOn,
        @Nullable LocalDate dueOn,
        String externalRef,
        boolean mayEdit,
        boolean mayRecord,
        List<SectionState> sections) {
    public CaseView {
        sections = List.copyOf(sections);
    }
}
