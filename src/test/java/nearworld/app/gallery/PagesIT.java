package nearworld.app.gallery;

import static org.assertj.core.api.Assertions.assertThat;

import com.microsoft.playwright.Browser;
import com.microsoft.playwright.BrowserContext;
import com.microsoft.playwright.Page;
import com.microsoft.playwright.options.ColorScheme;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import nearworld.app.browser.Chromium;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.boot.test.web.server.LocalServerPort;

/**
 * Every page in every state, in a real browser: no fault of accessibility by axe-core, nothing wider than the window
 * at 390 units and at 1280, nothing that the content policy stops, each id once. Screenshots go to
 * {@code target/pages}.
 */
@SpringBootTest(classes = GalleryApplication.class, webEnvironment = SpringBootTest.WebEnvironment.RANDOM_PORT)
class PagesIT {
    private static Chromium chromium;
    private static String axe;

    @LocalServerPort
    private int port;

    @BeforeAll
    static void start() throws IOException {
        chromium = Chromium.start();
        try (InputStream script = PagesIT.class.getResourceAsStream("/axe.min.js")) {
            axe = new String(script.readAllBytes(), StandardCharsets.UTF_8);
        }
    }

    @AfterAll
    static void stop() {
        chromium.close();
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "/gallery",
                "/gallery/sign-in/none",
                "/gallery/sign-in/wrong",
                "/gallery/sign-in/out",
                "/gallery/list/full",
                "/gallery/list/empty",
                "/gallery/list/filtered",
                "/gallery/new/empty",
                "/gallery/new/bad",
                "/gallery/case/plain",
                "/gallery/case/saved",
                "/gallery/case/editing",
                "/gallery/case/bad",
                "/gallery/case/conflict",
                "/gallery/case/waiting",
                "/gallery/case/read-only",
                "/gallery/assessment/plain",
                "/gallery/assessment/crowded",
                "/gallery/trail/case",
                "/gallery/trail/all",
                "/gallery/trail/intact",
                "/gallery/trail/broken",
                "/gallery/artefacts",
                "/gallery/error/400",
                "/gallery/error/403",
                "/gallery/error/404",
                "/gallery/error/409",
                "/gallery/error/500",
                "/gallery/error/other"
            })
    void everyPageIsAccessibleAndFits(String path) {
        List<String> faults = new ArrayList<>();
        faults.addAll(look(path, 1280, ColorScheme.LIGHT, "en"));
        faults.addAll(look(path, 390, ColorScheme.DARK, "de"));
        assertThat(faults).isEmpty();
    }

    private List<String> look(String path, int width, ColorScheme scheme, String language) {
        Browser.NewContextOptions options = new Browser.NewContextOptions()
                .setViewportSize(width, 900)
                .setColorScheme(scheme)
                .setLocale(language)
                .setBypassCSP(false);
        List<String> faults = new ArrayList<>();
        try (BrowserContext context = chromium.browser().newContext(options)) {
            Page page = context.newPage();
            page.onConsoleMessage(m -> {
                if (m.type().equals("error") && !path.contains("/error/")) {
                    faults.add(m.text());
                }
            });
            page.navigate("http://localhost:" + port + path);
            page.evaluate("document.querySelectorAll('details').forEach(d => d.open = true)");
            String name = path.substring(1).replace('/', '-') + "-" + width + ".png";
            page.screenshot(new Page.ScreenshotOptions().setFullPage(true).setPath(Path.of("target/pages", name)));
            faults.addAll(strings(page.evaluate(OVERFLOW)));
            faults.addAll(strings(page.evaluate(IDS)));
            page.evaluate(axe);
            faults.addAll(strings(page.evaluate(AXE)));
        }
        return faults.stream().map(f -> path + " at " + width + ": " + f).toList();
    }

    @SuppressWarnings("unchecked")
    private static List<String> strings(Object evaluated) {
        return (List<String>) evaluated;
    }

    private static final String OVERFLOW = """
            () => document.documentElement.scrollWidth > window.innerWidth
                ? ['wider than the window: ' + document.documentElement.scrollWidth] : []
            """;

    private static final String IDS = """
            () => { const seen = new Set(), twice = [];
                document.querySelectorAll('[id]').forEach(e => { if (seen.has(e.id)) twice.push('id twice: ' + e.id); seen.add(e.id); });
                return twice; }
            """;

    private static final String AXE = """
            async () => { const r = await axe.run(document, { runOnly: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice'] });
                return r.violations.map(v => v.id + ': ' + v.help + ' ' + v.nodes.slice(0, 4).map(n => n.target.join(' ') + ' ' + (n.any[0] ? n.any[0].message : '')).join(' | ')); }
            """;
}
