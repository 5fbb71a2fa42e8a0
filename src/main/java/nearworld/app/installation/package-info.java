/**
 * What belongs to this one installation rather than to the database: the data folder and the secrets kept in it.
 * Depends on no other feature.
 */
@NullMarked
package nearworld.app.installation;

import org.jspecify.annotations.NullMarked;
