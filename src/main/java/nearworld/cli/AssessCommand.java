package nearworld.cli;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayDeque;
import java.util.List;
import java.util.Objects;
import java.util.Queue;
import java.util.concurrent.CancellationException;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.function.Function;
import nearworld.engine.assessment.Assessor;
import nearworld.engine.basics.Fault;
import nearworld.exchange.cases.CaseReader;
import nearworld.exchange.faults.LocatedFault;
import nearworld.exchange.faults.Place;
import nearworld.exchange.faults.Reading;
import nearworld.exchange.packs.Pack;
import nearworld.exchange.packs.PackReader;
import nearworld.exchange.results.ResultBasis;
import nearworld.exchange.tables.Table;
import nearworld.exchange.tables.TableFit;
import nearworld.exchange.tables.TableReader;
import org.jspecify.annotations.Nullable;

/**
 * {@code assess}: one result a line for every case, in the order given. Status 0; 1 where a case was refused; 2 where nothing
 * could be assessed.
 */
final class AssessCommand {
    static final int GOOD = 0;
    static final int REFUSED = 1;
    static final int UNUSABLE = 2;

    static final String USAGE = """
            nearworld assess --table TABLE.csv --pack PACK.yaml [--threads N] CASE ...

            Assesses cases and writes one result (JSON, result/1) a line, in the order given.
            CASE is a .json file with one case, a .jsonl file with one case a line, or - for standard input.
            A case that is refused gives one line on standard error: file, line, JSON path, rule, values, sentence.

              --table FILE    mortality table: #key: value lines, then sex,age,qx
              --pack FILE     evidence pack, YAML or JSON
              --threads N     cases at a time; without it one for each processor
              --help          this text

            NEARWORLD_LANGUAGE=en|de chooses the language of the sentences.
            Status: 0 every case was assessed, 1 at least one was refused, 2 table, pack or arguments are unusable.

            Results are decision support, no medical opinion: a licensed underwriter or medical officer decides,
            and local law on sex, genetic information, disability and data protection comes first.
            """;

    /** Answers between two looks at whether anybody still reads. */
    private static final int CHECKED_EVERY = 64;

    private final Console console;
    private boolean anyRefused;
    private int printed;

    AssessCommand(Console console) {
        this.console = console;
    }

    int run(List<String> args) {
        AssessOptions options = AssessOptions.parse(args);
        if (options.help()) {
            console.result(USAGE.stripTrailing());
            return GOOD;
        }
        if (options.problem() != null) {
            console.say("nearworld assess: " + options.problem());
            console.say(USAGE.lines().findFirst().orElse(""));
            return UNUSABLE;
        }
        CaseAssessment assessment =
                prepare(Objects.requireNonNull(options.table()), Objects.requireNonNull(options.pack()));
        return assessment == null ? UNUSABLE : assessAll(options, assessment);
    }

    /** Reads table and pack; null where either cannot be used, after saying why. */
    private @Nullable CaseAssessment prepare(String tableFile, String packFile) {
        byte[] tableBytes = bytes(tableFile, TableReader.MOST_BYTES);
        byte[] packBytes = bytes(packFile, PackReader.MOST_BYTES);
        Table table = tableBytes == null ? null : read(tableFile, tableBytes, TableReader::read);
        Pack pack = packBytes == null ? null : read(packFile, packBytes, PackReader::read);
        if (table == null || pack == null || packBytes == null) {
            return null;
        }
        List<Fault> unfit = TableFit.check(table.rates(), pack.evidence());
        unfit.forEach(f -> console.say(console.text(tableFile, new LocatedFault(f, Place.NOWHERE))));
        return unfit.isEmpty() ? assessment(table, pack, new PackPlaces(packFile, packBytes)) : null;
    }

    private static CaseAssessment assessment(Table table, Pack pack, PackPlaces places) {
        ResultBasis basis = new ResultBasis(
                Assessor.ENGINE_VERSION,
                table.name(),
                table.sha256(),
                pack.evidence().id(),
                pack.evidence().version(),
                pack.sha256());
        return new CaseAssessment(
                new CaseReader(pack.evidence(), table.rates()),
                new Assessor(table.rates(), pack.evidence()),
                basis,
                places);
    }

    private byte @Nullable [] bytes(String file, int mostBytes) {
        try (InputStream in = Files.newInputStream(Path.of(file))) {
            return in.readNBytes(mostBytes + 1);
        } catch (IOException e) {
            console.say(console.text(file, new LocatedFault(CaseTexts.fault(e), Place.NOWHERE)));
            return null;
        }
    }

    private <T> @Nullable T read(String file, byte[] bytes, Function<byte[], Reading<T>> reader) {
        Reading<T> reading = reader.apply(bytes);
        reading.located().forEach(f -> console.say(console.text(file, f)));
        return reading.isAccepted() ? reading.value() : null;
    }

    private int assessAll(AssessOptions options, CaseAssessment assessment) {
        ExecutorService pool = Executors.newFixedThreadPool(options.threads());
        Queue<Future<CaseAnswer>> waiting = new ArrayDeque<>();
        int most = 4 * options.threads();
        try {
            CaseTexts texts = new CaseTexts(console.in(), text -> {
                waiting.add(pool.submit(() -> assessment.answer(text)));
                if (waiting.size() >= most) {
                    print(waiting.remove());
                }
            });
            options.cases().forEach(texts::read);
            while (!waiting.isEmpty()) {
                print(waiting.remove());
            }
        } catch (ClosedException e) {
            return REFUSED;
        } finally {
            pool.shutdownNow();
        }
        return anyRefused || console.isClosed() ? REFUSED : GOOD;
    }

    private void print(Future<CaseAnswer> future) {
        CaseAnswer answer;
        try {
            answer = future.get();
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            throw new CancellationException("interrupted");
        } catch (ExecutionException e) {
            throw new IllegalStateException(e.getCause());
        }
        if (answer.result() != null) {
            console.result(answer.result());
        } else {
            anyRefused = true;
            console.faults(answer);
        }
        printed++;
        if (printed % CHECKED_EVERY == 0 && console.isClosed()) {
            throw new ClosedException();
        }
    }

    /** Nobody reads the output any more. */
    private static final class ClosedException extends RuntimeException {
        private static final long serialVersionUID = 1L;
    }
}
