package nearworld.app.assessments;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.nio.charset.StandardCharsets;
import java.time.LocalDate;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.function.Supplier;
import nearworld.app.ApplicationTest;
import nearworld.app.artefacts.ArtefactKind;
import nearworld.app.artefacts.ArtefactView;
import nearworld.app.artefacts.Artefacts;
import nearworld.app.cases.CaseState;
import nearworld.app.cases.Cases;
import nearworld.app.cases.NewCase;
import nearworld.app.database.OwnerConnection;
import nearworld.app.forms.CaseForms;
import nearworld.app.forms.FormsOfCase;
import nearworld.app.forms.HistoryForm;
import nearworld.app.forms.Section;
import nearworld.app.people.CurrentPerson;
import nearworld.app.people.People;
import nearworld.app.people.PersonView;
import nearworld.app.people.Role;
import nearworld.app.trail.TrailVerifier;
import nearworld.app.trail.Verification;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.core.io.ClassPathResource;
import org.springframework.dao.DataAccessException;
import org.springframework.jdbc.core.JdbcTemplate;
import tools.jackson.databind.json.JsonMapper;

/** Recording, opening again, and what PostgreSQL refuses. */
@ApplicationTest
class AssessmentsIT {
    /** One of the invented cases of the demo. */
    private static final String CASE = "seed-data/cases/sp-0003-causes-much.json";

    private static final String PACK = "seed-data/packs/default-1.yaml";

    @Autowired
    private Assessments assessments;

    @Autowired
    private Calculations calculations;

    @Autowired
    private Cases cases;

    @Autowired
    private Artefacts artefacts;

    @Autowired
    private People people;

    @Autowired
    private CurrentPerson current;

    @Autowired
    private TrailVerifier verifier;

    @Autowired
    private JdbcTemplate jdbc;

    @Autowired
    private OwnerConnection owner;

    private PersonView underwriter;

    @BeforeEach
    void person() {
        String name = "assessments.underwriter";
        underwriter = people.byName(name)
                .orElseGet(() -> people.add(name, name, Role.UNDERWRITER, "long enough to be taken", "system"));
    }

    private <T> T as(Supplier<T> work) {
        Object[] result = new Object[1];
        current.runAs(underwriter, () -> result[0] = work.get());
        @SuppressWarnings("unchecked")
        T typed = (T) result[0];
        return typed;
    }

    private static String text(String path) throws Exception {
        return new ClassPathResource(path).getContentAsString(StandardCharsets.UTF_8);
    }

    private static CaseForms forms() throws Exception {
        return FormsOfCase.of(JsonMapper.shared().readTree(text(CASE)));
    }

    private String newCase() throws Exception {
        CaseForms forms = forms();
        return as(() -> cases.create(new NewCase("", "", null), underwriter, underwriter, forms));
    }

    private Calculated calculated(String ref) {
        Calculations.Worked worked = as(() -> calculations.of(ref, cases.forms(ref), Locale.ENGLISH));
        assertThat(worked.faults().all()).isEmpty();
        assertThat(worked.calculation()).isInstanceOf(Calculated.class);
        return (Calculated) worked.calculation();
    }

    @Test
    void whatIsRecordedIsWhatWasCalculatedToTheLastBit() throws Exception {
        String ref = newCase();
        Calculated before = calculated(ref);
        assertThat(as(() -> assessments.record(ref))).isEqualTo(new RecordOutcome.Recorded(1));
        RecordedAssessment opened = as(() -> assessments.open(ref, 1, Locale.ENGLISH));
        assertThat(opened.calculated().result()).isEqualTo(before.result());
        assertThat(opened.calculated().file()).isEqualTo(before.file());
        assertThat(opened.calculated().basis()).isEqualTo(before.basis());
        assertThat(as(() -> cases.view(ref)).state()).isEqualTo(CaseState.ASSESSED);
    }

