package nearworld.app.cases;

import java.time.Clock;
import java.time.Instant;
import java.time.LocalDate;
import java.time.temporal.ChronoUnit;
import java.util.Map;
import java.util.Optional;
import nearworld.app.forms.CaseForms;
import nearworld.app.forms.Composition;
import nearworld.app.forms.FormJson;
import nearworld.app.forms.Section;
import nearworld.app.keys.CaseKey;
import nearworld.app.keys.Keys;
import nearworld.app.people.CurrentPerson;
import nearworld.app.people.People;
import nearworld.app.people.Permissions;
import nearworld.app.people.PersonView;
import nearworld.app.trail.NewEntry;
import nearworld.app.trail.Trail;
import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;

/** Cases for the person who is signed in: what the permission matrix does not give is refused here. */
@Service
public class Cases {
    private final CaseRepository cases;
    private final SectionRepository sections;
    private final CaseSearch search;
    private final CaseComposing composing;
    private final Keys keys;
    private final People people;
    private final CurrentPerson current;
    private final Permissions permissions;
    private final Trail trail;
    private final Clock clock;

    Cases(
            CaseRepository cases,
            SectionRepository sections,
            CaseSearch search,
            CaseComposing composing,
            Keys keys,
            People people,
            CurrentPerson current,
            Permissions permissions,
            Trail trail,
            Clock clock) {
        this.cases = cases;
        this.sections = sections;
        this.search = search;
        this.composing = composing;
        this.keys = keys;
        this.people = people;
        this.current = current;
        this.permissions = permissions;
        this.trail = trail;
        this.clock = clock;
    }

    /** A page of the cases that the person sees. */
    @Transactional(readOnly = true)
    public CaseList list(CaseQuery query) {
        permissions.require("case.list");
        byte @Nullable [] index = query.q().isEmpty() ? null : keys.blindIndex(query.q());
        CaseSearch.Criteria criteria = new CaseSearch.Criteria(
                query,
                index,
                permissions.scopes("case.view"),
                current.required().id());
        long total = search.count(criteria);
        int pages = (int) Math.max(1, (total + CaseSearch.PAGE_SIZE - 1) / CaseSearch.PAGE_SIZE);
        int page = Math.min(query.page(), pages);
        return new CaseList(
                search.page(criteria, page, LocalDate.now(clock)),
                query,
                page,
                pages,
                total,
                search.owners(criteria),
                permissions.may("case.create"));
    }

    /**
     * Makes a case that the person owns; an underwriter's is assigned to the underwriter.
     *
     * @return the case reference
     */
    @Transactional
    public String create(NewCase wanted) {
        permissions.require("case.create");
        PersonView me = current.required();
        boolean mine = !permissions.scopes("case.edit").contains(nearworld.app.people.Scope.ALL);
        return create(wanted, me, mine ? me : null, CaseForms.empty());
    }

    /** Makes a case with sections already filled, for whoever fills an installation. */
    @Transactional
    public String create(NewCase wanted, PersonView owner, @Nullable PersonView assignee, CaseForms forms) {
        String ref = wanted.ref().isEmpty() ? nextRef() : wanted.ref();
        if (!ref.matches(NewCase.REF_PATTERN)) {
            throw new IllegalArgumentException("ref must match " + NewCase.REF_PATTERN);
        }
        if (cases.existsByRef(ref)) {
            throw new CaseRefTakenException();
        }
        Instant now = now();
        CaseEntity entity = new CaseEntity(
                ref, owner.id(), assignee == null ? null : assignee.id(), keys.create(), LocalDate.now(clock), now);
        entity.dueOn(wanted.dueOn());
        CaseKey key = keys.of(entity.keyId());
        if (!wanted.externalRef().isBlank()) {
            String external = wanted.externalRef().strip();
            entity.externalRef(key.seal(external, "externalRef"), keys.blindIndex(external));
        }
        cases.saveAndFlush(entity);
        StoredSections stored = StoredSections.create(entity.id(), forms, key, now, owner.name());
        compose(entity, stored);
        stored.entities().forEach(sections::save);
        trail.append(NewEntry.ofCase(owner.name(), "case.created", ref, Map.of()));
        return ref;
    }

    private String nextRef() {
        String ref;
        do {
            ref = "C-" + cases.nextNumber();
        } while (cases.existsByRef(ref));
        return ref;
    }

    /** The case, apart from what is typed in its sections. */
    @Transactional(readOnly = true)
    public CaseView view(String ref) {
        return view(visible(cases.findByRef(ref), "case.view"));
    }

