package nearworld.app.database;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.TimeoutException;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;

/**
 * The PostgreSQL server that a killed application left running: it holds the database's files, and the next start
 * would wait for it in vain. Call only while holding the folder's lock.
 */
final class OrphanedServer {
    private static final int STOP_WAIT_SECONDS = 30;
    private static final Logger LOG = LoggerFactory.getLogger(OrphanedServer.class);

    private OrphanedServer() {}

    /** Stops the server whose files these are, and removes the trace of one that no longer runs. */
    static void stop(Path files) throws IOException {
        Path trace = files.resolve("postmaster.pid");
        if (!Files.exists(trace)) {
            return;
        }
        List<String> lines = Files.readAllLines(trace);
        ProcessHandle process = lines.isEmpty()
                ? null
                : ProcessHandle.of(parsePid(lines.get(0))).orElse(null);
        if (process != null && isServerOf(files, process)) {
            LOG.warn("Stopping the PostgreSQL server that an earlier run left behind, process {}", process.pid());
            interrupt(process);
        } else {
            // PostgreSQL refuses to start if any process bears the recorded number, whatever that process is.
            Files.delete(trace);
        }
    }

    private static long parsePid(String line) {
        try {
            return Long.parseLong(line.strip());
        } catch (NumberFormatException e) {
            throw new DatabaseRefusedException(
                    "postmaster.pid must start with a process number, was \"" + line + "\"", e);
        }
    }

    private static boolean isServerOf(Path files, ProcessHandle process) {
        ProcessHandle.Info info = process.info();
        return info.command().orElse("").endsWith("/postgres")
                && Arrays.asList(info.arguments().orElse(new String[0])).contains(files.toString());
    }

    /** SIGINT is PostgreSQL's fast shutdown: it ends open transactions; SIGTERM would wait for them. */
    private static void interrupt(ProcessHandle process) throws IOException {
        try {
            new ProcessBuilder("sh", "-c", "kill -INT \"$1\"", "sh", Long.toString(process.pid()))
                    .start()
                    .waitFor();
            process.onExit().get(STOP_WAIT_SECONDS, TimeUnit.SECONDS);
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            throw new IOException("Interrupted while stopping process " + process.pid(), e);
        } catch (ExecutionException | TimeoutException e) {
            throw new DatabaseRefusedException(
                    "The PostgreSQL server of an earlier run, process " + process.pid()
                            + ", does not stop; stop it by hand.",
                    e);
        }
    }
}
