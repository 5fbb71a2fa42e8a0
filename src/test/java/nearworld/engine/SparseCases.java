package nearworld.engine;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Random;
import nearworld.engine.network.EvidencePack;

/**
 * Packs of many conditions with few links, two behaviours and some event types, and a case with a full history: larger than
 * an enumeration can check, of the size that the engine is made for. All numbers are drawn, none is evidence.
 */
public final class SparseCases {
    private static final int TYPES = 4;

    private SparseCases() {}

    /** The engine's form of {@link #text}. */
    public static EvidencePack pack(long seed, int conditions, int eventTypes) {
        return Inputs.pack(text(seed, conditions, eventTypes));
    }

    /** A pack as YAML: each condition has one to three earlier ones as causes, each event four to six rate ratios. */
    public static String text(long seed, int conditions, int eventTypes) {
        Random random = new Random(seed);
        StringBuilder yaml = new StringBuilder("""
                pack: {id: sparse, version: 1, title: Sparse, population: general, taper: {from: 40, pivot: 65, to: 105}}
                frailty: {variance: 0.3, points: 9}
                behaviours:
                  smoking:
                    levels:
                      never: {share: {male: {40: 0.5}, female: {40: 0.6}}, hazardRatio: 1}
                      former: {share: {male: {40: 0.3}, female: {40: 0.25}}, hazardRatio: 1.3, halfLifeYears: 8}
                      current: {share: {male: {40: 0.2}, female: {40: 0.15}}, hazardRatio: 2.2}
                  bodyMass:
                    levels:
                      normal: {share: {male: {40: 0.4}, female: {40: 0.45}}, hazardRatio: 1}
                      high: {share: {male: {40: 0.4}, female: {40: 0.35}}, hazardRatio: 1.1}
                      veryHigh: {share: {male: {40: 0.2}, female: {40: 0.2}}, hazardRatio: 1.4}
                conditions:
                """);
        for (int i = 0; i < conditions; i++) {
            double prevalence = between(random, 0.03, 0.25);
            List<String> causes = new ArrayList<>();
            int most = i == 0 ? 0 : 1 + random.nextInt(Math.min(3, i));
            for (int k = 0; k < most; k++) {
                // Causes lie close before: sparse, as networks of illnesses are.
                int cause = i - 1 - k * 2 - random.nextInt(2);
                if (cause >= 0 && causes.stream().noneMatch(c -> c.startsWith("c" + cause + ":"))) {
                    causes.add(number("c" + cause + ": %.4f", prevalence * between(random, 0.4, 1)));
                }
            }
            if (i % 4 == 0) {
                causes.add(number("smoking.current: %.4f", prevalence * 0.2));
            }
            yaml.append(number("  c" + i + ": {prevalence: {male: {40: %.4f", prevalence / 2))
                    .append(number(", 70: %.4f}", prevalence))
                    .append(number(", female: {40: %.4f}}", prevalence))
                    .append(number(", hazardRatio: %.3f", between(random, 1.1, 2.5)))
                    .append(", diagnosedShare: 0.7, causedBy: {")
                    .append(String.join(", ", causes))
                    .append("}}\n");
        }
        yaml.append("events:\n");
        for (int e = 0; e < eventTypes; e++) {
            event(yaml, random, e, conditions);
        }
        return yaml.append("""
                findings:
                  test: {of: c3, levels: {high: {present: 0.8, absent: 0.1}, normal: {present: 0.2, absent: 0.9}}}
                sources:
                  applicant: {sensitivity: 0.85, specificity: 0.98, sees: diagnosed}
                  doctor: {sensitivity: 0.96, specificity: 0.995}
                treatments:
                  pill: {hazardRatio: 0.9, onlyWith: c1}
                """).toString();
    }

    private static void event(StringBuilder yaml, Random random, int number, int conditions) {
        List<String> ratios = new ArrayList<>();
        int count = 4 + random.nextInt(3);
        int first = random.nextInt(conditions);
        for (int k = 0; k < count; k++) {
            ratios.add(number("c" + (first + 2 * k) % conditions + ": %.3f", between(random, 1.3, 4)));
        }
        yaml.append("  e")
                .append(number)
                .append(": {frailtyPower: 0.8, episodeDays: 14, ratePerYear: {male: {40: 0.01, 80: 0.05},")
                .append(" female: {40: 0.01, 80: 0.05}}, rateRatios: {")
                .append(String.join(", ", ratios))
                .append("},\n    ")
                .append(number == 0 ? "bringsOn: {c" + (first + 1) % conditions + ": 0.2}, " : "")
                .append("outcomes: {ward: {share: {40: 0.9}, afterEffect: {hazardRatio: 1.5, halfLifeYears: 1}},")
                .append(" intensive: {share: {40: 0.06}, oddsRatios: {c")
                .append(first)
                .append(
                        ": 1.5}, afterEffect: {hazardRatio: 2, halfLifeYears: 2}}, died: {share: {40: 0.04}, oddsRatios: {c")
                .append(first)
                .append(": 1.7}, fatal: true}}}\n");
    }

    private static double between(Random random, double low, double high) {
        return low + (high - low) * random.nextDouble();
    }

    private static String number(String format, double value) {
        return String.format(Locale.ROOT, format, value);
    }

    /** Six occurrences in four event types, both behaviours known, four statements, three what-ifs. */
    public static String caseText() {
        String[] dates = {"2018-03-04", "2019-09-10", "2021-01-20", "2022-06-15", "2023-11-02", "2025-04-30"};
        StringBuilder history = new StringBuilder();
        for (int e = 0; e < TYPES; e++) {
            StringBuilder occurrences = new StringBuilder();
            for (int j = e; j < dates.length; j += TYPES) {
                occurrences
                        .append(j == e ? "" : ", ")
                        .append("{\"on\": \"")
                        .append(dates[j])
                        .append("\", \"outcome\": \"")
                        .append(j == 2 ? "intensive" : "ward")
                        .append("\"}");
            }
            history.append(e == 0 ? "" : ", ")
                    .append("{\"event\": \"e")
                    .append(e)
                    .append("\", \"from\": \"2016-12-01\", \"to\": \"2026-12-01\", \"occurrences\": [")
                    .append(occurrences)
                    .append("]}");
        }
        return """
                {"format": "case/1", "caseRef": "L-1", "assessedOn": "2026-12-01",
                 "applicant": {"sex": "male", "bornOn": "1966-05-03",
                               "behaviours": {"smoking": {"level": "former", "since": "2015-06-01"},
                                              "bodyMass": {"level": "high"}}},
                 "statements": [{"condition": "c1", "present": true, "source": "doctor"},
                                {"condition": "c2", "present": false, "source": "applicant"},
                                {"condition": "c5", "present": false, "source": "applicant"},
                                {"condition": "c8", "present": false, "source": "doctor"}],
                 "findings": [{"finding": "test", "level": "normal"}],
                 "history": [%s],
                 "cover": {"kind": "term", "years": 20, "sumAssured": 100000, "currency": "EUR"},
                 "whatIfs": [
                  {"name": "Not the first", "changes": [{"remove": {"event": "e0", "on": "2018-03-04"}}]},
                  {"name": "Never c4", "changes": [{"without": {"condition": "c4"}}]},
                  {"name": "Treated, and again", "changes": [{"treat": {"treatment": "pill"}},
                   {"add": {"event": "e1", "on": "2027-06-01"}}]}]}
                """.formatted(history);
    }
}
