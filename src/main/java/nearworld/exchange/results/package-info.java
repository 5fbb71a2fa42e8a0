/** Results in the exchange format. Depends on the engine's result. */
@NullMarked
package nearworld.exchange.results;

import org.jspecify.annotations.NullMarked;
