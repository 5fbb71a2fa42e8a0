package nearworld.app.assessments;

import java.util.Map;
import java.util.TreeMap;
import nearworld.app.trail.TrailEntryView;
import nearworld.app.trail.Vouched;
import nearworld.exchange.documents.Sha256;
import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Component;

/** What the trail says of a recorded assessment, and whether the stored one still agrees with it. */
@Component
class AssessmentSeal implements Vouched {
    static final String RECORDED = "assessment.recorded";

    private final AssessmentRepository repository;

    AssessmentSeal(AssessmentRepository repository) {
        this.repository = repository;
    }

    /** Every stored column, the personal ones by the checksum of their ciphertext. */
    static Map<String, String> details(AssessmentEntity entity) {
        Basis basis = entity.basis("");
        Map<String, String> details = new TreeMap<>();
        details.put("number", Integer.toString(entity.number()));
        details.put("recordedAt", entity.recordedAt().toString());
        details.put("recordedBy", entity.recordedBy());
        details.put("engine", basis.engine());
        details.put("table", basis.tableName());
        details.put("tableSha256", basis.tableSha256());
        details.put("pack", basis.packId());
        details.put("packVersion", Integer.toString(basis.packVersion()));
        details.put("packSha256", basis.packSha256());
        details.put("inputSha256", Sha256.hex(entity.sealed().input()));
        details.put("resultSha256", Sha256.hex(entity.sealed().result()));
        details.put("curvesSha256", Sha256.hex(entity.sealed().curves()));
        details.put("mortalityRatio", Double.toString(entity.mortalityRatio()));
        details.put("extraPerMille", Double.toString(entity.extraPerMille()));
        details.put("expectation", Double.toString(entity.expectation()));
        return details;
    }

    @Override
    public String action() {
        return RECORDED;
    }

    @Override
    public @Nullable String faultOf(TrailEntryView entry) {
        String ref = entry.caseRef() == null ? "" : entry.caseRef();
        int number = Integer.parseInt(entry.details().getOrDefault("number", "0"));
        boolean intact = repository
                .findByCaseRef(ref, number)
                .filter(a -> details(a).equals(entry.details()))
                .isPresent();
        return intact ? null : "assessment";
    }

    @Override
    public long stored() {
        return repository.count();
    }
}
