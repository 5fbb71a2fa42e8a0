package nearworld.oracle;

import java.util.ArrayList;
import java.util.List;
import nearworld.oracle.Cohort.Carried;
import nearworld.oracle.OraclePack.Level;
import nearworld.oracle.OraclePack.Outcome;
import nearworld.oracle.WhatIf.Coming;
import nearworld.oracle.WhatIf.Cure;
import nearworld.oracle.WhatIf.NewHabit;
import nearworld.oracle.WhatIf.Therapy;

/** Carries cohorts from today to the end of the table, month by month, with the changes that begin today or later. */
final class Projection {
    /** Survival at the start and after each month. */
    final double[] survival;

    double expectation;

    private final Person person;
    private final Population population;
    private final WhatIf whatIf;
    private final boolean ownHabits;
    private List<Cohort> cohorts;

    /** {@code ownHabits} is whether a habit given up fades as the person's own does. */
    Projection(List<Cohort> start, Person person, WhatIf whatIf, boolean ownHabits) {
        this.person = person;
        this.population = person.population;
        this.whatIf = whatIf;
        this.ownHabits = ownHabits;
        cohorts = start;
        survival = new double[population.months + 1];
        survival[0] = total();
        for (int k = 0; k < population.months; k++) {
            month(k);
            survival[k + 1] = total();
        }
    }

    private double total() {
        double sum = 0;
        for (Cohort cohort : cohorts) {
            for (double w : cohort.weights()) {
                sum += w;
            }
        }
        return sum;
    }

    private void month(int k) {
        double start = population.age + k / 12.0;
        double end = start + population.monthLength[k];
        double middle = population.age + (k + 0.5) / 12;
        double[] rho = relativeHazards(middle);
        double[] excess = excess(middle);
        double at = start;
        for (Coming coming : whatIf.coming) {
            if (coming.atAge() >= start && coming.atAge() < end) {
                live(k, at, coming.atAge(), middle, rho, excess);
                happen(coming);
                at = coming.atAge();
            }
        }
        live(k, at, end, middle, rho, excess);
    }

    private void live(int k, double from, double to, double middle, double[] rho, double[] excess) {
        double length = to - from;
        double h = population.baseline[k] * length / population.monthLength[k];
        for (Cohort cohort : cohorts) {
            double ratio = cohort.ratio(population.pack, middle);
            double added = cohort.excess(middle);
            double[] weights = cohort.weights();
            for (int m = 0; m < weights.length; m++) {
                if (weights[m] == 0) {
                    continue;
                }
                if (Double.isInfinite(population.baseline[k])) {
                    expectation += weights[m] * length / 2;
                    weights[m] = 0;
                    continue;
                }
                double dying = rho[m] * h * ratio + (excess[m] + added) * length;
                double left = Math.exp(-dying);
                expectation += weights[m] * length * (dying < 1e-9 ? 1 - dying / 2 : -Math.expm1(-dying) / dying);
                weights[m] *= left;
            }
        }
    }

    /** Conditions that are out of the score at an age. */
    private int cured(double atAge) {
        int mask = 0;
        for (Cure cure : whatIf.cures) {
            mask |= atAge >= cure.fromAge() ? 1 << cure.condition() : 0;
        }
        return mask;
    }

    private double[] relativeHazards(double atAge) {
        double g = population.pack.taper(atAge);
        double[] result = new double[population.prior.length];
        for (int b = 0; b < population.levels.length; b++) {
            double habits = 0;
            for (int k = 0; k < population.levels[b].length; k++) {
                habits += habit(k, population.levels[b][k], atAge);
            }
            for (int mask = 0; mask < population.masks; mask++) {
                int there = mask & ~cured(atAge);
                double score = population.conditionScore(there) + habits;
                for (Therapy therapy : whatIf.therapies) {
                    int only = therapy.treatment().onlyWith();
                    boolean acts = atAge >= therapy.fromAge() && (only < 0 || (there & 1 << only) != 0);
                    score += acts ? therapy.treatment().logRatio() : 0;
                }
                for (int z = 0; z < population.bins; z++) {
                    result[population.index(mask, b, z)] = Math.exp(g * (score + Math.log(population.pack.frailty[z])));
                }
            }
        }
        return result;
    }

    private double habit(int k, int level, double atAge) {
        List<Level> levels = population.pack.behaviours.get(k).levels();
        for (NewHabit habit : whatIf.newHabits) {
            if (habit.behaviour() == k && atAge >= habit.fromAge()) {
                Level towards = levels.get(habit.level());
                if (levels.get(level).ratio() > towards.ratio()) {
                    return Person.fade(own(k, level, habit.fromAge()), towards, atAge - habit.fromAge());
                }
            }
        }
        return own(k, level, atAge);
    }

    private double own(int k, int level, double atAge) {
        return ownHabits && whatIf.always[k] != level
                ? person.habitScore(k, level, atAge)
                : population.pack.behaviours.get(k).levels().get(level).score();
    }

    private double[] excess(double atAge) {
        double[] result = new double[population.prior.length];
        for (int m = 0; m < result.length; m++) {
            int mask = m / population.bins / population.levels.length;
            result[m] = person.excess(mask & ~cured(atAge), atAge);
        }
        return result;
    }

    /** Splits every cohort by the outcome of a coming event and spreads it over what the event brings on. */
    private void happen(Coming coming) {
        List<Cohort> after = new ArrayList<>();
        List<Outcome> outcomes = coming.event().outcomes();
        for (Cohort cohort : cohorts) {
            for (int o = 0; o < outcomes.size(); o++) {
                if (!outcomes.get(o).fatal() && (coming.outcome() < 0 || coming.outcome() == o)) {
                    List<Carried> effects = new ArrayList<>(cohort.effects());
                    effects.add(new Carried(outcomes.get(o).afterEffect(), coming.atAge()));
                    after.add(new Cohort(effects, bringOn(coming, withOutcome(coming, o, cohort.weights()))));
                }
            }
        }
        cohorts = after;
    }

    private double[] withOutcome(Coming coming, int o, double[] weights) {
        double[] result = weights.clone();
        int block = population.bins * population.levels.length;
        for (int mask = 0; mask < population.masks && coming.outcome() < 0; mask++) {
            double[] present = new double[population.pack.conditions.size()];
            for (int i = 0; i < present.length; i++) {
                present[i] = (mask & ~cured(coming.atAge()) & 1 << i) != 0 ? 1 : 0;
            }
            double share = population.outcomes(coming.event(), coming.atAge(), present)[o];
            for (int m = mask * block; m < (mask + 1) * block; m++) {
                result[m] *= share;
            }
        }
        return result;
    }

    private double[] bringOn(Coming coming, double[] weights) {
        int block = population.bins * population.levels.length;
        double[] result = weights;
        for (int i = 0; i < population.pack.conditions.size(); i++) {
            double p = (whatIf.never & 1 << i) != 0 ? 0 : coming.event().bringsOn()[i];
            for (int m = 0; m < result.length && p > 0; m++) {
                int mask = m / block;
                if ((mask & 1 << i) == 0) {
                    result[m + (1 << i) * block] += p * result[m];
                    result[m] *= 1 - p;
                }
            }
        }
        return result;
    }
}
