package nearworld.app.cases;

import java.time.Clock;
import java.time.LocalDate;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import nearworld.app.artefacts.Artefacts;
import nearworld.app.artefacts.LoadedPack;
import nearworld.app.artefacts.LoadedTable;
import nearworld.app.forms.CaseCheck;
import nearworld.app.forms.CaseComposer;
import nearworld.app.forms.CaseForms;
import nearworld.app.forms.Composition;
import nearworld.engine.basics.Fault;
import nearworld.engine.mortality.MortalityTable;
import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Component;

/** Composes the typed sections of a case against the pack that is current for its kind of cover. */
@Component
public class CaseComposing {
    private static final Set<String> COVER_KINDS = Set.of("term", "wholeOfLife", "endowment", "lifeAnnuity");

    private final Artefacts artefacts;
    private final Clock clock;

    CaseComposing(Artefacts artefacts, Clock clock) {
        this.artefacts = artefacts;
        this.clock = clock;
    }

    /** What the typed sections come to today. */
    public Composition compose(String caseRef, CaseForms forms) {
        MortalityTable table = artefacts
                .currentTable(typedCoverKind(forms))
                .map(LoadedTable::table)
                .orElse(null);
        CaseCheck check = pack(forms)
                .map(pack -> pack.check(table))
                .orElse(input -> new CaseCheck.Checked(null, List.of(Fault.of("noPack", "$"))));
        return CaseComposer.compose(caseRef, LocalDate.now(clock), forms, check);
    }

    /** The pack that is current for the case; empty where none is published. */
    public Optional<LoadedPack> pack(CaseForms forms) {
        return artefacts.currentPack(typedCoverKind(forms));
    }

    private static @Nullable String typedCoverKind(CaseForms forms) {
        String kind = forms.cover().kind();
        return COVER_KINDS.contains(kind) ? kind : null;
    }
}
