package nearworld.cli;

import java.util.List;
import nearworld.exchange.faults.LocatedFault;
import org.jspecify.annotations.Nullable;

/**
 * What comes of one case.
 *
 * @param result a line of JSON; null where the case was refused
 * @param faults why it was refused
 */
record CaseAnswer(@Nullable String result, List<FaultInFile> faults) {
    /** A fault and the file that has it: the case's, or the case's with the pack's behind it. */
    record FaultInFile(String file, LocatedFault fault) {}
}
