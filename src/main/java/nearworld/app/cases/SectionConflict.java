package nearworld.app.cases;

import java.time.Instant;
import nearworld.app.forms.CaseForms;
import nearworld.app.forms.Section;

/**
 * Somebody else saved the section in the meantime; nothing was changed.
 *
 * @param theirs the case as it is stored
 */
public record SectionConflict(Section section, String savedBy, Instant savedAt, long currentVersion, CaseForms theirs)
        implements SaveOutcome {}
