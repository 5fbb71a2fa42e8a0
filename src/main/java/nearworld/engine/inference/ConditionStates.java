package nearworld.engine.inference;

import java.util.ArrayList;
import java.util.List;
import nearworld.engine.network.EvidencePack;
import nearworld.engine.network.EvidencePack.ConditionFactor;

/**
 * The states of the conditions: absent or present before all occurrences, times the hidden switches by which occurrences
 * bring a condition on.
 *
 * <p>State s of condition i stands for presence {@code s / patterns(i)} and switch pattern {@code s % patterns(i)}. A pattern
 * is a bit set over the occurrences. Where only the recorded world is asked for, patterns say which switch came on first,
 * since later ones then change nothing; where occurrences may be undone, each switch is told apart.
 */
public final class ConditionStates {
    private final long[][] patterns;
    private final double[][] probabilities;
    private final long[] days;

    /** @param everySwitch whether switches after the first are told apart */
    public ConditionStates(EvidencePack pack, List<Evidence.Occurrence> occurrences, boolean everySwitch) {
        if (occurrences.size() > Long.SIZE - 1) {
            throw new IllegalArgumentException("at most 63 episodes, are " + occurrences.size());
        }
        int conditions = pack.conditions().size();
        this.days = occurrences.stream().mapToLong(Evidence.Occurrence::day).toArray();
        this.patterns = new long[conditions][];
        this.probabilities = new double[conditions][];
        for (int i = 0; i < conditions; i++) {
            List<Integer> bringers = new ArrayList<>();
            List<Double> chances = new ArrayList<>();
            for (int j = 0; j < occurrences.size(); j++) {
                for (ConditionFactor b :
                        pack.events().get(occurrences.get(j).event()).bringsOn()) {
                    if (b.condition() == i) {
                        bringers.add(j);
                        chances.add(b.factor().value());
                    }
                }
            }
            fill(i, bringers, chances, everySwitch);
        }
    }

    private void fill(int condition, List<Integer> bringers, List<Double> chances, boolean everySwitch) {
        List<Long> masks = new ArrayList<>(List.of(0L));
        List<Double> weights = new ArrayList<>(List.of(1.0));
        for (int k = 0; k < bringers.size(); k++) {
            long bit = 1L << bringers.get(k);
            double chance = chances.get(k);
            int before = masks.size();
            for (int m = 0; m < before; m++) {
                if (everySwitch || masks.get(m) == 0) {
                    masks.add(masks.get(m) | bit);
                    weights.add(weights.get(m) * chance);
                    weights.set(m, weights.get(m) * (1 - chance));
                }
            }
        }
        List<Integer> possible = new ArrayList<>();
        for (int m = 0; m < masks.size(); m++) {
            if (weights.get(m) > 0) {
                possible.add(m);
            }
        }
        patterns[condition] = possible.stream().mapToLong(masks::get).toArray();
        probabilities[condition] = possible.stream().mapToDouble(weights::get).toArray();
    }

    int patterns(int condition) {
        return patterns[condition].length;
    }

    int states(int condition) {
        return 2 * patterns[condition].length;
    }

    public boolean before(int condition, int state) {
        return state >= patterns[condition].length;
    }

    /** The occurrences whose switches are on. */
    public long switches(int condition, int state) {
        return patterns[condition][state % patterns[condition].length];
    }

    double probability(int condition, int state) {
        return probabilities[condition][state % patterns[condition].length];
    }

    /** True where some occurrence may bring the condition on. */
    public boolean mayBeBroughtOn(int condition) {
        return patterns[condition].length > 1 || patterns[condition][0] != 0;
    }

    /** A bit set of the occurrences before a day (or up to it, where {@code inclusive}). */
    public long occurrencesBefore(long day, boolean inclusive) {
        long mask = 0;
        for (int j = 0; j < days.length; j++) {
            if (days[j] < day || (inclusive && days[j] == day)) {
                mask |= 1L << j;
            }
        }
        return mask;
    }
}
