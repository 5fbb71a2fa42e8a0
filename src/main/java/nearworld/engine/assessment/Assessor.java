package nearworld.engine.assessment;

import nearworld.engine.mortality.MortalityTable;
import nearworld.engine.network.EvidencePack;

/** The engine's front door: a case, a table and an evidence pack in, remaining lifetimes out. Stateless. */
public final class Assessor {
    /** Changes whenever a number that the engine computes may change. */
    public static final String ENGINE_VERSION = "1.0.0";

    private final MortalityTable table;
    private final EvidencePack pack;

    public Assessor(MortalityTable table, EvidencePack pack) {
        this.table = table;
        this.pack = pack;
    }

    /** Assesses one case. */
    public AssessmentOutcome assess(CaseFile file) {
        throw new UnsupportedOperationException();
    }
}
