/**
 * The command line: assesses cases from files without a server and without a database. A plain main program;
 * depends on the exchange formats and the engine, not on Spring.
 */
@NullMarked
package nearworld.cli;

import org.jspecify.annotations.NullMarked;
