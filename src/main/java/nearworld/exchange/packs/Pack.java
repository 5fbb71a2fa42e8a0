package nearworld.exchange.packs;

import java.util.List;
import nearworld.engine.basics.Fault;
import nearworld.engine.network.EvidencePack;

/**
 * An evidence pack as it was read.
 *
 * @param evidence the numbers, for the engine
 * @param texts the words and where the numbers come from
 * @param remarks what its author should look at though it is no fault
 * @param sha256 of the file's bytes
 */
public record Pack(EvidencePack evidence, PackTexts texts, List<Fault> remarks, String sha256) {
    public Pack {
        remarks = List.copyOf(remarks);
    }
}
