package nearworld.engine;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Random;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.stream.IntStream;
import java.util.stream.LongStream;
import nearworld.engine.assessment.AssessmentOutcome;
import nearworld.engine.assessment.AssessmentResult;
import nearworld.engine.assessment.AssessmentResult.WorldResult;
import nearworld.engine.assessment.Assessor;
import nearworld.engine.assessment.CaseFile;
import nearworld.engine.assessment.Refusal;
import nearworld.engine.mortality.MortalityTable;
import nearworld.engine.network.EvidencePack;
import nearworld.exchange.results.ResultBasis;
import nearworld.exchange.results.ResultWriter;
import nearworld.oracle.RandomPacks;
import nearworld.oracle.RandomPacks.Draw;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;
import tools.jackson.databind.node.ArrayNode;
import tools.jackson.databind.node.ObjectNode;

/** What must hold of any assessment, on random packs, tables and cases. */
class InvariancesTest {
    private static final JsonMapper JSON = JsonMapper.builder().build();
    /** Sums in another order differ by rounding only. */
    private static final double ROUNDING = 1e-11;

    static LongStream seeds() {
        return LongStream.rangeClosed(3001, 3030);
    }

    private static Draw draw(long seed) {
        return RandomPacks.draw(seed, 4);
    }

    private static AssessmentResult assess(Draw draw, JsonNode file) {
        return Inputs.result(draw.table(), draw.pack(), JSON.writeValueAsString(file));
    }

    @ParameterizedTest
    @MethodSource("seeds")
    void theOrderOfTheEvidenceDoesNotMatter(long seed) {
        Draw draw = draw(seed);
        ObjectNode file = (ObjectNode) JSON.readTree(draw.caseText());
        AssessmentResult expected = assess(draw, file);
        Random random = new Random(seed);
        for (String list : List.of("statements", "findings", "history")) {
            shuffle((ArrayNode) file.withArray(list), random);
        }
        file.get("history").forEach(h -> {
            if (h.has("occurrences")) {
                shuffle((ArrayNode) h.get("occurrences"), random);
            }
        });

        same(assess(draw, file), expected, draw);
    }

    private static void shuffle(ArrayNode list, Random random) {
        List<JsonNode> nodes = new ArrayList<>();
        list.forEach(nodes::add);
        Collections.shuffle(nodes, random);
        list.removeAll();
        nodes.forEach(list::add);
    }

    private static void same(AssessmentResult actual, AssessmentResult expected, Draw draw) {
        assertThat(actual.logEvidence()).as("%s", draw).isEqualTo(expected.logEvidence(), within(ROUNDING));
        for (int i = 0; i < expected.conditions().size(); i++) {
            assertThat(actual.conditions().get(i).posterior())
                    .as("%s, %s", expected.conditions().get(i).id(), draw)
                    .isEqualTo(expected.conditions().get(i).posterior(), within(ROUNDING));
        }
        for (int w = 0; w < expected.worlds().size(); w++) {
            sameCurve(actual.worlds().get(w), expected.worlds().get(w), draw);
        }
    }

    private static void sameCurve(WorldResult actual, WorldResult expected, Draw draw) {
        for (int k = 0; k < expected.monthly().size(); k++) {
            if (!(Math.abs(actual.monthly().get(k) - expected.monthly().get(k)) <= ROUNDING)) {
                assertThat(actual.monthly().get(k))
                        .as("%s, month %d, %s", expected.id(), k, draw)
                        .isEqualTo(expected.monthly().get(k), within(ROUNDING));
            }
        }
    }

    @ParameterizedTest
    @MethodSource("seeds")
    void survivalStartsAtOneAndNeverRises(long seed) {
        Draw draw = draw(seed);
        for (WorldResult world : assess(draw, JSON.readTree(draw.caseText())).worlds()) {
            List<Double> monthly = world.monthly();
            assertThat(monthly.get(0)).as("%s, %s", world.id(), draw).isEqualTo(1, within(1e-12));
            assertThat(monthly.get(monthly.size() - 1)).isZero();
            for (int k = 1; k < monthly.size(); k++) {
                assertThat(monthly.get(k))
                        .as("%s, month %d, %s", world.id(), k, draw)
                        .isBetween(0.0, monthly.get(k - 1));
            }
        }
    }

