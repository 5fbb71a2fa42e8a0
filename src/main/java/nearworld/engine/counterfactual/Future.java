package nearworld.engine.counterfactual;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import nearworld.engine.basics.Exponential;
import nearworld.engine.inference.Baseline;
import nearworld.engine.inference.EventMoment;
import nearworld.engine.inference.ExcessRate;
import nearworld.engine.inference.Person;
import nearworld.engine.inference.ScoreMeasure;
import nearworld.engine.network.EvidencePack.ConditionFactor;
import nearworld.engine.network.EvidencePack.Outcome;
import nearworld.engine.network.EvidencePack.Treatment;
import org.jspecify.annotations.Nullable;

/**
 * Carries the people of a world from today to the table's end: month k multiplies a state's weight by
 * exp(−ρ_u h_k M − (x_u + A)·d), everything read in the middle of the month.
 */
final class Future {
    /** How often nodes that nobody alive is left at are dropped. */
    private static final int MONTHS_BETWEEN_TRIMS = 12;

    private final Person person;
    private final Baseline baseline;
    private final WhatIfPlan plan;
    private final Habits habits;
    private final List<Moment> added = new ArrayList<>();
    private final int lastChange;
    private Strands strands;
    private long cured;
    private List<Treatment> treatments = List.of();
    private double alive;
    private double lived;

    private record Moment(WhatIfPlan.Added event, EventMoment moment) {}

    Future(Person person, WhatIfPlan plan, Habits habits, Strands strands) {
        this.person = person;
        this.baseline = person.baseline();
        this.plan = plan;
        this.habits = habits;
        this.strands = strands;
        for (WhatIfPlan.Added a : plan.added()) {
            double age = person.baseline().age() + a.at();
            added.add(new Moment(a, new EventMoment(person.prior(), a.event(), age)));
        }
        added.sort(Comparator.comparingDouble(m -> m.event().at()));
        this.lastChange = lastChange();
    }

    /** The conditions whose presence decides about changes to come, with those whose scores change with them. */
    static long tracked(Person person, WhatIfPlan plan) {
        long moving = bits(plan.cured().keySet());
        long asked = 0;
        for (WhatIfPlan.Added a : plan.added()) {
            for (ConditionFactor b : person.pack().events().get(a.event()).bringsOn()) {
                moving |= 1L << b.condition();
            }
            for (Outcome o : person.pack().events().get(a.event()).outcomes()) {
                for (ConditionFactor r : o.oddsRatios()) {
                    asked |= 1L << r.condition();
                }
            }
        }
        for (WhatIfPlan.Treated t : plan.treatments()) {
            int with = person.pack().treatments().get(t.treatment()).onlyWith();
            asked |= with < 0 ? 0 : 1L << with;
        }
        return person.scores().withPartners(moving) | asked | person.withExcess();
    }

    private static long bits(Iterable<Integer> conditions) {
        long set = 0;
        for (int c : conditions) {
            set |= 1L << c;
        }
        return set;
    }

    /** The month from which on nothing changes any more for somebody by name. */
    private int lastChange() {
        double last = -1;
        for (double t : plan.cured().values()) {
            last = Math.max(last, firstMonth(t));
        }
        for (WhatIfPlan.Treated t : plan.treatments()) {
            last = Math.max(last, firstMonth(t.from()));
        }
        for (Moment m : added) {
            last = Math.max(last, Math.floor(m.event().at() * Baseline.MONTHS_PER_YEAR) + 1);
        }
        return (int) last;
    }

    /** The first month whose middle is not before a time. */
    private static double firstMonth(double time) {
        return Math.max(0, Math.ceil(time * Baseline.MONTHS_PER_YEAR - 0.5));
    }

    private static double middle(int month) {
        return (month + 0.5) / Baseline.MONTHS_PER_YEAR;
    }

    WorldCurve run(double aliveToday, boolean newOccurrences) {
        double start = strands.total();
        List<Double> survival = new ArrayList<>(baseline.months() + 1);
        survival.add(1.0);
        alive = start;
        for (int k = 0; k < baseline.months(); k++) {
            change(k);
            if (Double.isInfinite(baseline.hazard(k))) {
                lived += alive * baseline.length(k) / 2;
                alive = 0;
            } else {
                if (k % MONTHS_BETWEEN_TRIMS == 0) {
                    strands.trim();
                }
                month(k);
            }
            survival.add(k == baseline.months() - 1 ? 0 : alive / start);
        }
        return new WorldCurve(survival, lived / start, aliveToday, newOccurrences);
    }

    /** Cures and treatments that act from this month on; when the last has come, strands that are alike now are joined. */
    private void change(int month) {
        long curedNow = 0;
        for (Map.Entry<Integer, Double> c : plan.cured().entrySet()) {
            curedNow |= firstMonth(c.getValue()) <= month ? 1L << c.getKey() : 0;
        }
        List<Treatment> treatmentsNow = new ArrayList<>();
        for (WhatIfPlan.Treated t : plan.treatments()) {
            if (firstMonth(t.from()) <= month) {
                treatmentsNow.add(person.pack().treatments().get(t.treatment()));
            }
        }
        boolean changed = curedNow != cured || treatmentsNow.size() != treatments.size();
        boolean joins = month == Math.max(0, lastChange);
        if (!changed && !joins) {
            return;
        }
        Strands next = new Strands(baseline.grid());
        for (Map.Entry<Strands.Key, ScoreMeasure> s : strands.measures().entrySet()) {
            Strands.Key key = s.getKey();
            double shift = score(key.present(), curedNow, treatmentsNow) - score(key.present(), cured, treatments);
            long left = joins ? key.present() & ~curedNow & person.withExcess() : key.present();
            next.at(new Strands.Key(left, key.habit(), key.effects())).addShifted(s.getValue(), shift, 1);
        }
        next.trim();
        strands = next;
        cured = curedNow;
        treatments = treatmentsNow;
    }

