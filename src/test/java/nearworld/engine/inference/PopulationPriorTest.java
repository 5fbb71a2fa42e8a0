package nearworld.engine.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import aima.core.probability.RandomVariable;
import aima.core.probability.bayes.exact.EliminationAsk;
import aima.core.probability.bayes.impl.BayesNet;
import aima.core.probability.bayes.impl.FullCPTNode;
import aima.core.probability.domain.BooleanDomain;
import aima.core.probability.proposition.AssignmentProposition;
import aima.core.probability.util.RandVar;
import java.util.stream.LongStream;
import nearworld.engine.Inputs;
import nearworld.engine.assessment.AssessmentResult;
import nearworld.engine.basics.Sex;
import nearworld.engine.network.EvidencePack;
import nearworld.oracle.Oracles;
import nearworld.oracle.RandomPacks;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** The noisy-OR network: its marginals, and small networks against the library of Russell and Norvig's textbook. */
class PopulationPriorTest {
    private static final double AGE = 57.25;

    static LongStream seeds() {
        return LongStream.rangeClosed(4001, 4030);
    }

    /** The leaks are solved so that a sum over all states gives back every published prevalence and share. */
    @ParameterizedTest
    @MethodSource("seeds")
    void marginalsAreThePublishedPrevalences(long seed) {
        EvidencePack pack = Inputs.pack(RandomPacks.draw(seed, 4).pack());
        for (Sex sex : Sex.values()) {
            PopulationPrior prior = new PopulationPrior(pack, sex, AGE);
            if (!prior.faults().isEmpty()) {
                // A draw keeps its promise for the drawn person's sex and age, not for all.
                continue;
            }
            double[][] mass = enumerated(prior);
            double total =
                    mass[0].length == 0 ? 1 : java.util.Arrays.stream(mass[0]).sum();
            assertThat(total).as("seed %d", seed).isEqualTo(1, within(1e-13));
            for (int i = 0; i < pack.conditions().size(); i++) {
                assertThat(mass[prior.conditionVariable(i)][1])
                        .as("%s, %s, seed %d", pack.conditions().get(i).id(), sex, seed)
                        .isEqualTo(
                                pack.conditions().get(i).prevalence().get(sex).at(AGE), within(1e-13));
            }
        }
    }

    /** P of each variable's states, by a sum over the whole joint distribution. */
    private static double[][] enumerated(PopulationPrior prior) {
        int[] cards = prior.cards();
        double[][] mass = new double[cards.length][];
        int size = 1;
        for (int v = 0; v < cards.length; v++) {
            mass[v] = new double[cards[v]];
            size *= cards[v];
        }
        int[] states = new int[cards.length];
        for (int n = 0; n < size; n++) {
            double p = 1;
            for (Factor f : prior.factors()) {
                p *= f.at(states);
            }
            for (int v = 0; v < cards.length; v++) {
                mass[v][states[v]] += p;
            }
            Factor.next(states, cards);
        }
        return mass;
    }

    /**
     * Four conditions and two reports as a network of aima-core (Russell and Norvig, Artificial Intelligence: A Modern
     * Approach), whose tables are written out by hand from prevalences and links; its elimination gives the posterior.
     *
     * <p>H and D are roots, C has links 0.04 from D and 0.02 from H, F has 0.12 from C and 0.005 from H.
     */
    @Test
    void posteriorsAgreeWithAimaCore() {
        String pack = """
                pack: {id: small, version: 1, title: Small, population: general, taper: {from: 40, pivot: 65, to: 105}}
                frailty: {variance: 0.3, points: 9}
                behaviours: {}
                conditions:
                  d: {title: D, prevalence: {male: {40: 0.14}, female: {40: 0.1}}, hazardRatio: 1.8}
                  h: {title: H, prevalence: {male: {40: 0.45}, female: {40: 0.42}}, hazardRatio: 1.25}
                  c: {title: C, prevalence: {male: {40: 0.09}, female: {40: 0.06}}, hazardRatio: 1.7, causedBy: {d: 0.04, h: 0.02}}
                  f: {title: F, prevalence: {male: {40: 0.03}, female: {40: 0.025}}, hazardRatio: 2.6, causedBy: {c: 0.12, h: 0.005}}
                events: {}
                findings: {}
                sources:
                  doctor: {title: Doctor, sensitivity: 0.8, specificity: 0.95}
                treatments: {}
                """;
        String json = """
                {"format": "case/1", "caseRef": "X", "assessedOn": "2026-12-01",
                 "applicant": {"sex": "male", "bornOn": "1966-12-01"},
                 "statements": [{"condition": "f", "present": true, "source": "doctor"},
                                {"condition": "d", "present": false, "source": "doctor"}]}
                """;
        double leakC = 1 - 0.91 / ((1 - 0.04 * 0.14) * (1 - 0.02 * 0.45));
        // C and H are dependent: P(h, c) by the table of C summed over D.
        double cIfH = 1 - (1 - leakC) * (1 - 0.02) * (1 - 0.04 * 0.14);
        double cIfNot = 1 - (1 - leakC) * (1 - 0.04 * 0.14);
        double kept = 0.45 * (1 - 0.005) * (1 - 0.12 * cIfH) + 0.55 * (1 - 0.12 * cIfNot);
        double leakF = 1 - 0.97 / kept;
        RandVar d = new RandVar("D", new BooleanDomain());
        RandVar h = new RandVar("H", new BooleanDomain());
        RandVar c = new RandVar("C", new BooleanDomain());
        RandVar f = new RandVar("F", new BooleanDomain());
        RandVar saidF = new RandVar("SaidF", new BooleanDomain());
        RandVar saidD = new RandVar("SaidD", new BooleanDomain());
        FullCPTNode nodeD = new FullCPTNode(d, new double[] {0.14, 0.86});
        FullCPTNode nodeH = new FullCPTNode(h, new double[] {0.45, 0.55});
        FullCPTNode nodeC = new FullCPTNode(c, or(leakC, 0.04, 0.02), nodeD, nodeH);
        FullCPTNode nodeF = new FullCPTNode(f, or(leakF, 0.12, 0.005), nodeC, nodeH);
        new FullCPTNode(saidF, new double[] {0.8, 0.2, 0.05, 0.95}, nodeF);
        new FullCPTNode(saidD, new double[] {0.8, 0.2, 0.05, 0.95}, nodeD);
        BayesNet net = new BayesNet(nodeD, nodeH);
        AssignmentProposition[] said = {new AssignmentProposition(saidF, true), new AssignmentProposition(saidD, false)
        };

        AssessmentResult result = Inputs.result(Oracles.text("worked/table.csv"), pack, json);

        RandVar[] asked = {d, h, c, f};
        for (int i = 0; i < asked.length; i++) {
            double expected = new EliminationAsk()
                    .ask(new RandomVariable[] {asked[i]}, said, net)
                    .getValues()[0];
            assertThat(result.conditions().get(i).posterior())
                    .as(asked[i].getName())
                    .isEqualTo(expected, within(1e-9));
        }
    }

    /** P(present), P(absent) for both parents present, the first only, the second only, none. */
    private static double[] or(double leak, double first, double second) {
        double[] absent = {
            (1 - leak) * (1 - first) * (1 - second), (1 - leak) * (1 - first), (1 - leak) * (1 - second), 1 - leak
        };
        double[] table = new double[8];
        for (int i = 0; i < 4; i++) {
            table[2 * i] = 1 - absent[i];
            table[2 * i + 1] = absent[i];
        }
        return table;
    }
}
