package nearworld.app.forms;

import nearworld.engine.basics.Fault;

/**
 * A fault at the field where it can be mended.
 *
 * @param section whose form holds the field
 * @param field the field's name in the form, for example {@code statements[0].on}
 * @param fault the rule that is broken, with its parameters
 */
public record FieldFault(Section section, String field, Fault fault) {
    /** Section and field in one, as pages look faults up: {@code person.bornOn}. */
    public String key() {
        return section.id() + "." + field;
    }
}
