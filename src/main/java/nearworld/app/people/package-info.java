/**
 * Who signs in, and what each role may do. Passwords are kept as bcrypt hashes; the permission matrix is read from
 * {@code permissions.csv} and denies what it does not name. Depends on the trail.
 */
@NullMarked
package nearworld.app.people;

import org.jspecify.annotations.NullMarked;
