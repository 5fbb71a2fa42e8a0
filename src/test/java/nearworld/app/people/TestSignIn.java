package nearworld.app.people;

import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.user;

import org.springframework.test.web.servlet.request.RequestPostProcessor;

/** Signs a person in for one request of MockMvc. */
public final class TestSignIn {
    private TestSignIn() {}

    /** As that person. */
    public static RequestPostProcessor as(PersonView person) {
        return user(new SignedIn(person.id(), person.name(), true, false, ""));
    }
}
