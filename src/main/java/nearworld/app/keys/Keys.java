package nearworld.app.keys;

import java.security.GeneralSecurityException;
import java.sql.Timestamp;
import java.time.Clock;
import java.util.Optional;
import java.util.UUID;
import org.springframework.beans.factory.SmartInitializingSingleton;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Propagation;
import org.springframework.transaction.annotation.Transactional;

/**
 * The keys of cases. They lie in the database wrapped by the master key, which lies outside of it
 * ({@link MasterKeyFile}); whoever copies one of the two can read nothing.
 */
@Service
public class Keys implements SmartInitializingSingleton {
    private final JdbcClient jdbc;
    private final MasterKeyFile file;
    private final Clock clock;
    private volatile Optional<MasterKey> master = Optional.empty();

    Keys(JdbcClient jdbc, MasterKeyFile file, Clock clock) {
        this.jdbc = jdbc;
        this.file = file;
        this.clock = clock;
    }

    /** Reads the master key, or makes one where no case has a key yet, and tries it on a stored key. */
    @Override
    public void afterSingletonsInstantiated() {
        Optional<Wrapped> any = jdbc.sql("select id, wrapped from data_key limit 1")
                .query((rows, number) -> new Wrapped(rows.getObject("id", UUID.class), rows.getBytes("wrapped")))
                .optional();
        MasterKey key = any.isPresent() ? file.read() : file.readOrMake();
        any.ifPresent(w -> tryOn(key, w));
        master = Optional.of(key);
    }

    private void tryOn(MasterKey key, Wrapped wrapped) {
        try {
            key.unwrap(wrapped.id(), wrapped.bytes());
        } catch (GeneralSecurityException e) {
            throw new IllegalStateException(
                    "The master key in " + file.path() + " does not belong to this database; restore the right one.",
                    e);
        }
    }

    /** Makes a key for a case in the transaction that makes the case. */
    @Transactional(propagation = Propagation.MANDATORY)
    public UUID create() {
        UUID id = UUID.randomUUID();
        jdbc.sql("insert into data_key (id, wrapped, created_at) values (:id, :wrapped, :at)")
                .param("id", id)
                .param("wrapped", master().newWrappedKey(id))
                .param("at", Timestamp.from(clock.instant()))
                .update();
        return id;
    }

    /** The key of that id, ready for use. */
    @Transactional(readOnly = true)
    public CaseKey of(UUID id) {
        byte[] wrapped = jdbc.sql("select wrapped from data_key where id = :id")
                .param("id", id)
                .query((rows, number) -> rows.getBytes(1))
                .optional()
                .orElseThrow(() -> new IllegalStateException("the key " + id + " is erased"));
        try {
            return master().unwrap(id, wrapped);
        } catch (GeneralSecurityException e) {
            throw new IllegalStateException("the key " + id + " does not open with the master key", e);
        }
    }

    /** A keyed checksum of a text, to find it again without storing it readably. */
    public byte[] blindIndex(String text) {
        return master().blindIndex(text);
    }

    private MasterKey master() {
        return master.orElseThrow(
                () -> new IllegalStateException("the master key is read when the application has started"));
    }

    private record Wrapped(UUID id, byte[] bytes) {}
}
