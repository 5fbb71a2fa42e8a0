package nearworld.app.people;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.request;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import nearworld.app.ApplicationTest;
import nearworld.app.cases.Cases;
import nearworld.app.cases.NewCase;
import nearworld.app.database.OwnerConnection;
import nearworld.app.forms.CaseForms;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.beans.factory.annotation.Qualifier;
import org.springframework.http.HttpMethod;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.test.web.servlet.request.MockHttpServletRequestBuilder;
import org.springframework.web.servlet.mvc.method.annotation.RequestMappingHandlerMapping;

/**
 * Every route, as every role, on a case of one's own and on one of each other kind: what the file that the application
 * reads says is what happens.
 */
@ApplicationTest
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class PermissionMatrixIT {
    /** Answers without the matrix: the page to sign in at, and the framework's error page. */
    private static final Set<String> PUBLIC = Set.of("GET /sign-in", " /error");

    private static final Set<Integer> DENIED = Set.of(403, 404);

    @Autowired
    private MockMvc mvc;

    @Autowired
    private People people;

    @Autowired
    private Cases cases;

    @Autowired
    private OwnerConnection owner;

    @Autowired
    @Qualifier("requestMappingHandlerMapping")
    private RequestMappingHandlerMapping handlers;

    private final PermissionMatrix matrix = PermissionMatrix.read();
    private final Map<Role, PersonView> persons = new EnumMap<>(Role.class);
    private final List<Kind> kinds = new ArrayList<>();

    /** Whom a case is tied to, seen from the person who asks. */
    private enum Tie {
        OWN,
        ASSIGNED,
        UNASSIGNED,
        REFERRED,
        NONE
    }

    private record Kind(Role role, Tie tie, String ref) {}

    @BeforeAll
    void onePersonOfEachRoleAndACaseOfEachKind() {
        PersonView stranger = add("matrix.stranger", Role.UNDERWRITER);
        for (Role role : Role.values()) {
            PersonView person = add("matrix." + role.ordinal(), role);
            persons.put(role, person);
            for (Tie tie : Tie.values()) {
                String ref = "M-" + role.ordinal() + "-" + tie.ordinal();
                cases.create(
                        new NewCase(ref, "", null),
                        tie == Tie.OWN ? person : stranger,
                        assignee(tie, person, stranger),
                        CaseForms.empty());
                if (tie == Tie.REFERRED) {
                    owner.execute("update cases set referred_to_id = " + person.id() + " where ref = '" + ref + "'");
                }
                kinds.add(new Kind(role, tie, ref));
            }
        }
    }

    private static @Nullable PersonView assignee(Tie tie, PersonView person, PersonView stranger) {
        return switch (tie) {
            case ASSIGNED -> person;
            case UNASSIGNED -> null;
            case OWN, REFERRED, NONE -> stranger;
        };
    }

    private PersonView add(String name, Role role) {
        return people.add(name, name, role, "long enough to be taken", "system");
    }

    @Test
    void everyRouteIsInTheMatrixAndNoOther() {
        Set<String> served = new TreeSet<>();
        handlers.getHandlerMethods()
                .keySet()
                .forEach(mapping -> mapping.getPatternValues().forEach(pattern -> {
                    if (mapping.getMethodsCondition().getMethods().isEmpty()) {
                        served.add(" " + pattern);
                    }
                    mapping.getMethodsCondition().getMethods().forEach(method -> served.add(method + " " + pattern));
                }));
        served.removeAll(PUBLIC);
        Set<String> named = new TreeSet<>();
        matrix.all().forEach(p -> p.routes().forEach(r -> named.add(r.method() + " " + r.pattern())));
        assertThat(served).isEqualTo(named);
    }

    @Test
    void everyRoleReachesWhatTheMatrixGivesAndNothingElse() throws Exception {
        List<String> wrong = new ArrayList<>();
        for (Permission permission : matrix.all()) {
            for (Permission.Route route : permission.routes()) {
                for (Kind kind : kinds) {
                    boolean expected = allowed(permission.of(kind.role()), kind.tie());
                    int status = status(route, kind);
                    if (DENIED.contains(status) == expected && !isAbsentAssessment(route, expected, status)) {
                        wrong.add(route + " as " + kind + ": " + status + ", expected "
                                + (expected ? "allowed" : "denied"));
                    }
                }
            }
        }
        assertThat(wrong).isEmpty();
    }

    /** None of these cases has an assessment, so that a person who may open one finds none. */
    private static boolean isAbsentAssessment(Permission.Route route, boolean expected, int status) {
        return expected && status == 404 && route.pattern().endsWith("{number}");
    }

    private int status(Permission.Route route, Kind kind) throws Exception {
        String path = route.pattern().replace("{ref}", kind.ref()).replace("{number}", "1");
        MockHttpServletRequestBuilder request = request(HttpMethod.valueOf(route.method()), path)
                .with(TestSignIn.as(java.util.Objects.requireNonNull(persons.get(kind.role()))))
                .with(csrf());
        return mvc.perform(request).andReturn().getResponse().getStatus();
    }

    /** Written out here once more, independent of the code that decides. */
    private static boolean allowed(Set<Scope> scopes, Tie tie) {
        return scopes.contains(Scope.ALL)
                || switch (tie) {
                    case OWN -> scopes.contains(Scope.OWN);
                    case ASSIGNED -> scopes.contains(Scope.ASSIGNED);
                    case UNASSIGNED -> scopes.contains(Scope.UNASSIGNED);
                    case REFERRED -> scopes.contains(Scope.REFERRED);
                    case NONE -> false;
                };
    }

    @Test
    void nobodyReachesAnythingWithoutSigningIn() throws Exception {
        for (Permission permission : matrix.all()) {
            for (Permission.Route route : permission.routes()) {
                String path = route.pattern().replace("{ref}", "M-0-0").replace("{number}", "1");
                assertThat(mvc.perform(request(HttpMethod.valueOf(route.method()), path)
                                        .with(csrf()))
                                .andReturn()
                                .getResponse()
                                .getRedirectedUrl())
                        .as(route.toString())
                        .endsWith("/sign-in");
            }
        }
    }

    @Test
    void nothingIsChangedByARequestFromElsewhere() throws Exception {
        PersonView manager = java.util.Objects.requireNonNull(persons.get(Role.MANAGER));
        for (Permission permission : matrix.all()) {
            for (Permission.Route route : permission.routes()) {
                if (route.method().equals("POST")) {
                    String path = route.pattern().replace("{ref}", "M-2-0");
                    assertThat(mvc.perform(request(HttpMethod.POST, path).with(TestSignIn.as(manager)))
                                    .andReturn()
                                    .getResponse()
                                    .getStatus())
                            .as(route.toString())
                            .isEqualTo(403);
                }
            }
        }
    }
}
