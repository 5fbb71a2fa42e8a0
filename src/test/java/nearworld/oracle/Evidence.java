package nearworld.oracle;

import nearworld.oracle.OracleCase.Episode;
import nearworld.oracle.OracleCase.Result;
import nearworld.oracle.OracleCase.Statement;
import nearworld.oracle.OracleCase.Window;
import nearworld.oracle.OraclePack.Event;
import nearworld.oracle.OraclePack.Finding;

/** The likelihood of section 5 for every hidden state, and the posterior. */
final class Evidence {
    private final Person person;
    private final Population population;
    private final OracleCase file;
    private final Aftermath aftermath;
    /** {@code posterior[s][index]}: switches s, and (conditions before anything was brought on, behaviours, frailty). */
    final double[][] posterior;

    final double logEvidence;

    Evidence(Person person) {
        this.person = person;
        this.population = person.population;
        this.file = person.file;
        this.aftermath = new Aftermath(person);
        posterior = new double[person.switchStates()][population.prior.length];
        double total = 0;
        for (int s = 0; s < posterior.length; s++) {
            for (int mask = 0; mask < population.masks; mask++) {
                total += weigh(s, mask);
            }
        }
        for (double[] row : posterior) {
            for (int m = 0; m < row.length; m++) {
                row[m] /= total;
            }
        }
        logEvidence = Math.log(total);
    }

    private double weigh(int s, int mask) {
        double ofConditions = person.switchProbability(s) * statements(s, mask) * findings(s, mask) * outcomes(s, mask);
        double sum = 0;
        for (int b = 0; b < population.levels.length; b++) {
            double[] exposure = new double[file.windows.size()];
            double rates = ofConditions * habits(b) * occurrences(s, mask, b);
            for (int w = 0; w < exposure.length; w++) {
                exposure[w] = exposure(file.windows.get(w), mask, b);
            }
            for (int z = 0; z < population.bins; z++) {
                int m = population.index(mask, b, z);
                double log = -aftermath.integral(s, mask, b, z);
                double factor = rates;
                for (int w = 0; w < exposure.length; w++) {
                    log -= exposure[w]
                            * population.frailtyFactor(file.windows.get(w).event(), z);
                }
                for (Episode episode : file.episodes) {
                    factor *= population.frailtyFactor(episode.event(), z);
                }
                posterior[s][m] = population.prior[m] * factor * Math.exp(log);
                sum += posterior[s][m];
            }
        }
        return sum;
    }

    /** Probability that a condition was there on a day (NaN for today) in this state. */
    private double there(int i, double day, int s, int mask) {
        double atAge = Double.isNaN(day) ? file.age : day;
        if ((person.broughtOn(s, person.allEpisodes(), atAge, true) & 1 << i) != 0) {
            return 1;
        }
        return (mask & 1 << i) == 0 ? 0 : Double.isNaN(day) ? 1 : person.omega(i, day);
    }

    /** Statements of sources that see only what is diagnosed share one hidden switch for each condition. */
    private double statements(int s, int mask) {
        double result = 1;
        for (int i = 0; i < population.pack.conditions.size(); i++) {
            double share = population.pack.conditions.get(i).diagnosedShare().value(file.age);
            double diagnosed = share;
            double undiagnosed = 1 - share;
            for (Statement statement : file.statements) {
                if (statement.condition() == i) {
                    double there = there(i, statement.day(), s, mask);
                    diagnosed *= said(statement, there);
                    undiagnosed *= said(statement, statement.source().seesDiagnosed() ? 0 : there);
                }
            }
            result *= diagnosed + undiagnosed;
        }
        return result;
    }

    private static double said(Statement statement, double there) {
        int i = statement.condition();
        double yes = there * statement.source().sensitivity()[i]
                + (1 - there) * (1 - statement.source().specificity()[i]);
        return statement.present() ? yes : 1 - yes;
    }

    private double findings(int s, int mask) {
        double result = 1;
        for (Result found : file.findings) {
            Finding finding = found.finding();
            if (finding.of().length == 1) {
                double there = there(finding.of()[0], found.day(), s, mask);
                int level = found.level();
                result *= there * finding.present()[level][0] + (1 - there) * finding.absent()[level];
            } else {
                double not = 1 - finding.absent()[0];
                for (int k = 0; k < finding.of().length; k++) {
                    double there = there(finding.of()[k], found.day(), s, mask);
                    not *= 1 - there + there * (1 - finding.present()[0][k]) / (1 - finding.absent()[0]);
                }
                result *= found.level() == 0 ? 1 - not : not;
            }
        }
        return result;
    }

    private double habits(int b) {
        for (int k = 0; k < file.behaviours.length; k++) {
            OracleCase.Held held = file.behaviours[k];
            if (held != null && held.level() != population.levels[b][k]) {
                return 0;
            }
        }
        return 1;
    }

    /** R/E[R] of every episode but for the frailty's part, which the caller adds. */
    private double occurrences(int s, int mask, int b) {
        double result = 1;
        for (Episode episode : file.episodes) {
            int broughtOn = person.broughtOn(s, person.allEpisodes(), episode.age(), false);
            double[] presence = person.presence(mask, broughtOn, episode.age());
            result *= population.rateWithoutFrailty(episode.event(), presence, b)
                    / population.meanRate(episode.event(), episode.age());
        }
        return result;
    }

    private double exposure(Window window, int mask, int b) {
        Event event = window.event();
        double middle = 0.5 * (window.from() + window.to());
        double rate = population.rateWithoutFrailty(event, person.presence(mask, 0, middle), b);
        return rate / population.meanRate(event, middle) * integratedRate(event, window.from(), window.to());
    }

    /** Integral of a rate that is linear in the logarithm between the ages it is given at. */
    static double integratedRate(Event event, double from, double to) {
        double sum = 0;
        double start = from;
        while (start < to) {
            double end = to;
            for (double knot : event.rate().at()) {
                end = knot > start && knot < end ? knot : end;
            }
            double first = event.rate().value(start);
            double last = event.rate().value(end);
            double log = Math.log(last / first);
            double mean = Math.abs(log) < 1e-9 ? first * (1 + log / 2) : (last - first) / log;
            sum += mean * (end - start);
            start = end;
        }
        return sum;
    }

    private double outcomes(int s, int mask) {
        double result = 1;
        for (Episode episode : file.episodes) {
            int broughtOn = person.broughtOn(s, person.allEpisodes(), episode.age(), false);
            result *= population
                    .outcomes(episode.event(), episode.age(), person.presence(mask, broughtOn, episode.age()))[
                    episode.outcome()];
        }
        return result;
    }

    /** Posterior of each condition, of the state after what occurrences brought on. */
    double[] conditions() {
        double[] result = new double[file.onset.length];
        for (int s = 0; s < posterior.length; s++) {
            int broughtOn = person.broughtOn(s, person.allEpisodes(), file.age, true);
            for (int m = 0; m < posterior[s].length; m++) {
                int mask = m / population.bins / population.levels.length | broughtOn;
                for (int i = 0; i < result.length; i++) {
                    result[i] += (mask & 1 << i) != 0 ? posterior[s][m] : 0;
                }
            }
        }
        return result;
    }
}
