package nearworld.app.results;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import nearworld.app.drawing.Lifeline;
import nearworld.engine.assessment.AssessmentResult;
import nearworld.engine.assessment.AssessmentResult.WorldResult;
import nearworld.engine.assessment.CaseFile;
import org.jspecify.annotations.Nullable;

/**
 * One world in the order in which readers meet it: the table, events removed, recorded, the what-ifs, and last the one
 * that learns nothing.
 *
 * @param letter of a what-if, A, B, …; empty for the others
 * @param whatIf null for the four worlds that every result has
 */
record World(Lifeline.Kind kind, String letter, WorldResult numbers, CaseFile.@Nullable WhatIf whatIf) {
    static final String WHAT_IF_PREFIX = "whatIf:";

    static List<World> of(CaseFile file, AssessmentResult result) {
        List<World> worlds = new ArrayList<>();
        worlds.add(new World(Lifeline.Kind.TABLE, "", result.world("table"), null));
        if (file.history().stream().anyMatch(h -> !h.occurrences().isEmpty())) {
            worlds.add(new World(Lifeline.Kind.REVEALED, "", result.world("eventsRemoved"), null));
        }
        worlds.add(new World(Lifeline.Kind.RECORDED, "", result.world("recorded"), null));
        List<CaseFile.WhatIf> whatIfs = new ArrayList<>(file.whatIfs());
        whatIfs.sort(Parting.latestFirst(file.assessedOn()));
        for (int i = 0; i < whatIfs.size(); i++) {
            WorldResult numbers = result.world(WHAT_IF_PREFIX + whatIfs.get(i).name());
            worlds.add(new World(Lifeline.Kind.WHAT_IF, letter(i), numbers, whatIfs.get(i)));
        }
        worlds.add(new World(Lifeline.Kind.CONTRAST, "", result.world("unlearned"), null));
        return worlds;
    }

    /** A to Z, then AA, AB, … */
    static String letter(int i) {
        String last = String.valueOf((char) ('A' + i % 26));
        return i < 26 ? last : letter(i / 26 - 1) + last;
    }

    /** The name in message keys. */
    String key() {
        return kind == Lifeline.Kind.WHAT_IF ? "whatIf" : numbers.id();
    }

    /** Where the world leaves the recorded one; null where it does not. */
    Lifeline.@Nullable Parting parting(CaseFile file) {
        if (whatIf != null) {
            Optional<LocalDate> day = Parting.of(whatIf, file.assessedOn());
            return new Lifeline.Parting(day.orElse(null));
        }
        return kind == Lifeline.Kind.REVEALED ? new Lifeline.Parting(firstOccurrence(file)) : null;
    }

    private static @Nullable LocalDate firstOccurrence(CaseFile file) {
        return file.history().stream()
                .flatMap(h -> h.occurrences().stream())
                .map(o -> o.on().middle())
                .min(LocalDate::compareTo)
                .orElse(null);
    }
}
