/**
 * Evidence packs in the exchange format: YAML 1.2 or JSON into the engine's numbers and, beside them, the words. Depends on
 * the engine's pack and on documents.
 */
@NullMarked
package nearworld.exchange.packs;

import org.jspecify.annotations.NullMarked;
