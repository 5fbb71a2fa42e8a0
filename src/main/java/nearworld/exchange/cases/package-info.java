/**
 * Cases in the exchange format: JSON into the engine's case, names resolved against one evidence pack. Depends on the engine's
 * case, pack and table and on documents.
 */
@NullMarked
package nearworld.exchange.cases;

import org.jspecify.annotations.NullMarked;
