package nearworld.cli;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Locale;

/** What one run of the command line gave. */
record Run(int status, List<String> out, List<String> err) {
    static Run of(String... args) {
        return of(new byte[0], args);
    }

    static Run of(byte[] standardInput, String... args) {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        ByteArrayOutputStream err = new ByteArrayOutputStream();
        Console console = new Console(
                new ByteArrayInputStream(standardInput),
                new PrintStream(out, true, StandardCharsets.UTF_8),
                new PrintStream(err, true, StandardCharsets.UTF_8),
                Locale.ENGLISH);
        int status = Main.run(List.of(args), console);
        return new Run(status, lines(out), lines(err));
    }

    private static List<String> lines(ByteArrayOutputStream bytes) {
        return bytes.toString(StandardCharsets.UTF_8).lines().toList();
    }
}
