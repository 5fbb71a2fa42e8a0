/** Decision bands in the exchange format. Depends on documents. */
@NullMarked
package nearworld.exchange.bands;

import org.jspecify.annotations.NullMarked;
