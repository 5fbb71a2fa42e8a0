package nearworld.exchange.results;

import java.util.List;
import nearworld.engine.assessment.AssessmentResult;
import nearworld.engine.assessment.AssessmentResult.ConditionShift;
import nearworld.engine.assessment.AssessmentResult.Split;
import nearworld.engine.assessment.AssessmentResult.WorldResult;
import nearworld.engine.basics.Fault;
import tools.jackson.core.StreamWriteFeature;
import tools.jackson.core.json.JsonFactory;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;
import tools.jackson.databind.node.ArrayNode;
import tools.jackson.databind.node.JsonNodeFactory;
import tools.jackson.databind.node.ObjectNode;

/** Writes results ({@code result/1}). Monthly curves are no part of them. */
public final class ResultWriter {
    private static final JsonNodeFactory NODES = JsonNodeFactory.instance;

    /** Numbers with the fewest digits that tell them apart, on every Java version alike. */
    private static final JsonMapper MAPPER = JsonMapper.builder(JsonFactory.builder()
                    .enable(StreamWriteFeature.USE_FAST_DOUBLE_WRITER)
                    .build())
            .build();

    private ResultWriter() {}

    /** A result as a tree. */
    public static ObjectNode tree(String caseRef, AssessmentResult result, ResultBasis basis) {
        ObjectNode node = NODES.objectNode();
        node.put("format", "result/1").put("caseRef", caseRef).put("engine", basis.engine());
        node.putObject("table").put("name", basis.tableName()).put("sha256", basis.tableSha256());
        node.putObject("pack")
                .put("id", basis.packId())
                .put("version", basis.packVersion())
                .put("sha256", basis.packSha256());
        node.put("age", result.age()).put("logEvidence", result.logEvidence());
        ArrayNode conditions = node.putArray("conditions");
        for (ConditionShift c : result.conditions()) {
            conditions.addObject().put("id", c.id()).put("prior", c.prior()).put("posterior", c.posterior());
        }
        ArrayNode worlds = node.putArray("worlds");
        result.worlds().forEach(w -> world(worlds.addObject(), w));
        split(node.putObject("revealed"), result.revealed());
        split(node.putObject("caused"), result.caused());
        ArrayNode warnings = node.putArray("warnings");
        result.warnings().forEach(w -> warning(warnings.addObject(), w));
        return node;
    }

    /** A tree as one line of text. */
    public static String line(JsonNode tree) {
        return MAPPER.writeValueAsString(tree);
    }

    private static void world(ObjectNode node, WorldResult world) {
        node.put("id", world.id())
                .put("expectation", world.expectation())
                .put("curtate", world.curtate())
                .put("median", world.median());
        numbers(node.putArray("quartiles"), List.of(world.lowerQuartile(), world.upperQuartile()));
        numbers(node.putArray("deciles"), world.deciles());
        node.put("termYears", world.termYears())
                .put("mortalityRatio", world.mortalityRatio())
                .put("extraPerMille", world.extraPerMille());
        if (world.ratedAge() != null) {
            node.put("ratedAge", world.ratedAge());
        }
        numbers(node.putArray("survival"), world.survival());
        if (world.aliveToday() != null) {
            // A sum of probabilities may come to a bit of rounding above one.
            node.put("aliveToday", Math.min(1, world.aliveToday()));
        }
    }

    private static void numbers(ArrayNode array, List<Double> values) {
        values.forEach(v -> array.add(v.doubleValue()));
    }

    private static void split(ObjectNode node, Split split) {
        node.put("years", split.years()).put("ratio", split.ratio());
    }

    private static void warning(ObjectNode node, Fault warning) {
        node.put("code", warning.code()).put("path", warning.path());
        ObjectNode values = node.putObject("values");
        warning.values().forEach(values::put);
    }
}
