/**
 * The model: from a table, an evidence pack and a case to counterfactual remaining lifetimes. Everything below
 * this package uses the JDK only: no Spring, no database, no formats, no clock and no logger.
 */
@NullMarked
package nearworld.engine;

import org.jspecify.annotations.NullMarked;
