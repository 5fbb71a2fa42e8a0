/**
 * The PostgreSQL server and its two roles: the owner, which migrates and owns the tables, and the application's, which
 * has only the rights that migrations grant it. Depends on {@code installation}.
 */
@NullMarked
package nearworld.app.database;

import org.jspecify.annotations.NullMarked;
