package nearworld.engine.assessment;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import nearworld.engine.assessment.AssessmentResult.ConditionShift;
import nearworld.engine.assessment.AssessmentResult.Split;
import nearworld.engine.assessment.AssessmentResult.WorldResult;
import nearworld.engine.basics.Fault;
import nearworld.engine.basics.PartialDate;
import nearworld.engine.counterfactual.WhatIfPlan;
import nearworld.engine.counterfactual.WorldCurve;
import nearworld.engine.counterfactual.Worlds;
import nearworld.engine.inference.Evidence;
import nearworld.engine.inference.Person;
import nearworld.engine.inference.PopulationPrior;
import nearworld.engine.inference.Posterior;
import nearworld.engine.mortality.LifeTable;
import nearworld.engine.mortality.MortalityTable;
import nearworld.engine.network.EvidencePack;
import org.jspecify.annotations.Nullable;

/** The engine's front door: a case, a table and an evidence pack in, remaining lifetimes out. Stateless. */
public final class Assessor {
    /** Changes whenever a number that the engine computes may change. */
    public static final String ENGINE_VERSION = "1.0.0";

    private static final String SMOKING = "smoking";
    /** Beyond these, a what-if that undoes something would take minutes: each occurrence doubles the courses of the past. */
    private static final int MOST_OCCURRENCES_UNDONE = 12;

    private static final int MOST_BRINGING_UNDONE = 8;

    private final MortalityTable table;
    private final EvidencePack pack;

    public Assessor(MortalityTable table, EvidencePack pack) {
        this.table = table;
        this.pack = pack;
    }

    /** Assesses one case: a result, or a refusal that says what stands in the way. */
    public AssessmentOutcome assess(CaseFile file) {
        if (file.death() != null) {
            return new Refusal(List.of(Fault.of("notSupported", "$.death")));
        }
        CaseResolver resolver = new CaseResolver(file, pack, Map.of());
        Prepared prepared = prepare(file, resolver.evidence());
        if (prepared.person() == null) {
            return new Refusal(prepared.faults());
        }
        Person person = prepared.person();
        Posterior posterior = new Posterior(person);
        if (!posterior.isPossible()) {
            return new Refusal(List.of(Fault.of("impossibleEvidence", "$")));
        }
        List<WhatIfPlan> plans = new ArrayList<>();
        for (int w = 0; w < file.whatIfs().size(); w++) {
            plans.add(resolver.plan(w));
        }
        List<Fault> late = lateEvents(plans, person);
        late.addAll(tooIntricate(plans, person));
        if (!late.isEmpty()) {
            return new Refusal(late);
        }
        return result(file, resolver, person, posterior, plans);
    }

    private record Prepared(@Nullable Person person, List<Fault> faults) {}

    private Prepared prepare(CaseFile file, Evidence evidence) {
        int smoking = table.isSmokingDistinct() ? pack.behaviourIndex(SMOKING) : -1;
        int level = smoking < 0 ? -1 : evidence.levels().get(smoking);
        if (smoking >= 0 && level < 0) {
            return refused(Fault.of("smokingUnknown", "$.applicant.behaviours"));
        }
        String levelId = level < 0
                ? null
                : pack.behaviours().get(smoking).levels().get(level).id();
        MortalityTable.Column column = table.column(file.sex(), levelId);
        if (column == null) {
            return refused(Fault.of(
                    "sexNotInTable", "$.applicant.sex", "sex", file.sex().name().toLowerCase(Locale.ROOT)));
        }
        LifeTable life = table.life(column);
        double age = evidence.age();
        if (!(age >= life.firstAge() && age <= life.omega() - 1)) {
            return refused(new Fault(
                    "ageOutsideTable",
                    "$.applicant.bornOn",
                    Map.of(
                            "age", String.valueOf(age),
                            "lowest", String.valueOf(life.firstAge()),
                            "highest", String.valueOf(life.omega() - 1))));
        }
        for (Evidence.Occurrence o : evidence.occurrences()) {
            if (evidence.age(o.day()) < life.firstAge()) {
                return refused(Fault.of(
                        "occurrenceBeforeTable",
                        "$.history",
                        "date",
                        LocalDate.ofEpochDay(o.day()),
                        "lowest",
                        life.firstAge()));
            }
        }
        PopulationPrior prior = new PopulationPrior(pack, file.sex(), age);
        if (!prior.faults().isEmpty()) {
            return new Prepared(null, prior.faults());
        }
        List<Integer> levels = smoking < 0
                ? List.of()
                : column.smokingLevels().stream()
                        .map(l -> pack.behaviours().get(smoking).levelIndex(l))
                        .filter(l -> l >= 0)
                        .toList();
        Person person = new Person(prior, evidence, life, smoking, levels);
        return person.faults().isEmpty() ? new Prepared(person, List.of()) : new Prepared(null, person.faults());
    }

    private static Prepared refused(Fault fault) {
        return new Prepared(null, List.of(fault));
    }

    private static List<Fault> lateEvents(List<WhatIfPlan> plans, Person person) {
        List<Fault> faults = new ArrayList<>();
        double end = person.baseline().table().omega() - person.baseline().age();
        for (int w = 0; w < plans.size(); w++) {
            for (WhatIfPlan.Added a : plans.get(w).added()) {
                if (a.at() >= end) {
                    faults.add(Fault.of("eventAfterTable", "$.whatIfs[" + w + "]", "years", a.at(), "highest", end));
                }
            }
        }
        return faults;
    }

