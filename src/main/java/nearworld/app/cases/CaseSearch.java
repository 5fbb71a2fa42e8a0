package nearworld.app.cases;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.LocalDate;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import nearworld.app.people.PersonView;
import nearworld.app.people.Role;
import nearworld.app.people.Scope;
import org.jspecify.annotations.Nullable;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Repository;

/** Finds the cases that a person sees, page by page. */
@Repository
class CaseSearch {
    static final int PAGE_SIZE = 25;

    private static final String COLUMNS = """
            select c.ref, c.state, c.created_on, c.updated_at, c.due_on, c.cover_kind, c.mortality_ratio,
                   o.id as o_id, o.name as o_name, o.display_name as o_display, o.role as o_role,
                   a.id as a_id, a.name as a_name, a.display_name as a_display, a.role as a_role
            """;
    private static final String FROM = """
            from cases c join person o on o.id = c.owner_id left join person a on a.id = c.assignee_id
            """;
    private static final Map<String, String> ORDER = Map.of(
            "ref", "c.ref",
            "due", "c.due_on",
            "updated", "c.updated_at",
            "created", "c.created_at",
            "state", "c.state");

    private final JdbcClient jdbc;

    CaseSearch(JdbcClient jdbc) {
        this.jdbc = jdbc;
    }

    /** Which cases are asked for, by whom, and whose are seen. */
    record Criteria(CaseQuery query, byte @Nullable [] externalRefIndex, Set<Scope> scopes, long me) {}

    long count(Criteria criteria) {
        Where where = new Where(criteria);
        return jdbc.sql("select count(*) " + FROM + where.text())
                .params(where.params)
                .query(Long.class)
                .single();
    }

    List<CaseRow> page(Criteria criteria, int page, LocalDate today) {
        Where where = new Where(criteria);
        return jdbc.sql(COLUMNS + FROM + where.text() + order(criteria.query().sort()) + " limit :limit offset :offset")
                .params(where.params)
                .param("limit", PAGE_SIZE)
                .param("offset", (page - 1L) * PAGE_SIZE)
                .query((rows, number) -> row(rows, today))
                .list();
    }

    /** Whose cases a person sees at all, by display name. */
    List<PersonView> owners(Criteria criteria) {
        Where where = new Where(new Criteria(CaseQuery.all(), null, criteria.scopes(), criteria.me()));
        return jdbc.sql("""
                        select o.id as o_id, o.name as o_name, o.display_name as o_display, o.role as o_role from person o
                        where o.id in (select c.owner_id
                        """ + FROM + where.text() + ") order by o.display_name, o.name")
                .params(where.params)
                .query((rows, number) -> owner(rows))
                .list();
    }

    private static String order(String sort) {
        boolean falling = sort.startsWith("-");
        String column = ORDER.get(falling ? sort.substring(1) : sort);
        return " order by " + column + (falling ? " desc nulls last" : " asc nulls last") + ", c.ref";
    }

    private static CaseRow row(ResultSet rows, LocalDate today) throws SQLException {
        LocalDate dueOn = rows.getObject("due_on", LocalDate.class);
        CaseState state = CaseState.ofId(rows.getString("state"));
        boolean finished = state == CaseState.DECIDED || state == CaseState.CLOSED;
        return new CaseRow(
                rows.getString("ref"),
                state,
                owner(rows),
                assignee(rows),
                rows.getObject("created_on", LocalDate.class),
                rows.getObject("updated_at", OffsetDateTime.class).toInstant(),
                dueOn,
                rows.getString("cover_kind"),
                rows.getObject("mortality_ratio", Double.class),
                dueOn != null && !finished && dueOn.isBefore(today));
    }

    private static PersonView owner(ResultSet rows) throws SQLException {
        return new PersonView(
                rows.getLong("o_id"),
                rows.getString("o_name"),
                rows.getString("o_display"),
                Role.ofId(rows.getString("o_role")));
    }

    private static @Nullable PersonView assignee(ResultSet rows) throws SQLException {
        long id = rows.getLong("a_id");
        return rows.wasNull()
                ? null
                : new PersonView(
                        id, rows.getString("a_name"), rows.getString("a_display"), Role.ofId(rows.getString("a_role")));
    }

    /** The conditions of a question with their parameters. */
    private static final class Where {
        private final List<String> conditions = new ArrayList<>();
        private final Map<String, Object> params = new HashMap<>();

        Where(Criteria criteria) {
            seen(criteria);
            CaseQuery query = criteria.query();
            if (!query.state().isEmpty()) {
                conditions.add("c.state = :state");
                params.put("state", query.state());
            }
            if (!query.owner().isEmpty()) {
                conditions.add("o.name = :owner");
                params.put("owner", query.owner());
            }
            if (!query.q().isEmpty()) {
                searched(query.q(), criteria.externalRefIndex());
            }
        }

        private void seen(Criteria criteria) {
            if (criteria.scopes().contains(Scope.ALL)) {
                return;
            }
            params.put("me", criteria.me());
            List<String> reached = new ArrayList<>(List.of("false"));
            for (Scope scope : criteria.scopes()) {
                reached.add(condition(scope));
            }
            conditions.add("(" + String.join(" or ", reached) + ")");
        }

        private static String condition(Scope scope) {
            return switch (scope) {
                case ALL -> "true";
                case OWN -> "c.owner_id = :me";
                case ASSIGNED -> "c.assignee_id = :me";
                case UNASSIGNED -> "c.assignee_id is null";
                case REFERRED -> "c.referred_to_id = :me";
            };
        }

        private void searched(String text, byte @Nullable [] externalRefIndex) {
            String part = "position(:part in lower(c.ref)) > 0";
            params.put("part", text.toLowerCase(Locale.ROOT));
            if (externalRefIndex == null) {
                conditions.add(part);
            } else {
                conditions.add("(" + part + " or c.external_ref_index = :external)");
                params.put("external", externalRefIndex);
            }
        }

        String text() {
            return conditions.isEmpty() ? "" : "where " + String.join(" and ", conditions);
        }
    }
}
