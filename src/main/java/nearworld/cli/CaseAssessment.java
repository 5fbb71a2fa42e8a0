package nearworld.cli;

import java.util.List;
import nearworld.engine.assessment.AssessmentOutcome;
import nearworld.engine.assessment.AssessmentResult;
import nearworld.engine.assessment.Assessor;
import nearworld.engine.assessment.CaseFile;
import nearworld.engine.assessment.Refusal;
import nearworld.engine.basics.Fault;
import nearworld.exchange.cases.CaseReader;
import nearworld.exchange.documents.JsonText;
import nearworld.exchange.faults.LocatedFault;
import nearworld.exchange.faults.Place;
import nearworld.exchange.faults.Reading;
import nearworld.exchange.results.ResultBasis;
import nearworld.exchange.results.ResultWriter;

/** Reads and assesses one case. Safe for many threads. */
final class CaseAssessment {
    private final CaseReader reader;
    private final Assessor assessor;
    private final ResultBasis basis;
    private final PackPlaces pack;

    CaseAssessment(CaseReader reader, Assessor assessor, ResultBasis basis, PackPlaces pack) {
        this.reader = reader;
        this.assessor = assessor;
        this.basis = basis;
        this.pack = pack;
    }

    CaseAnswer answer(CaseText text) {
        if (!text.faults().isEmpty()) {
            return refused(text, text.faults());
        }
        Reading<CaseFile> reading = reader.read(text.bytes(), text.firstLine());
        if (!reading.isAccepted()) {
            return refused(text, reading.located());
        }
        AssessmentOutcome outcome = outcome(reading.value());
        if (outcome instanceof AssessmentResult result) {
            return new CaseAnswer(
                    ResultWriter.line(ResultWriter.tree(reading.value().caseRef(), result, basis)), List.of());
        }
        return refused(text, (Refusal) outcome);
    }

    /** The outer edge: what goes wrong with one case, memory included, must not keep the others from their results. */
    private AssessmentOutcome outcome(CaseFile file) {
        try {
            return assessor.assess(file);
        } catch (RuntimeException | OutOfMemoryError | StackOverflowError e) {
            return new Refusal(List.of(Fault.of("calculationFailed", "$", "detail", e)));
        }
    }

    private static CaseAnswer refused(CaseText text, List<LocatedFault> faults) {
        return new CaseAnswer(
                null,
                faults.stream()
                        .map(f -> new CaseAnswer.FaultInFile(text.file(), f))
                        .toList());
    }

    private CaseAnswer refused(CaseText text, Refusal refusal) {
        return new CaseAnswer(
                null, refusal.faults().stream().map(f -> located(text, f)).toList());
    }

    private CaseAnswer.FaultInFile located(CaseText text, Fault fault) {
        if (PackPlaces.isOfPack(fault.path())) {
            String files = text.file() + ":" + text.firstLine() + ": " + pack.file();
            return new CaseAnswer.FaultInFile(files, new LocatedFault(fault, pack.of(fault.path())));
        }
        Place place = JsonText.read(text.bytes(), CaseReader.MOST_BYTES, text.firstLine())
                .faults()
                .placeOf(fault.path());
        return new CaseAnswer.FaultInFile(text.file(), new LocatedFault(fault, place));
    }
}
