package nearworld.exchange.packs;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import nearworld.engine.basics.AgeCurve.Scale;
import nearworld.engine.basics.Estimate;
import nearworld.engine.network.EvidencePack;
import org.jspecify.annotations.Nullable;
import tools.jackson.databind.JsonNode;

/** Turns the events of a pack without fault into the engine's. */
final class EventConversion {
    private static final Estimate NONE = Estimate.of(0);

    private final PackNames names;
    private final Quantities quantities;

    EventConversion(PackNames names, Quantities quantities) {
        this.names = names;
        this.quantities = quantities;
    }

    EvidencePack.EventType event(String id, JsonNode node) {
        List<EvidencePack.ConditionFactor> conditionRates = new ArrayList<>();
        List<EvidencePack.LevelFactor> levelRates = new ArrayList<>();
        for (Map.Entry<String, JsonNode> e : node.path("rateRatios").properties()) {
            Estimate ratio = Quantities.estimate(e.getValue());
            if (names.isLevel(e.getKey())) {
                PackNames.LevelName level = names.level(e.getKey());
                levelRates.add(new EvidencePack.LevelFactor(level.behaviour(), level.level(), ratio));
            } else {
                conditionRates.add(new EvidencePack.ConditionFactor(names.condition(e.getKey()), ratio));
            }
        }
        List<EvidencePack.Outcome> outcomes = new ArrayList<>();
        node.path("outcomes").properties().forEach(e -> outcomes.add(outcome(e.getKey(), e.getValue())));
        return new EvidencePack.EventType(
                id,
                node.has("frailtyPower") ? Quantities.estimate(node.path("frailtyPower")) : NONE,
                node.path("episodeDays").doubleValue(0),
                quantities.bySex(Scale.LOG, node.path("ratePerYear")),
                conditionRates,
                levelRates,
                outcomes,
                factors(node.path("bringsOn")));
    }

    private EvidencePack.Outcome outcome(String id, JsonNode node) {
        return new EvidencePack.Outcome(
                id,
                quantities.bySex(Scale.LOG, node.path("share")),
                factors(node.path("oddsRatios")),
                afterEffect(node.path("afterEffect")),
                node.path("fatal").booleanValue(false));
    }

    private List<EvidencePack.ConditionFactor> factors(JsonNode node) {
        List<EvidencePack.ConditionFactor> factors = new ArrayList<>();
        node.properties()
                .forEach(e -> factors.add(new EvidencePack.ConditionFactor(
                        names.condition(e.getKey()), Quantities.estimate(e.getValue()))));
        return factors;
    }

    private static EvidencePack.@Nullable AfterEffect afterEffect(JsonNode node) {
        if (!node.isObject()) {
            return null;
        }
        return new EvidencePack.AfterEffect(
                Quantities.estimateOrNull(node.path("hazardRatio")),
                Quantities.estimateOrNull(node.path("excessPerMille")),
                Quantities.estimateOrNull(node.path("halfLifeYears")));
    }
}
