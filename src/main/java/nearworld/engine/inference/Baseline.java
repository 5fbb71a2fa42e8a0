package nearworld.engine.inference;

import java.util.ArrayList;
import java.util.List;
import nearworld.engine.basics.Exponential;
import nearworld.engine.basics.Fault;
import nearworld.engine.mortality.LifeTable;
import nearworld.engine.network.EvidencePack.Taper;

/**
 * The baseline hazard that gives the population back its table: h_k of the months to come, h(a) of past ages.
 *
 * <p>Month k runs from x + k/12 to x + (k+1)/12, the last one to ω. h_k solves
 * Σ W_k(u)·exp(−ρ_u(x + (k + ½)/12)·h_k − x_u·d) = S0(t_{k+1})/S0(t_k), W carried on by the same factor.
 */
public final class Baseline {
    public static final double MONTHS_PER_YEAR = 12;
    private static final int MAX_NEWTON = 60;
    /** Close enough in survival over one month: far below the 1e-9 promised for all months together. */
    private static final double NEWTON_PRECISION = 2e-15;

    private final LifeTable table;
    private final Taper taper;
    private final ScoreGrid grid;
    private final double age;
    private final double end;
    private final double[] length;
    private final double[] hazard;
    private final double[][] relative;
    private final double[] survival;
    private final List<Fault> faults = new ArrayList<>();
    private final ScoreMeasure population;
    private final double populationExcess;

    /**
     * @param classes the population by its added rate of death a year: parallel lists
     */
    Baseline(LifeTable table, Taper taper, ScoreGrid grid, double age, List<ScoreMeasure> classes, double[] excess) {
        this.table = table;
        this.taper = taper;
        this.grid = grid;
        this.age = age;
        this.end = table.omega() - age;
        int months = (int) Math.ceil(end * MONTHS_PER_YEAR - 1e-9);
        this.length = new double[months];
        this.hazard = new double[months];
        this.relative = new double[months][];
        this.survival = new double[months + 1];
        this.population = new ScoreMeasure(grid);
        double mean = 0;
        for (int c = 0; c < classes.size(); c++) {
            population.addShifted(classes.get(c), 0, 1);
            mean += excess[c] * classes.get(c).total();
        }
        this.populationExcess = mean;
        solve(classes, excess);
    }

    private void solve(List<ScoreMeasure> classes, double[] excess) {
        double[][] weights = new double[classes.size()][];
        for (int c = 0; c < weights.length; c++) {
            weights[c] = classes.get(c).weight.clone();
        }
        double h0 = table.cumulativeHazard(age);
        double before = h0;
        survival[0] = 1;
        double guess = 0;
        for (int k = 0; k < hazard.length; k++) {
            double from = k / MONTHS_PER_YEAR;
            double to = Math.min((k + 1) / MONTHS_PER_YEAR, end);
            length[k] = to - from;
            relative[k] = relative(age + (k + 0.5) / MONTHS_PER_YEAR);
            double after = table.cumulativeHazard(age + to);
            boolean last = k == hazard.length - 1;
            survival[k + 1] = last ? 0 : StrictMath.exp(h0 - after);
            double target = last && !table.isExtended() ? 0 : StrictMath.exp(before - after);
            if (target == 0) {
                hazard[k] = Double.POSITIVE_INFINITY;
            } else {
                hazard[k] = month(k, target, guess, weights, excess, classes);
                guess = hazard[k];
            }
            before = after;
            if (!faults.isEmpty()) {
                return;
            }
        }
    }

    private double month(
            int k, double target, double guess, double[][] weights, double[] excess, List<ScoreMeasure> classes) {
        double[] kept = new double[weights.length];
        double atZero = 0;
        for (int c = 0; c < weights.length; c++) {
            kept[c] = StrictMath.exp(-excess[c] * length[k]);
            for (int n = population.from; n < population.to; n++) {
                atZero += weights[c][n] * kept[c];
            }
        }
        if (atZero < target - 1e-13) {
            refuse(age + k / MONTHS_PER_YEAR);
            return 0;
        }
        double[] combined = new double[population.to];
        for (int c = 0; c < weights.length; c++) {
            for (int n = population.from; n < population.to; n++) {
                combined[n] += weights[c][n] * kept[c];
            }
        }
        double[] rho = relative[k];
        double h = guess;
        for (int round = 0; round < MAX_NEWTON; round++) {
            double value = 0;
            double slope = 0;
            for (int n = population.from; n < population.to; n++) {
                double part = combined[n] * Exponential.exp(-rho[n] * h);
                value += part;
                slope += part * rho[n];
            }
            h = Math.max(0, h + (value - target) / slope);
            if (Math.abs(value - target) <= NEWTON_PRECISION) {
                break;
            }
        }
        double sum = 0;
        for (int n = population.from; n < population.to; n++) {
            double factor = Exponential.exp(-rho[n] * h);
            for (int c = 0; c < weights.length; c++) {
                weights[c][n] *= factor * kept[c];
                sum += weights[c][n];
            }
        }
        for (double[] w : weights) {
            for (int n = population.from; n < population.to; n++) {
                w[n] /= sum;
            }
        }
        return h;
    }

    private void refuse(double atAge) {
        faults.add(Fault.of("excessAboveTable", "$.conditions", "age", atAge));
    }

    /** ρ at the grid's nodes. */
    private double[] relative(double atAge) {
        double g = taper.at(atAge);
        double[] rho = new double[grid.size()];
        for (int n = 0; n < rho.length; n++) {
            rho[n] = Exponential.exp(g * grid.score(n));
        }
        return rho;
    }

    /** A past age as the aftermath needs it: the baseline a year there, and ρ at the nodes. */
    record Past(double hazardPerYear, double g, double[] relative) {}

    /** h(a) = (μ0(a) − E_P[x_u])/E_P[ρ_u(a)], a fault where it is negative. */
    Past past(double atAge) {
        double[] rho = relative(atAge);
        double h = (table.force(atAge) - populationExcess) / population.integral(rho);
        if (h < 0 && faults.isEmpty()) {
            refuse(atAge);
        }
        return new Past(h, taper.at(atAge), rho);
    }

    public List<Fault> faults() {
        return faults;
    }

    public ScoreGrid grid() {
        return grid;
    }

    public LifeTable table() {
        return table;
    }

    Taper taper() {
        return taper;
    }

    /** x, the exact age at month 0. */
    public double age() {
        return age;
    }

    public int months() {
        return hazard.length;
    }

    /** d of month k in years; only the last month may be shorter than a twelfth. */
    public double length(int month) {
        return length[month];
    }

    /** h_k; infinite where the table lets all die. */
    public double hazard(int month) {
        return hazard[month];
    }

    /** ρ at the nodes in the middle of month k. */
    public double[] relative(int month) {
        return relative[month];
    }

    /** g in the middle of month k. */
    public double taperAt(int month) {
        return taper.at(age + (month + 0.5) / MONTHS_PER_YEAR);
    }

    /** S0 at month k. */
    public double tableSurvival(int month) {
        return survival[month];
    }

    /** The table's hazard integrated over month k. */
    public double tableHazard(int month) {
        double from = age + month / MONTHS_PER_YEAR;
        return table.cumulativeHazard(Math.min(from + length[month], table.omega())) - table.cumulativeHazard(from);
    }
}
