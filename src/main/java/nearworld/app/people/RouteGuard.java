package nearworld.app.people;

import jakarta.servlet.http.HttpServletRequest;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Supplier;
import org.jspecify.annotations.Nullable;
import org.springframework.http.HttpMethod;
import org.springframework.security.authorization.AuthorizationDecision;
import org.springframework.security.authorization.AuthorizationManager;
import org.springframework.security.core.Authentication;
import org.springframework.security.web.access.intercept.RequestAuthorizationContext;
import org.springframework.security.web.servlet.util.matcher.PathPatternRequestMatcher;
import org.springframework.stereotype.Component;

/**
 * Lets a request pass where the matrix has its route and does not say "none" for the person's role; everything else is
 * denied. Which cases a role reaches is decided where the case is read.
 */
@Component
class RouteGuard implements AuthorizationManager<RequestAuthorizationContext> {
    private final List<Guarded> guarded = new ArrayList<>();
    private final CurrentPerson current;

    RouteGuard(PermissionMatrix matrix, CurrentPerson current) {
        this.current = current;
        PathPatternRequestMatcher.Builder matchers = PathPatternRequestMatcher.withDefaults();
        for (Permission permission : matrix.all()) {
            for (Permission.Route route : permission.routes()) {
                guarded.add(
                        new Guarded(matchers.matcher(HttpMethod.valueOf(route.method()), route.pattern()), permission));
            }
        }
    }

    /** The permission that the request needs; empty where the matrix does not know the route. */
    Optional<Permission> permission(HttpServletRequest request) {
        return guarded.stream()
                .filter(g -> g.matcher().matches(request))
                .map(Guarded::permission)
                .findFirst();
    }

    @Override
    public AuthorizationDecision authorize(
            Supplier<? extends @Nullable Authentication> authentication, RequestAuthorizationContext context) {
        boolean granted = permission(context.getRequest())
                .flatMap(p -> current.get().map(person -> !p.of(person.role()).isEmpty()))
                .orElse(false);
        return new AuthorizationDecision(granted);
    }

    private record Guarded(PathPatternRequestMatcher matcher, Permission permission) {}
}
