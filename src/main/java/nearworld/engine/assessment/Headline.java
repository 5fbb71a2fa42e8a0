package nearworld.engine.assessment;

import java.util.ArrayList;
import java.util.List;
import nearworld.engine.assessment.AssessmentResult.WorldResult;
import nearworld.engine.assessment.CaseFile.Cover;
import nearworld.engine.counterfactual.WorldCurve;
import nearworld.engine.mortality.LifeTable;
import org.jspecify.annotations.Nullable;

/** The headline numbers of section 7 of the model, from monthly survival. */
final class Headline {
    private static final int MONTHS = 12;
    /** The table's survival below which a term is not looked at any more. */
    private static final double LEAST_TABLE_SURVIVAL = 0.01;

    private static final double PER_MILLE = 1000;
    private static final double AGE_PRECISION = 1e-9;

    private final LifeTable life;
    private final List<Double> table;
    private final int termYears;

    Headline(LifeTable life, List<Double> tableSurvival, @Nullable Cover cover) {
        this.life = life;
        this.table = tableSurvival;
        int whole = (tableSurvival.size() - 1) / MONTHS;
        int term = cover == null || cover.years() == null ? whole : Math.min(cover.years(), whole);
        while (term > 1 && tableSurvival.get(term * MONTHS) < LEAST_TABLE_SURVIVAL) {
            term--;
        }
        this.termYears = term;
    }

    /** @param ownAge the age to report as rated age; NaN: to be found */
    WorldResult of(String id, WorldCurve curve, double ownAge, @Nullable Double aliveToday) {
        List<Double> s = curve.survival();
        List<Double> years = new ArrayList<>();
        double curtate = 0;
        for (int y = 1; y * MONTHS < s.size(); y++) {
            years.add(s.get(y * MONTHS));
            curtate += s.get(y * MONTHS);
        }
        List<Double> deciles = new ArrayList<>();
        for (int d = 1; d <= 9; d++) {
            deciles.add(whenBelow(s, 1 - d / 10.0));
        }
        double log = StrictMath.log(s.get(termYears * MONTHS));
        double logTable = StrictMath.log(table.get(termYears * MONTHS));
        return new WorldResult(
                id,
                curve.expectation(),
                curtate,
                whenBelow(s, 0.5),
                whenBelow(s, 0.75),
                whenBelow(s, 0.25),
                deciles,
                termYears,
                log / logTable,
                PER_MILLE * (logTable - log) / termYears,
                Double.isNaN(ownAge) ? ratedAge(curve.expectation()) : Double.valueOf(ownAge),
                years,
                s,
                aliveToday);
    }

    /** Years until survival has fallen to a level, linearly within the month. */
    private static double whenBelow(List<Double> s, double level) {
        int k = 1;
        while (k < s.size() - 1 && s.get(k) > level) {
            k++;
        }
        double before = s.get(k - 1);
        double after = s.get(k);
        double part = before == after ? 1 : (before - level) / (before - after);
        return (k - 1 + part) / MONTHS;
    }

    /** The age at which the table's expectation is as given: on the falling side, null where the table has none such. */
    private @Nullable Double ratedAge(double expectation) {
        double low = life.firstAge();
        double best = life.expectation(low);
        for (double a = low; a < Math.min(life.omega(), low + 20); a++) {
            if (life.expectation(a) > best) {
                best = life.expectation(a);
                low = a;
            }
        }
        double high = life.omega();
        if (expectation > best) {
            return null;
        }
        while (high - low > AGE_PRECISION) {
            double middle = (low + high) / 2;
            if (life.expectation(middle) > expectation) {
                low = middle;
            } else {
                high = middle;
            }
        }
        return (low + high) / 2;
    }
}
