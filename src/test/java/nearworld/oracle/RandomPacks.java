package nearworld.oracle;

import java.util.ArrayList;
import java.util.List;
import tools.jackson.databind.json.JsonMapper;
import tools.jackson.databind.node.ArrayNode;
import tools.jackson.databind.node.ObjectNode;
import tools.jackson.dataformat.yaml.YAMLMapper;

/**
 * Random packs, tables and cases in the exchange format, valid by construction or thrown away: what the enumeration refuses
 * (links that explain more than a prevalence, excess above the table) is drawn again.
 */
public final class RandomPacks {
    private static final JsonMapper JSON = JsonMapper.builder().build();
    private static final YAMLMapper YAML = YAMLMapper.builder().build();
    private static final List<String> SEXES = List.of("male", "female");
    private static final int ATTEMPTS = 200;

    /** The three texts of one draw, and what the enumeration makes of them. */
    public record Draw(long seed, String table, String pack, String caseText, BruteForce.Assessment expected) {
        @Override
        public String toString() {
            return "seed " + seed + "\n--- pack\n" + pack + "\n--- case\n" + caseText;
        }
    }

    private final Dice dice;
    /** Now and then numbers far beyond what is published. */
    private final double wild;

    private final ObjectNode pack = JSON.createObjectNode();
    private final List<String> conditions = new ArrayList<>();
    private final List<String> levels = new ArrayList<>();

    private RandomPacks(Dice dice, int count) {
        this.dice = dice;
        wild = dice.chance(0.25) ? 2.5 : 1;
        ObjectNode head = pack.putObject("pack");
        head.put("id", "random").put("version", 1).put("title", "Random").put("population", "general");
        head.putObject("taper")
                .put("from", dice.whole(30, 50))
                .put("pivot", dice.whole(52, 70))
                .put("to", dice.whole(95, 115));
        pack.putObject("frailty")
                .put("variance", Dice.round(dice.ratio(0.05, 0.8 * wild)))
                .put("points", dice.whole(2, 7));
        for (int i = 0; i < count; i++) {
            conditions.add("condition" + (char) ('A' + i));
        }
        behaviours();
        ObjectNode nodes = pack.putObject("conditions");
        // Causes come after their effects as often as before: the order of the pack says nothing.
        List<String> order = new ArrayList<>(conditions);
        java.util.Collections.shuffle(order, new java.util.Random(dice.whole(0, 1_000_000)));
        conditions.forEach(nodes::putObject);
        for (int i = 0; i < count; i++) {
            condition((ObjectNode) nodes.get(order.get(i)), order.subList(0, i));
        }
        interactions();
        events();
        findings();
        sources();
        treatments();
    }

    /** The draw of a seed: a pack of two to {@code most} conditions with a table and a case. */
    public static Draw draw(long seed, int most) {
        Dice dice = new Dice(seed);
        for (int attempt = 0; attempt < ATTEMPTS; attempt++) {
            ObjectNode pack = new RandomPacks(dice, dice.whole(2, most)).pack;
            String packText = YAML.writeValueAsString(pack);
            ObjectNode file = new RandomCases(dice, pack).draw();
            String caseText = JSON.writerWithDefaultPrettyPrinter().writeValueAsString(file);
            boolean split = file.get("applicant").get("behaviours").has("smoking") && dice.chance(0.25);
            String table = split
                    ? RandomTables.split(
                            dice,
                            Values.names(pack.get("behaviours").get("smoking").get("levels")))
                    : RandomTables.draw(dice);
            try {
                BruteForce.Assessment expected = BruteForce.assess(table, packText, caseText);
                return new Draw(seed, table, packText, caseText, expected);
            } catch (IllegalArgumentException refused) {
                // Drawn again: the next attempt goes on with the same dice.
            }
        }
        throw new IllegalStateException("nothing valid in " + ATTEMPTS + " attempts, seed " + seed);
    }

    private void number(ObjectNode node, String field, double value) {
        double rounded = Dice.round(value);
        if (dice.chance(0.2)) {
            node.putObject(field)
                    .put("value", rounded)
                    .put("low", Dice.round(rounded * 0.9))
                    .put("high", Dice.round(rounded + 0.1 * Math.min(rounded, Math.abs(1 - rounded))));
        } else {
            node.put(field, rounded);
        }
    }

    private void behaviours() {
        ObjectNode node = pack.putObject("behaviours");
        int count = dice.whole(0, 2);
        for (int b = 0; b < count; b++) {
            String id = b == 0 ? "smoking" : "habit";
            ObjectNode of = node.putObject(id).putObject("levels");
            int size = dice.whole(2, 3);
            for (int l = 0; l < size; l++) {
                String level = "level" + l;
                levels.add(id + "." + level);
                ObjectNode one = of.putObject(level);
                ObjectNode share = one.putObject("share");
                for (String sex : SEXES) {
                    share.putObject(sex)
                            .put("40", Dice.round(dice.between(0.1, 0.5)))
                            .put("75", Dice.round(dice.between(0.1, 0.5)));
                }
                double ratio = Dice.round(l == 0 ? 1 : dice.ratio(0.9 / wild, 2.5 * wild));
                if (dice.chance(0.2)) {
                    one.putObject("hazardRatio").put("value", ratio).put("atAge", dice.whole(45, 80));
                } else {
                    one.put("hazardRatio", ratio);
                }
                if (dice.chance(0.6)) {
                    one.put("halfLifeYears", dice.whole(2, 12));
                    if (dice.chance(0.5)) {
                        one.put("longRun", Dice.round(dice.ratio(0.95, 1.6)));
                    }
                }
            }
        }
    }

