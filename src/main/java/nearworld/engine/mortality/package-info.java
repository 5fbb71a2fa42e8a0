/**
 * Mortality tables and survival curves. Depends on {@code basics}.
 */
@NullMarked
package nearworld.engine.mortality;

import org.jspecify.annotations.NullMarked;
