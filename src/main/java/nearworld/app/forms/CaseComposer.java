package nearworld.app.forms;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import nearworld.engine.basics.Fault;

/**
 * Turns what was typed into a case in the exchange format. A row with a fault is left out and named; a row is the
 * smallest thing whose absence says nothing false: a statement, a finding, an event's whole history (without one of its
 * occurrences it would say that nothing happened), a whole what-if.
 */
public final class CaseComposer {
    private CaseComposer() {}

    /**
     * Composes a case.
     *
     * @param today the day that the case speaks of where none is typed
     */
    public static Composition compose(String caseRef, LocalDate today, CaseForms forms, CaseCheck check) {
        Set<String> leftOut = new HashSet<>();
        Set<FieldFault> faults = new LinkedHashSet<>();
        Set<Fault> general = new LinkedHashSet<>();
        while (true) {
            CaseDraft draft = CaseDraft.of(caseRef, today, forms, leftOut);
            boolean more = false;
            for (CaseDraft.RowFault rowFault : draft.faults()) {
                faults.add(rowFault.fault());
                more |= leftOut.add(rowFault.row());
            }
            if (more) {
                continue;
            }
            CaseCheck.Checked checked = check.check(draft.json());
            for (Fault fault : checked.faults()) {
                Optional<CaseDraft.Place> place = draft.place(fault.path());
                if (place.isEmpty()) {
                    general.add(fault);
                } else if (!draft.isUntouchedPerson(place.get())) {
                    addOnce(faults, place.get().fault(fault));
                    more |= leftOut.add(place.get().row()) && place.get().removable();
                }
            }
            if (!more) {
                return finished(draft, checked, faults, general);
            }
        }
    }

    /** One fault a field is enough: the form's own comes first and says it best. */
    private static void addOnce(Set<FieldFault> faults, FieldFault fault) {
        if (faults.stream().noneMatch(f -> f.key().equals(fault.key()))) {
            faults.add(fault);
        }
    }

    private static Composition finished(
            CaseDraft draft, CaseCheck.Checked checked, Set<FieldFault> faults, Set<Fault> general) {
        List<Fault> reasons = new ArrayList<>(general);
        if (draft.personIncomplete()) {
            reasons.clear();
            reasons.add(Fault.of("personIncomplete", "$.applicant"));
        }
        boolean calculable = reasons.isEmpty() && checked.faults().isEmpty();
        return new Composition(
                draft.json(),
                calculable ? checked.file() : null,
                new FieldFaults(new ArrayList<>(faults)),
                reasons,
                draft.validParts(calculable || faultsSpare(checked)));
    }

    /** True where the person section itself has no fault, so that its part is valid even if the whole is not. */
    private static boolean faultsSpare(CaseCheck.Checked checked) {
        return checked.faults().stream()
                .noneMatch(f -> f.path().startsWith("$.applicant") || f.path().startsWith("$.assessedOn"));
    }
}
