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
        sentences.add(split(YearsSplit.of(result)));
        return sentences;
    }

    private String split(YearsSplit split) {
        if (split.isNothing()) {
            return say("sentence.asTable");
        }
        if (split.isLoss()) {
            return say("sentence.lost", bare(split.total()), bare(split.revealed()), bare(split.caused()));
        }
        if (split.isGain()) {
            return say("sentence.gained", bare(split.total()), bare(split.revealed()), bare(split.caused()));
        }
        return say(
                "sentence.mixed",
                fewerOrMore(split.total()),
                fewerOrMore(split.revealed()),
                fewerOrMore(split.caused()));
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

    private String say(String key, Object... values) {
        return words.getMessage(key, values, locale);
    }
}
