package nearworld.engine.assessment;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import nearworld.engine.assessment.CaseFile.History;
import nearworld.engine.assessment.CaseFile.Occurrence;
import nearworld.engine.assessment.CaseFile.Statement;
import nearworld.engine.basics.Fault;
import nearworld.engine.basics.PartialDate;
import nearworld.engine.counterfactual.WhatIfPlan;
import nearworld.engine.inference.Evidence;
import nearworld.engine.inference.Scores;
import nearworld.engine.network.EvidencePack;
import org.jspecify.annotations.Nullable;

/**
 * Turns a case into what the calculation sees: dates become days, occurrences episodes, changes plans.
 *
 * <p>A partial date stands for its middle unless another day is asked for at its path; a past one is cut at the assessment day,
 * a future one begins there.
 */
final class CaseResolver {
    private final CaseFile file;
    private final EvidencePack pack;
    private final Map<String, LocalDate> chosen;
    private final Map<String, PartialDate> partial = new LinkedHashMap<>();
    private final List<Fault> warnings = new ArrayList<>();
    private final Map<Dated, Integer> episodeOf = new HashMap<>();
    private final Evidence evidence;

    private record Dated(int event, PartialDate on) {}

    private record Single(int event, long day, int outcome, Dated dated, String path) {}

    /** @param chosen days to take for partial dates, by JSON path */
    CaseResolver(CaseFile file, EvidencePack pack, Map<String, LocalDate> chosen) {
        this.file = file;
        this.pack = pack;
        this.chosen = chosen;
        this.evidence = resolve();
    }

    Evidence evidence() {
        return evidence;
    }

    /** The partial dates of the case, by JSON path. */
    Map<String, PartialDate> partialDates() {
        return partial;
    }

    List<Fault> warnings() {
        return warnings;
    }

    private long past(PartialDate date, String path) {
        return day(date, path, false);
    }

    private double ahead(PartialDate date, String path) {
        return evidence.yearsFromToday(day(date, path, true));
    }

    private long day(PartialDate date, String path, boolean future) {
        if (!date.isExact()) {
            partial.put(path, date);
        }
        LocalDate day = chosen.getOrDefault(path, date.middle());
        boolean beyond = future ? day.isBefore(file.assessedOn()) : day.isAfter(file.assessedOn());
        return (beyond && !date.isExact() ? file.assessedOn() : day).toEpochDay();
    }

    private Evidence resolve() {
        long today = file.assessedOn().toEpochDay();
        List<Integer> levels =
                new ArrayList<>(java.util.Collections.nCopies(pack.behaviours().size(), -1));
        List<Evidence.GivenUp> habits = new ArrayList<>();
        Scores scores = new Scores(pack);
        for (CaseFile.BehaviourReport b : file.behaviours()) {
            levels.set(b.behaviour(), b.level());
            if (b.since() != null) {
                String id = pack.behaviours().get(b.behaviour()).id();
                int left = b.left() >= 0
                        ? b.left()
                        : scores.highestLevel(pack.behaviours().get(b.behaviour()));
                long since = past(b.since(), "$.applicant.behaviours." + id + ".since");
                habits.add(new Evidence.GivenUp(b.behaviour(), since, left));
            }
        }
        List<Long> onsets =
                new ArrayList<>(java.util.Collections.nCopies(pack.conditions().size(), Evidence.NO_DAY));
        List<Evidence.Said> said = new ArrayList<>();
        for (int i = 0; i < file.statements().size(); i++) {
            said.add(said(file.statements().get(i), "$.statements[" + i + "]", today, onsets));
        }
        List<Evidence.Found> found = new ArrayList<>();
        for (int i = 0; i < file.findings().size(); i++) {
            CaseFile.FindingReport f = file.findings().get(i);
            long day = f.on() == null ? today : past(f.on(), "$.findings[" + i + "].on");
            found.add(new Evidence.Found(f.finding(), f.level(), day));
        }
        List<Evidence.Window> windows = new ArrayList<>();
        List<Evidence.Occurrence> occurrences = history(windows);
        return new Evidence(
                file.sex(),
                past(file.bornOn(), "$.applicant.bornOn"),
                today,
                levels,
                habits,
                onsets,
                said,
                found,
                windows,
                occurrences);
    }

    private Evidence.Said said(Statement s, String path, long today, List<Long> onsets) {
        long day = s.on() == null ? today : past(s.on(), path + ".on");
        if (s.onset() != null) {
            day = past(s.onset(), path + ".onset");
            long known = onsets.get(s.condition());
            if (s.present() && (known == Evidence.NO_DAY || day < known)) {
                onsets.set(s.condition(), day);
            }
        }
        return new Evidence.Said(s.condition(), s.present(), s.source(), day);
    }

