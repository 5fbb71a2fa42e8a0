/**
 * The web application. Each package below is one feature; the engine and the exchange formats are siblings of
 * this package, so that no component or entity scan reaches them.
 */
@NullMarked
package nearworld.app;

import org.jspecify.annotations.NullMarked;
