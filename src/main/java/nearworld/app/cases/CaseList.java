package nearworld.app.cases;

import java.util.List;
import nearworld.app.people.PersonView;

/**
 * One page of the cases that a person sees.
 *
 * @param page from 1
 * @param pages at least 1
 * @param total cases on all pages
 * @param owners whom the list can be filtered by
 */
public record CaseList(
        List<CaseRow> rows,
        CaseQuery query,
        int page,
        int pages,
        long total,
        List<PersonView> owners,
        boolean mayCreate) {
    public CaseList {
        rows = List.copyOf(rows);
        owners = List.copyOf(owners);
    }
}
