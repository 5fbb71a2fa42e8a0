package nearworld.app.people;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestBuilders.formLogin;
import static org.springframework.security.test.web.servlet.response.SecurityMockMvcResultMatchers.authenticated;
import static org.springframework.security.test.web.servlet.response.SecurityMockMvcResultMatchers.unauthenticated;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.header;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.redirectedUrl;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import java.util.List;
import nearworld.app.ApplicationTest;
import nearworld.app.database.OwnerConnection;
import nearworld.app.trail.Trail;
import nearworld.app.trail.TrailEntryView;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.jdbc.core.JdbcTemplate;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.test.web.servlet.ResultActions;

/** Signing in: who is let in, who is locked out, and what every answer carries. */
@ApplicationTest
class SignInIT {
    private static final String PASSWORD = "seven reeds by the water";

    @Autowired
    private MockMvc mvc;

    @Autowired
    private People people;

    @Autowired
    private JdbcTemplate jdbc;

    @Autowired
    private OwnerConnection owner;

    @Autowired
    private Trail trail;

    @BeforeEach
    void somebodyWhoIsNotLockedOut() {
        if (people.byName("sign.in").isEmpty()) {
            people.add("sign.in", "Sign In", Role.UNDERWRITER, PASSWORD, "system");
        }
        owner.execute(
                "update person set failed_attempts = 0, locked_until = null, enabled = true where name = 'sign.in'");
    }

    private ResultActions signIn(String name, String password) throws Exception {
        return mvc.perform(formLogin("/sign-in").user(name).password(password));
    }

    @Test
    void theRightPasswordLetsIn() throws Exception {
        signIn("sign.in", PASSWORD)
                .andExpect(authenticated().withUsername("sign.in"))
                .andExpect(redirectedUrl("/"));
        assertThat(lastActions()).contains("person.signedIn");
    }

    @Test
    void aNameIsReadWithoutRegardToCase() throws Exception {
        signIn("Sign.In", PASSWORD).andExpect(authenticated().withUsername("sign.in"));
    }

    @Test
    void wrongPasswordAndUnknownNameLookAlike() throws Exception {
        signIn("sign.in", "wrong").andExpect(unauthenticated()).andExpect(redirectedUrl("/sign-in?error"));
        signIn("nobody", "wrong").andExpect(unauthenticated()).andExpect(redirectedUrl("/sign-in?error"));
    }

    @Test
    void fiveFailuresLockOutEvenTheRightPasswordAndEachFurtherOneForLonger() throws Exception {
        for (int i = 0; i < PersonEntity.FREE_ATTEMPTS; i++) {
            signIn("sign.in", "wrong").andExpect(unauthenticated());
        }
        signIn("sign.in", PASSWORD).andExpect(unauthenticated());
        assertThat(secondsLocked()).isBetween(30.0, 60.0);
        owner.execute("update person set locked_until = now() - interval '1 second' where name = 'sign.in'");
        signIn("sign.in", "wrong").andExpect(unauthenticated());
        assertThat(secondsLocked()).isBetween(90.0, 120.0);
        owner.execute("update person set locked_until = now() - interval '1 second' where name = 'sign.in'");
        signIn("sign.in", PASSWORD).andExpect(authenticated());
        assertThat(jdbc.queryForObject("select failed_attempts from person where name = 'sign.in'", Integer.class))
                .isZero();
    }

    private double secondsLocked() {
        Double seconds = jdbc.queryForObject(
                "select extract(epoch from locked_until - now()) from person where name = 'sign.in'", Double.class);
        return seconds == null ? 0 : seconds;
    }

    @Test
    void aDisabledPersonIsNotLetInAndAnOpenOneIsPutOut() throws Exception {
        PersonView person = people.byName("sign.in").orElseThrow();
        mvc.perform(get("/cases").with(TestSignIn.as(person))).andExpect(status().isOk());
        owner.execute("update person set enabled = false where name = 'sign.in'");
        signIn("sign.in", PASSWORD).andExpect(unauthenticated());
        mvc.perform(get("/cases").with(TestSignIn.as(person))).andExpect(status().isForbidden());
    }

    @Test
    void noPasswordIsStoredReadablyAndTheHashIsBcrypt() {
        String hash = jdbc.queryForObject("select password_hash from person where name = 'sign.in'", String.class);
        assertThat(hash).startsWith("{bcrypt}$2a$12$").doesNotContain(PASSWORD);
    }

    @Test
    void everyAnswerCarriesTheHeaders() throws Exception {
        mvc.perform(get("/sign-in").secure(true))
                .andExpect(status().isOk())
                .andExpect(header().string("Content-Security-Policy", SecurityConfiguration.CONTENT_POLICY))
                .andExpect(header().string("X-Content-Type-Options", "nosniff"))
                .andExpect(header().string("X-Frame-Options", "DENY"))
                .andExpect(header().string("Referrer-Policy", "same-origin"))
                .andExpect(header().string("Strict-Transport-Security", "max-age=31536000 ; includeSubDomains"))
                .andExpect(header().string("Cache-Control", "no-cache, no-store, max-age=0, must-revalidate"));
    }

    /** The row outlives the server process, so that a restart signs nobody out. */
    @Test
    void whoIsSignedInIsKeptInTheDatabase() throws Exception {
        signIn("sign.in", PASSWORD).andExpect(authenticated());
        assertThat(jdbc.queryForObject(
                        "select count(*) from spring_session where principal_name = 'sign.in'", Integer.class))
                .isPositive();
    }

    private List<String> lastActions() {
        return trail.page(1, true).entries().stream()
                .filter(e -> e.person().equals("sign.in"))
                .map(TrailEntryView::action)
                .toList();
    }
}
