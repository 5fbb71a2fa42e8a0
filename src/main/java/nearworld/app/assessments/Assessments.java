package nearworld.app.assessments;

import java.time.Clock;
import java.time.temporal.ChronoUnit;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import nearworld.app.artefacts.Artefacts;
import nearworld.app.artefacts.LoadedPack;
import nearworld.app.cases.CaseRecord;
import nearworld.app.cases.Cases;
import nearworld.app.cases.NoSuchCaseException;
import nearworld.app.forms.CaseCheck;
import nearworld.app.keys.CaseKey;
import nearworld.app.keys.Keys;
import nearworld.app.people.CurrentPerson;
import nearworld.app.trail.NewEntry;
import nearworld.app.trail.Trail;
import nearworld.engine.assessment.AssessmentResult;
import nearworld.engine.assessment.CaseFile;
import nearworld.exchange.CanonicalJson;
import nearworld.exchange.results.ResultBasis;
import nearworld.exchange.results.ResultWriter;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;
import tools.jackson.databind.json.JsonMapper;
import tools.jackson.databind.node.ObjectNode;

/** Records assessments and opens them again. */
@Service
public class Assessments {
    private static final JsonMapper MAPPER = JsonMapper.shared();

    private final Cases cases;
    private final Calculations calculations;
    private final AssessmentRepository repository;
    private final Artefacts artefacts;
    private final Keys keys;
    private final CurrentPerson current;
    private final Trail trail;
    private final Clock clock;

    Assessments(
            Cases cases,
            Calculations calculations,
            AssessmentRepository repository,
            Artefacts artefacts,
            Keys keys,
            CurrentPerson current,
            Trail trail,
            Clock clock) {
        this.cases = cases;
        this.calculations = calculations;
        this.repository = repository;
        this.artefacts = artefacts;
        this.keys = keys;
        this.current = current;
        this.trail = trail;
        this.clock = clock;
    }

    /** Records the calculation of a case as it stands: input, result, curves, versions and checksums, once and for all. */
    @Transactional
    public RecordOutcome record(String ref) {
        CaseRecord locked = cases.lockForRecording(ref);
        Calculations.Worked worked = calculations.of(ref, locked.forms(), Locale.ENGLISH);
        if (worked.faults().any() || !(worked.calculation() instanceof Calculated calculated)) {
            return new RecordOutcome.NotRecorded();
        }
        int number = repository.lastNumber(locked.id()) + 1;
        String by = current.required().name();
        AssessmentResult.WorldResult recorded = calculated.result().world("recorded");
        AssessmentEntity entity = new AssessmentEntity(
                locked.id(),
                number,
                clock.instant().truncatedTo(ChronoUnit.MICROS),
                by,
                calculated.basis(),
                seal(locked, number, worked.composition().input(), calculated),
                recorded);
        repository.saveAndFlush(entity);
        cases.recorded(locked, recorded.mortalityRatio());
        trail.append(NewEntry.ofCase(by, AssessmentSeal.RECORDED, ref, AssessmentSeal.details(entity)));
        return new RecordOutcome.Recorded(number);
    }

    private AssessmentEntity.Sealed seal(CaseRecord locked, int number, ObjectNode input, Calculated calculated) {
        CaseKey key = keys.of(locked.keyId());
        return new AssessmentEntity.Sealed(
                key.seal(CanonicalJson.of(input), purpose("input", number)),
                key.seal(result(locked.ref(), calculated), purpose("result", number)),
                key.seal(StoredResult.curves(calculated.result()), purpose("curves", number)));
    }

    private static String result(String ref, Calculated calculated) {
        Basis basis = calculated.basis();
        ResultBasis made = new ResultBasis(
                basis.engine(),
                basis.tableName(),
                basis.tableSha256(),
                basis.packId(),
                basis.packVersion(),
                basis.packSha256());
        return ResultWriter.line(ResultWriter.tree(ref, calculated.result(), made));
    }

    /** The assessments of a case, newest first. */
    @Transactional(readOnly = true)
    public List<AssessmentView> of(String ref) {
        return repository.findByCaseIdOrderByNumberDesc(cases.find(ref).id()).stream()
                .map(AssessmentEntity::view)
                .toList();
    }

    /** Opens a recorded assessment from what was stored, with the pack that it was made with. */
    @Transactional
    public RecordedAssessment open(String ref, int number, Locale locale) {
        CaseRecord found = cases.find(ref);
        AssessmentEntity entity =
                repository.findByCaseIdAndNumber(found.id(), number).orElseThrow(NoSuchCaseException::new);
        CaseKey key = keys.of(found.keyId());
        LoadedPack pack = artefacts.pack(entity.basis("").packSha256());
        AssessmentEntity.Sealed sealed = entity.sealed();
        Calculated calculated = new Calculated(
                file(pack, key.open(sealed.input(), purpose("input", number))),
                StoredResult.read(
                        key.open(sealed.result(), purpose("result", number)),
                        key.open(sealed.curves(), purpose("curves", number))),
                pack.pack(),
                pack.choices(locale),
                entity.basis(pack.title(locale)),
                List.of());
        trail.append(NewEntry.ofCase(
                current.required().name(), Trail.CASE_VIEWED, ref, Map.of("assessment", Integer.toString(number))));
        return new RecordedAssessment(entity.view(), calculated);
    }

    private static CaseFile file(LoadedPack pack, String input) {
        CaseCheck.Checked checked = pack.check(null).check((ObjectNode) MAPPER.readTree(input));
        if (checked.file() == null) {
            throw new IllegalStateException("a recorded case no longer reads: " + checked.faults());
        }
        return checked.file();
    }

    private static String purpose(String part, int number) {
        return "assessment:" + number + ":" + part;
    }
}
