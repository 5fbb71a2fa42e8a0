package nearworld.app;

import static com.microsoft.playwright.assertions.PlaywrightAssertions.assertThat;
import static org.assertj.core.api.Assertions.assertThat;

import com.microsoft.playwright.Browser;
import com.microsoft.playwright.BrowserContext;
import com.microsoft.playwright.Locator;
import com.microsoft.playwright.Page;
import com.microsoft.playwright.options.AriaRole;
import com.microsoft.playwright.options.SelectOption;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import nearworld.app.browser.Chromium;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.springframework.boot.builder.SpringApplicationBuilder;
import org.springframework.context.ConfigurableApplicationContext;

/**
 * The main job from end to end, as a person does it: signs in, fills a new case, reads the result, records the
 * assessment, and finds it again after the server was stopped and started on the same data. The browser runs no
 * JavaScript: every page is complete without.
 */
class FirstLightIT {
    private static final String UNDERWRITER = "ada.quill";
    private static final double PATIENCE_MILLIS = 120_000;

    @TempDir
    private Path data;

    @Test
    void aCaseGoesInAResultComesOutAndTheRecordStays() throws IOException {
        String recorded;
        try (Chromium chromium = Chromium.start()) {
            try (Server server = new Server(data);
                    BrowserContext context = browse(chromium)) {
                Page page = signIn(context, server);
                create(page);
                fillPerson(page);
                fillStatements(page);
                fillHistory(page);
                fillWhatIf(page);
                fillCover(page);
                readResult(page);
                recorded = record(page);
            }
            try (Server server = new Server(data);
                    BrowserContext context = browse(chromium)) {
                Page page = signIn(context, server);
                page.getByLabel("Case or external reference").fill("FL-1");
                page.getByRole(
                                AriaRole.BUTTON,
                                new Page.GetByRoleOptions().setName("Show").setExact(true))
                        .click();
                page.getByRole(AriaRole.LINK, new Page.GetByRoleOptions().setName("FL-1"))
                        .click();
                page.getByRole(AriaRole.LINK, new Page.GetByRoleOptions().setName("Assessment 1"))
                        .click();
                assertThat(mainText(page)).isEqualTo(recorded);
            }
        }
    }

    private static BrowserContext browse(Chromium chromium) {
        BrowserContext context = chromium.browser()
                .newContext(new Browser.NewContextOptions()
                        .setJavaScriptEnabled(false)
                        .setLocale("en")
                        .setViewportSize(1280, 900));
        context.setDefaultTimeout(PATIENCE_MILLIS);
        return context;
    }

    private Page signIn(BrowserContext context, Server server) throws IOException {
        Page page = context.newPage();
        page.navigate(server.address() + "/cases");
        page.getByLabel("Name").fill(UNDERWRITER);
        page.getByLabel("Password").fill(password());
        page.getByRole(AriaRole.BUTTON, new Page.GetByRoleOptions().setName("Sign in"))
                .click();
        assertThat(page.getByRole(AriaRole.HEADING, new Page.GetByRoleOptions().setName("Cases")))
                .isVisible();
        return page;
    }

    private String password() throws IOException {
        return Files.readAllLines(data.resolve("demo-people.txt")).stream()
                .filter(line -> line.startsWith(UNDERWRITER + " "))
                .map(line -> line.split(" +")[1])
                .findFirst()
                .orElseThrow();
    }

    private static void create(Page page) {
        page.getByRole(AriaRole.LINK, new Page.GetByRoleOptions().setName("New case"))
                .click();
        page.getByLabel("Case reference").fill("FL-1");
        page.getByRole(AriaRole.BUTTON, new Page.GetByRoleOptions().setName("Create case"))
                .click();
        assertThat(page.locator("h1")).containsText("FL-1");
        assertThat(page.locator("#calculation")).containsText("There is no result yet");
    }

    private static void fillPerson(Page page) {
        Locator person = page.locator("#person");
        person.getByText("Male", exactly()).click();
        person.getByLabel("Born on").fill("1962-03-09");
        person.getByLabel("Assessed on").fill("2026-12-01");
        save(page, "person");
    }