    /** The same, for somebody who asks for the case's trail. */
    @Transactional(readOnly = true)
    public CaseView viewForTrail(String ref) {
        return view(visible(cases.findByRef(ref), "case.trail"));
    }

    private CaseView view(CaseEntity entity) {
        CaseKey key = keys.of(entity.keyId());
        byte[] external = entity.externalRef();
        Permissions.Ties ties = entity.ties();
        return new CaseView(
                entity.ref(),
                entity.state(),
                person(ties.owner()),
                ties.assignee() == null ? null : person(ties.assignee()),
                entity.createdOn(),
                entity.dueOn(),
                external == null ? "" : key.open(external, "externalRef"),
                permissions.may("case.edit", ties) && editable(entity),
                permissions.may("case.record", ties) && editable(entity),
                stored(entity).states());
    }

    private PersonView person(long id) {
        return people.byId(id).orElseThrow(() -> new IllegalStateException("no person " + id));
    }

    /** Notes in the trail that the person looks at the case. */
    @Transactional
    public void viewed(String ref) {
        visible(cases.findByRef(ref), "case.view");
        trail.append(NewEntry.ofCase(current.required().name(), Trail.CASE_VIEWED, ref, Map.of()));
    }

    /** What is typed in the sections. */
    @Transactional(readOnly = true)
    public CaseForms forms(String ref) {
        return stored(visible(cases.findByRef(ref), "case.view")).forms();
    }

    /**
     * Saves one section: what was typed, its valid part, its version, the case's state and the trail, together or not
     * at all.
     *
     * @param version the version that the person edited
     * @param form what was typed, of the section's form type
     */
    @Transactional
    public SaveOutcome save(String ref, Section section, long version, Object form) {
        CaseEntity entity = visible(cases.lockByRef(ref), "case.edit");
        requireEditable(entity);
        StoredSections stored = stored(entity);
        SectionState state = stored.state(section);
        if (state.version() != version) {
            return new SectionConflict(section, state.savedBy(), state.savedAt(), state.version(), stored.forms());
        }
        String me = current.required().name();
        stored.save(section, form, now(), me);
        entity.edited(now());
        compose(entity, stored);
        long saved = stored.state(section).version();
        trail.append(NewEntry.ofCase(
                        me, "case.saved", ref, Map.of("section", section.id(), "version", Long.toString(saved)))
                .withSealed(keys.of(entity.keyId()).seal(FormJson.write(form), "trail:" + section.id() + ":" + saved)));
        return new SaveOutcome.Saved(saved);
    }

    private void compose(CaseEntity entity, StoredSections stored) {
        CaseForms forms = stored.forms();
        Composition composition = composing.compose(entity.ref(), forms);
        stored.valid(composition);
        entity.coverKind(composition.coverKind());
    }

    /** Locks a case of which the person may record an assessment. */
    @Transactional
    public CaseRecord lockForRecording(String ref) {
        CaseEntity entity = visible(cases.lockByRef(ref), "case.record");
        requireEditable(entity);
        return new CaseRecord(
                entity.id(), entity.ref(), entity.keyId(), stored(entity).forms());
    }

    /**
     * Notes on a locked case that an assessment was recorded.
     *
     * @param mortalityRatio of the recorded world, 1 = table
     */
    @Transactional
    public void recorded(CaseRecord locked, double mortalityRatio) {
        cases.lockByRef(locked.ref()).orElseThrow().recorded(mortalityRatio, now());
    }

    /** Number and key of a case that the person sees. */
    @Transactional(readOnly = true)
    public CaseRecord find(String ref) {
        CaseEntity entity = visible(cases.findByRef(ref), "case.view");
        return new CaseRecord(
                entity.id(), entity.ref(), entity.keyId(), stored(entity).forms());
    }

    private static boolean editable(CaseEntity entity) {
        return entity.state() == CaseState.OPEN || entity.state() == CaseState.ASSESSED;
    }

    private static void requireEditable(CaseEntity entity) {
        if (!editable(entity)) {
            throw new org.springframework.security.access.AccessDeniedException(
                    "the case is " + entity.state().id());
        }
    }

    /** The case, if the person sees it; then the action must be permitted too. */
    private CaseEntity visible(Optional<CaseEntity> found, String action) {
        CaseEntity entity =
                found.filter(c -> permissions.may("case.view", c.ties())).orElseThrow(NoSuchCaseException::new);
        permissions.require(action, entity.ties());
        return entity;
    }

    private StoredSections stored(CaseEntity entity) {
        return StoredSections.of(sections.ofCase(entity.id()), keys.of(entity.keyId()));
    }

    private Instant now() {
        return clock.instant().truncatedTo(ChronoUnit.MICROS);
    }
}
