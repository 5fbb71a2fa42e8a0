package nearworld.app.people;

import java.security.SecureRandom;
import java.time.Clock;
import java.time.Instant;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import nearworld.app.trail.NewEntry;
import nearworld.app.trail.Trail;
import org.springframework.security.crypto.password.PasswordEncoder;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;

/** Those who sign in. */
@Service
public class People {
    private static final String NAME_PATTERN = "[a-z0-9][a-z0-9._@-]{0,59}";
    private static final int SHORTEST_PASSWORD = 12;
    /** bcrypt reads no more than 72 bytes. */
    private static final int LONGEST_PASSWORD = 72;

    /** Letters and digits that are not taken for one another. */
    private static final String PASSWORD_LETTERS = "abcdefghjkmnpqrstuvwxyz23456789";

    private static final int PASSWORD_GROUPS = 4;
    private static final int PASSWORD_GROUP_LENGTH = 5;

    private final PersonRepository repository;
    private final PasswordEncoder encoder;
    private final Trail trail;
    private final Clock clock;

    People(PersonRepository repository, PasswordEncoder encoder, Trail trail, Clock clock) {
        this.repository = repository;
        this.encoder = encoder;
        this.trail = trail;
        this.clock = clock;
    }

    /**
     * Adds a person.
     *
     * @param name to sign in with: lower-case letters, digits, {@code . _ @ -}
     * @param by sign-in name of who adds
     */
    @Transactional
    public PersonView add(String name, String displayName, Role role, String password, String by) {
        if (!name.matches(NAME_PATTERN)) {
            throw new IllegalArgumentException("name must match " + NAME_PATTERN + ", was \"" + name + "\"");
        }
        if (!(password.length() >= SHORTEST_PASSWORD && password.length() <= LONGEST_PASSWORD)) {
            throw new IllegalArgumentException("password must have " + SHORTEST_PASSWORD + " to " + LONGEST_PASSWORD
                    + " characters, has " + password.length());
        }
        PersonEntity entity = repository.save(new PersonEntity(
                name, displayName, role, Objects.requireNonNull(encoder.encode(password)), Instant.now(clock)));
        trail.append(NewEntry.of(by, "person.created", Map.of("name", name, "role", role.id())));
        return entity.view();
    }

    /** A random password of 20 letters and digits in four groups, about 99 bits. */
    public static String randomPassword() {
        SecureRandom random = new SecureRandom();
        StringBuilder password = new StringBuilder();
        for (int i = 0; i < PASSWORD_GROUPS * PASSWORD_GROUP_LENGTH; i++) {
            if (i > 0 && i % PASSWORD_GROUP_LENGTH == 0) {
                password.append('-');
            }
            password.append(PASSWORD_LETTERS.charAt(random.nextInt(PASSWORD_LETTERS.length())));
        }
        return password.toString();
    }

    /** The person of that number, unless disabled. */
    @Transactional(readOnly = true)
    public Optional<PersonView> active(long id) {
        return repository.findById(id).filter(PersonEntity::enabled).map(PersonEntity::view);
    }

    /** The person of that number. */
    @Transactional(readOnly = true)
    public Optional<PersonView> byId(long id) {
        return repository.findById(id).map(PersonEntity::view);
    }

    /** The person of that sign-in name. */
    @Transactional(readOnly = true)
    public Optional<PersonView> byName(String name) {
        return repository.findByName(name.toLowerCase(Locale.ROOT)).map(PersonEntity::view);
    }

    /** Everybody, by sign-in name. */
    @Transactional(readOnly = true)
    public List<PersonView> all() {
        return repository.findAllByOrderByName().stream()
                .map(PersonEntity::view)
                .toList();
    }

    /** True before the first person is added. */
    @Transactional(readOnly = true)
    public boolean isEmpty() {
        return repository.count() == 0;
    }
}
