package nearworld.cli;

import java.io.FileDescriptor;
import java.io.FileInputStream;
import java.io.FileOutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Locale;

/** Starts the command line. */
public final class Main {
    private static final int BUFFER = 1 << 16;

    private Main() {}

    public static void main(String[] args) {
        PrintStream out = stream(FileDescriptor.out);
        PrintStream err = stream(FileDescriptor.err);
        Locale locale = Locale.forLanguageTag(System.getenv().getOrDefault("NEARWORLD_LANGUAGE", "en"));
        Console console = new Console(new FileInputStream(FileDescriptor.in), out, err, locale);
        int status = run(List.of(args), console);
        out.flush();
        err.flush();
        System.exit(status);
    }

    static int run(List<String> args, Console console) {
        List<String> rest = args;
        if (!args.isEmpty() && (args.get(0).equals("assess") || args.get(0).equals("help"))) {
            rest = args.get(0).equals("help") ? List.of("--help") : args.subList(1, args.size());
        }
        return new AssessCommand(console).run(rest);
    }

    /** UTF-8 whatever the platform's encoding is. */
    private static PrintStream stream(FileDescriptor descriptor) {
        return new PrintStream(
                new java.io.BufferedOutputStream(new FileOutputStream(descriptor), BUFFER),
                false,
                StandardCharsets.UTF_8);
    }
}
