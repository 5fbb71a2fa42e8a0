/**
 * What the fields of pages need: their ids, and what a select offers, by title in the reader's language. Depends on
 * artefacts and forms.
 */
@NullMarked
package nearworld.app.fields;

import org.jspecify.annotations.NullMarked;
