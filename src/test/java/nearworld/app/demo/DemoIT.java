package nearworld.app.demo;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.PosixFilePermissions;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.stream.Collectors;
import nearworld.app.ApplicationTest;
import nearworld.app.assessments.Calculated;
import nearworld.app.assessments.Calculations;
import nearworld.app.cases.CaseQuery;
import nearworld.app.cases.CaseRow;
import nearworld.app.cases.Cases;
import nearworld.app.installation.DataFolder;
import nearworld.app.people.CurrentPerson;
import nearworld.app.people.People;
import nearworld.app.people.PersonView;
import nearworld.app.people.Role;
import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.jdbc.core.JdbcTemplate;

/** The demo as it stands after the first start. */
@ApplicationTest
class DemoIT {
    @Autowired
    private Demo demo;

    @Autowired
    private People people;

    @Autowired
    private CurrentPerson current;

    @Autowired
    private Cases cases;

    @Autowired
    private Calculations calculations;

    @Autowired
    private DataFolder folder;

    @Autowired
    private JdbcTemplate jdbc;

    @Test
    void thereIsSomebodyOfEachRoleAndASecondUnderwriter() {
        Map<Role, Long> byRole = Demo.PEOPLE.stream()
                .map(c -> people.byName(c.name()).orElseThrow())
                .collect(Collectors.groupingBy(PersonView::role, Collectors.counting()));
        assertThat(byRole.keySet()).isEqualTo(Set.of(Role.values()));
        assertThat(byRole.get(Role.UNDERWRITER)).isEqualTo(2);
    }

    @Test
    void everyCaseOfTheDemoCalculatesWithNothingLeftOut() {
        PersonView manager = people.byName("dina.holt").orElseThrow();
        current.runAs(manager, () -> {
            List<CaseRow> rows =
                    cases.list(new CaseQuery("SP-", "", "", "ref", 1)).rows();
            assertThat(rows).hasSize(8);
            for (CaseRow row : rows) {
                Calculations.Worked worked = calculations.of(row.ref(), cases.forms(row.ref()), Locale.ENGLISH);
                assertThat(worked.faults().all()).as(row.ref()).isEmpty();
                assertThat(worked.calculation()).as(row.ref()).isInstanceOf(Calculated.class);
            }
            assertThat(rows).anyMatch(r -> r.mortalityRatio() != null).anyMatch(r -> r.assignee() == null);
        });
    }

    @Test
    void loadingAgainChangesNothing() {
        Long entries = jdbc.queryForObject("select count(*) from trail", Long.class);
        demo.load();
        assertThat(jdbc.queryForObject("select count(*) from trail", Long.class))
                .isEqualTo(entries);
    }

    @Test
    void passwordsAreKeptForTheOwnerOfTheServerOnly() throws Exception {
        Path file = folder.path().resolve("demo-people.txt");
        assertThat(PosixFilePermissions.toString(Files.getPosixFilePermissions(file)))
                .isEqualTo("rw-------");
        assertThat(Files.readAllLines(file))
                .hasSize(Demo.PEOPLE.size())
                .allMatch(line -> line.matches(
                        "[a-z.]+ +[a-z2-9]{5}(-[a-z2-9]{5}){3}  (underwriter|medicalOfficer|manager|admin|auditor)"));
    }
}
