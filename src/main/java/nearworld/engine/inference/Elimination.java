package nearworld.engine.inference;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.TreeSet;

/** Sum-product variable elimination over tables (Zhang and Poole 1994), smallest table first. */
final class Elimination {
    private Elimination() {}

    /** The product of all factors summed over every variable but the kept ones: a table over {@code keep}. */
    static Factor marginal(List<Factor> factors, int[] keep, int[] cardOfVariable) {
        List<Factor> open = new ArrayList<>(factors);
        TreeSet<Integer> toSum = new TreeSet<>();
        for (Factor f : open) {
            for (int v : f.scope()) {
                toSum.add(v);
            }
        }
        for (int v : keep) {
            toSum.remove(v);
        }
        while (!toSum.isEmpty()) {
            int variable = cheapest(open, toSum, cardOfVariable);
            toSum.remove(variable);
            List<Factor> with = new ArrayList<>();
            for (Factor f : open) {
                if (f.has(variable)) {
                    with.add(f);
                }
            }
            open.removeAll(with);
            open.add(product(with, variable, new int[0], cardOfVariable));
        }
        return product(open, -1, keep, cardOfVariable);
    }

    /** The sum of the product of all factors over every state. */
    static double total(List<Factor> factors, int[] cardOfVariable) {
        return marginal(factors, new int[0], cardOfVariable).values()[0];
    }

    private static int cheapest(List<Factor> open, TreeSet<Integer> candidates, int[] cardOfVariable) {
        int best = -1;
        double bestSize = Double.POSITIVE_INFINITY;
        for (int candidate : candidates) {
            TreeSet<Integer> union = new TreeSet<>();
            for (Factor f : open) {
                if (f.has(candidate)) {
                    for (int v : f.scope()) {
                        union.add(v);
                    }
                }
            }
            double size = 1;
            for (int v : union) {
                size *= cardOfVariable[v];
            }
            if (size < bestSize) {
                bestSize = size;
                best = candidate;
            }
        }
        return best;
    }

    /** The product of factors, summed over one variable (-1: none), over at least the variables of {@code atLeast}. */
    private static Factor product(List<Factor> factors, int summed, int[] atLeast, int[] cardOfVariable) {
        TreeSet<Integer> union = new TreeSet<>();
        for (Factor f : factors) {
            for (int v : f.scope()) {
                union.add(v);
            }
        }
        for (int v : atLeast) {
            union.add(v);
        }
        union.remove(summed);
        int n = union.size();
        int[] scope = new int[n];
        int[] cards = new int[n];
        int size = 1;
        int k = 0;
        for (int v : union) {
            scope[k] = v;
            cards[k] = cardOfVariable[v];
            size *= cards[k++];
        }
        int[][] strides = new int[factors.size()][n];
        int[] summedStride = new int[factors.size()];
        for (int f = 0; f < strides.length; f++) {
            for (int i = 0; i < n; i++) {
                strides[f][i] = factors.get(f).stride(scope[i]);
            }
            summedStride[f] = summed < 0 ? 0 : factors.get(f).stride(summed);
        }
        int summedCard = summed < 0 ? 1 : cardOfVariable[summed];
        double[] values = new double[size];
        int[] states = new int[n];
        int[] index = new int[strides.length];
        for (int at = 0; at < size; at++) {
            Arrays.fill(index, 0);
            for (int f = 0; f < strides.length; f++) {
                for (int i = 0; i < n; i++) {
                    index[f] += strides[f][i] * states[i];
                }
            }
            double sum = 0;
            for (int s = 0; s < summedCard; s++) {
                double product = 1;
                for (int f = 0; f < strides.length; f++) {
                    product *= factors.get(f).values()[index[f] + s * summedStride[f]];
                }
                sum += product;
            }
            values[at] = sum;
            Factor.next(states, cards);
        }
        return new Factor(scope, cards, values);
    }
}
