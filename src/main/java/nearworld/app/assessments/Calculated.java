package nearworld.app.assessments;

import java.util.List;
import nearworld.app.artefacts.PackChoices;
import nearworld.engine.assessment.AssessmentResult;
import nearworld.engine.assessment.CaseFile;
import nearworld.engine.basics.Fault;
import nearworld.engine.network.EvidencePack;

/**
 * A result with all that is needed to show it: the same for a calculation of this moment and for a recorded one.
 *
 * @param file the case as it was calculated
 * @param pack the numbers of the evidence pack; the file's indices point into it
 * @param words the pack's titles, in the pack's order
 * @param basis versions and checksums of table, pack and engine
 * @param leftOut what was typed but could not be counted in; always empty for a recorded assessment
 */
public record Calculated(
        CaseFile file, AssessmentResult result, EvidencePack pack, PackChoices words, Basis basis, List<Fault> leftOut)
        implements Calculation {
    public Calculated {
        leftOut = List.copyOf(leftOut);
    }
}
