package nearworld.app.cases;

import java.time.Instant;
import nearworld.app.forms.Section;

/** Which version of a section is stored, since when and by whom. */
public record SectionState(Section section, long version, Instant savedAt, String savedBy) {}
