/**
 * The trail: one chain of entries for the whole installation, each with the checksum of the one before it, appended in
 * the transaction of the action that it tells of. Depends on no feature.
 */
@NullMarked
package nearworld.app.trail;

import org.jspecify.annotations.NullMarked;
