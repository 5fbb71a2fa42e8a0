package nearworld.app.results;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import nearworld.app.web.Figures;
import nearworld.app.web.FiguresTest;
import nearworld.engine.assessment.AssessmentResult;
import nearworld.engine.assessment.AssessmentResult.Split;
import nearworld.engine.assessment.AssessmentResult.WorldResult;
import org.junit.jupiter.api.Test;
import org.springframework.context.MessageSource;

class SentencesTest {
    private final MessageSource words = FiguresTest.words();
    private final Figures figures = FiguresTest.figures();

    @Test
    void theLostYearsAreTheSumOfTheirParts() {
        assertThat(told(15.96, 9.91, 8.12, Locale.ENGLISH))
                .containsExactly(
                        "In the recorded world half of people like this one live at least 7.6 more years (to age 72.4); the table gives 15.5.",
                        "Of the 7.8 years of expectation lost against the table, 6.0 were revealed by the history and 1.8 caused by its events.");
    }

    @Test
    void germanHasItsComma() {
        assertThat(told(15.96, 9.91, 8.12, Locale.GERMAN).get(1))
                .isEqualTo(
                        "Von den 7,8 Jahren Lebenserwartung, die gegenüber der Tafel fehlen, hat die Vorgeschichte 6,0 offenbart, und ihre Ereignisse haben 1,8 verursacht.");
    }

    @Test
    void yearsCanBeGained() {
        assertThat(told(15, 16.2, 16.2, Locale.ENGLISH).get(1))
                .isEqualTo(
                        "Of the 1.2 years of expectation gained against the table, 1.2 were revealed by the history and 0.0 caused by its events.");
    }

    @Test
    void whatIsRevealedAndWhatIsCausedMayPointApart() {
        assertThat(told(15, 16.2, 14.7, Locale.ENGLISH).get(1))
                .isEqualTo(
                        "Expectation of life against the table: 0.3 years fewer. The history reveals 1.2 years more; its events caused 1.5 years fewer.");
    }

    @Test
    void noDifferenceIsSaidAsSuch() {
        assertThat(told(15, 15.01, 14.99, Locale.ENGLISH).get(1))
                .startsWith("The expectation of life is that of the table");
    }

    private List<String> told(double table, double eventsRemoved, double recorded, Locale locale) {
        List<WorldResult> worlds = new ArrayList<>();
        worlds.add(world("table", table));
        worlds.add(world("recorded", recorded));
        worlds.add(world("eventsRemoved", eventsRemoved));
        Split unused = new Split(0, 1);
        return new Sentences(words, figures, locale)
                .of(new AssessmentResult(64.75, 0, List.of(), worlds, unused, unused, List.of()));
    }

    private static WorldResult world(String id, double expectation) {
        return new WorldResult(
                id,
                expectation,
                expectation - 0.5,
                expectation - 0.5,
                1,
                2,
                List.of(),
                15,
                1,
                0,
                null,
                List.of(0.9),
                List.of(1.0),
                null);
    }
}
