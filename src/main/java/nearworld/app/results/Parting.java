package nearworld.app.results;

import java.time.LocalDate;
import java.util.Comparator;
import java.util.Optional;
import nearworld.engine.assessment.CaseFile;
import org.jspecify.annotations.Nullable;

/** When a what-if leaves the recorded world: at the earliest of its changes. */
final class Parting {
    private Parting() {}

    /** Empty where the what-if always was different. */
    static Optional<LocalDate> of(CaseFile.WhatIf whatIf, LocalDate today) {
        if (whatIf.changes().stream().anyMatch(c -> day(c, today) == null)) {
            return Optional.empty();
        }
        return whatIf.changes().stream().map(c -> day(c, today)).min(Comparator.naturalOrder());
    }

    /** The latest first, so that the lines of the drawing cross as little as can be; those without a date last. */
    static Comparator<CaseFile.WhatIf> latestFirst(LocalDate today) {
        return Comparator.comparing(w -> of(w, today).orElse(LocalDate.MIN), Comparator.reverseOrder());
    }

    private static @Nullable LocalDate day(CaseFile.Change change, LocalDate today) {
        if (change instanceof CaseFile.Remove c) {
            return c.on().middle();
        }
        if (change instanceof CaseFile.Move c) {
            return c.on().middle().isBefore(c.to().middle()) ? c.on().middle() : c.to().middle();
        }
        if (change instanceof CaseFile.OtherOutcome c) {
            return c.on().middle();
        }
        if (change instanceof CaseFile.Without c) {
            return c.from() == null ? null : c.from().middle();
        }
        if (change instanceof CaseFile.ChangedBehaviour c) {
            return c.from() == null ? null : c.from().middle();
        }
        if (change instanceof CaseFile.Treat c) {
            return c.from() == null ? today : c.from().middle();
        }
        if (change instanceof CaseFile.Add c) {
            return c.on().middle();
        }
        throw new IllegalArgumentException("unknown change " + change.kind());
    }
}
