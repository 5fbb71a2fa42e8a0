package nearworld.engine.inference;

/**
 * Evenly spaced values of the score B on which measures over the score are kept.
 *
 * <p>An atom at B is spread over the ten nearest nodes with Lagrange's weights: every smooth function of B then has the
 * integral that its degree-9 interpolation has. All functions integrated here are products of exp(−H·e^{gB}), whose shape
 * in gB does not depend on H; with steps of {@value #STEP_TIMES_G}/g the interpolation error stays near 1e-10.
 */
public final class ScoreGrid {
    static final int POINTS = 10;
    private static final double STEP_TIMES_G = 0.08;
    /** Where surviving an aftermath speaks for a high score, the factor exp(+c·e^{gB}) is steeper than any exp(−H·e^{gB}). */
    private static final double FINE_STEP_TIMES_G = 0.03;

    private static final double SMALLEST_G = 0.4;
    /** Every spreading over ten nodes widens a measure by five at most; so many may follow one another. */
    private static final int MARGIN = 10 * (POINTS / 2);

    private static final double[] DENOMINATORS = denominators();

    private final int originSteps;
    private final double step;
    private final int size;

    /**
     * @param lowest lowest score that may occur
     * @param highest highest score that may occur
     * @param steepest the largest g at which the score acts
     * @param fine whether some occurrence may have lowered the hazard
     */
    ScoreGrid(double lowest, double highest, double steepest, boolean fine) {
        this.step = (fine ? FINE_STEP_TIMES_G : STEP_TIMES_G) / Math.max(steepest, SMALLEST_G);
        this.originSteps = (int) Math.floor(lowest / step) - MARGIN;
        this.size = (int) Math.ceil(highest / step) + MARGIN + 1 - originSteps;
    }

    public int size() {
        return size;
    }

    double score(int node) {
        return (originSteps + node) * step;
    }

    /** The score of a node in steps from 0: nodes are whole multiples of the step. */
    int wholeSteps(int node) {
        return originSteps + node;
    }

    /** How many steps a shift of the score spans. */
    double steps(double shift) {
        return shift / step;
    }

    /** First of the ten nodes around a score; fills their weights. Scores beyond the grid are read at its end. */
    int stencil(double score, double[] weights) {
        double position = score / step - originSteps;
        int cell = (int) Math.floor(position);
        cell = Math.max(POINTS / 2 - 1, Math.min(cell, size - POINTS / 2 - 1));
        double s = Math.max(0, Math.min(position - cell, 1));
        lagrange(s, weights);
        return cell - (POINTS / 2 - 1);
    }

    /** Lagrange's weights of nodes −4 … 5 at s within [0, 1]. */
    static void lagrange(double s, double[] weights) {
        double left = 1;
        for (int j = 0; j < POINTS; j++) {
            weights[j] = left * DENOMINATORS[j];
            left *= s - (j - (POINTS / 2 - 1));
        }
        double right = 1;
        for (int j = POINTS - 1; j >= 0; j--) {
            weights[j] *= right;
            right *= s - (j - (POINTS / 2 - 1));
        }
    }

    private static double[] denominators() {
        double[] d = new double[POINTS];
        for (int j = 0; j < POINTS; j++) {
            double product = 1;
            for (int m = 0; m < POINTS; m++) {
                if (m != j) {
                    product *= j - m;
                }
            }
            d[j] = 1 / product;
        }
        return d;
    }
}
