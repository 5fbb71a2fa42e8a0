package nearworld.exchange.tables;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.TreeMap;
import java.util.regex.Pattern;
import nearworld.engine.basics.Fault;
import nearworld.engine.basics.Sex;
import nearworld.engine.mortality.MortalityTable.Column;
import nearworld.exchange.faults.FaultList;
import nearworld.exchange.faults.JsonPath;
import nearworld.exchange.faults.Place;
import org.apache.commons.csv.CSVRecord;
import org.jspecify.annotations.Nullable;

/** Gathers the rows of a table into columns of rates by sex and smoking class. */
final class RateRows {
    private static final int LAST_AGE = 119;
    private static final Pattern WHOLE = Pattern.compile("[0-9]{1,9}");
    private static final Pattern DECIMAL = Pattern.compile("[-+]?([0-9]+\\.?[0-9]*|\\.[0-9]+)([eE][-+]?[0-9]{1,4})?");
    private static final List<String> CLASSES = List.of("nonsmoker", "smoker");

    private record Key(Sex sex, String smoking) {}

    private record Rate(double q, int line) {}

    private final FaultList faults;
    private final Map<String, List<String>> smokingLevels;
    private final Map<Key, TreeMap<Integer, Rate>> rates =
            new TreeMap<>(Comparator.comparing(Key::sex).thenComparing(Key::smoking));
    private int firstLine;

    RateRows(FaultList faults, Map<String, List<String>> smokingLevels) {
        this.faults = faults;
        this.smokingLevels = smokingLevels;
    }

    void add(CSVRecord record, List<String> names, int line) {
        firstLine = firstLine == 0 ? line : firstLine;
        if (record.size() != names.size()) {
            faults.add(
                    Fault.of("cellCount", JsonPath.ROOT, "found", record.size(), "expected", names.size()),
                    new Place(line, 1));
            return;
        }
        if (!cell(record, names, "duration").isEmpty()) {
            String duration = cell(record, names, "duration");
            faults.add(Fault.of("notSupported", "$.duration", "value", duration), new Place(line, 1));
            return;
        }
        Sex sex = sex(cell(record, names, "sex"), line);
        Integer age = age(cell(record, names, "age"), line);
        Double q = q(cell(record, names, "qx"), line);
        String smoking = cell(record, names, "smoking");
        if (CLASSES.contains(smoking) && !smokingLevels.containsKey(smoking)) {
            faults.add(Fault.of("smokingClassUnmapped", "$.smoking", "value", smoking), new Place(line, 1));
        }
        if (sex == null || age == null) {
            return;
        }
        TreeMap<Integer, Rate> column = rates.computeIfAbsent(new Key(sex, smoking), k -> new TreeMap<>());
        Rate before = column.get(age);
        if (before != null) {
            faults.add(
                    new Fault(
                            "duplicateRow",
                            "$.age",
                            Map.of("sex", name(sex), "age", age.toString(), "firstLine", String.valueOf(before.line))),
                    new Place(line, 1));
            return;
        }
        column.put(age, new Rate(q == null ? Double.NaN : q, line));
    }

    private static String cell(CSVRecord record, List<String> names, String name) {
        int index = names.indexOf(name);
        return index < 0 ? "" : record.get(index);
    }

    private @Nullable Sex sex(String text, int line) {
        switch (text) {
            case "male":
                return Sex.MALE;
            case "female":
                return Sex.FEMALE;
            default:
                faults.add(
                        Fault.of("notAllowed", "$.sex", "value", text, "allowed", "male, female"), new Place(line, 1));
                return null;
        }
    }

    private @Nullable Integer age(String text, int line) {
        if (WHOLE.matcher(text).matches() && Integer.parseInt(text) <= LAST_AGE) {
            return Integer.valueOf(text);
        }
        faults.add(
                new Fault("ageNotWhole", "$.age", Map.of("value", text, "lowest", "0", "highest", "" + LAST_AGE)),
                new Place(line, 1));
        return null;
    }

    private @Nullable Double q(String text, int line) {
        Place place = new Place(line, 1);
        if (!DECIMAL.matcher(text).matches()) {
            faults.add(Fault.of("notANumber", "$.qx", "value", text), place);
            return null;
        }
        double q = Double.parseDouble(text);
        if (!(q >= 0)) {
            faults.add(Fault.of("belowMinimum", "$.qx", "value", text, "bound", "0"), place);
            return null;
        }
        if (!(q <= 1)) {
            faults.add(Fault.of("aboveMaximum", "$.qx", "value", text, "bound", "1"), place);
            return null;
        }
        return q;
    }

    private static String name(Sex sex) {
        return sex.name().toLowerCase(Locale.ROOT);
    }

    /** The columns, or as many as could be made; what is wrong with them is added to the faults. */
    List<Column> columns() {
        if (rates.isEmpty() && firstLine == 0 && faults.isEmpty()) {
            faults.add(Fault.of("noRates", JsonPath.ROOT));
        }
        boolean whole = rates.keySet().stream().anyMatch(k -> k.smoking.isEmpty());
        boolean split = rates.keySet().stream().anyMatch(k -> !k.smoking.isEmpty());
        if (whole && split) {
            faults.add(Fault.of("smokingHalfGiven", "$.smoking"), new Place(firstLine, 1));
        }
        rates.forEach(this::checkAges);
        List<Column> columns = new ArrayList<>();
        if (faults.isEmpty()) {
            rates.forEach((key, column) -> columns.add(new Column(
                    key.sex,
                    key.smoking.isEmpty() ? List.of() : smokingLevels.getOrDefault(key.smoking, List.of(key.smoking)),
                    column.firstKey(),
                    column.values().stream().map(Rate::q).toList())));
        }
        return columns;
    }

    private void checkAges(Key key, TreeMap<Integer, Rate> column) {
        int expected = column.firstKey();
        for (Map.Entry<Integer, Rate> row : column.entrySet()) {
            Place place = new Place(row.getValue().line, 1);
            if (row.getKey() != expected) {
                String missing = expected == row.getKey() - 1 ? "" + expected : expected + "–" + (row.getKey() - 1);
                faults.add(Fault.of("ageGap", "$.age", "sex", name(key.sex), "missing", missing), place);
            }
            expected = row.getKey() + 1;
            if (row.getValue().q == 1 && !row.getKey().equals(column.lastKey())) {
                faults.add(
                        Fault.of("certainDeathBeforeEnd", "$.qx", "age", row.getKey(), "last", column.lastKey()),
                        place);
            }
        }
    }
}
