/**
 * Encryption of what is personal: a key for each case, wrapped by a master key that lies outside the database. Erasing
 * the key of a case erases what was encrypted by it. Depends on no feature.
 */
@NullMarked
package nearworld.app.keys;

import org.jspecify.annotations.NullMarked;
