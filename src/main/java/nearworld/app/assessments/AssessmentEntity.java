package nearworld.app.assessments;

import jakarta.persistence.Entity;
import jakarta.persistence.GeneratedValue;
import jakarta.persistence.GenerationType;
import jakarta.persistence.Id;
import jakarta.persistence.Table;
import java.time.Instant;
import nearworld.engine.assessment.AssessmentResult.WorldResult;
import org.hibernate.annotations.Immutable;
import org.hibernate.annotations.JdbcTypeCode;
import org.hibernate.type.SqlTypes;
import org.jspecify.annotations.Nullable;

/** A recorded assessment as stored: written once, never changed. */
@Entity
@Immutable
@Table(name = "assessment")
class AssessmentEntity {
    @Id
    @GeneratedValue(strategy = GenerationType.IDENTITY)
    private @Nullable Long id;

    private long caseId;
    private int number;
    private Instant recordedAt;
    private String recordedBy;
    private String engine;
    private String tableName;

    @JdbcTypeCode(SqlTypes.CHAR)
    private String tableSha256;

    private String packId;
    private int packVersion;

    @JdbcTypeCode(SqlTypes.CHAR)
    private String packSha256;

    @JdbcTypeCode(SqlTypes.CHAR)
    private @Nullable String bandsSha256;

    private byte[] input;
    private byte[] result;
    private byte[] curves;
    private double mortalityRatio;
    private double extraPerMille;
    private double expectation;

    /** For the mapper only, which fills every field. */
    @SuppressWarnings("NullAway.Init")
    protected AssessmentEntity() {}

    AssessmentEntity(
            long caseId, int number, Instant recordedAt, String by, Basis basis, Sealed sealed, WorldResult world) {
        this.caseId = caseId;
        this.number = number;
        this.recordedAt = recordedAt;
        this.recordedBy = by;
        this.engine = basis.engine();
        this.tableName = basis.tableName();
        this.tableSha256 = basis.tableSha256();
        this.packId = basis.packId();
        this.packVersion = basis.packVersion();
        this.packSha256 = basis.packSha256();
        this.input = sealed.input();
        this.result = sealed.result();
        this.curves = sealed.curves();
        this.mortalityRatio = world.mortalityRatio();
        this.extraPerMille = world.extraPerMille();
        this.expectation = world.expectation();
    }

    /** The three texts of an assessment, encrypted. */
    record Sealed(byte[] input, byte[] result, byte[] curves) {}

    int number() {
        return number;
    }

    Sealed sealed() {
        return new Sealed(input, result, curves);
    }

    Instant recordedAt() {
        return recordedAt;
    }

    String recordedBy() {
        return recordedBy;
    }

    double mortalityRatio() {
        return mortalityRatio;
    }

    double extraPerMille() {
        return extraPerMille;
    }

    double expectation() {
        return expectation;
    }

    Basis basis(String packTitle) {
        return new Basis(tableName, tableSha256, packId, packVersion, packTitle, packSha256, engine);
    }

    AssessmentView view() {
        return new AssessmentView(
                number, recordedAt, recordedBy, tableName, packId, packVersion, engine, mortalityRatio, expectation);
    }
}
