package nearworld.app.results;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import nearworld.app.artefacts.PackChoices;
import nearworld.app.assessments.Calculated;
import nearworld.app.drawing.Lifeline;
import nearworld.app.web.Figures;
import nearworld.engine.assessment.CaseFile;
import nearworld.engine.basics.PartialDate;
import nearworld.engine.network.EvidencePack;
import org.jspecify.annotations.Nullable;
import org.springframework.context.MessageSource;

/** The history of a case in words: as lanes and flags of the drawing, and as rows of the table below it. */
final class HistoryWords {
    private static final int FATAL_SEVERITY = 3;

    private final Calculated calculated;
    private final MessageSource words;
    private final Figures figures;
    private final Locale locale;

    HistoryWords(Calculated calculated, MessageSource words, Figures figures, Locale locale) {
        this.calculated = calculated;
        this.words = words;
        this.figures = figures;
        this.locale = locale;
    }

    /** Lanes with occurrences first; watched types in which nothing happened share a lane for each window. */
    List<Lifeline.Lane> lanes() {
        List<Lifeline.Lane> lanes = new ArrayList<>();
        Map<Lifeline.Lane, List<String>> quiet = new LinkedHashMap<>();
        for (CaseFile.History history : calculated.file().history()) {
            Lifeline.Lane lane = lane(history);
            if (lane.marks().isEmpty()) {
                Lifeline.Lane window = new Lifeline.Lane("", lane.from(), lane.to(), List.of());
                quiet.computeIfAbsent(window, w -> new ArrayList<>()).add(lane.title());
            } else {
                lanes.add(lane);
            }
        }
        quiet.forEach((window, titles) ->
                lanes.add(new Lifeline.Lane(noneHappened(titles), window.from(), window.to(), List.of())));
        return lanes;
    }

    private String noneHappened(List<String> titles) {
        return titles.size() == 1
                ? words.getMessage("lifeline.noneHappenedOne", titles.toArray(), locale)
                : words.getMessage("lifeline.noneHappened", new Object[] {titles.size()}, locale);
    }

    private Lifeline.Lane lane(CaseFile.History history) {
        List<Lifeline.Mark> marks = history.occurrences().stream()
                .map(o -> new Lifeline.Mark(
                        o.on().middle(),
                        severity(history.event(), o.outcome()),
                        occurrence(history.event(), o),
                        brief(o.on())))
                .toList();
        boolean watched = history.from() != null && history.to() != null;
        return new Lifeline.Lane(
                event(history.event()).title(),
                watched ? middle(history.from()) : null,
                watched ? middle(history.to()) : null,
                marks);
    }

    private static @Nullable LocalDate middle(@Nullable PartialDate date) {
        return date == null ? null : date.middle();
    }

    /** The rank among outcomes that one can survive, in the pack's order from mild to severe. */
    private int severity(int event, int outcome) {
        List<EvidencePack.Outcome> outcomes =
                calculated.pack().events().get(event).outcomes();
        if (outcome < 0) {
            return 0;
        }
        if (outcomes.get(outcome).fatal()) {
            return FATAL_SEVERITY;
        }
        return (int)
                outcomes.subList(0, outcome).stream().filter(o -> !o.fatal()).count();
    }

    private String brief(PartialDate on) {
        return on.isExact() ? figures.month(on.middle(), locale) : figures.date(on, locale);
    }

    private String occurrence(int event, CaseFile.Occurrence occurrence) {
        String on = figures.date(occurrence.on(), locale);
        if (occurrence.outcome() < 0) {
            return on;
        }
        String outcome = event(event).outcomes().get(occurrence.outcome()).title();
        return words.getMessage("history.occurrence", new Object[] {outcome, on}, locale);
    }

    private PackChoices.EventChoice event(int event) {
        return calculated.words().events().get(event);
    }

    /** Onsets of conditions that a source says are there, the earliest for each condition. */
    List<Lifeline.Flag> flags() {
        return onsets().stream()
                .map(s -> new Lifeline.Flag(
                        onset(s).middle(),
                        condition(s) + " " + figures.date(onset(s), locale) + " · " + source(s),
                        condition(s) + " " + brief(onset(s))))
                .toList();
    }

    List<ResultView.OnsetRow> onsetRows() {
        return onsets().stream()
                .map(s -> new ResultView.OnsetRow(condition(s), figures.date(onset(s), locale), source(s)))
                .toList();
    }

    private List<CaseFile.Statement> onsets() {
        List<CaseFile.Statement> dated = calculated.file().statements().stream()
                .filter(s -> s.present() && s.onset() != null)
                .sorted(Comparator.comparing(s -> onset(s).middle()))
                .toList();
        return dated.stream()
                .filter(s -> dated.stream()
                        .filter(other -> other.condition() == s.condition())
                        .findFirst()
                        .orElseThrow()
                        .equals(s))
                .toList();
    }

    private static PartialDate onset(CaseFile.Statement statement) {
        PartialDate onset = statement.onset();
        if (onset == null) {
            throw new IllegalArgumentException("statement has no onset");
        }
        return onset;
    }

    private String condition(CaseFile.Statement s) {
        return calculated.words().conditions().get(s.condition()).title();
    }

    private String source(CaseFile.Statement s) {
        return calculated.words().sources().get(s.source()).title();
    }

    List<ResultView.HistoryRow> rows() {
        return calculated.file().history().stream()
                .map(h -> new ResultView.HistoryRow(
                        event(h.event()).title(),
                        watched(h),
                        h.occurrences().stream()
                                .map(o -> occurrence(h.event(), o))
                                .toList()))
                .toList();
    }

    private @Nullable String watched(CaseFile.History h) {
        if (h.from() == null || h.to() == null) {
            return null;
        }
        Object[] ends = {figures.date(h.from(), locale), figures.date(h.to(), locale)};
        return words.getMessage("history.watched", ends, locale);
    }
}
