/**
 * What-if worlds: what is carried over from the recorded world and what changes. Depends on {@code inference}.
 */
@NullMarked
package nearworld.engine.counterfactual;

import org.jspecify.annotations.NullMarked;
