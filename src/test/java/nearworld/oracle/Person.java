package nearworld.oracle;

import java.util.ArrayList;
import java.util.List;
import nearworld.oracle.OracleCase.Episode;
import nearworld.oracle.OracleCase.Held;
import nearworld.oracle.OraclePack.Excess;
import nearworld.oracle.OraclePack.Level;

/** What a case fixes about a person's hidden states: onsets, hidden switches of what occurrences brought on, habits. */
final class Person {
    /** Episode {@code episode} brings condition on with this probability, where it was absent. */
    record Switch(int episode, int condition, double probability) {}

    final OracleCase file;
    final Population population;
    final List<Switch> switches = new ArrayList<>();
    /** Age from which years since onset count for the excess, NaN where nothing dates it. */
    private final double[] excessFrom;

    Person(OracleCase file, Population population) {
        this.file = file;
        this.population = population;
        excessFrom = file.onset.clone();
        for (int e = 0; e < file.episodes.size(); e++) {
            Episode episode = file.episodes.get(e);
            double[] bringsOn = episode.event().bringsOn();
            for (int i = 0; i < bringsOn.length; i++) {
                if (bringsOn[i] > 0) {
                    switches.add(new Switch(e, i, bringsOn[i]));
                }
                if (bringsOn[i] == 1 && Double.isNaN(excessFrom[i])) {
                    excessFrom[i] = episode.age();
                }
            }
        }
    }

    int switchStates() {
        return 1 << switches.size();
    }

    double switchProbability(int state) {
        double result = 1;
        for (int s = 0; s < switches.size(); s++) {
            double p = switches.get(s).probability();
            result *= (state & 1 << s) != 0 ? p : 1 - p;
        }
        return result;
    }

    /** Conditions brought on by kept episodes at ages below (or, if inclusive, up to) the given one. */
    int broughtOn(int state, int kept, double atAge, boolean inclusive) {
        int mask = 0;
        for (int s = 0; s < switches.size(); s++) {
            Switch hidden = switches.get(s);
            double when = file.episodes.get(hidden.episode()).age();
            boolean past = inclusive ? when <= atAge : when < atAge;
            if ((state & 1 << s) != 0 && (kept & 1 << hidden.episode()) != 0 && past) {
                mask |= 1 << hidden.condition();
            }
        }
        return mask;
    }

    int allEpisodes() {
        return (1 << file.episodes.size()) - 1;
    }

    /** Probability that a condition there today was there at an age: by its onset if dated, else as in the population. */
    double omega(int i, double atAge) {
        double began = file.onset[i];
        return Double.isNaN(began) ? population.omega(i, atAge) : atAge >= began ? 1 : 0;
    }

    /** How far each condition counts at an age, given those of the hidden state and those brought on before. */
    double[] presence(int mask, int broughtOn, double atAge) {
        double[] result = new double[file.onset.length];
        for (int i = 0; i < result.length; i++) {
            result[i] = (broughtOn & 1 << i) != 0 ? 1 : (mask & 1 << i) != 0 ? omega(i, atAge) : 0;
        }
        return result;
    }

    /** Excess rate per year of a set of conditions at an age. */
    double excess(int mask, double atAge) {
        double sum = 0;
        for (int i = 0; i < excessFrom.length; i++) {
            if ((mask & 1 << i) != 0) {
                Excess excess = population.pack.conditions.get(i).excess();
                double years = atAge - excessFrom[i];
                sum += excess.byYears() == null || Double.isNaN(years)
                        ? excess.unknown()
                        : years < 0 ? 0 : excess.byYears().value(years);
            }
        }
        return sum;
    }

    /** Ages at which the excess has a corner. */
    List<Double> excessCorners() {
        List<Double> corners = new ArrayList<>();
        for (int i = 0; i < excessFrom.length; i++) {
            Excess excess = population.pack.conditions.get(i).excess();
            if (excess.byYears() != null && !Double.isNaN(excessFrom[i])) {
                corners.add(excessFrom[i]);
                for (double years : excess.byYears().at()) {
                    corners.add(excessFrom[i] + years);
                }
            }
        }
        return corners;
    }

    /** Score of a behaviour's level at an age; a habit given up fades from that of the level left. */
    double habitScore(int behaviour, int level, double atAge) {
        List<Level> levels = population.pack.behaviours.get(behaviour).levels();
        Held held = file.behaviours[behaviour];
        Level own = levels.get(level);
        if (held == null || held.level() != level || Double.isNaN(held.since())) {
            return own.score();
        }
        double start = levels.get(held.left()).score();
        return fade(start, own, atAge - held.since());
    }

    /** From a score towards a level's long run, by its half-life; at once without one. */
    static double fade(double start, Level towards, double years) {
        double left = Double.isNaN(towards.halfLife()) ? 0 : Math.pow(2, -years / towards.halfLife());
        return towards.longRunScore() + (start - towards.longRunScore()) * left;
    }
}
