package nearworld.oracle;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/** One sex and smoking class of a mortality table in CSV: q by attained age, without select rows or improvement. */
final class OracleTable {
    private static final double LAST_AGE = 120;

    private final double[] q;
    private final int first;
    private final String withinYear;
    private final double shift;
    private final double end;
    /** The levels of smoking that these rates speak of; empty for all. */
    private final List<String> smoking;

    private OracleTable(TreeMap<Integer, Double> rows, String ageBasis, String withinYear, List<String> smoking) {
        if (rows.isEmpty()) {
            throw new IllegalArgumentException("the table has no rates for this sex and class of smoking");
        }
        this.smoking = smoking;
        this.first = rows.firstKey();
        boolean closed = rows.lastEntry().getValue() >= 1;
        int last = closed ? rows.lastKey() : Math.max(rows.lastKey(), 119);
        this.q = new double[last - first + 1];
        for (int age = first; age <= last; age++) {
            q[age - first] = rows.getOrDefault(age, rows.lastEntry().getValue());
        }
        this.withinYear = withinYear;
        this.shift = ageBasis.equals("last") ? 0.5 : 0;
        this.end = Math.min(LAST_AGE, closed ? last + 1 + shift : LAST_AGE);
    }

    /** Reads the rates of a sex and, where the table is split, of the class of a level of smoking. */
    static OracleTable read(String csv, String sex, String level) {
        Map<String, String> head = new HashMap<>();
        Map<String, List<String>> classes = new HashMap<>();
        TreeMap<Integer, Double> rows = new TreeMap<>();
        List<String> smoking = List.of();
        for (String line : csv.lines().toList()) {
            String[] cells = line.split(",");
            if (line.startsWith("#")) {
                String[] parts = line.substring(1).split(":", 2);
                head.put(parts[0].strip(), parts[1].strip());
                classes = classes(head.getOrDefault("smokingLevels", ""));
            } else if (cells[0].equals(sex) && cells.length == 3) {
                rows.put(Integer.valueOf(cells[1]), Double.valueOf(cells[2]));
            } else if (cells[0].equals(sex)) {
                // sex,age,smoking,qx
                List<String> levels = classes.getOrDefault(cells[2], List.of(cells[2]));
                if (levels.contains(level)) {
                    smoking = levels;
                    rows.put(Integer.valueOf(cells[1]), Double.valueOf(cells[3]));
                }
            }
        }
        return new OracleTable(
                rows,
                head.getOrDefault("ageBasis", "exact"),
                head.getOrDefault("withinYear", "constantForce"),
                smoking);
    }

    /** Classes as {@code nonsmoker=never,former; smoker=current}. */
    private static Map<String, List<String>> classes(String text) {
        Map<String, List<String>> result = new HashMap<>();
        for (String part : text.split(";")) {
            String[] sides = part.split("=");
            if (sides.length == 2) {
                result.put(sides[0].strip(), List.of(sides[1].strip().split("\\s*,\\s*")));
            }
        }
        return result;
    }

    /** Whether these rates speak of a level of smoking. */
    boolean speaksOf(String level) {
        return smoking.isEmpty() || smoking.contains(level);
    }

    /** Exact age at which the curve ends. */
    double end() {
        return end;
    }

    /** Whether ages in the table change at half years of exact age. */
    double shift() {
        return shift;
    }

    /** Force of mortality at an exact age, per year. */
    double force(double age) {
        double y = age - shift;
        int row = row(y);
        double rate = q[row];
        double s = y - (row + first);
        if (rate >= 1 || withinYear.equals("uniform")) {
            return rate / (1 - s * rate);
        }
        return withinYear.equals("balducci") ? rate / (1 - (1 - s) * rate) : -Math.log1p(-rate);
    }

    /** Probability that a life of exact age {@code from} is alive at {@code to}. */
    double survival(double from, double to) {
        double y = from - shift;
        double yEnd = to - shift;
        double result = 1;
        int row = row(y);
        double s = y - (row + first);
        while (row + first + 1 < yEnd) {
            result *= within(row, 1) / within(row, s);
            row++;
            s = 0;
            if (row == q.length) {
                return 0;
            }
        }
        return result * within(row, yEnd - (row + first)) / within(row, s);
    }

    private int row(double y) {
        return Math.min(q.length - 1, (int) Math.floor(y) - first);
    }

    /** Survival from the start of a year of age through the part {@code s} of it. */
    private double within(int row, double s) {
        double rate = q[row];
        if (rate >= 1 || withinYear.equals("uniform")) {
            return Math.max(0, 1 - s * rate);
        }
        return withinYear.equals("balducci") ? (1 - rate) / (1 - (1 - s) * rate) : Math.pow(1 - rate, s);
    }
}
