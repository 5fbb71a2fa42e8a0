package nearworld.oracle;

import java.util.List;
import java.util.Locale;

/** Tables of Gompertz and Makeham's shape in every age basis and law within the year, closed with q = 1 or not. */
final class RandomTables {
    private RandomTables() {}

    static String draw(Dice dice) {
        return draw(dice, "");
    }

    /** A table split by smoking, the first level against the others. */
    static String split(Dice dice, List<String> levels) {
        String others = String.join(",", levels.subList(1, levels.size()));
        return draw(dice, "#smokingLevels: nonsmoker=" + levels.get(0) + "; smoker=" + others + "\n");
    }

    private static String draw(Dice dice, String smoking) {
        int last = dice.whole(100, 119);
        boolean closed = dice.chance(0.6);
        StringBuilder csv = new StringBuilder("#name: Random\n").append(smoking);
        csv.append("#ageBasis: ")
                .append(dice.of(List.of("exact", "nearest", "last")))
                .append('\n');
        String within = dice.of(List.of("constantForce", "uniform", "balducci", "default"));
        if (!within.equals("default")) {
            csv.append("#withinYear: ").append(within).append('\n');
        }
        boolean split = !smoking.isEmpty();
        csv.append(split ? "sex,age,smoking,qx\n" : "sex,age,qx\n");
        for (String sex : List.of("male", "female")) {
            for (String who : split ? List.of("nonsmoker", "smoker") : List.of("")) {
                double accident = dice.ratio(1e-4, 8e-4);
                double level = dice.ratio(1.5e-5, 6e-5);
                double growth = dice.between(0.085, 0.105);
                for (int age = 0; age <= last; age++) {
                    double force = accident + level * Math.exp(growth * (age + 0.5));
                    double q = age == last && closed ? 1 : -Math.expm1(-force);
                    csv.append(String.format(Locale.ROOT, "%s,%d,%s%s%.9f%n", sex, age, who, split ? "," : "", q));
                }
            }
        }
        return csv.toString();
    }
}
