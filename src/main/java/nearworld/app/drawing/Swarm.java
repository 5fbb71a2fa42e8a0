package nearworld.app.drawing;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * Lets signs that would lie on each other hang below the line, each on the first row with room; beyond the last row
 * they may overlap. Signs at the very same place share it.
 */
final class Swarm {
    private static final double ROOM = 13;
    private static final double ROW = 14;
    private static final int MOST_ROWS = 4;

    private final Map<Double, Integer> rows;

    private Swarm(Map<Double, Integer> rows) {
        this.rows = rows;
    }

    static Swarm of(List<Double> places) {
        Map<Double, Integer> rows = new LinkedHashMap<>();
        List<Double> ends = new ArrayList<>();
        for (double x : places.stream().sorted().distinct().toList()) {
            int row = 0;
            while (row < ends.size() && x - ends.get(row) < ROOM) {
                row++;
            }
            if (row >= MOST_ROWS) {
                row = oldest(ends);
            }
            if (row == ends.size()) {
                ends.add(x);
            }
            ends.set(row, x);
            rows.put(x, row);
        }
        return new Swarm(rows);
    }

    private static int oldest(List<Double> ends) {
        int best = 0;
        for (int row = 1; row < ends.size(); row++) {
            best = ends.get(row) < ends.get(best) ? row : best;
        }
        return best;
    }

    /** How far below the line the sign at {@code x} hangs. */
    double offset(double x) {
        return rows.getOrDefault(x, 0) * ROW;
    }

    /** How far below the line the lowest sign hangs. */
    double depth() {
        return rows.values().stream().mapToInt(Integer::intValue).max().orElse(0) * ROW;
    }
}
