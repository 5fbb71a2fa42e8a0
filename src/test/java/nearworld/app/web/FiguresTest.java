package nearworld.app.web;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.LocalDate;
import java.util.Locale;
import nearworld.engine.basics.PartialDate;
import org.junit.jupiter.api.Test;
import org.springframework.context.MessageSource;
import org.springframework.context.support.ResourceBundleMessageSource;

public class FiguresTest {
    private static final Locale EN = Locale.ENGLISH;
    private static final Locale DE = Locale.GERMAN;

    private final Figures figures = figures();

    /** The words of the pages. */
    public static MessageSource words() {
        ResourceBundleMessageSource words = new ResourceBundleMessageSource();
        words.setBasename("messages/web");
        words.setDefaultEncoding("UTF-8");
        words.setFallbackToSystemLocale(false);
        return words;
    }

    public static Figures figures() {
        return new Figures(words());
    }

    @Test
    void onlyWhatIsCertainIsZeroOrOne() {
        assertThat(figures.probability(0, EN)).isEqualTo("0%");
        assertThat(figures.probability(1, EN)).isEqualTo("100%");
        assertThat(figures.probability(1e-9, EN)).isEqualTo("under 0.1%");
        assertThat(figures.probability(1 - 1e-9, EN)).isEqualTo("over 99.9%");
        assertThat(figures.probability(0.0304, EN)).isEqualTo("3.0%");
        assertThat(figures.probability(0.626, EN)).isEqualTo("63%");
        assertThat(figures.probability(0.994, EN)).isEqualTo("99.4%");
    }

    @Test
    void differencesCarryTheirSign() {
        assertThat(figures.difference(1.84, EN)).isEqualTo("+1.8");
        assertThat(figures.difference(-1.84, DE)).isEqualTo("−1,8");
        assertThat(figures.difference(-0.01, EN)).isEqualTo("±0.0");
    }

    @Test
    void datesAreAsExactAsTheyAreKnown() {
        assertThat(figures.date(PartialDate.ofDay(LocalDate.of(2024, 5, 10)), EN))
                .isEqualTo("10 May 2024");
        assertThat(figures.date(PartialDate.ofMonth(2024, 5), EN)).isEqualTo("May 2024");
        assertThat(figures.date(PartialDate.ofYear(2024), EN)).isEqualTo("2024");
        assertThat(figures.date(PartialDate.ofDay(LocalDate.of(2024, 5, 10)), DE))
                .isEqualTo("10. Mai 2024");
    }

    @Test
    void ratiosAreInPerCentOfTheTable() {
        assertThat(figures.ratio(3.159, EN)).isEqualTo("316%");
        assertThat(figures.factor(1.309, EN)).isEqualTo("× 1.31");
        assertThat(figures.perMille(-0.04, EN)).isEqualTo("0.0");
        assertThat(figures.years(8.05, DE)).isEqualTo("8,1 Jahre");
    }
}