    /** The part of the score that depends on the conditions told apart, on what is cured and on treatments. */
    private double score(long present, long curedThen, List<Treatment> treatedWith) {
        long left = present & ~curedThen;
        double sum = person.scores().of(left);
        for (Treatment t : treatedWith) {
            boolean acts = t.onlyWith() < 0 || (left >> t.onlyWith() & 1) != 0;
            sum += acts ? StrictMath.log(t.hazardRatio().value()) : 0;
        }
        return sum;
    }

    private void month(int month) {
        double from = month / Baseline.MONTHS_PER_YEAR;
        double done = 0;
        for (Moment m : added) {
            double at = (m.event().at() - from) / baseline.length(month);
            if (at >= 0 && at < 1) {
                advance(month, at - done);
                happen(m);
                done = at;
            }
        }
        advance(month, 1 - done);
    }

    private void advance(int month, double part) {
        alive = 0;
        for (Map.Entry<Strands.Key, ScoreMeasure> s : strands.measures().entrySet()) {
            alive += advance(month, part, s.getKey(), s.getValue());
        }
    }

    private double advance(int month, double part, Strands.Key key, ScoreMeasure measure) {
        double time = middle(month);
        double length = baseline.length(month) * part;
        double logRatio = baseline.taperAt(month) * habits.shift(key.habit(), time);
        double excess = 0;
        for (Effect e : key.effects().all()) {
            double read = Math.max(time, e.start());
            double left = e.left(read);
            logRatio += person.pack().taper().at(baseline.age() + read) * e.logRatio() * left;
            excess += e.excessPerYear() * left;
        }
        for (int i = 0; i < person.excess().size(); i++) {
            ExcessRate rate = person.excess().get(i);
            excess += rate != null && has(key, i) ? rate.at(time) : 0;
        }
        double scale = baseline.hazard(month) * part * Exponential.exp(logRatio);
        double constant = excess * length;
        double[] rho = baseline.relative(month);
        double[] weight = measure.weights();
        double total = 0;
        double years = 0;
        for (int n = measure.from(); n < measure.to(); n++) {
            double y = rho[n] * scale + constant;
            double kept = Exponential.exp(-y);
            years += weight[n] * Exponential.meanSurvival(y, kept);
            weight[n] *= kept;
            total += weight[n];
        }
        lived += years * length;
        return total;
    }

    private boolean has(Strands.Key key, int condition) {
        return ((key.present() & ~cured) >> condition & 1) != 0;
    }

    /** An added event: some die, the others carry its after-effect and what it brings on. */
    private void happen(Moment m) {
        long curedBy = 0;
        for (Map.Entry<Integer, Double> c : plan.cured().entrySet()) {
            curedBy |= c.getValue() <= m.event().at() ? 1L << c.getKey() : 0;
        }
        Strands next = new Strands(baseline.grid());
        List<Outcome> outcomes = m.moment().event().outcomes();
        for (Map.Entry<Strands.Key, ScoreMeasure> s : strands.measures().entrySet()) {
            double[] chances = chances(m, s.getKey().present() & ~curedBy, outcomes.size());
            for (int o = 0; o < chances.length; o++) {
                if (!outcomes.get(o).fatal() && chances[o] > 0) {
                    @Nullable
                    Effect effect =
                            Effect.of(outcomes.get(o).afterEffect(), m.event().at());
                    Effects effects = s.getKey().effects().and(effect);
                    branch(
                            next,
                            s.getKey().present(),
                            s.getKey(),
                            s.getValue(),
                            chances[o],
                            effects,
                            m,
                            curedBy | plan.never(),
                            0);
                }
            }
        }
        strands = next;
    }

    private static double[] chances(Moment m, long present, int outcomes) {
        if (m.event().outcome() >= 0) {
            double[] given = new double[outcomes];
            given[m.event().outcome()] = 1;
            return given;
        }
        int[] conditions = m.moment().outcomeConditions();
        double[] weights = new double[conditions.length];
        for (int i = 0; i < weights.length; i++) {
            weights[i] = present >> conditions[i] & 1;
        }
        return m.moment().outcomeProbabilities(weights);
    }

    /** Branches over the event's switches from the {@code at}-th on, where the condition is absent and was not ruled out. */
    private void branch(
            Strands next,
            long present,
            Strands.Key before,
            ScoreMeasure measure,
            double chance,
            Effects effects,
            Moment m,
            long ruledOut,
            int at) {
        List<ConditionFactor> brings = m.moment().event().bringsOn();
        if (at == brings.size()) {
            double shift = score(present, cured, treatments) - score(before.present(), cured, treatments);
            next.at(new Strands.Key(present, before.habit(), effects)).addShifted(measure, shift, chance);
            return;
        }
        long bit = 1L << brings.get(at).condition();
        double on = (present & bit) != 0 || (ruledOut & bit) != 0
                ? 0
                : brings.get(at).factor().value();
        if (on > 0) {
            branch(next, present | bit, before, measure, chance * on, effects, m, ruledOut, at + 1);
        }
        if (on < 1) {
            branch(next, present, before, measure, chance * (1 - on), effects, m, ruledOut, at + 1);
        }
    }
}
