package nearworld.engine.inference;

import java.util.function.ToDoubleFunction;

/**
 * A non-negative table over some variables, the last of its scope varying fastest.
 *
 * @param scope variable numbers, in rising order
 * @param cards the number of states of each variable of the scope
 */
public record Factor(int[] scope, int[] cards, double[] values) {

    /** Fills a table from a function of the states of the scope's variables (in the scope's order). */
    public static Factor of(int[] scope, int[] cardOfVariable, ToDoubleFunction<int[]> function) {
        int[] sorted = scope.clone();
        java.util.Arrays.sort(sorted);
        int[] cards = new int[sorted.length];
        int size = 1;
        for (int i = 0; i < sorted.length; i++) {
            cards[i] = cardOfVariable[sorted[i]];
            size *= cards[i];
        }
        double[] values = new double[size];
        int[] states = new int[sorted.length];
        int[] place = new int[scope.length];
        for (int i = 0; i < scope.length; i++) {
            place[i] = java.util.Arrays.binarySearch(sorted, scope[i]);
        }
        int[] asAsked = new int[scope.length];
        for (int n = 0; n < size; n++) {
            for (int i = 0; i < scope.length; i++) {
                asAsked[i] = states[place[i]];
            }
            values[n] = function.applyAsDouble(asAsked);
            next(states, cards);
        }
        return new Factor(sorted, cards, values);
    }

    static Factor constant(double value) {
        return new Factor(new int[0], new int[0], new double[] {value});
    }

    public boolean has(int variable) {
        return place(variable) >= 0;
    }

    int place(int variable) {
        return java.util.Arrays.binarySearch(scope, variable);
    }

    /** The step in {@link #values} when a variable moves by one state; 0 where it is not in the scope. */
    public int stride(int variable) {
        int place = place(variable);
        if (place < 0) {
            return 0;
        }
        int stride = 1;
        for (int i = scope.length - 1; i > place; i--) {
            stride *= cards[i];
        }
        return stride;
    }

    /** The value for the states of all variables, of which those of the scope are read. */
    public double at(int[] stateOfVariable) {
        int index = 0;
        for (int i = 0; i < scope.length; i++) {
            index = index * cards[i] + stateOfVariable[scope[i]];
        }
        return values[index];
    }

    /** Counts up, the last place fastest; wraps to zeros. */
    static void next(int[] states, int[] cards) {
        for (int i = states.length - 1; i >= 0; i--) {
            if (++states[i] < cards[i]) {
                return;
            }
            states[i] = 0;
        }
    }
}
