package nearworld.app.web;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.Reader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Properties;
import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import nearworld.app.cases.CaseState;
import nearworld.app.forms.Section;
import nearworld.app.people.Role;
import org.junit.jupiter.api.Test;

/** Every word that a page asks for is there, in both languages. */
class MessagesTest {
    private static final Path MESSAGES = Path.of("src/main/resources/messages");
    private static final Path TEMPLATES = Path.of("src/main/resources/templates");
    private static final Pattern IN_TEMPLATES =
            Pattern.compile("#\\{([a-zA-Z0-9.]+)[(}]|#messages\\.msg\\('([a-zA-Z0-9.]+)'[,)]");
    private static final Pattern PARAMETER = Pattern.compile("\\{(\\d)}");

    @Test
    void bothLanguagesHaveTheSameKeys() throws IOException {
        assertThat(read("web_de").stringPropertyNames()).isEqualTo(read("web").stringPropertyNames());
    }

    @Test
    void bothLanguagesFillInTheSameValues() throws IOException {
        Properties english = read("web");
        Properties german = read("web_de");
        for (String key : english.stringPropertyNames()) {
            assertThat(parameters(german.getProperty(key))).as(key).isEqualTo(parameters(english.getProperty(key)));
        }
    }

    @Test
    void everyKeyOfATemplateHasItsWords() throws IOException {
        Set<String> known = read("web").stringPropertyNames();
        Set<String> asked = new TreeSet<>();
        for (Path template : templates()) {
            Matcher matcher = IN_TEMPLATES.matcher(Files.readString(template));
            while (matcher.find()) {
                asked.add(matcher.group(1) == null ? matcher.group(2) : matcher.group(1));
            }
        }
        assertThat(asked).hasSizeGreaterThan(150);
        assertThat(known).containsAll(asked);
    }

    @Test
    void everyStateRoleAndSectionHasItsWords() throws IOException {
        Set<String> known = read("web").stringPropertyNames();
        Stream.of(CaseState.values()).forEach(s -> assertThat(known).contains("state." + s.id()));
        Stream.of(Role.values()).forEach(r -> assertThat(known).contains("role." + r.id()));
        Stream.of(Section.values()).forEach(s -> assertThat(known).contains("section." + s.id()));
        Stream.of("remove", "move", "outcome", "without", "behaviour", "treat", "add")
                .forEach(kind -> assertThat(known).contains("changeKind." + kind));
    }

    @Test
    void noStraightApostropheSpoilsAPattern() throws IOException {
        for (String language : List.of("web", "web_de")) {
            Properties words = read(language);
            for (String key : words.stringPropertyNames()) {
                assertThat(words.getProperty(key)).as(language + " " + key).doesNotContain("'");
            }
        }
    }

    private static Set<String> parameters(String pattern) {
        Set<String> found = new TreeSet<>();
        Matcher matcher = PARAMETER.matcher(pattern);
        while (matcher.find()) {
            found.add(matcher.group(1));
        }
        return found;
    }

    private static Properties read(String name) throws IOException {
        Properties words = new Properties();
        try (Reader reader = Files.newBufferedReader(MESSAGES.resolve(name + ".properties"), StandardCharsets.UTF_8)) {
            words.load(reader);
        }
        return words;
    }

    private static List<Path> templates() throws IOException {
        try (Stream<Path> files = Files.walk(TEMPLATES)) {
            return files.filter(f -> f.toString().endsWith(".html")).toList();
        }
    }
}
