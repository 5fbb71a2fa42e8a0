package nearworld.engine;

import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.TimeUnit;
import java.util.stream.Stream;
import nearworld.engine.assessment.AssessmentOutcome;
import nearworld.engine.assessment.Assessor;
import nearworld.engine.assessment.CaseFile;
import nearworld.engine.mortality.MortalityTable;
import nearworld.engine.network.EvidencePack;
import nearworld.oracle.Oracles;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;
import org.openjdk.jmh.infra.Blackhole;
import org.openjdk.jmh.runner.Runner;
import org.openjdk.jmh.runner.RunnerException;
import org.openjdk.jmh.runner.options.OptionsBuilder;

/**
 * How long a case takes, warm: 20 conditions with one to three causes, six occurrences in four event types of four to six rate
 * ratios, three what-ifs, both behaviours known ({@link SparseCases}); and the demo cases with the default pack.
 *
 * <p>{@link #main} with {@code cpu} reports the processor time of the thread instead, which other work on the machine moves
 * less than the clock. DEVELOPERS.md says how to run both.
 */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
@Warmup(iterations = 5, time = 2)
@Measurement(iterations = 5, time = 2)
@Fork(1)
public class AssessmentBenchmark {
    private static final long SEED = 7001;
    private static final int WARM_UP = 60;
    private static final int RUNS = 60;
    private static final Path SEED_DATA = Path.of("seed-data");

    private Assessor large;
    private CaseFile largeCase;
    private CaseFile largeCaseWithoutWhatIfs;
    private Assessor demo;
    private final List<CaseFile> demoCases = new ArrayList<>();

    /** Reads packs, tables and cases. */
    @Setup
    public void read() throws IOException {
        MortalityTable table = Inputs.table(Oracles.text("worked/table.csv"));
        EvidencePack pack = SparseCases.pack(SEED, 20, 4);
        large = new Assessor(table, pack);
        largeCase = Inputs.caseFile(pack, table, SparseCases.caseText());
        largeCaseWithoutWhatIfs = withoutWhatIfs(largeCase);
        MortalityTable demoTable = Inputs.table(text(SEED_DATA.resolve("tables/us-2014-population.csv")));
        EvidencePack demoPack = Inputs.pack(text(SEED_DATA.resolve("packs/default-1.yaml")));
        demo = new Assessor(demoTable, demoPack);
        try (Stream<Path> files = Files.list(SEED_DATA.resolve("cases"))) {
            for (Path file :
                    files.filter(f -> f.toString().endsWith(".json")).sorted().toList()) {
                demoCases.add(Inputs.caseFile(demoPack, demoTable, text(file)));
            }
        }
    }

    private static String text(Path file) throws IOException {
        return Files.readString(file, StandardCharsets.UTF_8);
    }

    private static CaseFile withoutWhatIfs(CaseFile c) {
        return new CaseFile(
                c.caseRef(),
                c.assessedOn(),
                c.sex(),
                c.bornOn(),
                c.behaviours(),
                c.statements(),
                c.findings(),
                c.history(),
                c.death(),
                c.cover(),
                List.of());
    }

    /** Posterior, all worlds with three what-ifs, headline numbers. */
    @Benchmark
    public AssessmentOutcome twentyConditions() {
        return large.assess(largeCase);
    }

    /** The same without the what-ifs. */
    @Benchmark
    public AssessmentOutcome twentyConditionsWithoutWhatIfs() {
        return large.assess(largeCaseWithoutWhatIfs);
    }

    /** All demo cases, one after the other. */
    @Benchmark
    public void demoCases(Blackhole hole) {
        demoCases.forEach(c -> hole.consume(demo.assess(c)));
    }

    /** JMH; or, with {@code cpu}, the processor time of one thread, median and least of {@value #RUNS} runs. */
    public static void main(String[] arguments) throws RunnerException, IOException {
        if (!List.of(arguments).contains("cpu")) {
            new Runner(new OptionsBuilder()
                            .include(AssessmentBenchmark.class.getSimpleName())
                            .build())
                    .run();
            return;
        }
        AssessmentBenchmark b = new AssessmentBenchmark();
        b.read();
        Inputs.result(b.twentyConditions());
        report("20 conditions, whole case", b::twentyConditions);
        report("20 conditions, without what-ifs", b::twentyConditionsWithoutWhatIfs);
        for (CaseFile demoCase : b.demoCases) {
            report("demo " + demoCase.caseRef(), () -> b.demo.assess(demoCase));
        }
    }

    private static void report(String what, Runnable run) {
        for (int i = 0; i < WARM_UP; i++) {
            run.run();
        }
        double[] millis = new double[RUNS];
        for (int i = 0; i < RUNS; i++) {
            long before = ManagementFactory.getThreadMXBean().getCurrentThreadCpuTime();
            run.run();
            millis[i] = (ManagementFactory.getThreadMXBean().getCurrentThreadCpuTime() - before) / 1e6;
        }
        java.util.Arrays.sort(millis);
        System.out.printf("%-32s median %8.2f ms, least %8.2f ms%n", what, millis[RUNS / 2], millis[0]);
    }
}
