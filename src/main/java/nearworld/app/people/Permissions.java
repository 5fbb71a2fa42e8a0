package nearworld.app.people;

import java.util.Objects;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.springframework.security.access.AccessDeniedException;
import org.springframework.stereotype.Service;

/** What the person who is signed in may do. */
@Service
public class Permissions {
    private final PermissionMatrix matrix;
    private final CurrentPerson current;

    Permissions(PermissionMatrix matrix, CurrentPerson current) {
        this.matrix = matrix;
        this.current = current;
    }

    /**
     * Whom a case is tied to, by the people's numbers.
     *
     * @param owner always somebody
     * @param assignee null: nobody
     * @param referredTo null: nobody
     */
    public record Ties(
            long owner, @Nullable Long assignee, @Nullable Long referredTo) {}

    /** Whose cases the person reaches in an action. */
    public Set<Scope> scopes(String action) {
        return matrix.scopes(action, current.required().role());
    }

    /** True where the person may do something that is not about one case. */
    public boolean may(String action) {
        return !scopes(action).isEmpty();
    }

    /** True where the person may do something to a case. */
    public boolean may(String action, Ties ties) {
        long me = current.required().id();
        return scopes(action).stream().anyMatch(scope -> reaches(scope, me, ties));
    }

    /** Refuses what the person may not do. */
    public void require(String action) {
        if (!may(action)) {
            throw new AccessDeniedException(action);
        }
    }

    /** Refuses what the person may not do to a case. */
    public void require(String action, Ties ties) {
        if (!may(action, ties)) {
            throw new AccessDeniedException(action);
        }
    }

    private static boolean reaches(Scope scope, long me, Ties ties) {
        return switch (scope) {
            case ALL -> true;
            case OWN -> ties.owner() == me;
            case ASSIGNED -> Objects.equals(ties.assignee(), me);
            case UNASSIGNED -> ties.assignee() == null;
            case REFERRED -> Objects.equals(ties.referredTo(), me);
        };
    }
}
