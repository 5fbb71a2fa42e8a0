package nearworld.app.cases;

import java.time.Instant;
import java.util.Comparator;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import nearworld.app.forms.CaseForms;
import nearworld.app.forms.Composition;
import nearworld.app.forms.FormJson;
import nearworld.app.forms.Section;
import nearworld.app.keys.CaseKey;

/** The five stored sections of one case, opened with its key. */
final class StoredSections {
    private final Map<Section, SectionEntity> entities;
    private final CaseKey key;

    private StoredSections(Map<Section, SectionEntity> entities, CaseKey key) {
        this.entities = entities;
        this.key = key;
    }

    static StoredSections of(List<SectionEntity> stored, CaseKey key) {
        Map<Section, SectionEntity> entities = new EnumMap<>(Section.class);
        stored.forEach(s -> entities.put(s.section(), s));
        return new StoredSections(entities, key);
    }

    /** Five new sections of a case. */
    static StoredSections create(long caseId, CaseForms forms, CaseKey key, Instant moment, String by) {
        Map<Section, SectionEntity> entities = new EnumMap<>(Section.class);
        for (Section section : Section.values()) {
            byte[] typed = key.seal(FormJson.write(forms.of(section)), typedPurpose(section));
            byte[] valid = key.seal("{}", validPurpose(section));
            entities.put(section, new SectionEntity(caseId, section, typed, valid, moment, by));
        }
        return new StoredSections(entities, key);
    }

    CaseForms forms() {
        CaseForms forms = CaseForms.empty();
        for (SectionEntity entity : entities.values()) {
            Section section = entity.section();
            forms = forms.with(section, FormJson.read(section, key.open(entity.typed(), typedPurpose(section))));
        }
        return forms;
    }

    List<SectionState> states() {
        return entities.values().stream()
                .map(SectionEntity::state)
                .sorted(Comparator.comparing(SectionState::section))
                .toList();
    }

    SectionState state(Section section) {
        return entity(section).state();
    }

    void save(Section section, Object form, Instant moment, String by) {
        entity(section).save(key.seal(FormJson.write(form), typedPurpose(section)), moment, by);
    }

    /** Stores the valid parts where they changed. */
    void valid(Composition composition) {
        composition.validParts().forEach((section, part) -> {
            SectionEntity entity = entity(section);
            if (!part.equals(key.open(entity.valid(), validPurpose(section)))) {
                entity.valid(key.seal(part, validPurpose(section)));
            }
        });
    }

    Iterable<SectionEntity> entities() {
        return entities.values();
    }

    private SectionEntity entity(Section section) {
        SectionEntity entity = entities.get(section);
        if (entity == null) {
            throw new IllegalStateException("the case has no section " + section.id());
        }
        return entity;
    }

    private static String typedPurpose(Section section) {
        return "typed:" + section.id();
    }

    private static String validPurpose(Section section) {
        return "valid:" + section.id();
    }
}
