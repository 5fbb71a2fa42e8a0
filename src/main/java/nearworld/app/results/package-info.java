/**
 * Results as a reader sees them: the lifeline, the sentence in plain words, and the numbers with their units. Turns a
 * calculation into words and drawings; calculates nothing about a life itself.
 */
@NullMarked
package nearworld.app.results;

import org.jspecify.annotations.NullMarked;
