package nearworld.exchange.tables;

import java.util.ArrayList;
import java.util.List;
import nearworld.engine.basics.Fault;
import nearworld.engine.mortality.MortalityTable;
import nearworld.engine.network.EvidencePack;

/** Whether a table and an evidence pack can be used together. */
public final class TableFit {
    private static final String SMOKING = "smoking";

    private TableFit() {}

    /** The faults of a table, read with a pack: a table split by smoking needs the pack's levels, each in one class. */
    public static List<Fault> check(MortalityTable table, EvidencePack pack) {
        List<Fault> faults = new ArrayList<>();
        if (!table.isSmokingDistinct()) {
            return faults;
        }
        int smoking = pack.behaviourIndex(SMOKING);
        if (smoking < 0) {
            faults.add(Fault.of("packWithoutSmoking", "$.smoking", "pack", pack.id()));
            return faults;
        }
        List<String> known = pack.behaviours().get(smoking).levels().stream()
                .map(EvidencePack.Level::id)
                .toList();
        List<String> given = table.columns().stream()
                .flatMap(c -> c.smokingLevels().stream())
                .distinct()
                .toList();
        for (String level : given) {
            if (!known.contains(level)) {
                faults.add(Fault.of("unknownLevel", "$.smoking", "name", level, "of", SMOKING));
            }
        }
        for (String level : known) {
            if (!given.contains(level)) {
                faults.add(Fault.of("smokingLevelWithoutRates", "$.smoking", "level", level));
            }
        }
        return faults;
    }
}
