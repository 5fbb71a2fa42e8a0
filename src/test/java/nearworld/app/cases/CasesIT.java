package nearworld.app.cases;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Map;
import java.util.UUID;
import java.util.function.Supplier;
import nearworld.app.ApplicationTest;
import nearworld.app.database.OwnerConnection;
import nearworld.app.forms.CaseForms;
import nearworld.app.forms.CoverForm;
import nearworld.app.forms.HistoryForm;
import nearworld.app.forms.PersonForm;
import nearworld.app.forms.Section;
import nearworld.app.people.CurrentPerson;
import nearworld.app.people.People;
import nearworld.app.people.PersonView;
import nearworld.app.people.Role;
import nearworld.app.trail.Trail;
import nearworld.app.trail.TrailEntryView;
import nearworld.app.trail.TrailVerifier;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.jdbc.core.JdbcTemplate;
import org.springframework.security.access.AccessDeniedException;

/** Cases on a real database: saving, conflicts, what is encrypted, who sees what. */
@ApplicationTest
class CasesIT {
    private static final PersonForm PERSON = new PersonForm("female", "1961-02-03", "2026-12-01", List.of());

    /** The second row is half filled and its date makes no sense: it must be kept as it is. */
    private static final HistoryForm HISTORY = new HistoryForm(List.of(new HistoryForm.HistoryRow(
            "heartAttack", "2006", "2026-12-01", List.of(new HistoryForm.OccurrenceRow("the day before Easter", "")))));

    @Autowired
    private Cases cases;

    @Autowired
    private People people;

    @Autowired
    private CurrentPerson current;

    @Autowired
    private Trail trail;

    @Autowired
    private TrailVerifier verifier;

    @Autowired
    private JdbcTemplate jdbc;

    @Autowired
    private OwnerConnection owner;

    private PersonView underwriter;
    private PersonView colleague;
    private PersonView manager;
    private PersonView admin;

    @BeforeEach
    void people() {
        underwriter = person("cases.underwriter", Role.UNDERWRITER);
        colleague = person("cases.colleague", Role.UNDERWRITER);
        manager = person("cases.manager", Role.MANAGER);
        admin = person("cases.admin", Role.ADMIN);
    }

    private PersonView person(String name, Role role) {
        return people.byName(name).orElseGet(() -> people.add(name, name, role, "long enough to be taken", "system"));
    }

    private <T> T as(PersonView person, Supplier<T> work) {
        Object[] result = new Object[1];
        current.runAs(person, () -> result[0] = work.get());
        @SuppressWarnings("unchecked")
        T typed = (T) result[0];
        return typed;
    }

    private String newCase() {
        return as(underwriter, () -> cases.create(new NewCase("", "EXT-" + UUID.randomUUID(), null)));
    }

    private SaveOutcome save(PersonView person, String ref, Section section, long version, Object form) {
        return as(person, () -> cases.save(ref, section, version, form));
    }

    @Test
    void aSectionIsKeptAsTypedHoweverInvalid() {
        String ref = newCase();
        assertThat(save(underwriter, ref, Section.HISTORY, 0, HISTORY)).isEqualTo(new SaveOutcome.Saved(1));
        CaseForms forms = as(underwriter, () -> cases.forms(ref));
        assertThat(forms.history()).isEqualTo(HISTORY);
        assertThat(forms.person()).isEqualTo(PersonForm.empty());
    }

    @Test
    void eachSectionHasAVersionOfItsOwn() {
        String ref = newCase();
        save(underwriter, ref, Section.PERSON, 0, PERSON);
        save(underwriter, ref, Section.PERSON, 1, PERSON);
        save(underwriter, ref, Section.HISTORY, 0, HISTORY);
        List<SectionState> sections = as(underwriter, () -> cases.view(ref)).sections();
        assertThat(sections).extracting(SectionState::section).containsExactly(Section.values());
        assertThat(sections).extracting(SectionState::version).containsExactly(2L, 0L, 1L, 0L, 0L);
    }

    @Test
    void whoComesSecondIsShownBothSidesAndOverwritesNothing() {
        String ref = newCase();
        save(manager, ref, Section.PERSON, 0, PERSON);
        PersonForm mine = new PersonForm("male", "1950", "", List.of());
        SaveOutcome outcome = save(underwriter, ref, Section.PERSON, 0, mine);
        assertThat(outcome).isInstanceOfSatisfying(SectionConflict.class, conflict -> {
            assertThat(conflict.savedBy()).isEqualTo(manager.name());
            assertThat(conflict.currentVersion()).isEqualTo(1);
            assertThat(conflict.theirs().person()).isEqualTo(PERSON);
        });
        assertThat(as(underwriter, () -> cases.forms(ref)).person()).isEqualTo(PERSON);
        assertThat(save(underwriter, ref, Section.PERSON, 1, mine)).isEqualTo(new SaveOutcome.Saved(2));
    }

    /** The columns are read as the owner of the tables would read a stolen copy. */
    @Test
    void nothingPersonalIsReadableInTheDatabase() {
        String ref = as(underwriter, () -> cases.create(new NewCase("", "POLICY-77-PRIVATE", null)));
        save(underwriter, ref, Section.PERSON, 0, PERSON);
        save(underwriter, ref, Section.HISTORY, 0, HISTORY);
        StringBuilder stored = new StringBuilder();
        for (String table : List.of("cases", "case_section", "trail")) {
            for (Map<String, Object> row : jdbc.queryForList("select * from " + table)) {
                row.values()
                        .forEach(value -> stored.append(
                                value instanceof byte[] bytes
                                        ? new String(bytes, StandardCharsets.ISO_8859_1)
                                        : value));
            }
        }
        assertThat(stored.toString())
                .doesNotContain("1961-02-03", "Easter", "heartAttack", "POLICY-77-PRIVATE")
                .contains(ref);
    }

