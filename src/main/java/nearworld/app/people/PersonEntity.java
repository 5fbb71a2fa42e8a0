package nearworld.app.people;

import jakarta.persistence.Column;
import jakarta.persistence.Entity;
import jakarta.persistence.GeneratedValue;
import jakarta.persistence.GenerationType;
import jakarta.persistence.Id;
import jakarta.persistence.Table;
import java.time.Duration;
import java.time.Instant;
import org.jspecify.annotations.Nullable;

/** A person as stored. */
@Entity
@Table(name = "person")
class PersonEntity {
    /** Failures that are free before the first lock-out. */
    static final int FREE_ATTEMPTS = 5;

    private static final Duration FIRST_LOCK = Duration.ofMinutes(1);
    private static final int MOST_DOUBLINGS = 6;

    @Id
    @GeneratedValue(strategy = GenerationType.IDENTITY)
    private @Nullable Long id;

    @Column(updatable = false)
    private String name;

    private String displayName;
    private String role;
    private String passwordHash;
    private boolean enabled;
    private int failedAttempts;
    private @Nullable Instant lockedUntil;

    @Column(updatable = false)
    private Instant createdAt;

    /** For the mapper only, which fills every field. */
    @SuppressWarnings("NullAway.Init")
    protected PersonEntity() {}

    PersonEntity(String name, String displayName, Role role, String passwordHash, Instant createdAt) {
        this.name = name;
        this.displayName = displayName;
        this.role = role.id();
        this.passwordHash = passwordHash;
        this.enabled = true;
        this.createdAt = createdAt;
    }

    PersonView view() {
        if (id == null) {
            throw new IllegalStateException("the person is not stored yet");
        }
        return new PersonView(id, name, displayName, Role.ofId(role));
    }

    String passwordHash() {
        return passwordHash;
    }

    void passwordHash(String hash) {
        passwordHash = hash;
    }

    boolean enabled() {
        return enabled;
    }

    boolean lockedAt(Instant moment) {
        return lockedUntil != null && moment.isBefore(lockedUntil);
    }

    /** Counts a failure: from the fifth on the person is locked out, each time twice as long, up to about an hour. */
    void failedAt(Instant moment) {
        failedAttempts++;
        if (failedAttempts >= FREE_ATTEMPTS) {
            int doublings = Math.min(failedAttempts - FREE_ATTEMPTS, MOST_DOUBLINGS);
            lockedUntil = moment.plus(FIRST_LOCK.multipliedBy(1L << doublings));
        }
    }

    void succeeded() {
        failedAttempts = 0;
        lockedUntil = null;
    }
}
