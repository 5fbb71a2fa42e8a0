package nearworld.app.results;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import nearworld.app.web.Figures;
import nearworld.engine.assessment.AssessmentResult;
import nearworld.engine.assessment.AssessmentResult.WorldResult;
import org.springframework.context.MessageSource;

/** The result in plain words, from message patterns. */
final class Sentences {
    /** Differences below half of the last digit shown are none. */
    private static final double NOTHING = 0.05;

    private final MessageSource words;
    private final Figures figures;
    private final Locale locale;

    Sentences(MessageSource words, Figures figures, Locale locale) {
        this.words = words;
        this.figures = figures;
        this.locale = locale;
    }

    List<String> of(AssessmentResult result) {
        List<String> sentences = new ArrayList<>();
        WorldResult recorded = result.world("recorded");
        WorldResult table = result.world("table");
        sentences.add(say(
                "sentence.median",
                figures.bareYears(recorded.median(), locale),
                figures.bareYears(result.age() + recorded.median(), locale),
                figures.bareYears(table.median(), locale)));
        sentences.add(split(revealed(result), caused(result)));
        return sentences;
    }

    /** Years of expectation that the history reveals; negative: lost. */
    static double revealed(AssessmentResult result) {
        return result.world("eventsRemoved").expectation()
                - result.world("table").expectation();
    }

    /** Years of expectation that the events caused; negative: lost. */
    static double caused(AssessmentResult result) {
        return result.world("recorded").expectation()
                - result.world("eventsRemoved").expectation();
    }

    private String split(double revealed, double caused) {
        double total = Figures.round(revealed + caused, 1);
        boolean nothing = Math.abs(revealed) < NOTHING && Math.abs(caused) < NOTHING;
        if (nothing) {
            return say("sentence.asTable");
        }
        // The smaller part is rounded, the larger takes the rest, so that the parts of the sentence add up.
        boolean causedIsSmaller = Math.abs(caused) < Math.abs(revealed);
        double small = Figures.round(causedIsSmaller ? caused : revealed, 1);
        double large = Figures.round(total - small, 1);
        double first = causedIsSmaller ? large : small;
        double second = causedIsSmaller ? small : large;
        if (total < 0 && first <= 0 && second <= 0) {
            return say("sentence.lost", bare(total), bare(first), bare(second));
        }
        if (total > 0 && first >= 0 && second >= 0) {
            return say("sentence.gained", bare(total), bare(first), bare(second));
        }
        return say("sentence.mixed", signed(total), signed(first), signed(second));
    }

    /** "6.1 years fewer", "0.3 years more", or "no difference". */
    String fewerOrMore(double years) {
        if (Math.abs(years) < NOTHING) {
            return say("figure.noDifference");
        }
        return say(years < 0 ? "figure.fewer" : "figure.more", bare(years));
    }

    private String bare(double years) {
        return figures.bareYears(Math.abs(years), locale);
    }

    private String signed(double years) {
        return fewerOrMore(years);
    }

    private String say(String key, Object... values) {
        return words.getMessage(key, values, locale);
    }
}
