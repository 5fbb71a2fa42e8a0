package nearworld.oracle;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import nearworld.oracle.OraclePack.Event;
import org.jspecify.annotations.Nullable;
import tools.jackson.databind.JsonNode;

/** A case with its days turned into exact ages and its occurrences gathered into episodes. */
final class OracleCase {
    /** {@code day} is the age the statement looks at, NaN for today. */
    record Statement(int condition, boolean present, OraclePack.Source source, double day) {}

    record Result(OraclePack.Finding finding, int level, double day) {}

    /** {@code since} and {@code left} are NaN and -1 where the level was always held. */
    record Held(int level, double since, int left) {}

    record Window(Event event, double from, double to) {}

    /** Occurrences of one type that count as one: at the first age, with the worst outcome, fading from the last age. */
    record Episode(Event event, List<LocalDate> dates, double age, double lastAge, int outcome) {}

    private record Occurrence(LocalDate on, int outcome) {}

    final JsonNode root;
    final String sex;
    final LocalDate bornOn;
    final LocalDate assessedOn;
    final double age;
    final List<Statement> statements = new ArrayList<>();
    final List<Result> findings = new ArrayList<>();
    final @Nullable Held[] behaviours;
    final List<Window> windows = new ArrayList<>();
    /** In order of age; of one day, in the order of the pack. */
    final List<Episode> episodes = new ArrayList<>();
    /** Age at onset by statement, NaN where none gives one. */
    final double[] onset;

    OracleCase(JsonNode root, OraclePack pack) {
        if (Values.given(root, "death")) {
            throw new IllegalArgumentException("the dead are not enumerated here");
        }
        this.root = root;
        JsonNode applicant = root.get("applicant");
        sex = applicant.get("sex").asString();
        bornOn = Values.date(applicant.get("bornOn"));
        assessedOn = Values.date(root.get("assessedOn"));
        age = ageOn(assessedOn);
        behaviours = new Held[pack.behaviours.size()];
        applicant.path("behaviours").properties().forEach(e -> {
            int b = pack.behaviourIndex(e.getKey());
            behaviours[b] = held(e.getValue(), pack.behaviours.get(b));
        });
        onset = new double[pack.conditions.size()];
        java.util.Arrays.fill(onset, Double.NaN);
        root.path("statements").forEach(node -> statement(node, pack));
        root.path("findings").forEach(node -> {
            OraclePack.Finding finding = pack.findings.get(node.get("finding").asString());
            int level = finding.levels().indexOf(node.get("level").asString());
            findings.add(new Result(finding, level, day(node, "on")));
        });
        history(root.path("history"), pack);
    }

    double ageOn(LocalDate date) {
        return Values.years(bornOn, date);
    }

    private double day(JsonNode node, String field) {
        return Values.given(node, field) ? ageOn(Values.date(node.get(field))) : Double.NaN;
    }

    private Held held(JsonNode node, OraclePack.Behaviour behaviour) {
        int level = behaviour.indexOf(node.get("level").asString());
        int left = 0;
        for (int l = 1; l < behaviour.levels().size(); l++) {
            left = behaviour.levels().get(l).ratio()
                            > behaviour.levels().get(left).ratio()
                    ? l
                    : left;
        }
        if (Values.given(node, "left")) {
            left = behaviour.indexOf(node.get("left").asString());
        }
        return new Held(level, day(node, "since"), left);
    }

    private void statement(JsonNode node, OraclePack pack) {
        int condition = pack.conditionIndex(node.get("condition").asString());
        boolean present = node.get("present").asBoolean();
        double began = day(node, "onset");
        if (!Double.isNaN(began)) {
            onset[condition] = Double.isNaN(onset[condition]) ? began : Math.min(onset[condition], began);
        }
        double looksAt = Double.isNaN(began) ? day(node, "on") : began;
        statements.add(new Statement(
                condition, present, pack.sources.get(node.get("source").asString()), looksAt));
    }

    private void history(JsonNode history, OraclePack pack) {
        Map<String, List<Occurrence>> byEvent = new HashMap<>();
        for (JsonNode node : history) {
            Event event = pack.events.get(node.get("event").asString());
            if (Values.given(node, "from")) {
                windows.add(new Window(event, day(node, "from"), day(node, "to")));
            }
            for (JsonNode o : node.path("occurrences")) {
                byEvent.computeIfAbsent(event.id(), k -> new ArrayList<>())
                        .add(new Occurrence(
                                Values.date(o.get("on")),
                                event.indexOf(o.get("outcome").asString())));
            }
        }
        for (Event event : pack.events.values()) {
            gather(event, byEvent.getOrDefault(event.id(), List.of()));
        }
        episodes.sort(Comparator.comparingDouble(Episode::age));
    }

    private void gather(Event event, List<Occurrence> occurrences) {
        List<Occurrence> sorted = new ArrayList<>(occurrences);
        sorted.sort(Comparator.comparing(Occurrence::on));
        int i = 0;
        while (i < sorted.size()) {
            List<LocalDate> dates = new ArrayList<>();
            dates.add(sorted.get(i).on());
            int worst = sorted.get(i).outcome();
            for (i++; i < sorted.size(); i++) {
                LocalDate before = dates.get(dates.size() - 1);
                if (before.plusDays(event.episodeDays()).isBefore(sorted.get(i).on())) {
                    break;
                }
                dates.add(sorted.get(i).on());
                worst = Math.max(worst, sorted.get(i).outcome());
            }
            double last = ageOn(dates.get(dates.size() - 1));
            episodes.add(new Episode(event, dates, ageOn(dates.get(0)), last, worst));
        }
    }
}
