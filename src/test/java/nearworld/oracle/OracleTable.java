package nearworld.oracle;

import java.util.HashMap;
import java.util.Map;
import java.util.TreeMap;

/** One sex of a mortality table in CSV: q by attained age, without classes, select rows or improvement. */
final class OracleTable {
    private static final double LAST_AGE = 120;

    private final double[] q;
    private final int first;
    private final String withinYear;
    private final double shift;
    private final double end;

    private OracleTable(TreeMap<Integer, Double> rows, String ageBasis, String withinYear) {
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

    static OracleTable read(String csv, String sex) {
        Map<String, String> head = new HashMap<>();
        TreeMap<Integer, Double> rows = new TreeMap<>();
        for (String line : csv.lines().toList()) {
            if (line.startsWith("#")) {
                String[] parts = line.substring(1).split(":", 2);
                head.put(parts[0].strip(), parts[1].strip());
            } else if (line.startsWith(sex + ",")) {
                String[] cells = line.split(",");
                rows.put(Integer.valueOf(cells[1].strip()), Double.valueOf(cells[2].strip()));
            }
        }
        return new OracleTable(
                rows, head.getOrDefault("ageBasis", "exact"), head.getOrDefault("withinYear", "constantForce"));
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
