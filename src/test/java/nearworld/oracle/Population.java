package nearworld.oracle;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import nearworld.oracle.OraclePack.Behaviour;
import nearworld.oracle.OraclePack.Condition;
import nearworld.oracle.OraclePack.Event;
import nearworld.oracle.OraclePack.Interaction;
import nearworld.oracle.Values.Curve;

/**
 * The prior over (conditions, behaviours, frailty) at the assessment's age and what follows from it for the population:
 * leaks, mean rates, outcome weights and the baseline hazards that return the table (sections 3 and 4).
 */
final class Population {
    final OraclePack pack;
    final OracleTable table;
    final double age;
    final int masks;
    /** {@code levels[b][k]} is behaviour k's level in the b-th combination. */
    final int[][] levels;

    final int bins;
    final double[] leaks;
    final double[] prior;
    /** The prior given the table's class of smoking: it carries the baseline hazard, and nothing else. */
    private final double[] ofTable;

    final int months;
    /** Integrated baseline hazard and length in years of each month; infinite where all die. */
    final double[] baseline;

    final double[] monthLength;
    private final Map<String, Double> meanRates = new HashMap<>();
    private final Map<String, double[]> outcomeWeights = new HashMap<>();

    Population(OraclePack pack, OracleTable table, double age) {
        this.pack = pack;
        this.table = table;
        this.age = age;
        masks = 1 << pack.conditions.size();
        levels = combinations(pack.behaviours);
        bins = pack.frailty.length;
        leaks = new double[pack.conditions.size()];
        prior = spreadOverBins(network(behaviourShares()));
        ofTable = givenClass();
        months = (int) Math.ceil((table.end() - age) * 12 - 1e-9);
        baseline = new double[months];
        monthLength = new double[months];
        calibrate();
    }

    int index(int mask, int b, int z) {
        return (mask * levels.length + b) * bins + z;
    }

    static int[][] combinations(List<Behaviour> behaviours) {
        int total = 1;
        for (Behaviour behaviour : behaviours) {
            total *= behaviour.levels().size();
        }
        int[][] result = new int[total][behaviours.size()];
        for (int b = 0; b < total; b++) {
            int rest = b;
            for (int k = behaviours.size() - 1; k >= 0; k--) {
                result[b][k] = rest % behaviours.get(k).levels().size();
                rest /= behaviours.get(k).levels().size();
            }
        }
        return result;
    }

    private double[] behaviourShares() {
        double[] result = new double[levels.length];
        for (int b = 0; b < result.length; b++) {
            result[b] = 1;
            for (int k = 0; k < pack.behaviours.size(); k++) {
                double total = 0;
                for (OraclePack.Level level : pack.behaviours.get(k).levels()) {
                    total += level.share().value(age);
                }
                result[b] *= pack.behaviours
                                .get(k)
                                .levels()
                                .get(levels[b][k])
                                .share()
                                .value(age)
                        / total;
            }
        }
        return result;
    }

    /** Probability that no active link brings condition i on. */
    double noLink(int i, int mask, int b) {
        return noLink(i, mask, b, 0, -1);
    }

    /** The same over links active under (mask, b) but not under (butMask, butB); no second state if {@code butB} is -1. */
    double noLink(int i, int mask, int b, int butMask, int butB) {
        Condition condition = pack.conditions.get(i);
        double result = 1;
        for (int j = 0; j < leaks.length; j++) {
            if ((mask & 1 << j) != 0 && !(butB >= 0 && (butMask & 1 << j) != 0)) {
                result *= 1 - condition.linkOfCondition()[j];
            }
        }
        for (int k = 0; k < levels[b].length; k++) {
            if (!(butB >= 0 && levels[butB][k] == levels[b][k])) {
                result *= 1 - condition.linkOfLevel()[k][levels[b][k]];
            }
        }
        return result;
    }

    /** Joint of conditions and behaviours, the leaks solved on the way, parents first. */
    private double[][] network(double[] shares) {
        double[][] joint = new double[masks][levels.length];
        joint[0] = shares.clone();
        for (int i : pack.parentsFirst) {
            double mean = 0;
            for (int mask = 0; mask < masks; mask++) {
                for (int b = 0; b < levels.length; b++) {
                    mean += joint[mask][b] == 0 ? 0 : joint[mask][b] * noLink(i, mask, b);
                }
            }
            double noLeak = (1 - pack.conditions.get(i).prevalence().value(age)) / mean;
            if (noLeak > 1) {
                throw new IllegalArgumentException(
                        "links of " + pack.conditionIds.get(i) + " explain more than its prevalence at " + age);
            }
            leaks[i] = 1 - noLeak;
            for (int mask = masks - 1; mask >= 0; mask--) {
                for (int b = 0; b < levels.length; b++) {
                    if (joint[mask][b] > 0 && (mask & 1 << i) == 0) {
                        double absent = noLeak * noLink(i, mask, b);
                        joint[mask | 1 << i][b] = joint[mask][b] * (1 - absent);
                        joint[mask][b] *= absent;
                    }
                }
            }
        }
        return joint;
    }

