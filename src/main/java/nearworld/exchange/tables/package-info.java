/**
 * Mortality tables in the exchange format: a head of {@code #key: value} lines and a CSV of rates. Depends on the engine's
 * table and on documents.
 */
@NullMarked
package nearworld.exchange.tables;

import org.jspecify.annotations.NullMarked;
