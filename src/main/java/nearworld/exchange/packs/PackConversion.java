package nearworld.exchange.packs;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import nearworld.engine.basics.AgeCurve.Scale;
import nearworld.engine.basics.Estimate;
import nearworld.engine.network.EvidencePack;
import org.jspecify.annotations.Nullable;
import tools.jackson.databind.JsonNode;

/** Turns a pack without fault into the engine's numbers. */
final class PackConversion {
    private static final int DEFAULT_FRAILTY_POINTS = 9;

    private final PackNames names;
    private final JsonNode root;
    private final Quantities quantities;

    PackConversion(PackNames names, JsonNode root) {
        this.names = names;
        this.root = root;
        this.quantities =
                new Quantities(root.path("pack").path("taper").path("pivot").doubleValue());
    }

    EvidencePack pack() {
        JsonNode head = root.path("pack");
        JsonNode taper = head.path("taper");
        JsonNode frailty = root.path("frailty");
        return new EvidencePack(
                head.path("id").asString(),
                head.path("version").intValue(),
                head.path("population").asString("unstated"),
                new EvidencePack.Taper(
                        taper.path("from").doubleValue(),
                        taper.path("pivot").doubleValue(),
                        taper.path("to").doubleValue()),
                new EvidencePack.Frailty(
                        Quantities.estimate(frailty.path("variance")),
                        frailty.path("points").intValue(DEFAULT_FRAILTY_POINTS)),
                each("behaviours", this::behaviour),
                each("conditions", this::condition),
                root.path("interactions").values().stream()
                        .map(this::interaction)
                        .toList(),
                each("events", new EventConversion(names, quantities)::event),
                each("findings", this::finding),
                each("sources", this::source),
                each("treatments", this::treatment));
    }

    private interface Item<T> {
        T of(String id, JsonNode node);
    }

    private <T> List<T> each(String section, Item<T> item) {
        return each(root.path(section), item);
    }

    private static <T> List<T> each(JsonNode section, Item<T> item) {
        List<T> list = new ArrayList<>();
        for (Map.Entry<String, JsonNode> e : section.properties()) {
            list.add(item.of(e.getKey(), e.getValue()));
        }
        return list;
    }

    private EvidencePack.Behaviour behaviour(String id, JsonNode node) {
        return new EvidencePack.Behaviour(id, each(node.path("levels"), this::level));
    }

    private EvidencePack.Level level(String id, JsonNode node) {
        return new EvidencePack.Level(
                id,
                quantities.bySex(Scale.LOG, node.path("share")),
                quantities.ratioOrOne(node.path("hazardRatio")),
                node.has("longRun") ? quantities.ratio(node.path("longRun")) : null,
                Quantities.estimateOrNull(node.path("halfLifeYears")));
    }

    private EvidencePack.Condition condition(String id, JsonNode node) {
        return new EvidencePack.Condition(
                id,
                quantities.bySex(Scale.LOGIT, node.path("prevalence")),
                quantities.ratioOrOne(node.path("hazardRatio")),
                Quantities.excess(node.path("excessPerMille")),
                node.has("diagnosedShare") ? Quantities.curve(Scale.LOGIT, node.path("diagnosedShare")) : null,
                each(node.path("causedBy"), this::link));
    }

    private EvidencePack.Link link(String name, JsonNode node) {
        Estimate probability = Quantities.estimate(node);
        if (names.isLevel(name)) {
            PackNames.LevelName level = names.level(name);
            return new EvidencePack.Link(level.behaviour(), level.level(), probability);
        }
        return new EvidencePack.Link(-1, names.condition(name), probability);
    }

    private EvidencePack.Interaction interaction(JsonNode node) {
        List<Integer> of = node.path("of").values().stream()
                .map(n -> names.condition(n.asString()))
                .toList();
        return new EvidencePack.Interaction(of, Quantities.estimate(node.path("ratio")));
    }

    private EvidencePack.Finding finding(String id, JsonNode node) {
        JsonNode of = node.path("of");
        List<String> conditions = of.isString()
                ? List.of(of.asString())
                : of.values().stream().map(JsonNode::asString).toList();
        List<EvidencePack.FindingLevel> levels = conditions.size() > 1
                ? firstAndRest(node.path("levels"), conditions)
                : each(node.path("levels"), (l, n) -> level(l, n, conditions));
        return new EvidencePack.Finding(
                id,
                conditions.stream().map(names::condition).toList(),
                levels,
                numberOrNull(node.path("cost")),
                numberOrNull(node.path("days")));
    }

    /** The two levels of a finding of several conditions: the second is what the first one leaves. */
    private static List<EvidencePack.FindingLevel> firstAndRest(JsonNode levels, List<String> conditions) {
        List<String> ids = new ArrayList<>();
        levels.properties().forEach(e -> ids.add(e.getKey()));
        EvidencePack.FindingLevel first = level(ids.get(0), levels.path(ids.get(0)), conditions);
        return List.of(
                first,
                new EvidencePack.FindingLevel(
                        ids.get(1),
                        first.present().stream().map(Quantities::complement).toList(),
                        Quantities.complement(first.absent())));
    }

    private static EvidencePack.FindingLevel level(String id, JsonNode node, List<String> conditions) {
        JsonNode present = node.path("present");
        return new EvidencePack.FindingLevel(
                id,
                conditions.stream()
                        .map(c -> Quantities.estimate(present.has(c) ? present.path(c) : present))
                        .toList(),
                Quantities.estimate(node.path("absent")));
    }

    private EvidencePack.Source source(String id, JsonNode node) {
        return new EvidencePack.Source(
                id,
                Quantities.estimate(node.path("sensitivity")),
                Quantities.estimate(node.path("specificity")),
                node.has("sees"),
                each(
                        node.path("byCondition"),
                        (c, n) -> new EvidencePack.SourceOverride(
                                names.condition(c),
                                Quantities.estimateOrNull(n.path("sensitivity")),
                                Quantities.estimateOrNull(n.path("specificity")))),
                numberOrNull(node.path("cost")),
                numberOrNull(node.path("days")));
    }

    private EvidencePack.Treatment treatment(String id, JsonNode node) {
        return new EvidencePack.Treatment(
                id,
                Quantities.estimate(node.path("hazardRatio")),
                node.has("onlyWith") ? names.condition(node.path("onlyWith").asString()) : -1);
    }

    private static @Nullable Double numberOrNull(JsonNode node) {
        return node.isNumber() ? Double.valueOf(node.doubleValue()) : null;
    }
}
