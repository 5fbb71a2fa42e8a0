package nearworld.cli;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * The arguments of {@code assess}.
 *
 * @param problem what is wrong with them; null: nothing
 * @param help true where only the text of help is asked for
 */
record AssessOptions(
        @Nullable String table,
        @Nullable String pack,
        int threads,
        List<String> cases,
        boolean help,
        @Nullable String problem) {
    private static final int MOST_THREADS = 256;

    AssessOptions {
        cases = List.copyOf(cases);
    }

    static AssessOptions parse(List<String> args) {
        Parser parser = new Parser();
        String problem = null;
        for (int i = 0; i < args.size() && problem == null; i++) {
            String arg = args.get(i);
            int equals = arg.indexOf('=');
            boolean joined = arg.startsWith("--") && equals > 0;
            String name = joined ? arg.substring(0, equals) : arg;
            boolean takesValue = List.of("--table", "--pack", "--threads").contains(name);
            if (parser.onlyCases || arg.equals("-") || !arg.startsWith("-")) {
                parser.cases.add(arg);
            } else if (arg.equals("--")) {
                parser.onlyCases = true;
            } else if (arg.equals("--help") || arg.equals("-h")) {
                parser.help = true;
            } else if (takesValue && joined) {
                problem = parser.option(name, arg.substring(equals + 1));
            } else if (takesValue && i + 1 < args.size()) {
                problem = parser.option(name, args.get(++i));
            } else {
                problem = takesValue ? name + " needs a value" : "unknown option " + arg;
            }
        }
        return parser.options(problem);
    }

    private static final class Parser {
        private @Nullable String table;
        private @Nullable String pack;
        private int threads;
        private final List<String> cases = new ArrayList<>();
        private boolean help;
        private boolean onlyCases;

        @Nullable
        String option(String name, String value) {
            switch (name) {
                case "--table" -> {
                    if (table != null) {
                        return "--table is given twice";
                    }
                    table = value;
                }
                case "--pack" -> {
                    if (pack != null) {
                        return "--pack is given twice";
                    }
                    pack = value;
                }
                default -> {
                    if (!value.matches("[0-9]{1,3}")
                            || Integer.parseInt(value) < 1
                            || Integer.parseInt(value) > MOST_THREADS) {
                        return "--threads must be a whole number from 1 to " + MOST_THREADS + ", is " + value;
                    }
                    threads = Integer.parseInt(value);
                }
            }
            return null;
        }

        AssessOptions options(@Nullable String problem) {
            String missing = table == null
                    ? "--table is missing"
                    : pack == null ? "--pack is missing" : cases.isEmpty() ? "no case is named" : null;
            int count = threads > 0 ? threads : Runtime.getRuntime().availableProcessors();
            return new AssessOptions(
                    table, pack, count, cases, help && problem == null, problem != null || help ? problem : missing);
        }
    }
}