    @Test
    void anOldAssessmentOpensAsItWasWhateverIsPublishedLater() throws Exception {
        String ref = newCase();
        as(() -> assessments.record(ref));
        Calculated before = as(() -> assessments.open(ref, 1, Locale.ENGLISH)).calculated();
        ArtefactView later = artefacts.publishPack(
                text(PACK)
                        .replaceFirst("(?m)^( *)version: 1\\b", "$1version: 2")
                        .replaceFirst("variance: (\\{value: )?0\\.[0-9]+", "variance: $10.45"),
                "system");
        artefacts.makeDefault(ArtefactKind.PACK, later.sha256(), "term", LocalDate.of(2001, 1, 1));
        try {
            assertThat(calculated(ref).basis().packVersion()).isEqualTo(2);
            assertThat(calculated(ref).result()).isNotEqualTo(before.result());
            assertThat(as(() -> assessments.open(ref, 1, Locale.ENGLISH))
                            .calculated()
                            .result())
                    .isEqualTo(before.result());
            assertThat(as(() -> assessments.record(ref))).isEqualTo(new RecordOutcome.Recorded(2));
            assertThat(as(() -> assessments.of(ref)))
                    .extracting(AssessmentView::packVersion)
                    .containsExactly(2, 1);
        } finally {
            owner.execute("delete from artefact_default where from_day = '2001-01-01'");
        }
    }

    @Test
    void aCaseWithSomethingLeftOutIsNotRecorded() throws Exception {
        String ref = newCase();
        HistoryForm bad = new HistoryForm(List.of(new HistoryForm.HistoryRow(
                "heartAttack", "2006", "2026", List.of(new HistoryForm.OccurrenceRow("soon", "ward")))));
        as(() -> cases.save(ref, Section.HISTORY, 0, bad));
        assertThat(as(() -> assessments.record(ref))).isEqualTo(new RecordOutcome.NotRecorded());
        assertThat(as(() -> assessments.of(ref))).isEmpty();
        assertThat(as(() -> cases.view(ref)).state()).isEqualTo(CaseState.OPEN);
    }

    @Test
    void anEmptyCaseIsNotRecorded() {
        String ref = as(() -> cases.create(new NewCase("", "", null)));
        assertThat(as(() -> assessments.record(ref))).isEqualTo(new RecordOutcome.NotRecorded());
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "update assessment set mortality_ratio = 1",
                "delete from assessment",
                "truncate assessment",
                "update artefact set content = ''",
                "update artefact set sha256 = repeat('0', 64)",
                "delete from artefact",
                "delete from person",
                "delete from cases",
                "delete from case_section",
                "delete from data_key",
                "update data_key set wrapped = ''",
                "update artefact_default set artefact_id = 1"
            })
    void postgresqlRefusesTheApplicationToChangeWhatIsRecorded(String statement) {
        assertThatThrownBy(() -> jdbc.execute(statement))
                .isInstanceOf(DataAccessException.class)
                .rootCause()
                .hasMessageContaining("permission denied");
    }

    @Test
    void notEvenTheOwnerChangesAPublishedArtefactUnnoticed() {
        assertThatThrownBy(() -> owner.execute("update artefact set content = content || ' '"))
                .rootCause()
                .hasMessageContaining("is published and never changes");
    }

    @Test
    void nothingPersonalOfAnAssessmentIsReadable() throws Exception {
        String ref = newCase();
        as(() -> assessments.record(ref));
        StringBuilder stored = new StringBuilder();
        for (Map<String, Object> row : jdbc.queryForList("select * from assessment")) {
            row.values()
                    .forEach(value -> stored.append(
                            value instanceof byte[] bytes ? new String(bytes, StandardCharsets.ISO_8859_1) : value));
        }
        assertThat(stored.toString()).doesNotContain("1973-11-02", "heartAttack", "survival", "monthly");
    }

    @Test
    void verifyingFindsATamperedAssessment() throws Exception {
        String ref = newCase();
        as(() -> assessments.record(ref));
        assertThat(verifier.verify().intact()).isTrue();
        String where = " where case_id = (select id from cases where ref = '" + ref + "')";
        owner.execute("update assessment set mortality_ratio = mortality_ratio * 2" + where);
        Verification verification = verifier.verify();
        assertThat(verification.intact()).isFalse();
        assertThat(verification.reason()).isEqualTo("assessment");
        owner.execute("update assessment set mortality_ratio = mortality_ratio / 2" + where);
        owner.execute("update assessment set result = curves" + where);
        assertThat(verifier.verify().reason()).isEqualTo("assessment");
        owner.execute("delete from assessment" + where);
        assertThat(verifier.verify().reason()).isEqualTo("assessment");
        owner.execute("delete from trail where seq >= (select max(seq) from trail where case_ref = '" + ref
                + "' and action = 'assessment.recorded')");
        assertThat(verifier.verify().intact()).isTrue();
    }
}