    private void condition(ObjectNode node, List<String> before) {
        ObjectNode prevalence = node.putObject("prevalence");
        for (String sex : SEXES) {
            double middle = dice.ratio(0.01, 0.4);
            // Most illnesses grow with age; one in six does not.
            double first = dice.chance(0.84) ? dice.between(0.2, 0.9) : dice.between(1, 1.5);
            prevalence
                    .putObject(sex)
                    .put("40", Dice.round(middle * first))
                    .put("60", Dice.round(middle))
                    .put("80", Dice.round(middle * dice.between(0.7, 2)));
        }
        boolean excess = dice.chance(0.3);
        if (!excess || dice.chance(0.5)) {
            double ratio = Dice.round(dice.ratio(0.9 / wild, 3.5 * wild));
            if (dice.chance(0.3)) {
                node.putObject("hazardRatio").put("value", ratio).put("atAge", dice.whole(45, 80));
            } else {
                number(node, "hazardRatio", ratio);
            }
        }
        if (excess) {
            excess(node);
        }
        if (dice.chance(0.6)) {
            if (dice.chance(0.5)) {
                node.put("diagnosedShare", Dice.round(dice.between(0.3, 0.95)));
            } else {
                node.putObject("diagnosedShare")
                        .put("40", Dice.round(dice.between(0.3, 0.9)))
                        .put("80", Dice.round(dice.between(0.3, 0.95)));
            }
        }
        links(node, before);
    }

    private void excess(ObjectNode node) {
        if (dice.chance(0.4)) {
            number(node, "excessPerMille", dice.ratio(0.5, 10));
            return;
        }
        ObjectNode byYears = node.putObject("excessPerMille");
        byYears.put("unknown", Dice.round(dice.ratio(1, 20)));
        byYears.put(dice.chance(0.8) ? "0" : "0.5", Dice.round(dice.ratio(20, 100)));
        byYears.put(dice.chance(0.5) ? "2" : "3.5", Dice.round(dice.ratio(5, 40)));
        byYears.put("10", Dice.round(dice.ratio(1, 5)));
    }

    /** Links that together explain at most most of the prevalence, at the middle of its ages. */
    private void links(ObjectNode node, List<String> before) {
        double own = prevalence(node);
        ObjectNode causedBy = JSON.createObjectNode();
        double share = dice.between(0.2, 0.8) / 3;
        for (String cause : before) {
            if (causedBy.size() < 3 && dice.chance(0.5)) {
                double others = prevalence((ObjectNode) pack.get("conditions").get(cause));
                number(causedBy, cause, Math.min(0.7, share * own / others));
            }
        }
        for (String level : levels) {
            if (causedBy.size() < 4 && dice.chance(0.2)) {
                number(causedBy, level, Math.min(0.7, share * own / 0.35));
            }
        }
        if (!causedBy.isEmpty()) {
            node.set("causedBy", causedBy);
        }
    }

    private static double prevalence(ObjectNode condition) {
        return condition.get("prevalence").get("male").get("60").doubleValue();
    }

    private void interactions() {
        if (!dice.chance(0.6)) {
            return;
        }
        ArrayNode list = pack.putArray("interactions");
        for (int i = dice.whole(1, 2); i > 0; i--) {
            ObjectNode one = list.addObject();
            List<String> of = some(dice.chance(0.3) && conditions.size() > 2 ? 3 : 2);
            of.forEach(one.putArray("of")::add);
            number(one, "ratio", dice.ratio(0.7 / wild, 1.4 * wild));
        }
    }

    private List<String> some(int count) {
        List<String> left = new ArrayList<>(conditions);
        while (left.size() > count) {
            left.remove(dice.whole(0, left.size() - 1));
        }
        return left;
    }

    private void events() {
        ObjectNode node = pack.putObject("events");
        int count = dice.whole(1, 3);
        for (int e = 0; e < count; e++) {
            event(node.putObject("event" + (char) ('A' + e)));
        }
    }

