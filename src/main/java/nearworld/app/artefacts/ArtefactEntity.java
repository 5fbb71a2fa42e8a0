package nearworld.app.artefacts;

import jakarta.persistence.Column;
import jakarta.persistence.Entity;
import jakarta.persistence.GeneratedValue;
import jakarta.persistence.GenerationType;
import jakarta.persistence.Id;
import jakarta.persistence.Table;
import java.time.Instant;
import org.hibernate.annotations.JdbcTypeCode;
import org.hibernate.type.SqlTypes;
import org.jspecify.annotations.Nullable;

/** An artefact as stored. Everything but its state is written once. */
@Entity
@Table(name = "artefact")
class ArtefactEntity {
    static final String PUBLISHED = "published";

    @Id
    @GeneratedValue(strategy = GenerationType.IDENTITY)
    private @Nullable Long id;

    @Column(updatable = false)
    private String kind;

    @Column(updatable = false)
    private String name;

    @Column(updatable = false)
    private int version;

    @Column(updatable = false)
    private String title;

    private String state;

    @Column(updatable = false)
    @JdbcTypeCode(SqlTypes.CHAR)
    private String sha256;

    @Column(updatable = false)
    private String content;

    @Column(updatable = false)
    private Instant createdAt;

    private @Nullable Instant publishedAt;

    /** For the mapper only, which fills every field. */
    @SuppressWarnings("NullAway.Init")
    protected ArtefactEntity() {}

    ArtefactEntity(
            ArtefactKind kind,
            String name,
            int version,
            String title,
            String sha256,
            String content,
            Instant published) {
        this.kind = kind.id();
        this.name = name;
        this.version = version;
        this.title = title;
        this.state = PUBLISHED;
        this.sha256 = sha256;
        this.content = content;
        this.createdAt = published;
        this.publishedAt = published;
    }

    long id() {
        if (id == null) {
            throw new IllegalStateException("the artefact is not stored yet");
        }
        return id;
    }

    String sha256() {
        return sha256;
    }

    String content() {
        return content;
    }

    ArtefactView view(boolean isDefault) {
        return new ArtefactView(kind, name, version, title, state, sha256, publishedAt, isDefault);
    }
}
