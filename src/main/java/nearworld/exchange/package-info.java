/**
 * The exchange formats (table, pack, bands, case, result) and their JSON Schemas: reads and writes what the
 * engine takes and gives. Depends on the engine and on Jackson; neither on Spring nor on the application.
 */
@NullMarked
package nearworld.exchange;

import org.jspecify.annotations.NullMarked;
