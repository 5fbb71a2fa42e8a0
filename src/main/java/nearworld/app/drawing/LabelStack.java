package nearworld.app.drawing;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/**
 * Gives labels of marks on one line a place above it, on as many levels as it takes, so that no label covers another
 * and no leader runs through a label. The newest comes first and keeps the lowest level; its label runs to the right of
 * its mark, into the empty space after today. Where all levels are full, the oldest marks go without.
 */
final class LabelStack {
    private static final double GAP = 7;

    private final double right;
    private final double size;
    private final int levels;
    private final List<Placed> placed = new ArrayList<>();

    LabelStack(double right, double size, int levels) {
        this.right = right;
        this.size = size;
        this.levels = levels;
    }

    /** A label that wants to stand at a mark. */
    record Wish(double x, String words) {}

    /** A label with its place: its leader stands at {@code x}, its words begin at {@code from}. */
    record Placed(double x, double from, double to, int level, String words) {}

    /** Places what it can; the answer is ordered from the newest to the oldest. */
    List<Placed> place(List<Wish> wishes) {
        List<Wish> newestFirst = new ArrayList<>(wishes);
        newestFirst.sort(Comparator.comparingDouble(Wish::x).reversed());
        newestFirst.forEach(this::place);
        return List.copyOf(placed);
    }

    private void place(Wish wish) {
        double width = Lettering.width(wish.words(), size);
        double from = Math.min(wish.x() - 3, right - width);
        for (int level = 0; level < levels; level++) {
            Placed candidate = new Placed(wish.x(), from, from + width, level, wish.words());
            Optional<Placed> hindrance =
                    placed.stream().filter(p -> collide(p, candidate)).findFirst();
            if (hindrance.isEmpty()) {
                placed.add(candidate);
                return;
            }
        }
    }

    private static boolean collide(Placed a, Placed b) {
        if (a.level() == b.level()) {
            return a.from() < b.to() + GAP && b.from() < a.to() + GAP;
        }
        Placed upper = a.level() > b.level() ? a : b;
        Placed lower = a.level() > b.level() ? b : a;
        return upper.x() > lower.from() - 2 && upper.x() < lower.to() + 2;
    }

    /** How many levels a set of places takes. */
    static int levels(List<Placed> places) {
        return places.stream().mapToInt(p -> p.level() + 1).max().orElse(0);
    }
}
