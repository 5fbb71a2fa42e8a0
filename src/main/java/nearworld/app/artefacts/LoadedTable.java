package nearworld.app.artefacts;

import nearworld.engine.mortality.MortalityTable;

/**
 * A mortality table ready for use.
 *
 * @param sha256 of its content, hexadecimal
 */
public record LoadedTable(MortalityTable table, String sha256) {}