    /** What-ifs that undo something branch over every occurrence, and over every switch of what occurrences bring on. */
    private static List<Fault> tooIntricate(List<WhatIfPlan> plans, Person person) {
        int bringing = 0;
        for (Evidence.Occurrence o : person.evidence().occurrences()) {
            bringing += person.pack().events().get(o.event()).bringsOn().isEmpty() ? 0 : 1;
        }
        List<Fault> faults = new ArrayList<>();
        int occurrences = person.evidence().occurrences().size();
        for (int w = 0; w < plans.size(); w++) {
            boolean differs = bringing > 0
                    || plans.get(w).never() != 0
                    || !plans.get(w).always().isEmpty();
            if (!plans.get(w).undoesNothing()
                    && differs
                    && (occurrences > MOST_OCCURRENCES_UNDONE || bringing > MOST_BRINGING_UNDONE)) {
                faults.add(new Fault(
                        "tooManyOccurrences",
                        "$.whatIfs[" + w + "]",
                        Map.of(
                                "occurrences", String.valueOf(occurrences),
                                "highest", String.valueOf(MOST_OCCURRENCES_UNDONE),
                                "bringing", String.valueOf(bringing),
                                "highestBringing", String.valueOf(MOST_BRINGING_UNDONE))));
            }
        }
        return faults;
    }

    private AssessmentResult result(
            CaseFile file, CaseResolver resolver, Person person, Posterior posterior, List<WhatIfPlan> plans) {
        Worlds worlds = new Worlds(person, posterior);
        WorldCurve tableCurve = worlds.table();
        double age = person.baseline().age();
        Headline headline = new Headline(person.baseline().table(), tableCurve.survival(), file.cover());
        List<WorldResult> results = new ArrayList<>();
        results.add(headline.of("table", tableCurve, age, null));
        Worlds.Revealed revealed = worlds.posteriorWorlds();
        WorldResult recorded = headline.of("recorded", revealed.recorded(), Double.NaN, null);
        WorldResult removed = headline.of("eventsRemoved", revealed.eventsRemoved(), Double.NaN, null);
        results.add(recorded);
        results.add(removed);
        results.add(headline.of("unlearned", worlds.unlearned(), Double.NaN, null));
        List<Fault> warnings = new ArrayList<>(resolver.warnings());
        addTableWarnings(warnings, person);
        for (int w = 0; w < plans.size(); w++) {
            WorldCurve curve = worlds.whatIf(plans.get(w));
            results.add(headline.of("whatIf:" + plans.get(w).name(), curve, Double.NaN, curve.aliveToday()));
            if (curve.newOccurrences()) {
                warnings.add(Fault.of("newOccurrencesNotInvented", "$.whatIfs[" + w + "]"));
            }
        }
        addPartialDateWarnings(warnings, file, resolver);
        List<ConditionShift> conditions = new ArrayList<>();
        for (int i = 0; i < pack.conditions().size(); i++) {
            conditions.add(new ConditionShift(
                    pack.conditions().get(i).id(), person.prior().prevalence(i), posterior.condition(i)));
        }
        WorldResult tableResult = results.get(0);
        return new AssessmentResult(
                age,
                posterior.logEvidence(),
                conditions,
                results,
                split(tableResult, removed),
                split(removed, recorded),
                warnings);
    }

    private static Split split(WorldResult from, WorldResult to) {
        return new Split(to.expectation() - from.expectation(), to.mortalityRatio() / from.mortalityRatio());
    }

    private void addTableWarnings(List<Fault> warnings, Person person) {
        if (!table.population().equals(pack.population())) {
            warnings.add(Fault.of("populationMismatch", "$", "table", table.population(), "pack", pack.population()));
        }
        if (person.baseline().table().isExtended()) {
            warnings.add(Fault.of("tableExtended", "$", "lastAge", LifeTable.LAST_AGE));
        }
    }

    /** For each partial date of the recorded history: the headline numbers at both ends of its period. */
    private void addPartialDateWarnings(List<Fault> warnings, CaseFile file, CaseResolver resolver) {
        for (Map.Entry<String, PartialDate> date : resolver.partialDates().entrySet()) {
            WorldResult early = variant(file, date.getKey(), date.getValue().earliest());
            WorldResult late = variant(file, date.getKey(), date.getValue().latest());
            Map<String, String> values = new java.util.TreeMap<>();
            values.put("earliest", date.getValue().earliest().toString());
            values.put("latest", date.getValue().latest().toString());
            values.put("middle", date.getValue().middle().toString());
            if (early != null && late != null) {
                values.put("expectationAtEarliest", String.valueOf(early.expectation()));
                values.put("expectationAtLatest", String.valueOf(late.expectation()));
                values.put("ratioAtEarliest", String.valueOf(early.mortalityRatio()));
                values.put("ratioAtLatest", String.valueOf(late.mortalityRatio()));
            }
            warnings.add(new Fault("partialDate", date.getKey(), values));
        }
    }

    /** The world that a date bears on, with another day there: the what-if's for its own dates, else the recorded one. */
    private @Nullable WorldResult variant(CaseFile file, String path, LocalDate day) {
        CaseResolver resolver = new CaseResolver(file, pack, Map.of(path, day));
        Person person = prepare(file, resolver.evidence()).person();
        if (person == null) {
            return null;
        }
        Posterior posterior = new Posterior(person);
        if (!posterior.isPossible()) {
            return null;
        }
        Worlds worlds = new Worlds(person, posterior);
        String whatIfs = "$.whatIfs[";
        WorldCurve curve = path.startsWith(whatIfs)
                ? worlds.whatIf(resolver.plan(Integer.parseInt(path.substring(whatIfs.length(), path.indexOf(']')))))
                : worlds.posteriorWorlds().recorded();
        Headline own = new Headline(person.baseline().table(), worlds.table().survival(), file.cover());
        return own.of("variant", curve, Double.NaN, null);
    }
}
