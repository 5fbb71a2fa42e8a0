package nearworld.exchange.results;

/**
 * What a result was computed with.
 *
 * @param engine version of the engine
 * @param tableSha256 of the table's bytes
 * @param packSha256 of the pack's bytes
 */
public record ResultBasis(
        String engine, String tableName, String tableSha256, String packId, int packVersion, String packSha256) {}
