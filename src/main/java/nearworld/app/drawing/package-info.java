/**
 * Draws results as SVG: the lifeline and the survival curves. Presentation attributes only, no style and no script, so
 * that the same bytes live under a strict content policy, in a document and in an API; every element carries a class
 * beside its attributes, so that a page may recolour it. Depends on the JDK only. Words come in with the input.
 */
@NullMarked
package nearworld.app.drawing;

import org.jspecify.annotations.NullMarked;
