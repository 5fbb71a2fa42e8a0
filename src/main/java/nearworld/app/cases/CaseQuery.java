package nearworld.app.cases;

import java.util.Set;

/**
 * What is asked of the list of cases. What makes no sense is read as not asked.
 *
 * @param q a part of the case reference, or the whole external reference; empty: all
 * @param state a state's id; empty: all
 * @param owner a person's sign-in name; empty: all
 * @param sort one of {@link #SORTS}
 * @param page from 1
 */
public record CaseQuery(String q, String state, String owner, String sort, int page) {
    /** What a list can be sorted by; a minus turns it round. */
    public static final Set<String> SORTS =
            Set.of("ref", "-ref", "due", "-due", "updated", "-updated", "created", "-created", "state", "-state");

    private static final String DEFAULT_SORT = "-updated";
    private static final int LAST_PAGE = 100_000;

    public CaseQuery {
        q = q == null ? "" : q.strip();
        state = state == null ? "" : state;
        owner = owner == null ? "" : owner;
        sort = sort == null || !SORTS.contains(sort) ? DEFAULT_SORT : sort;
        page = Math.min(Math.max(page, 1), LAST_PAGE);
    }

    /** All cases, the last touched first. */
    public static CaseQuery all() {
        return new CaseQuery("", "", "", DEFAULT_SORT, 1);
    }
}