    private List<Evidence.Occurrence> history(List<Evidence.Window> windows) {
        List<Single> singles = new ArrayList<>();
        for (int h = 0; h < file.history().size(); h++) {
            History history = file.history().get(h);
            String path = "$.history[" + h + "]";
            if (history.from() != null && history.to() != null) {
                windows.add(new Evidence.Window(
                        history.event(), past(history.from(), path + ".from"), past(history.to(), path + ".to")));
            }
            for (int o = 0; o < history.occurrences().size(); o++) {
                Occurrence occurrence = history.occurrences().get(o);
                String at = path + ".occurrences[" + o + "]";
                singles.add(new Single(
                        history.event(),
                        past(occurrence.on(), at + ".on"),
                        occurrence.outcome(),
                        new Dated(history.event(), occurrence.on()),
                        at));
            }
        }
        singles.sort(Comparator.comparingLong(Single::day).thenComparingInt(Single::event));
        return merged(singles);
    }

    /** Occurrences of one type within episodeDays of the one before become one: first date, worst outcome, last date. */
    private List<Evidence.Occurrence> merged(List<Single> singles) {
        List<Evidence.Occurrence> episodes = new ArrayList<>();
        for (Single s : singles) {
            int of = -1;
            for (int e = 0; e < episodes.size(); e++) {
                boolean near = episodes.get(e).event() == s.event()
                        && s.day() - episodes.get(e).lastDay()
                                <= pack.events().get(s.event()).episodeDays();
                of = near ? e : of;
            }
            if (of < 0) {
                of = episodes.size();
                episodes.add(new Evidence.Occurrence(s.event(), s.day(), s.day(), s.outcome()));
            } else {
                Evidence.Occurrence before = episodes.get(of);
                episodes.set(
                        of,
                        new Evidence.Occurrence(
                                s.event(), before.day(), s.day(), Math.max(before.outcome(), s.outcome())));
                warnings.add(Fault.of("episodeMerged", s.path(), "first", LocalDate.ofEpochDay(before.day())));
            }
            episodeOf.put(s.dated(), of);
        }
        return episodes;
    }

    /** The plan of a what-if. */
    WhatIfPlan plan(int index) {
        CaseFile.WhatIf whatIf = file.whatIfs().get(index);
        PlanDraft draft = new PlanDraft();
        for (int c = 0; c < whatIf.changes().size(); c++) {
            CaseFile.Change change = whatIf.changes().get(c);
            add(draft, change, "$.whatIfs[" + index + "].changes[" + c + "]." + change.kind());
        }
        return draft.named(whatIf.name());
    }

    private static final class PlanDraft {
        long removed;
        long never;
        final Map<Integer, Integer> outcomes = new TreeMap<>();
        final Map<Integer, Double> moved = new TreeMap<>();
        final Map<Integer, Double> cured = new TreeMap<>();
        final Map<Integer, Integer> always = new TreeMap<>();
        final Map<Integer, WhatIfPlan.Habit> habits = new TreeMap<>();
        final List<WhatIfPlan.Treated> treatments = new ArrayList<>();
        final List<WhatIfPlan.Added> added = new ArrayList<>();

        WhatIfPlan named(String name) {
            return new WhatIfPlan(name, removed, outcomes, moved, never, cured, always, habits, treatments, added);
        }
    }

    private void add(PlanDraft draft, CaseFile.Change change, String path) {
        if (change instanceof CaseFile.Remove c) {
            draft.removed |= 1L << episode(c.event(), c.on());
        } else if (change instanceof CaseFile.Move c) {
            long to = past(c.to(), path + ".to");
            draft.moved.put(episode(c.event(), c.on()), evidence.yearsFromToday(to));
        } else if (change instanceof CaseFile.OtherOutcome c) {
            draft.outcomes.put(episode(c.event(), c.on()), c.to());
        } else if (change instanceof CaseFile.Without c) {
            addWithout(draft, c, path);
        } else if (change instanceof CaseFile.ChangedBehaviour c) {
            addBehaviour(draft, c, path);
        } else if (change instanceof CaseFile.Treat c) {
            draft.treatments.add(new WhatIfPlan.Treated(c.treatment(), from(c.from(), path)));
        } else if (change instanceof CaseFile.Add c) {
            draft.added.add(new WhatIfPlan.Added(c.event(), ahead(c.on(), path + ".on"), c.outcome()));
        }
    }

    private void addWithout(PlanDraft draft, CaseFile.Without c, String path) {
        if (c.from() == null) {
            draft.never |= 1L << c.condition();
        } else {
            draft.cured.put(c.condition(), from(c.from(), path));
        }
    }

    private void addBehaviour(PlanDraft draft, CaseFile.ChangedBehaviour c, String path) {
        if (c.from() == null) {
            draft.always.put(c.behaviour(), c.level());
        } else {
            draft.habits.put(c.behaviour(), new WhatIfPlan.Habit(c.level(), from(c.from(), path)));
        }
    }

    private double from(@Nullable PartialDate date, String path) {
        return date == null ? 0 : ahead(date, path + ".from");
    }

    private int episode(int event, PartialDate on) {
        Integer index = episodeOf.get(new Dated(event, on));
        if (index == null) {
            throw new IllegalArgumentException("no occurrence of event " + event + " on " + on);
        }
        return index;
    }
}