    private void event(ObjectNode node) {
        if (dice.chance(0.8)) {
            number(node, "frailtyPower", dice.between(0, 1.3 * wild));
        }
        if (dice.chance(0.5)) {
            node.put("episodeDays", dice.whole(0, 40));
        }
        ObjectNode rate = node.putObject("ratePerYear");
        for (String sex : SEXES) {
            double young = dice.ratio(0.001, 0.01);
            rate.putObject(sex)
                    .put("40", Dice.round(young))
                    .put("60", Dice.round(young * dice.between(0.8, 4)))
                    .put("80", Dice.round(young * dice.between(2, 20)));
        }
        ObjectNode ratios = node.putObject("rateRatios");
        some(dice.whole(0, 3)).forEach(c -> number(ratios, c, dice.ratio(0.7 / wild, 5 * wild)));
        for (String level : levels) {
            if (dice.chance(0.3)) {
                number(ratios, level, dice.ratio(0.8, 2.5));
            }
        }
        if (dice.chance(0.5)) {
            ObjectNode brings = node.putObject("bringsOn");
            for (String c : some(dice.whole(1, 2))) {
                brings.put(c, dice.chance(0.3) ? 1.0 : Dice.round(dice.between(0.05, 0.6)));
            }
        }
        ObjectNode outcomes = node.putObject("outcomes");
        int mild = dice.whole(1, 3);
        for (int o = 0; o < mild; o++) {
            outcome(outcomes.putObject("outcome" + o), o == 0 ? 0.7 : 0.1, true);
        }
        if (dice.chance(0.8) || mild == 1) {
            ObjectNode died = outcomes.putObject("died");
            outcome(died, 0.05, false);
            died.put("fatal", true);
        }
    }

    private void outcome(ObjectNode node, double share, boolean survived) {
        node.putObject("share")
                .put("40", Dice.round(share * dice.between(0.5, 1)))
                .put("80", Dice.round(share * dice.between(0.5, 1.4)));
        if (dice.chance(0.6)) {
            ObjectNode odds = node.putObject("oddsRatios");
            some(dice.whole(1, 2)).forEach(c -> number(odds, c, dice.ratio(0.6 / wild, 3 * wild)));
        }
        if (survived && dice.chance(0.85)) {
            ObjectNode effect = node.putObject("afterEffect");
            boolean ratio = dice.chance(0.8);
            if (ratio) {
                number(effect, "hazardRatio", dice.ratio(1 / wild, 2.5 * wild));
            }
            if (!ratio || dice.chance(0.3)) {
                number(effect, "excessPerMille", dice.ratio(1, 20));
            }
            if (dice.chance(0.8)) {
                number(effect, "halfLifeYears", dice.between(0.4, 6));
            }
        }
    }

    private void findings() {
        ObjectNode node = pack.putObject("findings");
        for (int f = dice.whole(1, 3); f > 0; f--) {
            ObjectNode one = node.putObject("finding" + f);
            boolean several = dice.chance(0.3);
            if (several) {
                several(one, some(dice.whole(2, Math.min(3, conditions.size()))));
            } else {
                one.put("of", dice.of(conditions));
                boolean three = dice.chance(0.4);
                ObjectNode of = one.putObject("levels");
                double high = dice.thousandths(0.4, 0.7);
                double low = dice.thousandths(0.02, 0.2);
                of.putObject("high").put("present", high).put("absent", low);
                if (three) {
                    of.putObject("middle").put("present", 0.2).put("absent", 0.25);
                }
                of.putObject("normal")
                        .put("present", Dice.round(1 - high - (three ? 0.2 : 0)))
                        .put("absent", Dice.round(1 - low - (three ? 0.25 : 0)));
            }
        }
    }

    private void several(ObjectNode node, List<String> of) {
        of.forEach(node.putArray("of")::add);
        ObjectNode two = node.putObject("levels");
        ObjectNode yes = two.putObject("yes");
        ObjectNode no = two.putObject("no");
        ObjectNode yesPresent = yes.putObject("present");
        ObjectNode noPresent = no.putObject("present");
        for (String c : of) {
            double p = dice.thousandths(0.3, 0.9);
            yesPresent.put(c, p);
            noPresent.put(c, Dice.round(1 - p));
        }
        double absent = dice.thousandths(0.02, 0.25);
        yes.put("absent", absent);
        no.put("absent", Dice.round(1 - absent));
    }

    private void sources() {
        ObjectNode node = pack.putObject("sources");
        for (String id : List.of("applicant", "doctor", "record")) {
            ObjectNode one = node.putObject(id);
            number(one, "sensitivity", dice.between(0.6, 0.97));
            number(one, "specificity", dice.between(0.9, 0.998));
            if (dice.chance(id.equals("record") ? 0.2 : 0.7)) {
                one.put("sees", "diagnosed");
            }
            if (dice.chance(0.4)) {
                ObjectNode own = one.putObject("byCondition").putObject(dice.of(conditions));
                own.put("sensitivity", Dice.round(dice.between(0.4, 0.9)));
                if (dice.chance(0.4)) {
                    own.put("specificity", Dice.round(dice.between(0.85, 0.99)));
                }
            }
        }
    }

    private void treatments() {
        ObjectNode node = pack.putObject("treatments");
        number(node.putObject("treatmentA"), "hazardRatio", dice.ratio(0.6, 1.1));
        ObjectNode second = node.putObject("treatmentB");
        number(second, "hazardRatio", dice.ratio(0.6, 0.95));
        second.put("onlyWith", dice.of(conditions));
    }
}
