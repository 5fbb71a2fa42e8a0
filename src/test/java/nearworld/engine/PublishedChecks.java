package nearworld.engine;

import java.io.IOException;
import java.io.StringReader;
import java.io.UncheckedIOException;
import java.math.BigDecimal;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import nearworld.oracle.Oracles;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVRecord;

/** The rows of {@code oracles/published_checks.csv}; each names its source, and says where that is from memory. */
final class PublishedChecks {
    private static final Pattern NUMBER = Pattern.compile("=([0-9.]+)(?:/([0-9]+))?");

    /**
     * @param printed as the source prints it, its digits told; empty where nothing is remembered or memory was wrong
     * @param computed from the source's parameters
     */
    record Row(String group, String item, String printed, double computed, String source) {
        /** Half a unit of the last printed digit. */
        double halfUnit() {
            return new BigDecimal("0.5")
                    .movePointLeft(new BigDecimal(printed).scale())
                    .doubleValue();
        }

        /** The numbers of an item such as {@code a=0.01,b=0.1,t=30} or {@code p=7/10,q=1/5}, in their order. */
        List<Double> parameters() {
            Matcher m = NUMBER.matcher(item);
            return Stream.iterate(m, Matcher::find, x -> x)
                    .map(x ->
                            Double.parseDouble(x.group(1)) / (x.group(2) == null ? 1 : Double.parseDouble(x.group(2))))
                    .toList();
        }

        @Override
        public String toString() {
            return group + ", " + item + " (" + source + ")";
        }
    }

    private PublishedChecks() {}

    static List<Row> of(String group) {
        try {
            List<Row> rows = CSVFormat.DEFAULT.parse(new StringReader(Oracles.text("published_checks.csv"))).stream()
                    .filter(r -> r.get(0).startsWith(group))
                    .map(PublishedChecks::row)
                    .toList();
            if (rows.isEmpty()) {
                throw new IllegalArgumentException("no rows of " + group);
            }
            return rows;
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private static Row row(CSVRecord r) {
        String printed = r.get(5).equals("AGREES") && r.get(2).matches("[0-9.]+") ? r.get(2) : "";
        return new Row(r.get(0), r.get(1), printed, Double.parseDouble(r.get(3)), r.get(6));
    }
}
