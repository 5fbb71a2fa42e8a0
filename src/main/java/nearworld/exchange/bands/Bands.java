package nearworld.exchange.bands;

import tools.jackson.databind.JsonNode;

/**
 * Decision bands as they were read.
 *
 * @param id of the bands
 * @param version from 1
 * @param document the whole tree; it is not to be changed
 * @param sha256 of the file's bytes
 */
public record Bands(String id, int version, JsonNode document, String sha256) {}
