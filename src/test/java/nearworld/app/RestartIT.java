package nearworld.app;

import static org.assertj.core.api.Assertions.assertThat;

import java.net.URI;
import java.net.URLEncoder;
import java.net.http.HttpResponse;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicInteger;
import org.jsoup.Jsoup;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * The server as a process of its own on the embedded database, killed (-9) while it saves, and started again: what it
 * had confirmed is there, and who was signed in still is.
 */
class RestartIT {
    private static final int SAVES_BEFORE_THE_KILL = 5;
    private static final int FIRST_YEAR = 1900;

    @TempDir
    private Path folder;

    private ServerProcess server;

    @AfterEach
    void stop() {
        if (server != null) {
            server.stop();
        }
    }

    @Test
    void whatWasConfirmedSurvivesAKillInTheMiddleOfSaving() throws Exception {
        server = ServerProcess.start(folder);
        Browser browser = new Browser(server);
        assertThat(browser.signIn("ada.quill", password("ada.quill")).headers().allValues("set-cookie"))
                .anyMatch(c -> c.startsWith("SESSION=") && c.contains("HttpOnly") && c.contains("SameSite=Lax"));
        String path = browser.post("/cases", Map.of("caseRef", "KILLED-1"))
                .headers()
                .firstValue("location")
                .orElseThrow();
        String casePath = URI.create(path).getPath();

        AtomicInteger confirmed = new AtomicInteger();
        CountDownLatch someSaved = new CountDownLatch(SAVES_BEFORE_THE_KILL);
        CompletableFuture<Void> saving =
                CompletableFuture.runAsync(() -> saveUntilKilled(browser, casePath, confirmed, someSaved));
        assertThat(someSaved.await(2, TimeUnit.MINUTES)).isTrue();
        server.kill();
        saving.get(1, TimeUnit.MINUTES);

        server = ServerProcess.start(folder);
        browser.moveTo(server);
        HttpResponse<String> page = browser.get(casePath);
        assertThat(page.statusCode()).as("still signed in").isEqualTo(200);
        int version = Integer.parseInt(Jsoup.parse(page.body())
                .select("form#person > input[name=version]")
                .attr("value"));
        assertThat(version).isBetween(confirmed.get(), confirmed.get() + 1);
        assertThat(Jsoup.parse(page.body()).select("form#person [name=bornOn]").attr("value"))
                .isEqualTo(String.valueOf(FIRST_YEAR + version));
        theTrailIsIntact();
    }

    /** Each save is of the year that its version will have, so that text and version can be compared afterwards. */
    private static void saveUntilKilled(
            Browser browser, String casePath, AtomicInteger confirmed, CountDownLatch someSaved) {
        while (true) {
            int version = confirmed.get();
            Map<String, String> fields = Map.of(
                    "version",
                    String.valueOf(version),
                    "bornOn",
                    String.valueOf(FIRST_YEAR + version + 1),
                    "sex",
                    "male");
            try {
                if (browser.post(casePath + "/person", fields).statusCode() != 302) {
                    return;
                }
            } catch (Exception e) {
                return;
            }
            confirmed.incrementAndGet();
            someSaved.countDown();
        }
    }

    private void theTrailIsIntact() throws Exception {
        Browser auditor = new Browser(server);
        auditor.signIn("fay.lund", password("fay.lund"));
        auditor.get("/trail");
        HttpResponse<String> verified = auditor.post("/trail/verify", Map.of());
        assertThat(verified.statusCode()).isEqualTo(200);
        assertThat(Jsoup.parse(verified.body()).select(".notice.done")).isNotEmpty();
    }

    private String password(String name) throws Exception {
        return Files.readAllLines(folder.resolve("data/demo-people.txt")).stream()
                .filter(line -> line.startsWith(name + " "))
                .map(line -> line.split(" +", -1)[1])
                .findFirst()
                .orElseThrow();
    }

    static String encoded(String text) {
        return URLEncoder.encode(text, StandardCharsets.UTF_8);
    }
}
