package nearworld.app.forms;

import tools.jackson.databind.json.JsonMapper;

/** What was typed, as JSON of the forms' fields: the way it is stored. */
public final class FormJson {
    private static final JsonMapper MAPPER = JsonMapper.shared();

    private FormJson() {}

    /** The form of one section as JSON. */
    public static String write(Object form) {
        return MAPPER.writeValueAsString(form);
    }

    /** The form of a section from its JSON. */
    public static Object read(Section section, String json) {
        return MAPPER.readValue(json, type(section));
    }

    private static Class<?> type(Section section) {
        return switch (section) {
            case PERSON -> PersonForm.class;
            case STATEMENTS -> StatementsForm.class;
            case HISTORY -> HistoryForm.class;
            case WHAT_IFS -> WhatIfsForm.class;
            case COVER -> CoverForm.class;
        };
    }
}
