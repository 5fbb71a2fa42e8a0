/**
 * The demo of the fictional Saltmarsh Provident, and the first admin of a production start. Depends on the features that
 * it fills.
 */
@NullMarked
package nearworld.app.demo;

import org.jspecify.annotations.NullMarked;
