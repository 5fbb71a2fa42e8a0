package nearworld.engine.assessment;

import java.util.List;
import nearworld.engine.basics.Fault;
import org.jspecify.annotations.Nullable;

/**
 * The result of an assessment of a living person.
 *
 * @param age exact age in years on the assessment day
 * @param logEvidence ln P(evidence), the normalising constant of the posterior
 * @param conditions in the pack's order
 * @param worlds table, recorded, eventsRemoved, unlearned, then one for each what-if in the case's order
 * @param revealed table → eventsRemoved
 * @param caused eventsRemoved → recorded
 * @param warnings codes with parameters, at their JSON paths
 */
public record AssessmentResult(
        double age,
        double logEvidence,
        List<ConditionShift> conditions,
        List<WorldResult> worlds,
        Split revealed,
        Split caused,
        List<Fault> warnings)
        implements AssessmentOutcome {

    public AssessmentResult {
        conditions = List.copyOf(conditions);
        worlds = List.copyOf(worlds);
        warnings = List.copyOf(warnings);
    }

    @Override
    public boolean isResult() {
        return true;
    }

    /** Probability of a condition before and after the evidence; after: of the state that the occurrences left. */
    public record ConditionShift(String id, double prior, double posterior) {}

    /**
     * A part of the excess over the table.
     *
     * @param years difference in complete expectation, in years
     * @param ratio quotient of the mortality ratios over the term
     */
    public record Split(double years, double ratio) {}

    /**
     * Remaining lifetime in one world.
     *
     * @param id {@code table}, {@code recorded}, {@code eventsRemoved}, {@code unlearned} or {@code whatIf:<name>}
     * @param expectation complete expectation of remaining life, in years
     * @param curtate curtate expectation, in years: Σ S(k), k = 1, 2, …
     * @param median in years, S linear within a month
     * @param lowerQuartile years by which a quarter has died
     * @param upperQuartile years by which three quarters have died
     * @param deciles years by which 10%, 20%, … 90% have died
     * @param termYears n, the years that the ratio and the extra speak of: the largest whole number up to the term at
     *     which the table's survival is at least 0.01
     * @param mortalityRatio ln S(n) / ln S0(n), 1 = table
     * @param extraPerMille 1000·(ln S0(n) − ln S(n))/n per year
     * @param ratedAge the age in years at which the table's expectation equals this world's; null where none does
     * @param survival S(1), S(2), … at whole years from today, to the table's end
     * @param monthly S at months 0, 1, 2, … from today
     * @param aliveToday the probability that no kept occurrence turned fatal; null outside what-ifs
     */
    public record WorldResult(
            String id,
            double expectation,
            double curtate,
            double median,
            double lowerQuartile,
            double upperQuartile,
            List<Double> deciles,
            int termYears,
            double mortalityRatio,
            double extraPerMille,
            @Nullable Double ratedAge,
            List<Double> survival,
            List<Double> monthly,
            @Nullable Double aliveToday) {
        public WorldResult {
            deciles = List.copyOf(deciles);
            survival = List.copyOf(survival);
            monthly = List.copyOf(monthly);
        }
    }

    /** The world of that id. */
    public WorldResult world(String id) {
        return worlds.stream()
                .filter(w -> w.id().equals(id))
                .findFirst()
                .orElseThrow(() -> new IllegalArgumentException("no world " + id));
    }
}
