package nearworld.app.results;

import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.stream.IntStream;
import nearworld.app.assessments.Calculated;
import nearworld.app.drawing.ShiftDrawing;
import nearworld.app.web.Figures;
import nearworld.engine.assessment.AssessmentResult;
import nearworld.engine.assessment.AssessmentResult.ConditionShift;
import nearworld.engine.assessment.AssessmentResult.WorldResult;
import org.springframework.context.MessageSource;
import org.springframework.stereotype.Service;

/** Turns a calculation, of this moment or recorded, into what a reader sees. */
@Service
public class ResultViews {
    private static final List<Integer> HORIZONS = List.of(1, 5, 10, 15, 20, 25, 30);
    private static final int HEADLINE_HORIZON = 10;

    private final MessageSource words;
    private final Figures figures;

    ResultViews(MessageSource words, Figures figures) {
        this.words = words;
        this.figures = figures;
    }

    /** The view of a result in a language. */
    public ResultView of(Calculated calculated, Locale locale) {
        AssessmentResult result = calculated.result();
        List<World> worlds = World.of(calculated.file(), result);
        HistoryWords history = new HistoryWords(calculated, words, figures, locale);
        Sentences sentences = new Sentences(words, figures, locale);
        List<String> told = sentences.of(result);
        ResultDrawings drawings = new ResultDrawings(calculated, worlds, words, figures, locale);
        int longest = result.world("table").survival().size();
        List<Integer> horizons = HORIZONS.stream().filter(h -> h <= longest).toList();
        return new ResultView(
                drawings.lifeline(history, told),
                drawings.curves(),
                told,
                part(
                        sentences,
                        YearsSplit.of(result).revealed(),
                        result.revealed().ratio(),
                        locale),
                part(sentences, YearsSplit.of(result).caused(), result.caused().ratio(), locale),
                worlds.stream()
                        .map(w -> row(w, result, horizons, drawings, locale))
                        .toList(),
                result.world("recorded").termYears(),
                horizons,
                worlds.stream().anyMatch(w -> isLess(w.numbers().aliveToday())),
                conditions(calculated, locale),
                history.rows(),
                history.onsetRows(),
                result.warnings(),
                calculated.leftOut());
    }

    private static boolean isLess(@org.jspecify.annotations.Nullable Double aliveToday) {
        return aliveToday != null && aliveToday < 1;
    }

    private ResultView.Part part(Sentences sentences, double years, double ratio, Locale locale) {
        return new ResultView.Part(sentences.fewerOrMore(years), figures.factor(ratio, locale));
    }

    private ResultView.WorldRow row(
            World world, AssessmentResult result, List<Integer> horizons, ResultDrawings drawings, Locale locale) {
        WorldResult n = world.numbers();
        boolean recorded = world.numbers().id().equals("recorded");
        double difference = n.expectation() - result.world("recorded").expectation();
        Double rated = n.ratedAge();
        Double alive = n.aliveToday();
        return new ResultView.WorldRow(
                world.key(),
                world.letter(),
                drawings.title(world),
                drawings.note(world),
                figures.bareYears(n.expectation(), locale),
                recorded ? "" : figures.difference(difference, locale),
                figures.bareYears(n.curtate(), locale),
                figures.bareYears(n.median(), locale),
                figures.bareYears(result.age() + n.median(), locale),
                figures.range(n.lowerQuartile(), n.upperQuartile(), locale),
                figures.range(n.deciles().get(0), n.deciles().get(8), locale),
                horizons.stream().map(h -> dying(n, h, locale)).toList(),
                dying(n, HEADLINE_HORIZON, locale),
                figures.ratio(n.mortalityRatio(), locale),
                figures.perMille(n.extraPerMille(), locale),
                rated == null ? "" : figures.bareYears(rated, locale),
                alive == null ? "" : figures.probability(alive, locale));
    }

    /** The probability of dying within whole years; beyond the table's end everybody has. */
    private String dying(WorldResult world, int years, Locale locale) {
        List<Double> survival = world.survival();
        double alive = years <= survival.size() ? survival.get(years - 1) : 0;
        return figures.probability(1 - alive, locale);
    }

    /** What moved most comes first. */
    private List<ResultView.ConditionRow> conditions(Calculated calculated, Locale locale) {
        List<ConditionShift> shifts = calculated.result().conditions();
        return IntStream.range(0, shifts.size())
                .boxed()
                .sorted(Comparator.comparingDouble(
                        i -> -Math.abs(shifts.get(i).posterior() - shifts.get(i).prior())))
                .map(i -> condition(calculated.words().conditions().get(i).title(), shifts.get(i), locale))
                .toList();
    }

    private ResultView.ConditionRow condition(String title, ConditionShift shift, Locale locale) {
        return new ResultView.ConditionRow(
                title,
                figures.probability(shift.prior(), locale),
                figures.probability(shift.posterior(), locale),
                figures.factor(shift.posterior() / shift.prior(), locale),
                ShiftDrawing.svg(shift.prior(), shift.posterior()));
    }
}
