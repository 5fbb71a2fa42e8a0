package nearworld.exchange.tables;

import java.util.Map;
import nearworld.engine.mortality.MortalityTable;

/**
 * A mortality table as it was read.
 *
 * @param rates for the engine
 * @param head the head's keys and values as typed
 * @param sha256 of the file's bytes
 */
public record Table(MortalityTable rates, Map<String, String> head, String sha256) {
    public Table {
        head = java.util.Collections.unmodifiableMap(new java.util.LinkedHashMap<>(head));
    }

    public String name() {
        return rates.name();
    }
}
