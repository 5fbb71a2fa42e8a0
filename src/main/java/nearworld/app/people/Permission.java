package nearworld.app.people;

import java.util.List;
import java.util.Map;
import java.util.Set;

/**
 * One row of the permission matrix.
 *
 * @param action what is permitted, for example {@code case.edit}
 * @param routes methods and addresses that the action answers at
 * @param scopes whose cases each role reaches; an empty set: none
 */
public record Permission(String action, List<Route> routes, Map<Role, Set<Scope>> scopes) {
    public Permission {
        routes = List.copyOf(routes);
        scopes = Map.copyOf(scopes);
    }

    /** A method and an address with {@code {variables}}. */
    public record Route(String method, String pattern) {
        static Route parse(String text) {
            String[] parts = text.strip().split(" ", -1);
            if (parts.length != 2 || !parts[1].startsWith("/")) {
                throw new IllegalArgumentException("a route must read METHOD /address, was \"" + text + "\"");
            }
            return new Route(parts[0], parts[1]);
        }
    }

    /** Whose cases a role reaches. */
    public Set<Scope> of(Role role) {
        return scopes.getOrDefault(role, Set.of());
    }
}
