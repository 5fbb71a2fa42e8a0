package nearworld.app.results;

import nearworld.app.web.Figures;
import nearworld.engine.assessment.AssessmentResult;

/**
 * What the history revealed and what its events caused, in years of expectation against the table, to one decimal;
 * negative: lost. The total and the smaller part are rounded, the larger takes the rest, so that what a reader adds up
 * adds up; the larger part is off by less than a tenth.
 */
record YearsSplit(double total, double revealed, double caused) {
    static YearsSplit of(AssessmentResult result) {
        double table = result.world("table").expectation();
        double eventsRemoved = result.world("eventsRemoved").expectation();
        double recorded = result.world("recorded").expectation();
        return of(eventsRemoved - table, recorded - eventsRemoved);
    }

    static YearsSplit of(double revealed, double caused) {
        double total = Figures.round(revealed + caused, 1);
        if (Math.abs(caused) < Math.abs(revealed)) {
            double small = Figures.round(caused, 1);
            return new YearsSplit(total, Figures.round(total - small, 1), small);
        }
        double small = Figures.round(revealed, 1);
        return new YearsSplit(total, small, Figures.round(total - small, 1));
    }

    boolean isNothing() {
        return revealed == 0 && caused == 0;
    }

    boolean isLoss() {
        return total < 0 && revealed <= 0 && caused <= 0;
    }

    boolean isGain() {
        return total > 0 && revealed >= 0 && caused >= 0;
    }
}
