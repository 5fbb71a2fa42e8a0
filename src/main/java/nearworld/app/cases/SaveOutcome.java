package nearworld.app.cases;

/** What comes of saving a section. */
public sealed interface SaveOutcome permits SaveOutcome.Saved, SectionConflict {
    /** The section is stored under this version. */
    record Saved(long version) implements SaveOutcome {}
}
