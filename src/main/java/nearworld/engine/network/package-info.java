/**
 * Hidden conditions, behaviours, events and the evidence about them. Depends on {@code basics}.
 */
@NullMarked
package nearworld.engine.network;

import org.jspecify.annotations.NullMarked;
