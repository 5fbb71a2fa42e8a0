package nearworld.app.assessments;

/** What a calculation rests on; checksums are SHA-256, hexadecimal. */
public record Basis(
        String tableName,
        String tableSha256,
        String packId,
        int packVersion,
        String packTitle,
        String packSha256,
        String engine) {}
