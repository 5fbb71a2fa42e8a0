package nearworld.oracle;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import nearworld.oracle.OraclePack.Event;
import nearworld.oracle.OraclePack.Treatment;
import tools.jackson.databind.JsonNode;

/** A named list of changes, ages instead of dates. */
final class WhatIf {
    /** A condition out of the score from an age on. */
    record Cure(int condition, double fromAge) {}

    record Therapy(Treatment treatment, double fromAge) {}

    /** From this age on, those whose level has a higher ratio move to this one. */
    record NewHabit(int behaviour, int level, double fromAge) {}

    /** A coming event; outcome -1 is unknown. */
    record Coming(Event event, double atAge, int outcome) {}

    final String name;
    int never;
    /** New level of each behaviour that always was another, -1 where unchanged. */
    final int[] always;

    int removed;
    /** Outcome given to an episode. */
    final Map<Integer, Integer> outcomes = new HashMap<>();
    /** Age from which the after-effect of a moved episode runs. */
    final Map<Integer, Double> moved = new HashMap<>();

    final List<Cure> cures = new ArrayList<>();
    final List<Therapy> therapies = new ArrayList<>();
    final List<NewHabit> newHabits = new ArrayList<>();
    final List<Coming> coming = new ArrayList<>();

    private final OracleCase file;
    private final OraclePack pack;

    WhatIf(JsonNode node, OracleCase file, OraclePack pack) {
        this.file = file;
        this.pack = pack;
        name = node.get("name").asString();
        always = new int[pack.behaviours.size()];
        Arrays.fill(always, -1);
        for (JsonNode change : node.get("changes")) {
            change.properties().forEach(e -> read(e.getKey(), e.getValue()));
        }
        coming.sort(Comparator.comparingDouble(Coming::atAge));
    }

    /** Nothing changed. */
    WhatIf(OracleCase file, OraclePack pack) {
        this.file = file;
        this.pack = pack;
        name = "";
        always = new int[pack.behaviours.size()];
        Arrays.fill(always, -1);
    }

    private void read(String kind, JsonNode change) {
        switch (kind) {
            case "remove" -> removed |= 1 << episode(change);
            case "move" -> moved.put(episode(change), file.ageOn(Values.date(change.get("to"))));
            case "outcome" -> {
                int episode = episode(change);
                Event event = file.episodes.get(episode).event();
                outcomes.put(episode, event.indexOf(change.get("to").asString()));
            }
            case "without" -> {
                int condition = pack.conditionIndex(change.get("condition").asString());
                if (Values.given(change, "from")) {
                    cures.add(new Cure(condition, from(change)));
                } else {
                    never |= 1 << condition;
                }
            }
            case "treat" ->
                therapies.add(
                        new Therapy(pack.treatments.get(change.get("treatment").asString()), from(change)));
            case "behaviour" -> habit(change);
            case "add" -> {
                Event event = pack.events.get(change.get("event").asString());
                int outcome = Values.given(change, "outcome")
                        ? event.indexOf(change.get("outcome").asString())
                        : -1;
                coming.add(new Coming(event, file.ageOn(Values.date(change.get("on"))), outcome));
            }
            default -> throw new IllegalArgumentException("no such change: " + kind);
        }
    }

    private void habit(JsonNode change) {
        for (String name : Values.names(change)) {
            if (!name.equals("from")) {
                int k = pack.behaviourIndex(name);
                int level = pack.behaviours.get(k).indexOf(change.get(name).asString());
                if (Values.given(change, "from")) {
                    newHabits.add(new NewHabit(k, level, from(change)));
                } else {
                    always[k] = level;
                }
            }
        }
    }

    private double from(JsonNode change) {
        return Values.given(change, "from") ? file.ageOn(Values.date(change.get("from"))) : file.age;
    }

    private int episode(JsonNode change) {
        LocalDate on = Values.date(change.get("on"));
        for (int e = 0; e < file.episodes.size(); e++) {
            OracleCase.Episode episode = file.episodes.get(e);
            if (episode.event().id().equals(change.get("event").asString())
                    && episode.dates().contains(on)) {
                return e;
            }
        }
        throw new IllegalArgumentException("no such occurrence: " + change);
    }
}
