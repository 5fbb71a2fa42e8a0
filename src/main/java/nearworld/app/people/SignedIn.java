package nearworld.app.people;

import java.util.Collection;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.springframework.security.core.CredentialsContainer;
import org.springframework.security.core.GrantedAuthority;
import org.springframework.security.core.userdetails.UserDetails;

/**
 * Who is signed in, as the session keeps it. Neither role nor rights are in it: they are read anew for each request, so
 * that a change acts at once.
 */
final class SignedIn implements UserDetails, CredentialsContainer {
    private static final long serialVersionUID = 1L;

    private final long personId;
    private final String name;
    private final boolean enabled;
    private final boolean locked;
    private transient @Nullable String passwordHash;

    SignedIn(long personId, String name, boolean enabled, boolean locked, String passwordHash) {
        this.personId = personId;
        this.name = name;
        this.enabled = enabled;
        this.locked = locked;
        this.passwordHash = passwordHash;
    }

    long personId() {
        return personId;
    }

    @Override
    public Collection<? extends GrantedAuthority> getAuthorities() {
        return List.of();
    }

    @Override
    public @Nullable String getPassword() {
        return passwordHash;
    }

    @Override
    public String getUsername() {
        return name;
    }

    @Override
    public boolean isEnabled() {
        return enabled;
    }

    @Override
    public boolean isAccountNonLocked() {
        return !locked;
    }

    @Override
    public void eraseCredentials() {
        passwordHash = null;
    }

    @Override
    public boolean equals(@Nullable Object other) {
        return other instanceof SignedIn that && personId == that.personId;
    }

    @Override
    public int hashCode() {
        return Long.hashCode(personId);
    }
}
