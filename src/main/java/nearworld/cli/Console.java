package nearworld.cli;

import java.io.InputStream;
import java.io.PrintStream;
import java.util.Locale;
import java.util.stream.Collectors;
import nearworld.engine.basics.Fault;
import nearworld.exchange.faults.FaultSentences;
import nearworld.exchange.faults.LocatedFault;
import nearworld.exchange.faults.Place;
import org.jspecify.annotations.Nullable;

/** Where a command reads and writes. A line of output is always one line, whatever a value holds. */
final class Console {
    private final InputStream in;
    private final PrintStream out;
    private final PrintStream err;
    private final Locale locale;
    private @Nullable FaultSentences sentences;

    Console(InputStream in, PrintStream out, PrintStream err, Locale locale) {
        this.in = in;
        this.out = out;
        this.err = err;
        this.locale = locale;
    }

    InputStream in() {
        return in;
    }

    void result(String line) {
        out.println(line);
    }

    /** True where nobody reads any more. Sends on what is waiting. */
    boolean isClosed() {
        boolean results = out.checkError();
        return err.checkError() || results;
    }

    void say(String line) {
        err.println(line);
    }

    /** All faults of one case on one line. */
    void faults(CaseAnswer answer) {
        say(answer.faults().stream().map(f -> text(f.file(), f.fault())).collect(Collectors.joining(" | ")));
    }

    /** file:line:column: path: rule (values): sentence. */
    String text(String file, LocatedFault located) {
        Fault fault = located.fault();
        Place place = located.place();
        String where = place.line() == 0 ? file : file + ":" + place.line() + ":" + Math.max(1, place.column());
        String values = FaultSentences.values(fault);
        String line = where + ": " + fault.path() + ": " + fault.code() + (values.isEmpty() ? "" : " (" + values + ")")
                + ": " + sentences().sentence(fault);
        return line.chars()
                .map(c -> Character.isISOControl(c) ? ' ' : c)
                .collect(StringBuilder::new, (b, c) -> b.append((char) c), StringBuilder::append)
                .toString();
    }

    private synchronized FaultSentences sentences() {
        if (sentences == null) {
            sentences = new FaultSentences(locale);
        }
        return sentences;
    }
}
