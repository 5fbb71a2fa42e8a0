/**
 * Texts and trees of the exchange formats: strict decoding, JSON and YAML 1.2 with the place of every value, validation
 * by the published JSON Schemas, canonical JSON and its hash. Depends on Jackson, the YAML parser beneath it and the
 * schema validator.
 */
@NullMarked
package nearworld.exchange.documents;

import org.jspecify.annotations.NullMarked;
