package nearworld.app.assessments;

import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.ConcurrentHashMap;
import nearworld.app.artefacts.Artefacts;
import nearworld.app.artefacts.LoadedPack;
import nearworld.app.artefacts.LoadedTable;
import nearworld.app.cases.CaseComposing;
import nearworld.app.forms.CaseForms;
import nearworld.app.forms.Composition;
import nearworld.app.forms.FieldFault;
import nearworld.app.forms.FieldFaults;
import nearworld.engine.assessment.AssessmentOutcome;
import nearworld.engine.assessment.AssessmentResult;
import nearworld.engine.assessment.Assessor;
import nearworld.engine.assessment.CaseFile;
import nearworld.engine.assessment.Refusal;
import nearworld.engine.basics.Fault;
import org.springframework.stereotype.Service;

/** Calculates cases as they stand, with the table and the pack that are current for their kind of cover. */
@Service
public class Calculations {
    private final CaseComposing composing;
    private final Artefacts artefacts;
    private final Map<String, Assessor> assessors = new ConcurrentHashMap<>();

    Calculations(CaseComposing composing, Artefacts artefacts) {
        this.composing = composing;
        this.artefacts = artefacts;
    }

    /**
     * A case as it stands.
     *
     * @param composition what the typed sections come to
     * @param calculation what comes of calculating that
     */
    public record Worked(Composition composition, Calculation calculation) {
        /** Faults field by field. */
        public FieldFaults faults() {
            return composition.faults();
        }
    }

    /** Calculates what is typed, with titles in a language. */
    public Worked of(String caseRef, CaseForms forms, Locale locale) {
        Composition composition = composing.compose(caseRef, forms);
        CaseFile file = composition.file();
        if (file == null) {
            return new Worked(composition, new NotCalculated(reasons(composition)));
        }
        Optional<LoadedPack> pack = composing.pack(forms);
        Optional<LoadedTable> table = artefacts.currentTable(composition.coverKind());
        if (pack.isEmpty() || table.isEmpty()) {
            return new Worked(composition, new NotCalculated(List.of(Fault.of("noTable", "$"))));
        }
        return new Worked(composition, calculate(file, table.get(), pack.get(), composition.faults(), locale));
    }

    private static List<Fault> reasons(Composition composition) {
        return composition.general().isEmpty()
                ? composition.faults().all().stream().map(FieldFault::fault).toList()
                : composition.general();
    }

    private Calculation calculate(
            CaseFile file, LoadedTable table, LoadedPack pack, FieldFaults faults, Locale locale) {
        AssessmentOutcome outcome = assessor(table, pack).assess(file);
        if (outcome instanceof AssessmentResult result) {
            return new Calculated(
                    file,
                    result,
                    pack.pack(),
                    pack.choices(locale),
                    basis(table, pack, locale),
                    faults.all().stream().map(FieldFault::fault).toList());
        }
        return new NotCalculated(((Refusal) outcome).faults());
    }

    private Assessor assessor(LoadedTable table, LoadedPack pack) {
        return assessors.computeIfAbsent(
                table.sha256() + pack.sha256(), key -> new Assessor(table.table(), pack.pack()));
    }

    private static Basis basis(LoadedTable table, LoadedPack pack, Locale locale) {
        return new Basis(
                table.table().name(),
                table.sha256(),
                pack.pack().id(),
                pack.pack().version(),
                pack.title(locale),
                pack.sha256(),
                Assessor.ENGINE_VERSION);
    }
}
