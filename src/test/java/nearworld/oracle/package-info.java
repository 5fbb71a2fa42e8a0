/**
 * The model a second time, by enumeration of every hidden state, as an independent check on the engine. Written from the
 * description of the model alone: nothing here may use the engine. It reads the exchange format, favours plain loops over
 * speed, and supports persons who live. {@link nearworld.oracle.BruteForce} is the way in.
 */
@NullMarked
package nearworld.oracle;

import org.jspecify.annotations.NullMarked;
