package nearworld.exchange.tables;

import java.io.IOException;
import java.io.StringReader;
import java.io.UncheckedIOException;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import nearworld.engine.basics.Fault;
import nearworld.engine.mortality.MortalityTable;
import nearworld.exchange.documents.FormatSchema;
import nearworld.exchange.documents.Sha256;
import nearworld.exchange.documents.StrictText;
import nearworld.exchange.faults.FaultList;
import nearworld.exchange.faults.JsonPath;
import nearworld.exchange.faults.Place;
import nearworld.exchange.faults.Reading;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVParser;
import org.apache.commons.csv.CSVRecord;
import org.jspecify.annotations.Nullable;
import tools.jackson.databind.node.JsonNodeFactory;
import tools.jackson.databind.node.ObjectNode;

/**
 * Reads a mortality table: {@code #key: value} lines, a line of column names, one row a rate. Paths of faults name the head's
 * key ({@code $.ageBasis}) or the column ({@code $.qx}); the line says the row.
 */
public final class TableReader {
    /** A hundred times what a table split by sex, smoking and duration needs. */
    public static final int MOST_BYTES = 16 * 1024 * 1024;

    private static final List<String> REQUIRED = List.of("sex", "age", "qx");
    private static final List<String> OPTIONAL = List.of("smoking", "duration");
    /** What a table that does not name its population is said to describe. */
    private static final String UNSTATED = "unstated";

    private final FaultList faults = new FaultList();

    private TableReader() {}

    public static Reading<Table> read(byte[] bytes) {
        TableReader reader = new TableReader();
        Table table = reader.table(bytes);
        return table == null ? Reading.refused(reader.faults.sorted()) : Reading.accepted(table);
    }

    private @Nullable Table table(byte[] bytes) {
        String text = StrictText.decode(bytes, MOST_BYTES, 1, faults);
        if (text == null) {
            return null;
        }
        Map<String, String> head = new LinkedHashMap<>();
        int headLines = head(text, head);
        Map<String, List<String>> smoking = smokingLevels(head);
        RateRows rows = new RateRows(faults, smoking);
        rates(text, headLines, rows);
        List<MortalityTable.Column> columns = rows.columns();
        if (!faults.isEmpty()) {
            return null;
        }
        MortalityTable rates = new MortalityTable(
                Objects.requireNonNull(head.get("name")),
                ageBasis(head.getOrDefault("ageBasis", "exact")),
                withinYear(head.getOrDefault("withinYear", "constantForce")),
                head.getOrDefault("population", UNSTATED),
                columns);
        return new Table(rates, head, Sha256.hex(bytes));
    }

    /** Reads the head; returns the number of its lines. */
    private int head(String text, Map<String, String> head) {
        ObjectNode tree = JsonNodeFactory.instance.objectNode();
        faults.place(JsonPath.ROOT, new Place(1, 1));
        int line = 0;
        for (String l : (Iterable<String>) text.lines()::iterator) {
            if (!l.startsWith("#") && !l.isBlank()) {
                break;
            }
            line++;
            if (l.startsWith("#")) {
                headLine(l, new Place(line, 1), tree, head);
            }
        }
        faults.endStage();
        FormatSchema.TABLE_HEAD.validate(tree, faults);
        return line;
    }

    private void headLine(String line, Place place, ObjectNode tree, Map<String, String> head) {
        int colon = line.indexOf(':');
        if (colon < 0) {
            faults.add(Fault.of("headLine", JsonPath.ROOT, "value", line), place);
            return;
        }
        String key = line.substring(1, colon).strip();
        String path = JsonPath.field(JsonPath.ROOT, key);
        if (tree.has(key)) {
            int first = faults.placeOf(path).line();
            faults.add(Fault.of("duplicateKey", path, "field", key, "firstLine", first), place);
            return;
        }
        faults.place(path, place);
        tree.put(key, line.substring(colon + 1).strip());
        head.put(key, line.substring(colon + 1).strip());
    }

    private static MortalityTable.AgeBasis ageBasis(String text) {
        return switch (text) {
            case "nearest" -> MortalityTable.AgeBasis.NEAREST;
            case "last" -> MortalityTable.AgeBasis.LAST;
            default -> MortalityTable.AgeBasis.EXACT;
        };
    }

    private static MortalityTable.WithinYear withinYear(String text) {
        return switch (text) {
            case "uniform" -> MortalityTable.WithinYear.UNIFORM;
            case "balducci" -> MortalityTable.WithinYear.BALDUCCI;
            default -> MortalityTable.WithinYear.CONSTANT_FORCE;
        };
    }

    /** {@code nonsmoker=never,former; smoker=current} by class. */
    private Map<String, List<String>> smokingLevels(Map<String, String> head) {
        Map<String, List<String>> levels = new LinkedHashMap<>();
        String text = head.get("smokingLevels");
        if (text == null) {
            return levels;
        }
        String path = "$.smokingLevels";
        List<String> seen = new ArrayList<>();
        for (String part : text.split(";", -1)) {
            int equals = part.indexOf('=');
            if (equals < 0) {
                continue;
            }
            String name = part.substring(0, equals).strip();
            List<String> of = Arrays.stream(part.substring(equals + 1).split(",", -1))
                    .map(String::strip)
                    .toList();
            if (levels.put(name, of) != null) {
                faults.add(Fault.of("repeatedItem", path, "value", name));
            }
            for (String level : of) {
                if (level.isEmpty()) {
                    faults.add(Fault.of("emptyText", path, "value", part.strip()));
                } else if (seen.contains(level)) {
                    faults.add(Fault.of("repeatedItem", path, "value", level));
                }
                seen.add(level);
            }
        }
        return levels;
    }

    private void rates(String text, int headLines, RateRows rows) {
        int start = 0;
        for (int i = 0; i < headLines; i++) {
            start = text.indexOf('\n', start) + 1;
        }
        CSVFormat format = CSVFormat.RFC4180
                .builder()
                .setTrim(true)
                .setIgnoreEmptyLines(true)
                .get();
        try (CSVParser parser = CSVParser.parse(new StringReader(text.substring(start)), format)) {
            List<String> names = null;
            for (CSVRecord record : parser) {
                int line = headLines + (int) parser.getCurrentLineNumber();
                if (names == null) {
                    names = columnNames(record, line);
                    if (names == null) {
                        return;
                    }
                } else {
                    rows.add(record, names, line);
                }
            }
            if (names == null) {
                faults.add(Fault.of("noColumns", JsonPath.ROOT), new Place(headLines + 1, 1));
            }
        } catch (IOException | UncheckedIOException | IllegalStateException e) {
            faults.add(Fault.of("notCsv", JsonPath.ROOT, "detail", String.valueOf(e.getMessage())));
        }
    }

    private @Nullable List<String> columnNames(CSVRecord record, int line) {
        List<String> names = record.toList();
        boolean good = true;
        for (int i = 0; i < names.size(); i++) {
            String name = names.get(i);
            if (!REQUIRED.contains(name) && !OPTIONAL.contains(name)) {
                faults.add(Fault.of("unknownColumn", JsonPath.ROOT, "column", name), new Place(line, 1));
                good = false;
            } else if (names.indexOf(name) < i) {
                faults.add(Fault.of("repeatedItem", JsonPath.ROOT, "value", name), new Place(line, 1));
                good = false;
            }
        }
        for (String name : REQUIRED) {
            if (!names.contains(name)) {
                faults.add(Fault.of("missingColumn", JsonPath.ROOT, "column", name), new Place(line, 1));
                good = false;
            }
        }
        return good ? names : null;
    }
}
