package nearworld.cli;

import java.util.List;
import nearworld.exchange.faults.LocatedFault;

/**
 * One case as it stands in its file.
 *
 * @param file as named on the command line
 * @param firstLine the number of its first line
 * @param bytes empty where there are faults
 * @param faults why it could not be read at all
 */
record CaseText(String file, int firstLine, byte[] bytes, List<LocatedFault> faults) {}
