/**
 * The five sections of a case as a person types them, and the way from there to the exchange format {@code case/1}. A
 * form keeps every text as it was typed, valid or not; {@link nearworld.app.forms.CaseComposer} takes what is valid
 * and names the rest field by field. Depends on the exchange formats and the engine's types only.
 */
@NullMarked
package nearworld.app.forms;

import org.jspecify.annotations.NullMarked;
