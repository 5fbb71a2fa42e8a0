package nearworld.app.demo;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.time.Clock;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import nearworld.app.artefacts.ArtefactKind;
import nearworld.app.artefacts.ArtefactView;
import nearworld.app.artefacts.Artefacts;
import nearworld.app.assessments.Assessments;
import nearworld.app.cases.Cases;
import nearworld.app.cases.NewCase;
import nearworld.app.database.DatabaseKind;
import nearworld.app.forms.FormsOfCase;
import nearworld.app.installation.DataFolder;
import nearworld.app.people.CurrentPerson;
import nearworld.app.people.People;
import nearworld.app.people.PersonView;
import nearworld.app.people.Role;
import nearworld.app.trail.NewEntry;
import org.springframework.beans.factory.annotation.Value;
import org.springframework.core.io.Resource;
import org.springframework.core.io.support.ResourcePatternResolver;
import org.springframework.stereotype.Component;
import org.springframework.transaction.PlatformTransactionManager;
import org.springframework.transaction.support.TransactionTemplate;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/**
 * The demo of the fictional insurer Saltmarsh Provident: invented people and cases on an open table. It is loaded once,
 * whole or not at all, and only into an embedded database or where {@code NEARWORLD_DEMO=true} asks for it.
 */
@Component
class Demo {
    /** What a person of the demo is called. */
    record Character(String name, String displayName, Role role) {}

    static final List<Character> PEOPLE = List.of(
            new Character("ada.quill", "Ada Quill", Role.UNDERWRITER),
            new Character("ben.tarn", "Ben Tarn", Role.UNDERWRITER),
            new Character("cleo.marsh", "Dr Cleo Marsh", Role.MEDICAL_OFFICER),
            new Character("dina.holt", "Dina Holt", Role.MANAGER),
            new Character("eli.frost", "Eli Frost", Role.ADMIN),
            new Character("fay.lund", "Fay Lund", Role.AUDITOR));

    private static final List<String> COVER_KINDS = List.of("term", "wholeOfLife", "endowment", "lifeAnnuity");
    private static final LocalDate ALWAYS = LocalDate.of(2000, 1, 1);
    private static final String TABLE = "classpath:seed-data/tables/us-2014-population.csv";
    private static final String PACK = "classpath:seed-data/packs/default-1.yaml";
    private static final String CASES = "classpath:seed-data/cases/*.json";

    /** Of every so many cases one belongs to the second underwriter, and one is assigned to nobody. */
    private static final int CASES_A_ROUND = 4;

    private static final int DAYS_BETWEEN_DUE = 3;

    private final DatabaseKind database;
    private final boolean asked;
    private final Artefacts artefacts;
    private final People people;
    private final CurrentPerson current;
    private final Cases cases;
    private final Assessments assessments;
    private final DataFolder folder;
    private final ResourcePatternResolver resources;
    private final TransactionTemplate transaction;
    private final Clock clock;

    Demo(
            DatabaseKind database,
            @Value("${nearworld.demo:false}") boolean asked,
            Artefacts artefacts,
            People people,
            CurrentPerson current,
            Cases cases,
            Assessments assessments,
            DataFolder folder,
            ResourcePatternResolver resources,
            PlatformTransactionManager transactions,
            Clock clock) {
        this.database = database;
        this.asked = asked;
        this.artefacts = artefacts;
        this.people = people;
        this.current = current;
        this.cases = cases;
        this.assessments = assessments;
        this.folder = folder;
        this.resources = resources;
        this.transaction = new TransactionTemplate(transactions);
        this.clock = clock;
    }

    boolean wanted() {
        return database == DatabaseKind.EMBEDDED || asked;
    }

    /** Loads the demo where there is nobody yet. */
    void load() {
        if (!people.isEmpty()) {
            return;
        }
        Map<String, String> passwords = new TreeMap<>();
        transaction.executeWithoutResult(status -> {
            fill(passwords);
            keep(passwords);
        });
        Console.print("Demo people of Saltmarsh Provident (name, password, role):\n" + listing(passwords)
                + "They are kept in " + passwordFile() + ".");
    }

    private void fill(Map<String, String> passwords) {
        publish();
        Map<String, PersonView> added = new TreeMap<>();
        for (Character character : PEOPLE) {
            String password = People.randomPassword();
            passwords.put(character.name(), password);
            added.put(
                    character.name(),
                    people.add(character.name(), character.displayName(), character.role(), password, NewEntry.SYSTEM));
        }
        List<Resource> files = caseFiles();
        for (int i = 0; i < files.size(); i++) {
            fillCase(files.get(i), i, added);
        }
    }

    private void publish() {
        if (!artefacts.list().isEmpty()) {
            return;
        }
        ArtefactView table = artefacts.publishTable(text(resources.getResource(TABLE)), 1, NewEntry.SYSTEM);
        ArtefactView pack = artefacts.publishPack(text(resources.getResource(PACK)), NewEntry.SYSTEM);
        for (String coverKind : COVER_KINDS) {
            artefacts.makeDefault(ArtefactKind.TABLE, table.sha256(), coverKind, ALWAYS);
            artefacts.makeDefault(ArtefactKind.PACK, pack.sha256(), coverKind, ALWAYS);
        }
    }

    /** The first case of a round is recorded, the third is the second underwriter's, the fourth waits for anybody. */
    private void fillCase(Resource file, int index, Map<String, PersonView> added) {
        JsonNode input = JsonMapper.shared().readTree(text(file));
        int place = index % CASES_A_ROUND;
        PersonView owner = person(added, place == 2 ? "ben.tarn" : place == 3 ? "dina.holt" : "ada.quill");
        String ref = cases.create(
                new NewCase(
                        input.path("caseRef").asString(""),
                        "",
                        LocalDate.now(clock).plusDays((long) index * DAYS_BETWEEN_DUE)),
                owner,
                place == 3 ? null : owner,
                FormsOfCase.of(input));
        if (place == 0) {
            current.runAs(owner, () -> assessments.record(ref));
        }
    }

    private static PersonView person(Map<String, PersonView> added, String name) {
        PersonView person = added.get(name);
        if (person == null) {
            throw new IllegalStateException("the demo has no " + name);
        }
        return person;
    }

    private List<Resource> caseFiles() {
        try {
            List<Resource> files = new ArrayList<>(Arrays.asList(resources.getResources(CASES)));
            files.sort(Comparator.comparing(r -> String.valueOf(r.getFilename())));
            return files;
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private static String text(Resource file) {
        try {
            return file.getContentAsString(StandardCharsets.UTF_8);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private void keep(Map<String, String> passwords) {
        try {
            folder.create();
            folder.writePrivately(passwordFile(), listing(passwords));
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private java.nio.file.Path passwordFile() {
        return folder.path().resolve("demo-people.txt");
    }

    private static String listing(Map<String, String> passwords) {
        StringBuilder text = new StringBuilder();
        for (Character character : PEOPLE) {
            text.append("%-12s %s  %s%n"
                    .formatted(
                            character.name(),
                            passwords.get(character.name()),
                            character.role().id()));
        }
        return text.toString();
    }
}
