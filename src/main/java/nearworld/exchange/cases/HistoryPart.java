package nearworld.exchange.cases;

import java.time.LocalDate;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import nearworld.engine.assessment.CaseFile;
import nearworld.engine.basics.Fault;
import nearworld.engine.basics.PartialDate;
import nearworld.exchange.documents.Spot;
import nearworld.exchange.faults.FaultList;
import org.jspecify.annotations.Nullable;

/** The events of a case: occurrences, and the windows in which all of them are known. */
final class HistoryPart {
    private record Window(int event, LocalDate from, LocalDate to, Spot spot) {}

    /** An occurrence as a what-if names it. */
    record Named(int event, PartialDate on) {}

    /** The calculation keeps sets of occurrences as bits of one number. */
    private static final int MOST_OCCURRENCES = 60;

    private final PackIndex index;
    private final Dates dates;
    private final FaultList faults;
    private final Map<Named, String> occurrences = new HashMap<>();
    private final List<Window> windows = new ArrayList<>();

    HistoryPart(PackIndex index, Dates dates, FaultList faults) {
        this.index = index;
        this.dates = dates;
        this.faults = faults;
    }

    /** @param died true where the person died: outcomes are then another matter */
    List<CaseFile.History> read(Spot history, boolean died) {
        List<CaseFile.History> result = new ArrayList<>();
        for (Spot spot : history.items()) {
            int event = index.event(spot.at("event"));
            PartialDate from = dates.past(spot.at("from"));
            PartialDate to = dates.past(spot.at("to"));
            window(event, from, to, spot);
            List<CaseFile.Occurrence> list = new ArrayList<>();
            for (Spot o : spot.at("occurrences").items()) {
                occurrence(event, o, list, died);
            }
            result.add(new CaseFile.History(event, from, to, list));
        }
        overlaps();
        int count = result.stream().mapToInt(h -> h.occurrences().size()).sum();
        if (count > MOST_OCCURRENCES) {
            faults.add(Fault.of("tooManyOccurrences", history.path(), "value", count, "bound", MOST_OCCURRENCES));
        }
        return result;
    }

    private void occurrence(int event, Spot spot, List<CaseFile.Occurrence> list, boolean died) {
        PartialDate on = dates.past(spot.at("on"));
        int outcome = index.outcome(event, spot.at("outcome"));
        if (!died && spot.isObject() && !spot.has("outcome")) {
            faults.add(Fault.of("missingField", spot.at("outcome").path(), "field", "outcome"));
        }
        if (!died
                && outcome >= 0
                && index.pack().events().get(event).outcomes().get(outcome).fatal()) {
            faults.add(Fault.of(
                    "fatalOutcomeOfLiving",
                    spot.at("outcome").path(),
                    "outcome",
                    spot.at("outcome").shown()));
        }
        if (on == null) {
            return;
        }
        String before = event < 0 ? null : occurrences.putIfAbsent(new Named(event, on), spot.path());
        if (before != null) {
            faults.add(Fault.of(
                    "repeatedOccurrence",
                    spot.at("on").path(),
                    "value",
                    spot.at("on").shown(),
                    "first",
                    before));
        }
        list.add(new CaseFile.Occurrence(on, outcome));
    }

    private void window(int event, @Nullable PartialDate from, @Nullable PartialDate to, Spot spot) {
        if (from == null || to == null) {
            return;
        }
        if (dates.day(to).isBefore(dates.day(from))) {
            faults.add(Fault.of(
                    "windowReversed",
                    spot.at("to").path(),
                    "value",
                    spot.at("to").shown(),
                    "from",
                    spot.at("from").shown()));
        } else if (event >= 0) {
            windows.add(new Window(event, dates.day(from), dates.day(to), spot));
        }
    }

    /** Windows of one type of event may touch, not overlap. */
    private void overlaps() {
        windows.sort(
                Comparator.comparing(Window::event).thenComparing(Window::from).thenComparing(Window::to));
        for (int i = 1; i < windows.size(); i++) {
            Window before = windows.get(i - 1);
            Window next = windows.get(i);
            if (before.event == next.event && next.from.isBefore(before.to)) {
                faults.add(new Fault(
                        "windowsOverlap",
                        next.spot.at("from").path(),
                        Map.of(
                                "event", next.spot.at("event").shown(),
                                "value", next.spot.at("from").shown(),
                                "other", before.spot.path(),
                                "otherTo", before.spot.at("to").shown())));
            }
            if (before.event == next.event && before.to.isAfter(next.to)) {
                windows.set(i, new Window(next.event, before.from, before.to, before.spot));
            }
        }
    }

    boolean has(Named occurrence) {
        return occurrences.containsKey(occurrence);
    }

    /** The first date of the episode that an occurrence belongs to: one thing for a what-if. */
    LocalDate episode(Named occurrence) {
        double episodeDays = index.pack().events().get(occurrence.event()).episodeDays();
        List<LocalDate> days = occurrences.keySet().stream()
                .filter(o -> o.event() == occurrence.event())
                .map(o -> dates.day(o.on()))
                .sorted()
                .toList();
        LocalDate own = dates.day(occurrence.on());
        LocalDate first = own;
        LocalDate last = null;
        for (LocalDate day : days) {
            if (day.isAfter(own)) {
                break;
            }
            boolean goesOn = last != null && ChronoUnit.DAYS.between(last, day) <= episodeDays;
            first = goesOn ? first : day;
            last = day;
        }
        return first;
    }
}