    /** What was so anyway changes nothing: the outcomes as recorded, the levels as recorded. */
    @ParameterizedTest
    @MethodSource("seeds")
    void aWhatIfWithoutEffectIsTheRecordedWorld(long seed) {
        Draw draw = draw(seed);
        ObjectNode file = (ObjectNode) JSON.readTree(draw.caseText());
        ArrayNode changes = onlyWhatIf(file);
        file.path("applicant")
                .path("behaviours")
                .properties()
                .forEach(b -> changes.addObject()
                        .putObject("behaviour")
                        .put(b.getKey(), b.getValue().get("level").asString()));
        boolean givenUp = file.path("applicant").path("behaviours").properties().stream()
                .anyMatch(b -> b.getValue().has("since"));
        for (JsonNode history : file.withArray("history")) {
            if (history.path("occurrences").size() == 1) {
                changes.addObject()
                        .putObject("outcome")
                        .put("event", history.get("event").asString())
                        .put("on", history.get("occurrences").get(0).get("on").asString())
                        .put(
                                "to",
                                history.get("occurrences").get(0).get("outcome").asString());
            }
        }
        if (changes.isEmpty() || givenUp || severalEntriesOfAnEvent(file)) {
            return;
        }

        AssessmentResult result = assess(draw, file);

        sameCurve(result.world("whatIf:other"), result.world("recorded"), draw);
    }

    /** Without all occurrences there is nothing that they caused. */
    @ParameterizedTest
    @MethodSource("seeds")
    void removingEverythingIsTheWorldWithoutEvents(long seed) {
        Draw draw = draw(seed);
        ObjectNode file = (ObjectNode) JSON.readTree(draw.caseText());
        ArrayNode changes = onlyWhatIf(file);
        List<JsonNode> removed = new ArrayList<>();
        for (JsonNode history : file.withArray("history")) {
            for (JsonNode occurrence : history.path("occurrences")) {
                ObjectNode one = JSON.createObjectNode()
                        .put("event", history.get("event").asString())
                        .put("on", occurrence.get("on").asString());
                if (!removed.contains(one)) {
                    removed.add(one);
                }
            }
        }
        if (removed.isEmpty() || episodesMerge(draw, file)) {
            return;
        }
        removed.forEach(r -> changes.addObject().set("remove", r));

        AssessmentResult result = assess(draw, file);

        sameCurve(result.world("whatIf:other"), result.world("eventsRemoved"), draw);
        assertThat(result.world("whatIf:other").aliveToday()).isEqualTo(1, within(1e-9));
    }

    private static ArrayNode onlyWhatIf(ObjectNode file) {
        return file.putArray("whatIfs").addObject().put("name", "other").putArray("changes");
    }

    private static boolean severalEntriesOfAnEvent(JsonNode file) {
        List<String> events = new ArrayList<>();
        file.get("history").forEach(h -> events.add(h.get("event").asString()));
        return events.stream().distinct().count() < events.size();
    }

    /** Whether the engine makes fewer episodes than there are occurrences: two changes of one episode are refused. */
    private static boolean episodesMerge(Draw draw, JsonNode file) {
        EvidencePack pack = Inputs.pack(draw.pack());
        for (int e = 0; e < pack.events().size(); e++) {
            List<java.time.LocalDate> dates = new ArrayList<>();
            for (JsonNode history : file.get("history")) {
                if (history.get("event").asString().equals(pack.events().get(e).id())) {
                    history.path("occurrences")
                            .forEach(o -> dates.add(
                                    java.time.LocalDate.parse(o.get("on").asString())));
                }
            }
            Collections.sort(dates);
            for (int k = 1; k < dates.size(); k++) {
                if (!dates.get(k - 1)
                        .plusDays((long) pack.events().get(e).episodeDays())
                        .isBefore(dates.get(k))) {
                    return true;
                }
            }
        }
        return false;
    }

    /** Section 10 of the model: the same bytes with any number of threads, however often. */
    @Test
    void threadsAndRepetitionGiveTheSameBytes() throws InterruptedException, ExecutionException {
        List<Draw> draws = LongStream.rangeClosed(3101, 3106)
                .mapToObj(InvariancesTest::draw)
                .toList();
        List<String> alone = draws.stream().map(InvariancesTest::bytes).toList();
        ExecutorService threads = Executors.newFixedThreadPool(3);
        try {
            List<Future<String>> together = IntStream.range(0, 3 * draws.size())
                    .mapToObj(i -> threads.submit(() -> bytes(draws.get(i % draws.size()))))
                    .toList();
            for (int i = 0; i < together.size(); i++) {
                assertThat(together.get(i).get())
                        .as("%s", draws.get(i % draws.size()))
                        .isEqualTo(alone.get(i % draws.size()));
            }
        } finally {
            threads.shutdownNow();
        }
    }

    private static String bytes(Draw draw) {
        MortalityTable table = Inputs.table(draw.table());
        EvidencePack pack = Inputs.pack(draw.pack());
        CaseFile file = Inputs.caseFile(pack, table, draw.caseText());
        AssessmentOutcome outcome = new Assessor(table, pack).assess(file);
        if (outcome instanceof Refusal refusal) {
            return refusal.toString();
        }
        ResultBasis basis = new ResultBasis(Assessor.ENGINE_VERSION, "table", "0", pack.id(), pack.version(), "0");
        return ResultWriter.line(ResultWriter.tree(file.caseRef(), (AssessmentResult) outcome, basis));
    }
}
