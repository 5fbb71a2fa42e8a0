package nearworld.app;

import java.io.File;
import java.io.IOException;
import java.net.ServerSocket;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.concurrent.TimeUnit;
import java.util.stream.Collectors;

/** The application as a process of its own, on an embedded database in a folder. */
final class ServerProcess {
    private static final int MINUTES_TO_START = 5;

    private final Process process;
    private final int port;

    private ServerProcess(Process process, int port) {
        this.process = process;
        this.port = port;
    }

    /** Starts and waits until the port answers. */
    static ServerProcess start(Path folder) throws IOException, InterruptedException {
        int port = freePort();
        ProcessBuilder builder = new ProcessBuilder(
                Path.of(System.getProperty("java.home"), "bin", "java").toString(),
                "-XX:TieredStopAtLevel=1",
                "-cp",
                applicationClassPath(),
                NearworldApplication.class.getName());
        builder.environment().put("NEARWORLD_PORT", String.valueOf(port));
        builder.environment().put("NEARWORLD_DATA", folder.resolve("data").toString());
        builder.environment().keySet().removeIf(name -> name.startsWith("NEARWORLD_DATABASE"));
        builder.redirectErrorStream(true);
        File log = folder.resolve("server.log").toFile();
        builder.redirectOutput(ProcessBuilder.Redirect.appendTo(log));
        ServerProcess server = new ServerProcess(builder.start(), port);
        server.awaitAnswer(log);
        return server;
    }

    /** Everything but the tests, whose configurations a scan would find. */
    private static String applicationClassPath() {
        String all = System.getProperty("surefire.test.class.path", System.getProperty("java.class.path"));
        return Arrays.stream(all.split(File.pathSeparator, -1))
                .filter(entry -> !entry.contains("test-classes"))
                .collect(Collectors.joining(File.pathSeparator));
    }

    private static int freePort() throws IOException {
        try (ServerSocket socket = new ServerSocket(0)) {
            return socket.getLocalPort();
        }
    }

    private void awaitAnswer(File log) throws InterruptedException {
        long deadline = System.nanoTime() + TimeUnit.MINUTES.toNanos(MINUTES_TO_START);
        while (!answers()) {
            if (process.waitFor(200, TimeUnit.MILLISECONDS) || System.nanoTime() > deadline) {
                process.destroy();
                throw new IllegalStateException("the server did not start; see " + log);
            }
        }
    }

    private boolean answers() {
        try (java.net.Socket socket = new java.net.Socket("localhost", port)) {
            return socket.isConnected();
        } catch (IOException e) {
            return false;
        }
    }

    int port() {
        return port;
    }

    /** As kill -9 does: without a word. Its database server lives on for the next start to find. */
    void kill() throws InterruptedException {
        process.destroyForcibly();
        process.waitFor();
    }

    /** As Ctrl-C does. */
    void stop() {
        process.destroy();
        try {
            process.waitFor(1, TimeUnit.MINUTES);
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
    }
}
