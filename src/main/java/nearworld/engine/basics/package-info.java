/**
 * Checked values and numeric helpers of the engine. Depends on nothing else of the project.
 */
@NullMarked
package nearworld.engine.basics;

import org.jspecify.annotations.NullMarked;
