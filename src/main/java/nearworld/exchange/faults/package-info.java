/**
 * What can be wrong with an input, and where: faults with their places in a text, the outcome of a reading, and the
 * sentences that tell a fault. Depends on the engine's basics.
 */
@NullMarked
package nearworld.exchange.faults;

import org.jspecify.annotations.NullMarked;