    private double[] spreadOverBins(double[][] joint) {
        double[] result = new double[masks * levels.length * bins];
        for (int mask = 0; mask < masks; mask++) {
            for (int b = 0; b < levels.length; b++) {
                for (int z = 0; z < bins; z++) {
                    result[index(mask, b, z)] = joint[mask][b] / bins;
                }
            }
        }
        return result;
    }

    private double[] givenClass() {
        double[] result = prior.clone();
        double total = 0;
        for (int m = 0; m < result.length; m++) {
            int[] held = levels[m / bins % levels.length];
            for (int k = 0; k < held.length; k++) {
                Behaviour behaviour = pack.behaviours.get(k);
                boolean out = behaviour.id().equals("smoking")
                        && !table.speaksOf(behaviour.levels().get(held[k]).id());
                result[m] = out ? 0 : result[m];
            }
            total += result[m];
        }
        for (int m = 0; m < result.length; m++) {
            result[m] /= total;
        }
        return result;
    }

    /** Score of the conditions with their interactions, without frailty and behaviours. */
    double conditionScore(int mask) {
        double score = 0;
        for (int i = 0; i < leaks.length; i++) {
            score += (mask & 1 << i) != 0 ? pack.conditions.get(i).score() : 0;
        }
        for (Interaction interaction : pack.interactions) {
            score += (mask & interaction.conditions()) == interaction.conditions() ? interaction.logRatio() : 0;
        }
        return score;
    }

    /** Score of a combination of levels, each at its own ratio. */
    double levelScore(int b) {
        double score = 0;
        for (int k = 0; k < levels[b].length; k++) {
            score += pack.behaviours.get(k).levels().get(levels[b][k]).score();
        }
        return score;
    }

    /** Excess rate per year of a set of conditions in the population. */
    double populationExcess(int mask) {
        double sum = 0;
        for (int i = 0; i < leaks.length; i++) {
            sum += (mask & 1 << i) != 0 ? pack.conditions.get(i).excess().unknown() : 0;
        }
        return sum;
    }

    /** Relative hazards of all states at an age, at the levels' own ratios. */
    double[] relativeHazards(double atAge) {
        double g = pack.taper(atAge);
        double[] result = new double[prior.length];
        for (int mask = 0; mask < masks; mask++) {
            for (int b = 0; b < levels.length; b++) {
                double known = Math.exp(g * (conditionScore(mask) + levelScore(b)));
                for (int z = 0; z < bins; z++) {
                    result[index(mask, b, z)] = known * Math.pow(pack.frailty[z], g);
                }
            }
        }
        return result;
    }

    private void calibrate() {
        double[] weight = ofTable.clone();
        double start = age;
        for (int k = 0; k < months; k++) {
            double end = Math.min(table.end(), age + (k + 1) / 12.0);
            monthLength[k] = end - start;
            double ratio = table.survival(start, end);
            double[] rho = relativeHazards(age + (k + 0.5) / 12);
            baseline[k] = ratio == 0 ? Double.POSITIVE_INFINITY : solve(weight, rho, ratio, monthLength[k], start);
            for (int m = 0; m < weight.length; m++) {
                double excess = populationExcess(m / bins / levels.length);
                weight[m] *= ratio == 0 ? 1 : Math.exp(-rho[m] * baseline[k] - excess * monthLength[k]) / ratio;
            }
            start = end;
        }
    }

    /** Newton's method from 0 on the logarithm of a sum of exponentials: convex and falling, so it never overshoots. */
    private double solve(double[] weight, double[] rho, double ratio, double length, double start) {
        double h = 0;
        for (int round = 0; round < 200; round++) {
            double alive = 0;
            double dying = 0;
            for (int m = 0; m < weight.length; m++) {
                double part = weight[m] * Math.exp(-rho[m] * h - populationExcess(m / bins / levels.length) * length);
                alive += part;
                dying += part * rho[m];
            }
            double step = Math.log(alive / ratio) * alive / dying;
            if (round == 0 && step < -1e-15) {
                throw new IllegalArgumentException("excess above the table at " + start);
            }
            h += step;
            if (Math.abs(step) <= 1e-13 * h) {
                break;
            }
        }
        return Math.max(h, 0);
    }

