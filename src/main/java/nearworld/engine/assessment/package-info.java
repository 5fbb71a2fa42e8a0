/**
 * The engine's entrance: a request goes in, a result and its explanation come out. Depends on every other
 * package of the engine, and none of them on it.
 */
@NullMarked
package nearworld.engine.assessment;

import org.jspecify.annotations.NullMarked;
