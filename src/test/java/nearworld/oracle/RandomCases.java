package nearworld.oracle;

import java.time.LocalDate;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;
import tools.jackson.databind.node.ArrayNode;
import tools.jackson.databind.node.ObjectNode;

/** Random cases of living persons for a pack: every kind of evidence and of what-if, alone and together. */
final class RandomCases {
    private record Occurrence(String event, LocalDate on, boolean first) {}

    private final Dice dice;
    private final ObjectNode pack;
    private final ObjectNode file = JsonMapper.builder().build().createObjectNode();
    private final LocalDate today;
    private final LocalDate bornOn;
    private final List<String> conditions;
    private final List<Occurrence> occurrences = new ArrayList<>();
    /** What a what-if has changed already: it may change each thing once. */
    private final Set<String> changed = new HashSet<>();

    RandomCases(Dice dice, ObjectNode pack) {
        this.dice = dice;
        this.pack = pack;
        today = LocalDate.of(2026, 1, 1).plusDays(dice.whole(0, 364));
        bornOn = today.minusDays(dice.whole(8_500, 35_500));
        conditions = Values.names(pack.get("conditions"));
    }

    ObjectNode draw() {
        file.put("format", "case/1").put("caseRef", "R-1").put("assessedOn", today.toString());
        ObjectNode applicant = file.putObject("applicant");
        applicant.put("sex", dice.chance(0.5) ? "male" : "female").put("bornOn", bornOn.toString());
        behaviours(applicant);
        history();
        statements();
        findings();
        cover();
        ArrayNode whatIfs = file.putArray("whatIfs");
        for (int w = dice.whole(2, 4); w > 0; w--) {
            whatIf(whatIfs.addObject().put("name", "world " + w));
        }
        return file;
    }

    /** A day of the life so far: now and then today, or the day of an occurrence. */
    private LocalDate past(int mostDays) {
        if (!occurrences.isEmpty() && dice.chance(0.15)) {
            return dice.of(occurrences).on();
        }
        return today.minusDays(dice.chance(0.05) ? 0 : dice.whole(0, Math.min(mostDays, 8_000)));
    }

    private void behaviours(ObjectNode applicant) {
        ObjectNode node = applicant.putObject("behaviours");
        pack.get("behaviours").properties().forEach(e -> {
            if (dice.chance(0.6)) {
                List<String> levels = Values.names(e.getValue().get("levels"));
                String level = dice.of(levels);
                ObjectNode held = node.putObject(e.getKey()).put("level", level);
                if (e.getValue().get("levels").get(level).has("halfLifeYears") && dice.chance(0.7)) {
                    held.put("since", past(6000).toString());
                    levels.remove(level);
                    if (dice.chance(0.4)) {
                        held.put("left", dice.of(levels));
                    }
                }
            }
        });
    }

    private void statements() {
        ArrayNode list = file.putArray("statements");
        for (int s = dice.whole(0, 5); s > 0; s--) {
            boolean present = dice.chance(0.5);
            ObjectNode one = list.addObject()
                    .put("condition", dice.of(conditions))
                    .put("present", present)
                    .put("source", dice.of(List.of("applicant", "doctor", "record")));
            if (present && dice.chance(0.4)) {
                one.put("onset", past(5000).toString());
            } else if (dice.chance(0.4)) {
                one.put("on", past(4000).toString());
            }
        }
    }

    private void findings() {
        ArrayNode list = file.putArray("findings");
        for (int f = dice.whole(0, 2); f > 0; f--) {
            String id = dice.of(Values.names(pack.get("findings")));
            String level = dice.of(Values.names(pack.get("findings").get(id).get("levels")));
            ObjectNode one = list.addObject().put("finding", id).put("level", level);
            if (dice.chance(0.4)) {
                one.put("on", past(3500).toString());
            }
        }
    }

    private void history() {
        ArrayNode list = file.putArray("history");
        for (String event : Values.names(pack.get("events"))) {
            if (dice.chance(0.25)) {
                continue;
            }
            ObjectNode first = list.addObject().put("event", event);
            boolean window = dice.chance(0.75);
            LocalDate from = today.minusDays(dice.whole(1000, 5500));
            LocalDate to = dice.chance(0.6) ? today : from.plusDays(dice.whole(300, 900));
            if (window) {
                first.put("from", from.toString()).put("to", to.toString());
            }
            occurrences(first.putArray("occurrences"), event);
            if (window && dice.chance(0.25)) {
                LocalDate earlier = from.minusDays(dice.whole(1, 500));
                ObjectNode second = list.addObject().put("event", event);
                second.put("from", earlier.minusDays(1500).toString()).put("to", earlier.toString());
                second.putArray("occurrences");
            }
        }
    }

