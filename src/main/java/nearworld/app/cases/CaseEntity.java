package nearworld.app.cases;

import jakarta.persistence.Column;
import jakarta.persistence.Entity;
import jakarta.persistence.GeneratedValue;
import jakarta.persistence.GenerationType;
import jakarta.persistence.Id;
import jakarta.persistence.Table;
import java.time.Instant;
import java.time.LocalDate;
import java.util.UUID;
import nearworld.app.people.Permissions;
import org.jspecify.annotations.Nullable;

/** A case as stored: what is plain, and the key of what is not. */
@Entity
@Table(name = "cases")
class CaseEntity {
    @Id
    @GeneratedValue(strategy = GenerationType.IDENTITY)
    private @Nullable Long id;

    @Column(updatable = false)
    private String ref;

    private String state;
    private Long ownerId;
    private @Nullable Long assigneeId;
    private @Nullable Long referredToId;

    @Column(updatable = false)
    private UUID keyId;

    private byte @Nullable [] externalRef;
    private byte @Nullable [] externalRefIndex;
    private @Nullable String coverKind;
    private @Nullable Double mortalityRatio;
    private @Nullable LocalDate dueOn;

    @Column(updatable = false)
    private LocalDate createdOn;

    @Column(updatable = false)
    private Instant createdAt;

    private Instant updatedAt;

    /** For the mapper only, which fills every field. */
    @SuppressWarnings("NullAway.Init")
    protected CaseEntity() {}

    CaseEntity(
            String ref, long ownerId, @Nullable Long assigneeId, UUID keyId, LocalDate createdOn, Instant createdAt) {
        this.ref = ref;
        this.state = CaseState.OPEN.id();
        this.ownerId = ownerId;
        this.assigneeId = assigneeId;
        this.keyId = keyId;
        this.createdOn = createdOn;
        this.createdAt = createdAt;
        this.updatedAt = createdAt;
    }

    long id() {
        if (id == null) {
            throw new IllegalStateException("the case is not stored yet");
        }
        return id;
    }

    String ref() {
        return ref;
    }

    CaseState state() {
        return CaseState.ofId(state);
    }

    Permissions.Ties ties() {
        return new Permissions.Ties(ownerId, assigneeId, referredToId);
    }

    UUID keyId() {
        return keyId;
    }

    byte @Nullable [] externalRef() {
        return externalRef;
    }

    void externalRef(byte[] ciphertext, byte[] index) {
        externalRef = ciphertext;
        externalRefIndex = index;
    }

    @Nullable
    LocalDate dueOn() {
        return dueOn;
    }

    void dueOn(@Nullable LocalDate day) {
        dueOn = day;
    }

    LocalDate createdOn() {
        return createdOn;
    }

    void coverKind(@Nullable String kind) {
        coverKind = kind;
    }

    /** An edit: an assessed case is open again. */
    void edited(Instant moment) {
        if (state() == CaseState.ASSESSED) {
            state = CaseState.OPEN.id();
        }
        updatedAt = moment;
    }

    /** An assessment was recorded: an open case is assessed. */
    void recorded(double ratio, Instant moment) {
        if (state() == CaseState.OPEN) {
            state = CaseState.ASSESSED.id();
        }
        mortalityRatio = ratio;
        updatedAt = moment;
    }
}
