package nearworld.app.cases;

import jakarta.persistence.Column;
import jakarta.persistence.Embeddable;
import jakarta.persistence.EmbeddedId;
import jakarta.persistence.Entity;
import jakarta.persistence.Table;
import java.io.Serializable;
import java.time.Instant;
import nearworld.app.forms.Section;

/** One section of a case as stored, encrypted by the key of the case. */
@Entity
@Table(name = "case_section")
class SectionEntity {
    @EmbeddedId
    private Key key;

    private long version;
    private byte[] typed;
    private byte[] valid;
    private Instant savedAt;
    private String savedBy;

    /** For the mapper only, which fills every field. */
    @SuppressWarnings("NullAway.Init")
    protected SectionEntity() {}

    SectionEntity(long caseId, Section section, byte[] typed, byte[] valid, Instant savedAt, String savedBy) {
        this.key = new Key(caseId, section.id());
        this.typed = typed;
        this.valid = valid;
        this.savedAt = savedAt;
        this.savedBy = savedBy;
    }

    Section section() {
        return Section.ofId(key.section());
    }

    SectionState state() {
        return new SectionState(section(), version, savedAt, savedBy);
    }

    byte[] typed() {
        return typed;
    }

    byte[] valid() {
        return valid;
    }

    void save(byte[] newTyped, Instant moment, String by) {
        typed = newTyped;
        version++;
        savedAt = moment;
        savedBy = by;
    }

    /** The valid part may change without an edit of the section: when another section makes it valid or invalid. */
    void valid(byte[] newValid) {
        valid = newValid;
    }

    /** Case and section. */
    @Embeddable
    record Key(@Column(name = "case_id") long caseId, String section) implements Serializable {}
}