    private static void fillStatements(Page page) {
        press(page.locator("#statements"), "Add a statement");
        Locator statements = page.locator("#statements");
        statements.getByLabel("Condition").selectOption(new SelectOption().setIndex(1));
        statements
                .getByLabel("Statement", new Locator.GetByLabelOptions().setExact(true))
                .selectOption("false");
        statements.getByLabel("Source").selectOption(new SelectOption().setIndex(1));
        save(page, "statements");
    }

    private static void fillHistory(Page page) {
        press(page.locator("#history"), "Add a type of event");
        Locator history = page.locator("#history");
        history.getByLabel("Type of event", new Locator.GetByLabelOptions().setExact(true))
                .selectOption(new SelectOption().setIndex(1));
        history.getByLabel("Watched from").fill("2016-12-01");
        history.getByLabel("Watched until").fill("2026-12-01");
        press(history, "Add an occurrence");
        page.locator("#history").getByLabel("Happened on").fill("2024-05-10");
        page.locator("#history").getByLabel("Outcome").selectOption(new SelectOption().setIndex(1));
        save(page, "history");
    }

    private static void fillWhatIf(Page page) {
        press(page.locator("#whatIfs"), "Add a what-if");
        page.locator("#whatIfs").getByLabel("Name of the what-if").fill("Never happened");
        page.locator("#whatIfs").getByLabel("Kind of change").selectOption("remove");
        press(page.locator("#whatIfs"), "Add this change");
        page.locator("#whatIfs").getByLabel("Event in the history").selectOption(new SelectOption().setIndex(1));
        save(page, "whatIfs");
    }

    private static void fillCover(Page page) {
        Locator cover = page.locator("#cover");
        cover.getByLabel("Kind of cover").selectOption("term");
        cover.getByLabel("Term in years").fill("15");
        cover.getByLabel("Sum assured").fill("100000");
        cover.getByLabel("Currency").fill("EUR");
        cover.getByLabel("Interest").fill("3");
        save(page, "cover");
    }

    private static void readResult(Page page) {
        Locator calculation = page.locator("#calculation");
        assertThat(calculation.locator("svg.nw-drawing").first()).isAttached();
        assertThat(calculation.locator(".plain-words"))
                .containsText("In the recorded world half of people like this one live at least");
        assertThat(calculation.locator(".worlds")).containsText("Never happened");
        assertThat(calculation.locator(".cautions")).containsText("It is not a medical opinion.");
        assertThat(page.locator(".summary")).hasCount(0);
    }

    private static String record(Page page) {
        page.getByRole(AriaRole.BUTTON, new Page.GetByRoleOptions().setName("Record assessment"))
                .click();
        assertThat(page).hasURL(java.util.regex.Pattern.compile(".*/cases/FL-1/assessments/1$"));
        assertThat(page.locator("h1")).hasText("Assessment 1 of case FL-1");
        String text = mainText(page);
        assertThat(text).contains("Never happened").contains("What it rests on");
        return text;
    }

    /** The page's own text once all of it has arrived: its address and heading are there earlier. */
    private static String mainText(Page page) {
        page.waitForURL("**/assessments/1");
        page.waitForLoadState();
        return page.locator("main").textContent();
    }

    private static void save(Page page, String section) {
        page.locator("#" + section).getByText("Save", exactly()).first().click();
        assertThat(page.locator(".notice.done")).containsText("Saved");
    }

    private static void press(Locator within, String button) {
        within.getByRole(AriaRole.BUTTON, new Locator.GetByRoleOptions().setName(button))
                .click();
    }

    private static Locator.GetByTextOptions exactly() {
        return new Locator.GetByTextOptions().setExact(true);
    }

    /** The whole application on a port of its own and a data folder that outlives it. */
    private static final class Server implements AutoCloseable {
        private final ConfigurableApplicationContext context;

        Server(Path data) {
            context = new SpringApplicationBuilder(NearworldApplication.class)
                    .run("--server.port=0", "--nearworld.data=" + data, "--spring.web.locale=en");
        }

        String address() {
            return "http://localhost:" + context.getEnvironment().getProperty("local.server.port");
        }

        @Override
        public void close() {
            context.close();
        }
    }
}
