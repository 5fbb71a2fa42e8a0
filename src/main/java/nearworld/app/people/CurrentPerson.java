package nearworld.app.people;

import java.util.Optional;
import org.springframework.security.authentication.AuthenticationCredentialsNotFoundException;
import org.springframework.security.authentication.UsernamePasswordAuthenticationToken;
import org.springframework.security.core.Authentication;
import org.springframework.security.core.context.SecurityContext;
import org.springframework.security.core.context.SecurityContextHolder;
import org.springframework.security.core.context.SecurityContextImpl;
import org.springframework.stereotype.Component;

/** Who is signed in, with the role that the person has now. */
@Component
public class CurrentPerson {
    private final People people;

    CurrentPerson(People people) {
        this.people = people;
    }

    /** The person of this request; empty where nobody is signed in or the person was disabled since. */
    public Optional<PersonView> get() {
        Authentication authentication = SecurityContextHolder.getContext().getAuthentication();
        return authentication != null && authentication.getPrincipal() instanceof SignedIn signedIn
                ? people.active(signedIn.personId())
                : Optional.empty();
    }

    /** Does something as a person who is not signed in: for what the application itself does on somebody's behalf. */
    public void runAs(PersonView person, Runnable work) {
        SecurityContext before = SecurityContextHolder.getContext();
        SignedIn acting = new SignedIn(person.id(), person.name(), true, false, "");
        acting.eraseCredentials();
        SecurityContextHolder.setContext(new SecurityContextImpl(
                UsernamePasswordAuthenticationToken.authenticated(acting, null, acting.getAuthorities())));
        try {
            work.run();
        } finally {
            SecurityContextHolder.setContext(before);
        }
    }

    /** The person of this request; refused where nobody is signed in. */
    public PersonView required() {
        return get().orElseThrow(() -> new AuthenticationCredentialsNotFoundException("nobody is signed in"));
    }
}