    @Test
    void theSameCiphertextDoesNotOpenInAnotherCase() {
        String one = newCase();
        String other = newCase();
        save(underwriter, one, Section.PERSON, 0, PERSON);
        owner.execute("update case_section t set typed = s.typed from case_section s, cases a, cases b where a.ref = '"
                + one + "' and b.ref = '" + other
                + "' and s.case_id = a.id and t.case_id = b.id and s.section = 'person' and t.section = 'person'");
        assertThatThrownBy(() -> as(underwriter, () -> cases.forms(other)))
                .isInstanceOf(IllegalStateException.class)
                .hasMessageContaining("does not open");
    }

    @Test
    void anEditOpensAnAssessedCaseAgain() {
        String ref = newCase();
        owner.execute("update cases set state = 'assessed' where ref = '" + ref + "'");
        save(underwriter, ref, Section.PERSON, 0, PERSON);
        assertThat(as(underwriter, () -> cases.view(ref)).state()).isEqualTo(CaseState.OPEN);
    }

    @Test
    void aDecidedCaseTakesNoEdits() {
        String ref = newCase();
        owner.execute("update cases set state = 'decided' where ref = '" + ref + "'");
        assertThatThrownBy(() -> save(underwriter, ref, Section.PERSON, 0, PERSON))
                .isInstanceOf(AccessDeniedException.class);
        assertThat(as(underwriter, () -> cases.view(ref)).mayEdit()).isFalse();
    }

    @Test
    void aSaveThatFailsAtItsLastStepLeavesNothingBehind() {
        String ref = newCase();
        owner.execute("alter table trail add constraint no_more check (seq < 0) not valid");
        try {
            assertThatThrownBy(() -> save(underwriter, ref, Section.PERSON, 0, PERSON))
                    .isNotNull();
        } finally {
            owner.execute("alter table trail drop constraint no_more");
        }
        assertThat(as(underwriter, () -> cases.forms(ref)).person()).isEqualTo(PersonForm.empty());
        assertThat(as(underwriter, () -> cases.view(ref)).sections().get(0).version())
                .isZero();
    }

    @Test
    void whoMayNotSeeACaseLearnsNotEvenThatItIsThere() {
        String ref = newCase();
        assertThatThrownBy(() -> as(colleague, () -> cases.view(ref))).isInstanceOf(NoSuchCaseException.class);
        assertThatThrownBy(() -> as(colleague, () -> cases.view("none"))).isInstanceOf(NoSuchCaseException.class);
        assertThatThrownBy(() -> as(admin, () -> cases.list(CaseQuery.all())))
                .isInstanceOf(AccessDeniedException.class);
        assertThat(as(manager, () -> cases.view(ref)).ref()).isEqualTo(ref);
    }

    @Test
    void listsShowWhatThePersonSeesFilteredSortedAndInPages() {
        String mine = as(underwriter, () -> cases.create(new NewCase("LIST-1", "ext 1", null)));
        as(underwriter, () -> cases.create(new NewCase("LIST-2", "", null)));
        as(manager, () -> cases.create(new NewCase("LIST-3", "", null)));
        assertThat(refs(underwriter, new CaseQuery("list-", "", "", "ref", 1)))
                .containsExactly("LIST-1", "LIST-2", "LIST-3");
        assertThat(refs(underwriter, new CaseQuery("list-", "", "", "-ref", 1)))
                .containsExactly("LIST-3", "LIST-2", "LIST-1");
        assertThat(refs(colleague, new CaseQuery("list-", "", "", "ref", 1))).containsExactly("LIST-3");
        assertThat(refs(underwriter, new CaseQuery("list-", "", manager.name(), "ref", 1)))
                .containsExactly("LIST-3");
        assertThat(refs(underwriter, new CaseQuery("list-", "closed", "", "ref", 1)))
                .isEmpty();
        assertThat(refs(underwriter, new CaseQuery("ext 1", "", "", "ref", 1))).containsExactly(mine);
        assertThat(refs(underwriter, new CaseQuery("%", "", "", "ref", 1))).isEmpty();
        CaseList beyond = as(manager, () -> cases.list(new CaseQuery("", "", "", "ref", 99)));
        assertThat(beyond.page()).isEqualTo(beyond.pages());
        assertThat(beyond.rows()).isNotEmpty();
    }

    private List<String> refs(PersonView person, CaseQuery query) {
        return as(person, () -> cases.list(query)).rows().stream()
                .map(CaseRow::ref)
                .toList();
    }

    @Test
    void aReferenceIsTakenOnce() {
        as(underwriter, () -> cases.create(new NewCase("ONCE", "", null)));
        assertThatThrownBy(() -> as(underwriter, () -> cases.create(new NewCase("ONCE", "", null))))
                .isInstanceOf(CaseRefTakenException.class);
    }

    @Test
    void theTrailTellsWhatHappenedAndStaysIntact() {
        String ref = newCase();
        save(underwriter, ref, Section.COVER, 0, new CoverForm("term", "20", "", "", "3"));
        current.runAs(underwriter, () -> cases.viewed(ref));
        List<TrailEntryView> entries = trail.ofCase(ref, true);
        assertThat(entries)
                .extracting(TrailEntryView::action)
                .containsExactly("case.created", "case.saved", "case.viewed");
        assertThat(entries.get(1).details()).containsEntry("section", "cover").containsEntry("version", "1");
        assertThat(verifier.verify().intact()).isTrue();
    }
}
