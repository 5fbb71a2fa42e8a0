package nearworld.oracle;

import java.util.List;
import java.util.TreeSet;
import nearworld.oracle.OracleCase.Episode;
import nearworld.oracle.OraclePack.AfterEffect;

/**
 * From the first occurrence to today, the hazard over and above that of the state before it (section 5, item 6), with the
 * conditions of the state taken as present throughout and each level at its own ratio.
 */
final class Aftermath {
    /** Nodes and weights of Gauss–Legendre quadrature on [-1, 1], found by Newton's method. */
    private static final double[][] GAUSS = gauss(16);

    private final Person person;
    private final Population population;
    private final OracleCase file;
    /** Ages at which an episode begins: between two of them what has been brought on stays the same. */
    private final double[] starts;
    /** Integrals from one start to the next, by state: with after-effects on the ratio, and without. */
    private final double[][] with;

    private final double[][] without;
    private double added;

    Aftermath(Person person) {
        this.person = person;
        this.population = person.population;
        this.file = person.file;
        starts = file.episodes.stream().mapToDouble(Episode::age).distinct().toArray();
        with = new double[starts.length][population.prior.length];
        without = new double[starts.length][population.prior.length];
        for (int e = 0; e < starts.length; e++) {
            double end = e + 1 < starts.length ? starts[e + 1] : file.age;
            double from = starts[e];
            for (double to : corners(from, end)) {
                integrate(e, from, to);
                from = to;
            }
        }
    }

    /** What the occurrences added to this state's hazard, integrated up to today. */
    double integral(int s, int mask, int b, int z) {
        double sum = added;
        for (int e = 0; e < starts.length; e++) {
            int after = mask | person.broughtOn(s, person.allEpisodes(), starts[e], true);
            sum += with[e][population.index(after, b, z)] - without[e][population.index(mask, b, z)];
        }
        return sum;
    }

    private TreeSet<Double> corners(double from, double to) {
        TreeSet<Double> cuts = new TreeSet<>();
        double shift = population.table.shift();
        for (double a = Math.floor(from) + shift - 1; a < to; a++) {
            cuts.add(a);
        }
        cuts.addAll(List.of(population.pack.from, population.pack.to));
        file.episodes.forEach(episode -> cuts.add(episode.lastAge()));
        cuts.addAll(person.excessCorners());
        TreeSet<Double> inside = new TreeSet<>(cuts.subSet(from, false, to, false));
        inside.add(to);
        return inside;
    }

    private void integrate(int e, double from, double to) {
        for (int n = 0; n < GAUSS[0].length; n++) {
            double a = 0.5 * (from + to) + 0.5 * (to - from) * GAUSS[0][n];
            double width = 0.5 * (to - from) * GAUSS[1][n];
            double[] rho = population.relativeHazards(a);
            double h = population.pastBaseline(a, rho);
            double logRatio = 0;
            for (Episode episode : file.episodes) {
                if (a >= episode.lastAge()) {
                    AfterEffect effect =
                            episode.event().outcomes().get(episode.outcome()).afterEffect();
                    double left = Math.pow(2, -(a - episode.lastAge()) / effect.halfLife());
                    logRatio += effect.logRatio() * left;
                    added += effect.excess() * left * width;
                }
            }
            double ratio = Math.exp(population.pack.taper(a) * logRatio);
            for (int m = 0; m < rho.length; m++) {
                double excess = person.excess(m / population.bins / population.levels.length, a);
                with[e][m] += (ratio * rho[m] * h + excess) * width;
                without[e][m] += (rho[m] * h + excess) * width;
            }
        }
    }

    private static double[][] gauss(int n) {
        double[][] result = new double[2][n];
        for (int i = 0; i < n; i++) {
            double t = Math.cos(Math.PI * (i + 0.75) / (n + 0.5));
            double slope = 0;
            for (int round = 0; round < 50; round++) {
                double before = 1;
                double value = t;
                for (int k = 2; k <= n; k++) {
                    double next = ((2 * k - 1) * t * value - (k - 1) * before) / k;
                    before = value;
                    value = next;
                }
                slope = n * (t * value - before) / (t * t - 1);
                t -= value / slope;
            }
            result[0][i] = t;
            result[1][i] = 2 / ((1 - t * t) * slope * slope);
        }
        return result;
    }
}
