package nearworld.oracle;

import java.util.ArrayList;
import java.util.List;
import nearworld.oracle.Cohort.Carried;
import nearworld.oracle.OracleCase.Episode;
import nearworld.oracle.OraclePack.Outcome;

/** What a what-if would have made of every recorded hidden state by today (section 6, abduction items 1 to 3). */
final class Counterfactual {
    private final Person person;
    private final Population population;
    private final OracleCase file;
    private final WhatIf whatIf;
    private final Cohort.Collector alive;
    private double dead;

    // The recorded state and its counterpart that are being followed.
    private int switches;
    private int mask;
    private int maskThen;
    private int b;
    private int bThen;

    Counterfactual(Evidence evidence, Person person, WhatIf whatIf) {
        this.person = person;
        this.population = person.population;
        this.file = person.file;
        this.whatIf = whatIf;
        alive = new Cohort.Collector(population.prior.length);
        for (switches = 0; switches < person.switchStates(); switches++) {
            for (mask = 0; mask < population.masks; mask++) {
                for (b = 0; b < population.levels.length; b++) {
                    follow(evidence.posterior[switches]);
                }
            }
        }
    }

    double aliveToday() {
        return alive.total() / (alive.total() + dead);
    }

    List<Cohort> cohorts() {
        return alive.dividedBy(alive.total());
    }

    private void follow(double[] posterior) {
        double[] byFrailty = new double[population.bins];
        double total = 0;
        for (int z = 0; z < byFrailty.length; z++) {
            byFrailty[z] = posterior[population.index(mask, b, z)];
            total += byFrailty[z];
        }
        if (total == 0) {
            return;
        }
        bThen = levelsThen();
        // Frailty is the same in both worlds and divides out of every ratio below.
        for (maskThen = 0; maskThen < population.masks; maskThen++) {
            double p = counterparts();
            if (p > 0) {
                occur(0, 0, new ArrayList<>(), p, byFrailty);
            }
        }
    }

    private int levelsThen() {
        for (int other = 0; other < population.levels.length; other++) {
            boolean fits = true;
            for (int k = 0; k < whatIf.always.length; k++) {
                int wanted = whatIf.always[k] < 0 ? population.levels[b][k] : whatIf.always[k];
                fits &= population.levels[other][k] == wanted;
            }
            if (fits) {
                return other;
            }
        }
        throw new IllegalStateException("no such levels");
    }

    /** Probability of the conditions {@code maskThen}, node by node with the noisy-OR's own switches. */
    private double counterparts() {
        double p = 1;
        for (int i = 0; i < person.file.onset.length && p > 0; i++) {
            boolean then = (maskThen & 1 << i) != 0;
            double absent;
            if ((whatIf.never & 1 << i) != 0) {
                absent = 1;
            } else if ((mask & 1 << i) != 0) {
                double noLeak = 1 - population.leaks[i];
                absent = noLeak
                        * population.noLink(i, maskThen, bThen)
                        * (1 - population.noLink(i, mask, b, maskThen, bThen))
                        / (1 - noLeak * population.noLink(i, mask, b));
            } else {
                absent = population.noLink(i, maskThen, bThen, mask, b);
            }
            p *= then ? 1 - absent : absent;
        }
        return p;
    }

    /** Thins the episodes one after the other; {@code outcomes} holds -1 for those that do not happen. */
    private void occur(int e, int kept, List<Integer> outcomes, double p, double[] byFrailty) {
        if (p == 0) {
            return;
        }
        if (e == file.episodes.size()) {
            survive(kept, outcomes, p, byFrailty);
            return;
        }
        Episode episode = file.episodes.get(e);
        int before = person.broughtOn(switches, person.allEpisodes(), episode.age(), false);
        int beforeThen = person.broughtOn(switches, kept, episode.age(), false) & ~whatIf.never;
        double[] presence = person.presence(mask, before, episode.age());
        double[] presenceThen = person.presence(maskThen, beforeThen, episode.age());
        double keep = (whatIf.removed & 1 << e) != 0
                ? 0
                : Math.min(
                        1,
                        population.rateWithoutFrailty(episode.event(), presenceThen, bThen)
                                / population.rateWithoutFrailty(episode.event(), presence, b));
        outcomes.add(-1);
        occur(e + 1, kept, outcomes, p * (1 - keep), byFrailty);
        double[] shares = outcomesThen(e, presence, presenceThen);
        for (int o = 0; o < shares.length && keep > 0; o++) {
            if (episode.event().outcomes().get(o).fatal()) {
                for (double w : byFrailty) {
                    dead += w * p * keep * shares[o];
                }
            } else {
                outcomes.set(e, o);
                occur(e + 1, kept | 1 << e, outcomes, p * keep * shares[o], byFrailty);
            }
        }
        outcomes.remove(e);
    }

    /** Probability of each outcome of an episode that is kept. */
    private double[] outcomesThen(int e, double[] presence, double[] presenceThen) {
        Episode episode = file.episodes.get(e);
        double[] result = new double[episode.event().outcomes().size()];
        if (whatIf.outcomes.containsKey(e)) {
            result[whatIf.outcomes.get(e)] = 1;
            return result;
        }
        double[] recorded = population.outcomes(episode.event(), episode.age(), presence);
        double[] then = population.outcomes(episode.event(), episode.age(), presenceThen);
        int own = episode.outcome();
        double same = Math.min(1, then[own] / recorded[own]);
        double room = 0;
        for (int o = 0; o < then.length; o++) {
            room += Math.max(0, then[o] - recorded[o]);
        }
        for (int o = 0; o < then.length && same < 1; o++) {
            result[o] = (1 - same) * Math.max(0, then[o] - recorded[o]) / room;
        }
        result[own] += same;
        return result;
    }

    private void survive(int kept, List<Integer> outcomes, double p, double[] byFrailty) {
        List<Carried> effects = new ArrayList<>();
        for (int e = 0; e < outcomes.size(); e++) {
            if (outcomes.get(e) >= 0) {
                Episode episode = file.episodes.get(e);
                Outcome outcome = episode.event().outcomes().get(outcomes.get(e));
                double from = whatIf.moved.getOrDefault(e, episode.lastAge());
                effects.add(new Carried(outcome.afterEffect(), from));
            }
        }
        int now = maskThen | person.broughtOn(switches, kept, file.age, true) & ~whatIf.never;
        double[] weights = alive.weights(effects);
        for (int z = 0; z < byFrailty.length; z++) {
            weights[population.index(now, bThen, z)] += p * byFrailty[z];
        }
    }
}
