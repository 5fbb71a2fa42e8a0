package nearworld.engine.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import java.util.TreeSet;
import nearworld.engine.SparseCases;
import nearworld.engine.basics.Sex;
import nearworld.engine.mortality.LifeTable;
import nearworld.engine.mortality.MortalityTable;
import nearworld.engine.network.EvidencePack;
import nearworld.oracle.Oracles;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Summing out beforehand what only hangs on through the network must change nothing. It is done from 30,000 states on, which
 * the packs of the other tests do not reach: here 15 conditions and two behaviours, over 200,000 states.
 */
class HiddenStatesTest {
    private static final double SAME = 1e-10;

    @ParameterizedTest
    @ValueSource(longs = {6001, 6003, 6006})
    void summingOutBeforehandChangesNothing(long seed) {
        Person person = person(seed);
        ConditionStates states =
                new ConditionStates(person.pack(), person.evidence().occurrences(), false);
        EvidenceFactors factors = person.factors(states, true);
        TreeSet<Integer> outer = person.variables(1);
        TreeSet<Integer> loose = person.variables(~1L);
        loose.removeAll(factors.coupled());
        assertThat(loose).as("seed %d", seed).hasSizeGreaterThan(2);
        HiddenStates split = hidden(person, states, factors, outer, loose);
        HiddenStates whole = hidden(person, states, factors, outer, new TreeSet<>());

        double[] survival = function(person.baseline().grid(), 0.7);
        HiddenStates.Marginals actual = split.marginals(s -> survival);
        HiddenStates.Marginals expected = whole.marginals(s -> survival);

        assertThat(actual.total() / expected.total()).as("seed %d", seed).isEqualTo(1, within(SAME));
        for (int v = 0; v < expected.byState().length; v++) {
            for (int s = 0; s < expected.byState()[v].length; s++) {
                assertThat(actual.byState()[v][s] / expected.total())
                        .as("variable %d, state %d, seed %d", v, s, seed)
                        .isEqualTo(expected.byState()[v][s] / expected.total(), within(SAME));
            }
        }
        List<ScoreMeasure> bySplit = measures(split, outer.first(), factors.cards()[outer.first()], person);
        List<ScoreMeasure> byWhole = measures(whole, outer.first(), factors.cards()[outer.first()], person);
        for (double hazard : new double[] {0, 1e-4, 0.01, 0.3, 2, 20}) {
            double[] f = function(person.baseline().grid(), hazard);
            for (int s = 0; s < bySplit.size(); s++) {
                assertThat(bySplit.get(s).integral(f) / expected.total())
                        .as("H = %s, state %d, seed %d", hazard, s, seed)
                        .isEqualTo(byWhole.get(s).integral(f) / expected.total(), within(SAME));
            }
        }
    }

    /** The split is really made in one of them: with it the visitor sees the states of the boundary too, not only those asked for. */
    @ParameterizedTest
    @ValueSource(longs = {6001, 6003, 6006})
    void theSplitIsMade(long seed) {
        Person person = person(seed);
        ConditionStates states =
                new ConditionStates(person.pack(), person.evidence().occurrences(), false);
        EvidenceFactors factors = person.factors(states, true);
        TreeSet<Integer> outer = person.variables(1);
        TreeSet<Integer> loose = person.variables(~1L);
        loose.removeAll(factors.coupled());

        int wanted = factors.cards()[outer.first()];
        assertThat(visits(hidden(person, states, factors, outer, new TreeSet<>())))
                .as("seed %d", seed)
                .isEqualTo(wanted);
        assertThat(visits(hidden(person, states, factors, outer, loose)))
                .as("seed %d", seed)
                .isGreaterThan(wanted);
    }

    private static int visits(HiddenStates hidden) {
        int[] visits = {0};
        hidden.forEach((s, measure) -> visits[0]++);
        return visits[0];
    }

    private static HiddenStates hidden(
            Person person,
            ConditionStates states,
            EvidenceFactors factors,
            TreeSet<Integer> outer,
            TreeSet<Integer> loose) {
        return new HiddenStates(
                factors.factors(),
                person.scores().terms(person.prior(), states, factors.cards()),
                factors.exposures(),
                factors.frailty(),
                0,
                factors.cards(),
                person.baseline().grid(),
                outer,
                loose);
    }

    private static double[] function(ScoreGrid grid, double hazard) {
        double[] f = new double[grid.size()];
        for (int n = 0; n < f.length; n++) {
            f[n] = Math.exp(-hazard * Math.exp(grid.score(n)));
        }
        return f;
    }

    /** The measure by the state of one variable. */
    private static List<ScoreMeasure> measures(HiddenStates hidden, int variable, int cards, Person person) {
        List<ScoreMeasure> byState = new ArrayList<>();
        for (int s = 0; s < cards; s++) {
            byState.add(new ScoreMeasure(person.baseline().grid()));
        }
        hidden.forEach((s, measure) -> byState.get(s[variable]).addShifted(measure, 0, 1));
        return byState;
    }

    /** A person of whom one event in a window is known, and two statements. */
    private static Person person(long seed) {
        EvidencePack pack = SparseCases.pack(seed, 15, 1);
        MortalityTable table = nearworld.engine.Inputs.table(Oracles.text("worked/table.csv"));
        MortalityTable.Column column = table.column(Sex.MALE, null);
        LifeTable life = table.life(java.util.Objects.requireNonNull(column));
        long today = 20_000;
        long born = today - 22_000;
        List<Long> onset = java.util.Collections.nCopies(15, Evidence.NO_DAY);
        Evidence evidence = new Evidence(
                Sex.MALE,
                born,
                today,
                List.of(-1, -1),
                List.of(),
                onset,
                List.of(new Evidence.Said(2, true, 0, today), new Evidence.Said(4, false, 1, today)),
                List.of(),
                List.of(new Evidence.Window(0, today - 3652, today)),
                List.of(new Evidence.Occurrence(0, today - 700, today - 700, 0)));
        PopulationPrior prior = new PopulationPrior(pack, Sex.MALE, evidence.age());
        assertThat(prior.faults()).isEmpty();
        Person person = new Person(prior, evidence, life, -1, List.of());
        assertThat(person.faults()).isEmpty();
        return person;
    }
}
