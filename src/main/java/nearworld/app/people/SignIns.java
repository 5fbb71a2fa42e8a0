package nearworld.app.people;

import java.time.Clock;
import java.util.Locale;
import java.util.Map;
import nearworld.app.trail.NewEntry;
import nearworld.app.trail.Trail;
import org.jspecify.annotations.Nullable;
import org.springframework.context.event.EventListener;
import org.springframework.security.authentication.event.AbstractAuthenticationFailureEvent;
import org.springframework.security.authentication.event.AuthenticationFailureBadCredentialsEvent;
import org.springframework.security.authentication.event.AuthenticationSuccessEvent;
import org.springframework.security.authentication.event.LogoutSuccessEvent;
import org.springframework.security.core.Authentication;
import org.springframework.security.core.userdetails.UserDetails;
import org.springframework.security.core.userdetails.UserDetailsPasswordService;
import org.springframework.security.core.userdetails.UserDetailsService;
import org.springframework.security.core.userdetails.UsernameNotFoundException;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;

/**
 * Signing in and out: who exists, how failures lock a person out, and what the trail tells of it. A name that nobody has
 * leaves no entry, because people type passwords into the wrong field.
 */
@Service
class SignIns implements UserDetailsService, UserDetailsPasswordService {
    private final PersonRepository repository;
    private final Trail trail;
    private final Clock clock;

    SignIns(PersonRepository repository, Trail trail, Clock clock) {
        this.repository = repository;
        this.trail = trail;
        this.clock = clock;
    }

    @Override
    @Transactional(readOnly = true)
    public UserDetails loadUserByUsername(String typed) {
        return repository
                .findByName(normal(typed))
                .map(this::details)
                .orElseThrow(() -> new UsernameNotFoundException("nobody has that name"));
    }

    private UserDetails details(PersonEntity person) {
        PersonView view = person.view();
        return new SignedIn(
                view.id(), view.name(), person.enabled(), person.lockedAt(clock.instant()), person.passwordHash());
    }

    /** Stores the hash anew where the encoder has become stronger. */
    @Override
    @Transactional
    public UserDetails updatePassword(UserDetails user, @Nullable String newHash) {
        PersonEntity person = repository.lockByName(user.getUsername()).orElseThrow();
        if (newHash != null) {
            person.passwordHash(newHash);
        }
        return details(person);
    }

    @EventListener
    @Transactional
    void signedIn(AuthenticationSuccessEvent event) {
        if (event.getAuthentication().getPrincipal() instanceof SignedIn signedIn) {
            repository.lockByName(signedIn.getUsername()).ifPresent(person -> {
                person.succeeded();
                trail.append(NewEntry.of(signedIn.getUsername(), "person.signedIn", Map.of()));
            });
        }
    }

    @EventListener
    @Transactional
    void refused(AbstractAuthenticationFailureEvent event) {
        if (event instanceof AuthenticationFailureBadCredentialsEvent) {
            repository.lockByName(normal(event.getAuthentication().getName())).ifPresent(person -> {
                person.failedAt(clock.instant());
                trail.append(NewEntry.of(person.view().name(), "person.signInRefused", Map.of()));
            });
        }
    }

    @EventListener
    @Transactional
    void signedOut(LogoutSuccessEvent event) {
        Authentication who = event.getAuthentication();
        if (who.getPrincipal() instanceof SignedIn signedIn) {
            trail.append(NewEntry.of(signedIn.getUsername(), "person.signedOut", Map.of()));
        }
    }

    private static String normal(String typed) {
        return typed.strip().toLowerCase(Locale.ROOT);
    }
}
