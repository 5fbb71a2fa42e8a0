package nearworld.app.results;

import java.util.List;
import nearworld.engine.basics.Fault;
import org.jspecify.annotations.Nullable;

/**
 * A result in words, numbers with units, and drawings; every text is in the reader's language.
 *
 * @param lifeline the lifeline in three widths
 * @param curves the survival curves in three widths
 * @param sentences the result in plain words
 * @param termYears the years that mortality ratios and extras speak of
 * @param horizons the years of the columns "dying within"
 * @param hasAliveToday whether in some what-if not everybody would have lived to see today
 */
public record ResultView(
        Drawings lifeline,
        Drawings curves,
        List<String> sentences,
        Part revealed,
        Part caused,
        List<WorldRow> worlds,
        int termYears,
        List<Integer> horizons,
        boolean hasAliveToday,
        List<ConditionRow> conditions,
        List<HistoryRow> history,
        List<OnsetRow> onsets,
        List<Fault> warnings,
        List<Fault> leftOut) {

    public ResultView {
        sentences = List.copyOf(sentences);
        worlds = List.copyOf(worlds);
        horizons = List.copyOf(horizons);
        conditions = List.copyOf(conditions);
        history = List.copyOf(history);
        onsets = List.copyOf(onsets);
        warnings = List.copyOf(warnings);
        leftOut = List.copyOf(leftOut);
    }

    /** One drawing laid out for three widths, as SVG. */
    public record Drawings(String wide, String medium, String narrow) {}

    /**
     * Revealed or caused.
     *
     * @param years for example "6.1 years fewer"
     * @param ratio for example "× 2.41"
     */
    public record Part(String years, String ratio) {}

    /**
     * One world in numbers.
     *
     * @param kind the id of its kind: table, eventsRemoved, recorded, whatIf or unlearned
     * @param againstRecorded difference of expectation to the recorded world, in years, signed; empty for itself
     * @param dying probabilities of dying within the horizons, in per cent
     */
    public record WorldRow(
            String kind,
            String letter,
            String title,
            String note,
            String expectation,
            String againstRecorded,
            String curtate,
            String median,
            String medianAge,
            String middleHalf,
            String middleMost,
            List<String> dying,
            String dyingWithinTen,
            String mortalityRatio,
            String extraPerMille,
            String ratedAge,
            String aliveToday) {
        public WorldRow {
            dying = List.copyOf(dying);
        }
    }

    /** A hidden condition: its probability of being present today, before and after the evidence. */
    public record ConditionRow(String title, String before, String after, String factor, String drawing) {}

    /** One type of event: the watched window in words (empty: none) and its occurrences. */
    public record HistoryRow(String event, @Nullable String watched, List<String> occurrences) {
        public HistoryRow {
            occurrences = List.copyOf(occurrences);
        }
    }

    /** Since when a condition is known, and from whom. */
    public record OnsetRow(String condition, String since, String source) {}
}
