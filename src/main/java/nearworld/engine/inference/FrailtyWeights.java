package nearworld.engine.inference;

/**
 * What the frailty's bins weigh and add to the score, before the exposures.
 *
 * @param weights by bin: its probability times the factors of the evidence that depend on nothing else
 * @param scores by bin: ln z
 */
public record FrailtyWeights(double[] weights, double[] scores) {
    int bins() {
        return weights.length;
    }

    double total() {
        double sum = 0;
        for (double w : weights) {
            sum += w;
        }
        return sum;
    }
}
