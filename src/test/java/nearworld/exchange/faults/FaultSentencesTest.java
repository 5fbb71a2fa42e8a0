package nearworld.exchange.faults;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.Reader;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Properties;
import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import nearworld.engine.basics.Fault;
import org.junit.jupiter.api.Test;

/** Every code that the engine and the exchange formats emit has its sentence, in English and in German. */
class FaultSentencesTest {
    private static final Path SOURCES = Path.of("src/main/java/nearworld");
    private static final Pattern EMITTED = Pattern.compile(
            "(?:Fault\\.of\\(|new Fault\\()\\s*(?:last \\? \"([a-zA-Z]+)\" : )?\"([a-z][A-Za-z0-9]+)\"");
    private static final Pattern BY_KEYWORD = Pattern.compile("(?:-> |return )\"([a-z][A-Za-z]+)\";");
    private static final Pattern LOOKED_UP = Pattern.compile("\"(unknown[A-Z][A-Za-z]+)\"");
    private static final Pattern NAME = Pattern.compile("\\{([a-zA-Z0-9]+)}");

    private static Set<String> emitted() throws IOException {
        Set<String> codes = new TreeSet<>();
        for (String part : List.of("engine", "exchange", "cli")) {
            try (Stream<Path> files = Files.walk(SOURCES.resolve(part))) {
                for (Path file :
                        files.filter(f -> f.toString().endsWith(".java")).toList()) {
                    String text = Files.readString(file);
                    collect(EMITTED, text, codes);
                    collect(LOOKED_UP, text, codes);
                    if (file.endsWith("FormatSchema.java")) {
                        collect(BY_KEYWORD, text, codes);
                    }
                }
            }
        }
        return codes;
    }

    private static void collect(Pattern pattern, String text, Set<String> codes) {
        Matcher m = pattern.matcher(text);
        while (m.find()) {
            for (int g = 1; g <= m.groupCount(); g++) {
                if (m.group(g) != null) {
                    codes.add(m.group(g));
                }
            }
        }
    }

    private static Properties words(String file) throws IOException {
        Properties words = new Properties();
        try (Reader in = Files.newBufferedReader(Path.of("src/main/resources/messages", file))) {
            words.load(in);
        }
        return words;
    }

    @Test
    void everyCodeHasItsSentenceInBothLanguages() throws IOException {
        Set<String> codes = emitted();

        assertThat(codes)
                .contains("unknownField", "dateBeforeBirth", "linksExceedPrevalence")
                .hasSizeGreaterThan(80);
        for (String file : List.of("faults.properties", "faults_de.properties")) {
            Set<String> known = new TreeSet<>();
            words(file).stringPropertyNames().forEach(k -> known.add(k.substring("fault.".length())));
            assertThat(known).as(file).containsAll(codes);
        }
    }

    @Test
    void bothLanguagesSpeakOfTheSameValues() throws IOException {
        Properties english = words("faults.properties");
        Properties german = words("faults_de.properties");

        assertThat(english.stringPropertyNames()).isEqualTo(german.stringPropertyNames());
        for (String key : english.stringPropertyNames()) {
            assertThat(names(english.getProperty(key))).as(key).isEqualTo(names(german.getProperty(key)));
        }
    }

    private static Set<String> names(String sentence) {
        Set<String> names = new TreeSet<>();
        collect(NAME, sentence, names);
        return names;
    }

    @Test
    void putsTheValuesIntoTheSentence() {
        Fault fault = new Fault("belowMinimum", "$.cover.years", Map.of("value", "-3", "bound", "1"));

        assertThat(new FaultSentences(Locale.ENGLISH).sentence(fault))
                .isEqualTo("The value is -3; it must be at least 1.");
        assertThat(new FaultSentences(Locale.GERMAN).sentence(fault))
                .isEqualTo("Der Wert ist -3; er muss mindestens 1 sein.");
        assertThat(new FaultSentences(Locale.ENGLISH).sentence(Fault.of("neverHeardOf", "$.x", "value", 1)))
                .isEqualTo("neverHeardOf (value=1)");
    }
}
