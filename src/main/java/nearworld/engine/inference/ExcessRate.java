package nearworld.engine.inference;

import java.util.List;
import nearworld.engine.basics.Estimate;
import nearworld.engine.network.EvidencePack.Excess;

/** The rate of death that a condition adds, a year: by years since onset where that is dated, in log between the knots. */
public final class ExcessRate {
    private static final double PER_MILLE = 1000;

    private final double unknown;
    private final double[] years;
    private final double[] logs;
    private final double onset;

    /** @param onset in years from today, negative in the past; NaN where it is not dated. A single rate needs no date. */
    ExcessRate(Excess excess, double onset) {
        this.unknown = excess.unknown().value() / PER_MILLE;
        this.years = excess.years().stream().mapToDouble(Double::doubleValue).toArray();
        List<Estimate> values = excess.values();
        this.logs = values.stream()
                .mapToDouble(v -> StrictMath.log(v.value() / PER_MILLE))
                .toArray();
        this.onset = years.length == 0 ? Double.NaN : onset;
    }

    /** The rate of somebody whose onset is not known: the population's. */
    double unknown() {
        return unknown;
    }

    /** The rate a year at a time, in years from today. */
    public double at(double time) {
        if (Double.isNaN(onset)) {
            return unknown;
        }
        double since = time - onset;
        if (since < 0) {
            return 0;
        }
        if (since <= years[0]) {
            return StrictMath.exp(logs[0]);
        }
        int i = 1;
        while (i < years.length && years[i] < since) {
            i++;
        }
        if (i == years.length) {
            return StrictMath.exp(logs[i - 1]);
        }
        double w = (since - years[i - 1]) / (years[i] - years[i - 1]);
        return StrictMath.exp(logs[i - 1] + w * (logs[i] - logs[i - 1]));
    }

    /** ∫ of the rate between two times, in years from today: exact on each stretch. */
    double integral(double from, double to) {
        if (Double.isNaN(onset)) {
            return unknown * (to - from);
        }
        double sum = 0;
        double a = Math.max(from, onset);
        while (a < to) {
            double b = to;
            for (double y : years) {
                if (onset + y > a + 1e-12 && onset + y < b) {
                    b = onset + y;
                }
            }
            double ra = at(a);
            double rb = at(b);
            double step = StrictMath.log(rb / ra);
            double mean = Math.abs(step) < 1e-6 ? 1 + step / 2 : StrictMath.expm1(step) / step;
            sum += ra * mean * (b - a);
            a = b;
        }
        return sum;
    }
}