    private void occurrences(ArrayNode list, String event) {
        int count = Math.min(dice.whole(0, 3), 4 - occurrences.size());
        LocalDate on = past(4500);
        for (int o = 0; o < count; o++) {
            // Now and then on the day of another event.
            if (o == 0 && !occurrences.isEmpty() && dice.chance(0.3)) {
                on = occurrences.get(0).on();
            }
            int apart = pack.get("events").get(event).path("episodeDays").asInt(0);
            LocalDate before = on;
            boolean known = occurrences.stream().anyMatch(x -> x.event().equals(event));
            if (o > 0) {
                on = on.plusDays(dice.chance(0.3) ? dice.whole(1, 40) : dice.whole(60, 1500));
                if (on.isAfter(today)) {
                    return;
                }
            }
            boolean first = !known || ChronoUnit.DAYS.between(before, on) > apart;
            occurrences.add(new Occurrence(event, on, first));
            list.addObject().put("on", on.toString()).put("outcome", dice.of(survived(event)));
        }
    }

    private List<String> survived(String event) {
        List<String> outcomes = Values.names(pack.get("events").get(event).get("outcomes"));
        outcomes.remove("died");
        return outcomes;
    }

    private void cover() {
        ObjectNode cover = file.putObject("cover");
        if (dice.chance(0.2)) {
            cover.put("kind", "wholeOfLife");
        } else {
            cover.put("kind", "term").put("years", dice.whole(5, 30));
        }
        cover.put("sumAssured", 100_000).put("currency", "EUR").put("interest", 0.03);
    }

    private void whatIf(ObjectNode whatIf) {
        ArrayNode changes = whatIf.putArray("changes");
        changed.clear();
        int wanted = dice.whole(1, 3);
        for (int attempt = 0; attempt < 50 && changes.size() < wanted; attempt++) {
            String kind = dice.of(List.of("remove", "move", "outcome", "without", "behaviour", "treat", "add"));
            ObjectNode change = JsonMapper.builder().build().createObjectNode();
            boolean possible = switch (kind) {
                case "remove", "move", "outcome" -> toOccurrence(kind, change.putObject(kind));
                case "without" -> without(change.putObject(kind));
                case "behaviour" -> behaviour(change.putObject(kind));
                case "treat" -> treat(change.putObject(kind));
                default -> add(change.putObject(kind));
            };
            if (possible) {
                changes.add(change);
            }
        }
    }

    private boolean toOccurrence(String kind, ObjectNode change) {
        List<Occurrence> named = occurrences.stream().filter(Occurrence::first).toList();
        if (named.isEmpty()) {
            return false;
        }
        Occurrence occurrence = dice.of(named);
        change.put("event", occurrence.event()).put("on", occurrence.on().toString());
        if (kind.equals("move")) {
            LocalDate to = occurrence.on().plusDays(dice.whole(-900, 900));
            change.put("to", (to.isAfter(today) ? today : to).toString());
        } else if (kind.equals("outcome")) {
            change.put("to", dice.of(survived(occurrence.event())));
        }
        return changed.add(occurrence.event() + occurrence.on());
    }

    private void maybeFrom(ObjectNode change, double p) {
        if (dice.chance(p)) {
            change.put("from", coming(12).toString());
        }
    }

    private LocalDate coming(int years) {
        return today.plusDays(dice.chance(0.15) ? 0 : dice.whole(1, years * 365));
    }

    private boolean without(ObjectNode change) {
        String condition = dice.of(conditions);
        change.put("condition", condition);
        maybeFrom(change, 0.4);
        return changed.add(condition);
    }

    private boolean behaviour(ObjectNode change) {
        List<String> ids = Values.names(pack.get("behaviours"));
        if (ids.isEmpty()) {
            return false;
        }
        String id = dice.of(ids);
        List<String> levels = Values.names(pack.get("behaviours").get(id).get("levels"));
        JsonNode held = file.get("applicant").get("behaviours").path(id).path("level");
        levels.remove(held.asString(""));
        change.put(id, dice.of(levels));
        maybeFrom(change, 0.5);
        return changed.add(id);
    }

    private boolean treat(ObjectNode change) {
        String treatment = dice.chance(0.5) ? "treatmentA" : "treatmentB";
        change.put("treatment", treatment);
        maybeFrom(change, 0.5);
        return changed.add(treatment);
    }

    private boolean add(ObjectNode change) {
        String event = dice.of(Values.names(pack.get("events")));
        LocalDate on = coming(15);
        // Tables run to 100 at least.
        if (on.isAfter(bornOn.plusYears(99))) {
            return false;
        }
        int apart = pack.get("events").get(event).path("episodeDays").asInt(0);
        boolean merges = occurrences.stream()
                .anyMatch(o -> o.event().equals(event) && ChronoUnit.DAYS.between(o.on(), on) <= apart);
        change.put("event", event).put("on", on.toString());
        if (dice.chance(0.4)) {
            change.put("outcome", dice.of(survived(event)));
        }
        return !merges && changed.add("add");
    }
}
