package nearworld.app.browser;

import com.microsoft.playwright.Browser;
import com.microsoft.playwright.BrowserType;
import com.microsoft.playwright.Playwright;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;

/** The system's Chromium, driven by Playwright, which downloads no browser of its own. */
public final class Chromium implements AutoCloseable {
    private static final List<String> FLAGS = List.of(
            "--headless=new",
            "--no-sandbox",
            "--disable-gpu",
            "--disable-dev-shm-usage",
            "--disable-quic",
            "--no-first-run",
            "--disable-background-networking",
            "--disable-component-update",
            "--disable-sync");

    private final Playwright playwright;
    private final Browser browser;

    private Chromium(Playwright playwright, Browser browser) {
        this.playwright = playwright;
        this.browser = browser;
    }

    /** Starts it; {@code ./nearworld check} installs it where it can. */
    public static Chromium start() {
        Playwright playwright = Playwright.create(
                new Playwright.CreateOptions().setEnv(Map.of("PLAYWRIGHT_SKIP_BROWSER_DOWNLOAD", "1")));
        Browser browser = playwright
                .chromium()
                .launch(new BrowserType.LaunchOptions()
                        .setHeadless(true)
                        .setExecutablePath(
                                Path.of(System.getenv().getOrDefault("NEARWORLD_CHROMIUM", "/usr/bin/chromium")))
                        .setArgs(FLAGS));
        return new Chromium(playwright, browser);
    }

    public Browser browser() {
        return browser;
    }

    @Override
    public void close() {
        playwright.close();
    }
}
