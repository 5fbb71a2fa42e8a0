/**
 * Exact posteriors of the hidden state given the evidence. Depends on {@code network} and what that depends on.
 */
@NullMarked
package nearworld.engine.inference;

import org.jspecify.annotations.NullMarked;
