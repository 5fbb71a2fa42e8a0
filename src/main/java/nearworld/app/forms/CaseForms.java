package nearworld.app.forms;

/** The five sections of one case, as typed. */
public record CaseForms(
        PersonForm person, StatementsForm statements, HistoryForm history, WhatIfsForm whatIfs, CoverForm cover) {

    /** Five sections in which nothing is typed. */
    public static CaseForms empty() {
        return new CaseForms(
                PersonForm.empty(),
                StatementsForm.empty(),
                HistoryForm.empty(),
                WhatIfsForm.empty(),
                CoverForm.empty());
    }

    /** The form of one section. */
    public Object of(Section section) {
        return switch (section) {
            case PERSON -> person;
            case STATEMENTS -> statements;
            case HISTORY -> history;
            case WHAT_IFS -> whatIfs;
            case COVER -> cover;
        };
    }

    /** A copy with another form in one section; the form must be of that section's type. */
    public CaseForms with(Section section, Object form) {
        return switch (section) {
            case PERSON -> new CaseForms((PersonForm) form, statements, history, whatIfs, cover);
            case STATEMENTS -> new CaseForms(person, (StatementsForm) form, history, whatIfs, cover);
            case HISTORY -> new CaseForms(person, statements, (HistoryForm) form, whatIfs, cover);
            case WHAT_IFS -> new CaseForms(person, statements, history, (WhatIfsForm) form, cover);
            case COVER -> new CaseForms(person, statements, history, whatIfs, (CoverForm) form);
        };
    }
}
