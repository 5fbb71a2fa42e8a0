package nearworld.engine.inference;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.TreeSet;
import nearworld.engine.basics.Fault;
import nearworld.engine.mortality.LifeTable;
import nearworld.engine.network.EvidencePack;
import nearworld.engine.network.EvidencePack.AfterEffect;
import nearworld.engine.network.EvidencePack.Condition;
import nearworld.engine.network.EvidencePack.ConditionFactor;
import nearworld.engine.network.EvidencePack.EventType;
import org.jspecify.annotations.Nullable;

/** Everything about one person that all worlds share: prior, baseline, evidence, and what the evidence says. */
public final class Person {
    private final EvidencePack pack;
    private final Evidence evidence;
    private final PopulationPrior prior;
    private final Scores scores;
    private final Baseline baseline;
    private final List<EventMoment> moments = new ArrayList<>();
    private final List<EventMoment> windows = new ArrayList<>();
    private final List<@Nullable ExcessRate> excess = new ArrayList<>();
    private final Aftermath aftermath;

    /**
     * @param prior without faults
     * @param smoking the behaviour that the table is split by, or -1, and its levels in the table's class
     */
    public Person(PopulationPrior prior, Evidence evidence, LifeTable table, int smoking, List<Integer> smokingLevels) {
        this.prior = prior;
        this.pack = prior.pack();
        this.evidence = evidence;
        this.scores = new Scores(pack);
        double earliest = evidence.occurrences().isEmpty()
                ? evidence.age()
                : evidence.age(evidence.occurrences().get(0).day());
        ScoreGrid grid = scores.grid(prior, pack.taper().at(Math.min(earliest, evidence.age())), mayHaveLightened());
        Population population = new Population(prior, scores, grid, smoking, smokingLevels);
        this.baseline =
                new Baseline(table, pack.taper(), grid, evidence.age(), population.classes(), population.excess());
        for (Evidence.Occurrence o : evidence.occurrences()) {
            moments.add(new EventMoment(prior, o.event(), evidence.age(o.day())));
        }
        for (Evidence.Window w : evidence.windows()) {
            double middle = (evidence.age(w.from()) + evidence.age(w.to())) / 2;
            windows.add(new EventMoment(prior, w.event(), middle));
        }
        for (int i = 0; i < pack.conditions().size(); i++) {
            Condition condition = pack.conditions().get(i);
            excess.add(condition.excess() == null ? null : new ExcessRate(condition.excess(), onset(i)));
        }
        this.aftermath = new Aftermath(baseline, evidence, pack, scores, excess);
    }

    /** Whether some past occurrence may have left the hazard lower than before. */
    private boolean mayHaveLightened() {
        for (Evidence.Occurrence o : evidence.occurrences()) {
            EventType event = pack.events().get(o.event());
            AfterEffect effect = event.outcomes().get(o.outcome()).afterEffect();
            boolean byEffect = effect != null
                    && effect.hazardRatio() != null
                    && effect.hazardRatio().value() < 1;
            if (byEffect || event.bringsOn().stream().anyMatch(b -> scores.leastOf(b.condition()) < 0)) {
                return true;
            }
        }
        return false;
    }

    /** When a condition began, in years from today: by the statement, else by what made it certain; NaN: not dated. */
    private double onset(int condition) {
        long stated = evidence.onsetDay().get(condition);
        if (stated != Evidence.NO_DAY) {
            return evidence.yearsFromToday(stated);
        }
        for (Evidence.Occurrence o : evidence.occurrences()) {
            for (ConditionFactor b : pack.events().get(o.event()).bringsOn()) {
                if (b.condition() == condition && b.factor().value() == 1) {
                    return evidence.yearsFromToday(o.day());
                }
            }
        }
        return Double.NaN;
    }

    /** What makes an assessment impossible. */
    public List<Fault> faults() {
        List<Fault> faults = new ArrayList<>(prior.faults());
        for (Fault fault : baseline.faults()) {
            Map<String, String> values = new TreeMap<>(fault.values());
            values.put("conditions", String.join(", ", namesWithExcess()));
            faults.add(new Fault(fault.code(), fault.path(), values));
        }
        return faults;
    }

    private List<String> namesWithExcess() {
        return pack.conditions().stream()
                .filter(c -> c.excess() != null)
                .map(Condition::id)
                .toList();
    }

    public EvidencePack pack() {
        return pack;
    }

    public Evidence evidence() {
        return evidence;
    }

    public PopulationPrior prior() {
        return prior;
    }

    public Scores scores() {
        return scores;
    }

    public Baseline baseline() {
        return baseline;
    }

    /** The moment of each occurrence, in their order. */
    public List<EventMoment> moments() {
        return moments;
    }

    /** The evidence as tables over the given states. */
    public EvidenceFactors factors(ConditionStates states, boolean learned) {
        return new EvidenceFactors(prior, evidence, states, moments, windows, learned);
    }

    /** The rate that each condition adds, in this person's time; null where it adds none. */
    public List<@Nullable ExcessRate> excess() {
        return excess;
    }

    public Aftermath aftermath() {
        return aftermath;
    }

    /** The conditions that add a rate of death, as a bit set. */
    public long withExcess() {
        long set = 0;
        for (int i = 0; i < excess.size(); i++) {
            set |= excess.get(i) == null ? 0 : 1L << i;
        }
        return set;
    }

    /** The conditions that past occurrences may have brought on, as a bit set. */
    public long mayBeBroughtOn() {
        long set = 0;
        for (Evidence.Occurrence o : evidence.occurrences()) {
            for (ConditionFactor b : pack.events().get(o.event()).bringsOn()) {
                set |= 1L << b.condition();
            }
        }
        return set;
    }

    /** The variables of a set of conditions. */
    public TreeSet<Integer> variables(long conditions) {
        TreeSet<Integer> variables = new TreeSet<>();
        for (int i = 0; i < pack.conditions().size(); i++) {
            if ((conditions >> i & 1) != 0) {
                variables.add(prior.conditionVariable(i));
            }
        }
        return variables;
    }
}
