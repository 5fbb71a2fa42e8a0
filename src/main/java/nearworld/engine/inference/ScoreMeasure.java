package nearworld.engine.inference;

import java.util.Arrays;

/** A (signed, by interpolation) measure over the score, kept on the nodes {@code from .. to-1} of a grid. Mutable. */
public final class ScoreMeasure {
    /** Ends that together hold less than this part of the whole are dropped. */
    private static final double NEGLIGIBLE = 1e-18;

    private final ScoreGrid grid;
    final double[] weight;
    private final double[] stencil = new double[ScoreGrid.POINTS];
    int from;
    int to;

    public ScoreMeasure(ScoreGrid grid) {
        this.grid = grid;
        this.weight = new double[grid.size()];
        this.from = grid.size();
        this.to = 0;
    }

    public boolean isEmpty() {
        return from >= to;
    }

    void clear() {
        if (!isEmpty()) {
            Arrays.fill(weight, from, to, 0);
        }
        from = grid.size();
        to = 0;
    }

    /** Adds an atom. */
    public void add(double score, double mass) {
        addAt(grid.stencil(score, stencil), stencil, mass);
    }

    /** Adds a mass spread over the nodes from {@code first} on with given weights. */
    void addAt(int first, double[] spread, double mass) {
        for (int j = 0; j < ScoreGrid.POINTS; j++) {
            weight[first + j] += mass * spread[j];
        }
        cover(first, first + ScoreGrid.POINTS);
    }

    /** Adds a multiple of another measure, its scores moved by a shift. */
    public void addShifted(ScoreMeasure other, double shift, double factor) {
        if (other.isEmpty()) {
            return;
        }
        if (shift == 0) {
            addMoved(other, 0, factor);
            return;
        }
        double steps = grid.steps(shift);
        int whole = (int) Math.floor(steps);
        ScoreGrid.lagrange(steps - whole, stencil);
        int offset = whole - (ScoreGrid.POINTS / 2 - 1);
        int last = grid.size() - ScoreGrid.POINTS;
        for (int n = other.from; n < other.to; n++) {
            double mass = factor * other.weight[n];
            int first = Math.max(0, Math.min(n + offset, last));
            for (int j = 0; j < ScoreGrid.POINTS; j++) {
                weight[first + j] += mass * stencil[j];
            }
        }
        cover(
                Math.max(0, Math.min(other.from + offset, last)),
                Math.max(0, Math.min(other.to - 1 + offset, last)) + ScoreGrid.POINTS);
    }

    private void addMoved(ScoreMeasure other, int steps, double factor) {
        int first = Math.max(other.from, -steps);
        int end = Math.min(other.to, weight.length - steps);
        for (int n = first; n < end; n++) {
            weight[n + steps] += factor * other.weight[n];
        }
        cover(first + steps, end + steps);
    }

    /** Adds a multiple of the convolution of two measures whose scores add. */
    void addConvolution(ScoreMeasure a, ScoreMeasure b, double factor) {
        for (int n = b.from; n < b.to; n++) {
            if (b.weight[n] != 0) {
                addMoved(a, grid.wholeSteps(n), factor * b.weight[n]);
            }
        }
    }

    /** Multiplies by a function given at the nodes. */
    public void multiply(double[] function) {
        for (int n = from; n < to; n++) {
            weight[n] *= function[n];
        }
    }

    public double total() {
        double sum = 0;
        for (int n = from; n < to; n++) {
            sum += weight[n];
        }
        return sum;
    }

    /** The sum of the masses' absolute values. */
    public double size() {
        double sum = 0;
        for (int n = from; n < to; n++) {
            sum += Math.abs(weight[n]);
        }
        return sum;
    }

    /** The integral of a function given at the nodes. */
    double integral(double[] function) {
        double sum = 0;
        for (int n = from; n < to; n++) {
            sum += weight[n] * function[n];
        }
        return sum;
    }

    /** Drops both ends as far as they hold next to nothing. */
    public void trim() {
        double spare = NEGLIGIBLE * size();
        double left = 0;
        while (from < to && (left += Math.abs(weight[from])) <= spare) {
            weight[from++] = 0;
        }
        double right = 0;
        while (from < to && (right += Math.abs(weight[to - 1])) <= spare) {
            weight[--to] = 0;
        }
    }

    /** Ends of the nodes that hold mass: {@code from() <= n < to()}. */
    public int from() {
        return from;
    }

    public int to() {
        return to;
    }

    /** The nodes' masses, to be changed in place by those who carry the measure through time. */
    public double[] weights() {
        return weight;
    }

    private void cover(int first, int end) {
        from = Math.min(from, first);
        to = Math.max(to, end);
    }
}
