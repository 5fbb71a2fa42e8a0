package nearworld.oracle;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import nearworld.oracle.Cohort.Carried;
import nearworld.oracle.OracleCase.Episode;
import org.jspecify.annotations.Nullable;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;
import tools.jackson.dataformat.yaml.YAMLMapper;

/** A case assessed by enumeration, from the texts of table, pack and case to the numbers of the result. */
public final class BruteForce {
    /** A world's numbers; {@code survival} holds whole years, {@code aliveToday} is null outside what-ifs. */
    public record World(
            String id,
            double expectation,
            double curtate,
            double median,
            double firstQuartile,
            double thirdQuartile,
            double mortalityRatio,
            double extraPerMille,
            List<Double> survival,
            List<Double> monthly,
            @Nullable Double aliveToday) {}

    /** A condition's probability before and after the evidence. */
    public record Belief(String id, double prior, double posterior) {}

    /** What brute force says of a case. */
    public record Assessment(double age, double logEvidence, List<Belief> conditions, Map<String, World> worlds) {}

    private static final JsonMapper JSON = JsonMapper.builder().build();
    private static final YAMLMapper YAML = YAMLMapper.builder().build();

    private final Person person;
    private final Population population;
    private final OracleCase file;
    private final Evidence evidence;
    private final double[] tableSurvival;
    private final Map<String, World> worlds = new LinkedHashMap<>();

    private BruteForce(String tableCsv, String packYaml, String caseJson) {
        JsonNode root = JSON.readTree(caseJson);
        String sex = root.get("applicant").get("sex").asString();
        OraclePack pack = new OraclePack(YAML.readTree(packYaml), sex);
        file = new OracleCase(root, pack);
        JsonNode behaviours = root.get("applicant").path("behaviours");
        String smoking = behaviours.path("smoking").path("level").asString("");
        population = new Population(pack, OracleTable.read(tableCsv, sex, smoking), file.age);
        person = new Person(file, population);
        evidence = new Evidence(person);
        tableSurvival = new double[population.months + 1];
        for (int k = 0; k <= population.months; k++) {
            double end = Math.min(population.table.end(), file.age + k / 12.0);
            tableSurvival[k] = population.table.survival(file.age, end);
        }
        atTheEnd(tableSurvival);
    }

    /** Assesses a case of a living person; throws {@link IllegalArgumentException} where the pack does not fit. */
    public static Assessment assess(String tableCsv, String packYaml, String caseJson) {
        return new BruteForce(tableCsv, packYaml, caseJson).assess();
    }

    /** Nobody is counted beyond the table's end, which falls within the last month. */
    private static double[] atTheEnd(double[] survival) {
        survival[survival.length - 1] = 0;
        return survival;
    }

    private Assessment assess() {
        WhatIf nothing = new WhatIf(file, population.pack);
        add("table", tableSurvival, tableExpectation(), null);
        add("recorded", new Projection(recorded(evidence.posterior), person, nothing, true));
        add("eventsRemoved", new Projection(eventsRemoved(), person, nothing, true));
        add("unlearned", new Projection(recorded(priorWithSwitches()), person, nothing, false));
        for (JsonNode node : file.root.path("whatIfs")) {
            WhatIf whatIf = new WhatIf(node, file, population.pack);
            Counterfactual then = new Counterfactual(evidence, person, whatIf);
            Projection projection = new Projection(then.cohorts(), person, whatIf, true);
            add("whatIf:" + whatIf.name, atTheEnd(projection.survival), projection.expectation, then.aliveToday());
        }
        List<Belief> conditions = new ArrayList<>();
        double[] posterior = evidence.conditions();
        for (int i = 0; i < posterior.length; i++) {
            double prior = population.pack.conditions.get(i).prevalence().value(file.age);
            conditions.add(new Belief(population.pack.conditionIds.get(i), prior, posterior[i]));
        }
        return new Assessment(file.age, evidence.logEvidence, conditions, worlds);
    }

    /** The table's own hazard is constant within a month of the grid; in a month that nobody survives deaths are uniform. */
    private double tableExpectation() {
        double sum = 0;
        for (int k = 0; k < population.months; k++) {
            double start = file.age + k / 12.0;
            double dying = -Math.log(population.table.survival(start, start + population.monthLength[k]));
            double lived = Double.isInfinite(dying) ? 0.5 : dying < 1e-9 ? 1 - dying / 2 : -Math.expm1(-dying) / dying;
            sum += tableSurvival[k] * lived * population.monthLength[k];
        }
        return sum;
    }

    private List<Cohort> recorded(double[][] weights) {
        List<Carried> effects = new ArrayList<>();
        for (Episode episode : file.episodes) {
            effects.add(new Carried(
                    episode.event().outcomes().get(episode.outcome()).afterEffect(), episode.lastAge()));
        }
        double[] now = new double[population.prior.length];
        int block = population.bins * population.levels.length;
        for (int s = 0; s < weights.length; s++) {
            int broughtOn = person.broughtOn(s, person.allEpisodes(), file.age, true);
            for (int m = 0; m < now.length; m++) {
                now[(m / block | broughtOn) * block + m % block] += weights[s][m];
            }
        }
        return List.of(new Cohort(effects, now));
    }

    private List<Cohort> eventsRemoved() {
        double[] now = new double[population.prior.length];
        for (double[] row : evidence.posterior) {
            for (int m = 0; m < now.length; m++) {
                now[m] += row[m];
            }
        }
        return List.of(new Cohort(List.of(), now));
    }

    private double[][] priorWithSwitches() {
        double[][] result = new double[person.switchStates()][];
        for (int s = 0; s < result.length; s++) {
            result[s] = population.prior.clone();
            for (int m = 0; m < result[s].length; m++) {
                result[s][m] *= person.switchProbability(s);
            }
        }
        return result;
    }

    private void add(String id, Projection projection) {
        add(id, atTheEnd(projection.survival), projection.expectation, null);
    }

    private void add(String id, double[] curve, double expectation, @Nullable Double aliveToday) {
        List<Double> whole = new ArrayList<>();
        double curtate = 0;
        for (int k = 12; k < curve.length; k += 12) {
            whole.add(curve[k]);
            curtate += curve[k];
        }
        int n = term();
        double log = n == 0 ? Double.NaN : Math.log(curve[12 * n]);
        double tableLog = n == 0 ? Double.NaN : Math.log(tableSurvival[12 * n]);
        worlds.put(
                id,
                new World(
                        id,
                        expectation,
                        curtate,
                        quantile(curve, 0.5),
                        quantile(curve, 0.75),
                        quantile(curve, 0.25),
                        log / tableLog,
                        1000 * (tableLog - log) / n,
                        whole,
                        java.util.Arrays.stream(curve).boxed().toList(),
                        aliveToday));
    }

    /** The largest whole number of years within the term at which the table has at least one in a hundred left. */
    private int term() {
        JsonNode cover = file.root.path("cover");
        int years = Values.given(cover, "years") ? cover.get("years").asInt() : 1000;
        int n = Math.min(years, population.months / 12);
        while (n > 0 && tableSurvival[12 * n] < 0.01) {
            n--;
        }
        return n;
    }

    /** Time in years at which a curve that is linear within a month falls to a level. */
    private double quantile(double[] curve, double level) {
        for (int k = 0; k + 1 < curve.length; k++) {
            if (curve[k + 1] <= level) {
                double part = (curve[k] - level) / (curve[k] - curve[k + 1]);
                return k / 12.0 + part * population.monthLength[k];
            }
        }
        return Double.NaN;
    }
}