    /** Baseline hazard per year at an age before the assessment. */
    double pastBaseline(double atAge, double[] rho) {
        double meanExcess = 0;
        double meanRho = 0;
        for (int m = 0; m < prior.length; m++) {
            meanExcess += ofTable[m] * populationExcess(m / bins / levels.length);
            meanRho += ofTable[m] * rho[m];
        }
        double above = table.force(atAge) - meanExcess;
        if (above < 0) {
            throw new IllegalArgumentException("excess above the table at " + atAge);
        }
        return above / meanRho;
    }

    /**
     * Probability that what is there at the assessment was there at this age, where nothing dates it; for the population
     * the same formula at a coming event's age.
     */
    double omega(int i, double atAge) {
        Curve prevalence = pack.conditions.get(i).prevalence();
        return Math.min(1, prevalence.value(atAge) / prevalence.value(age));
    }

    /** How far each condition of a mask counts at an age, in the population. */
    double[] presence(int mask, double atAge) {
        double[] result = new double[leaks.length];
        for (int i = 0; i < result.length; i++) {
            result[i] = (mask & 1 << i) != 0 ? omega(i, atAge) : 0;
        }
        return result;
    }

    /** R of an event, without its frailty factor. */
    double rateWithoutFrailty(Event event, double[] presence, int b) {
        double result = 1;
        for (int i = 0; i < presence.length; i++) {
            result *= 1 + presence[i] * (event.ratioOfCondition()[i] - 1);
        }
        for (int k = 0; k < levels[b].length; k++) {
            result *= event.ratioOfLevel()[k][levels[b][k]];
        }
        return result;
    }

    double frailtyFactor(Event event, int z) {
        return Math.pow(pack.frailty[z], event.frailtyPower());
    }

    /** Prior mean of R at an age. */
    double meanRate(Event event, double atAge) {
        return meanRates.computeIfAbsent(event.id() + "@" + atAge, k -> {
            double mean = 0;
            for (int mask = 0; mask < masks; mask++) {
                double[] presence = presence(mask, atAge);
                for (int b = 0; b < levels.length; b++) {
                    double rate = rateWithoutFrailty(event, presence, b);
                    for (int z = 0; z < bins; z++) {
                        mean += prior[index(mask, b, z)] * rate * frailtyFactor(event, z);
                    }
                }
            }
            return mean;
        });
    }

    /** Probability of each outcome of an event at an age where conditions count as given. */
    double[] outcomes(Event event, double atAge, double[] presence) {
        return shares(
                event, outcomeWeights.computeIfAbsent(event.id() + "@" + atAge, k -> weights(event, atAge)), presence);
    }

    private static double[] shares(Event event, double[] theta, double[] presence) {
        double[] result = new double[theta.length];
        double total = 0;
        for (int o = 0; o < theta.length; o++) {
            result[o] = theta[o];
            for (int i = 0; i < presence.length; i++) {
                result[o] *= 1 + presence[i] * (event.outcomes().get(o).oddsRatios()[i] - 1);
            }
            total += result[o];
        }
        for (int o = 0; o < theta.length; o++) {
            result[o] /= total;
        }
        return result;
    }

    /** θ by proportional fitting: each weight is scaled until those who have the event show the published shares. */
    private double[] weights(Event event, double atAge) {
        int n = event.outcomes().size();
        double[] target = new double[n];
        double total = 0;
        for (int o = 0; o < n; o++) {
            target[o] = event.outcomes().get(o).share().value(atAge);
            total += target[o];
        }
        double[][] presences = new double[masks][];
        double[] having = new double[masks];
        for (int mask = 0; mask < masks; mask++) {
            presences[mask] = presence(mask, atAge);
            for (int b = 0; b < levels.length; b++) {
                double rate = rateWithoutFrailty(event, presences[mask], b);
                for (int z = 0; z < bins; z++) {
                    having[mask] += prior[index(mask, b, z)] * rate * frailtyFactor(event, z) / meanRate(event, atAge);
                }
            }
        }
        double[] theta = new double[n];
        for (int o = 0; o < n; o++) {
            target[o] /= total;
            theta[o] = target[o];
        }
        double error = 1;
        for (int round = 0; round < 10_000 && error > 1e-14; round++) {
            double[] got = new double[n];
            for (int mask = 0; mask < masks; mask++) {
                double[] shares = shares(event, theta, presences[mask]);
                for (int o = 0; o < n; o++) {
                    got[o] += having[mask] * shares[o];
                }
            }
            error = 0;
            for (int o = 0; o < n; o++) {
                error = Math.max(error, Math.abs(got[o] / target[o] - 1));
                theta[o] *= target[o] / got[o];
            }
        }
        return theta;
    }
}
