package nearworld.exchange.cases;

import java.util.Map;
import nearworld.engine.assessment.CaseFile;
import nearworld.engine.assessment.CaseFile.CoverKind;
import nearworld.engine.basics.Fault;
import nearworld.exchange.documents.Spot;
import nearworld.exchange.faults.FaultList;
import org.jspecify.annotations.Nullable;

/** The cover of a case. */
final class CoverPart {
    private static final Map<String, CoverKind> KINDS = Map.of(
            "term", CoverKind.TERM,
            "wholeOfLife", CoverKind.WHOLE_OF_LIFE,
            "endowment", CoverKind.ENDOWMENT,
            "lifeAnnuity", CoverKind.LIFE_ANNUITY);

    private final FaultList faults;

    CoverPart(FaultList faults) {
        this.faults = faults;
    }

    CaseFile.@Nullable Cover read(Spot cover) {
        CoverKind kind = KINDS.get(cover.at("kind").shown());
        if (kind == null) {
            return null;
        }
        boolean hasTerm = kind == CoverKind.TERM || kind == CoverKind.ENDOWMENT;
        Spot years = cover.at("years");
        if (hasTerm && !cover.has("years")) {
            faults.add(Fault.of("missingField", years.path(), "field", "years"));
        }
        if (!hasTerm && cover.has("years")) {
            faults.add(Fault.of(
                    "yearsOfWholeLife", years.path(), "kind", cover.at("kind").shown()));
        }
        return new CaseFile.Cover(
                kind,
                years.whole(),
                cover.at("sumAssured").decimal(),
                cover.at("currency").text(),
                cover.at("interest").number());
    }
}
