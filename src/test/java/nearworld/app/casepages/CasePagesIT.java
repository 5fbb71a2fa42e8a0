package nearworld.app.casepages;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.post;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.redirectedUrl;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import nearworld.app.ApplicationTest;
import nearworld.app.people.People;
import nearworld.app.people.PersonView;
import nearworld.app.people.Role;
import nearworld.app.people.TestSignIn;
import org.jsoup.Jsoup;
import org.jsoup.nodes.Document;
import org.jsoup.select.Elements;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.test.web.servlet.ResultActions;
import org.springframework.test.web.servlet.request.MockHttpServletRequestBuilder;

/** The pages of cases as HTML, from an empty case to a recorded assessment. */
@ApplicationTest
class CasePagesIT {
    @Autowired
    private MockMvc mvc;

    @Autowired
    private People people;

    private PersonView underwriter;
    private String path = "";

    @BeforeEach
    void aNewCase() throws Exception {
        String name = "pages.underwriter";
        underwriter = people.byName(name)
                .orElseGet(
                        () -> people.add(name, "Page Turner", Role.UNDERWRITER, "long enough to be taken", "system"));
        String location = send(post("/cases").param("caseRef", "").param("dueOn", "2027-01-15"))
                .andExpect(status().isFound())
                .andReturn()
                .getResponse()
                .getRedirectedUrl();
        path = location == null ? "" : location;
        assertThat(path).matches("/cases/C-[0-9]+");
    }

    private ResultActions send(MockHttpServletRequestBuilder request) throws Exception {
        return mvc.perform(request.with(TestSignIn.as(underwriter)).with(csrf()));
    }

    private static Document html(ResultActions answer) throws Exception {
        return Jsoup.parse(answer.andReturn().getResponse().getContentAsString());
    }

    private Document page(String address) throws Exception {
        return html(send(get(address)).andExpect(status().isOk()));
    }

    private static String value(Document page, String name) {
        Elements fields = page.select("form.section [name='" + name + "']");
        assertThat(fields).as(name).isNotEmpty();
        return fields.get(0).attr("value");
    }

    private static Elements svg(Document page) {
        return page.select("#calculation svg");
    }

    private void fillPerson() throws Exception {
        send(post(path + "/person")
                        .param("version", "0")
                        .param("sex", "female")
                        .param("bornOn", "1961-02-03")
                        .param("assessedOn", "2026-12-01")
                        .param("behaviours[0].behaviour", "smoking")
                        .param("behaviours[0].level", "never"))
                .andExpect(redirectedUrl(path + "?saved=person#person"));
    }

    @Test
    void anEmptyCaseShowsFiveSectionsAndNoFaults() throws Exception {
        Document page = page(path);
        assertThat(page.select("form.section")).hasSize(5);
        assertThat(page.select("[aria-invalid=true]")).isEmpty();
        assertThat(page.select("[name=sex]")).isNotEmpty();
        assertThat(page.select("[style], script:not([src])")).isEmpty();
    }

    @Test
    void aSavedPersonIsShownAgainWithTheCalculationBeside() throws Exception {
        fillPerson();
        Document page = page(path + "?saved=person");
        assertThat(value(page, "bornOn")).isEqualTo("1961-02-03");
        assertThat(page.select("form#person > input[name=version]").attr("value"))
                .isEqualTo("1");
        assertThat(svg(page)).isNotEmpty();
    }

    @Test
    void whatIsTypedWrongIsKeptAndNamedAtItsField() throws Exception {
        fillPerson();
        send(post(path + "/statements")
                        .param("version", "0")
                        .param("statements[0].condition", "hypertension")
                        .param("statements[0].present", "true")
                        .param("statements[0].source", "applicant")
                        .param("statements[0].onset", "when I was <b>young</b>"))
                .andExpect(redirectedUrl(path + "?saved=statements#statements"));
        Document page = page(path);
        assertThat(value(page, "statements[0].onset")).isEqualTo("when I was <b>young</b>");
        assertThat(page.select("[name='statements[0].onset']").attr("aria-invalid"))
                .isEqualTo("true");
        assertThat(svg(page)).isNotEmpty();
        send(post(path + "/assessments")).andExpect(status().isUnprocessableContent());
    }

    @Test
    void addingARowSavesNothingAndKeepsWhatIsTyped() throws Exception {
        fillPerson();
        Document page = html(send(post(path + "/history")
                        .param("version", "0")
                        .param("history[0].event", "heartAttack")
                        .param("history[0].from", "2016")
                        .param("history[0].occurrences[0].on", "spring")
                        .param("add", "history[0].occurrences"))
                .andExpect(status().isOk()));
        assertThat(value(page, "history[0].from")).isEqualTo("2016");
        assertThat(value(page, "history[0].occurrences[0].on")).isEqualTo("spring");
        assertThat(value(page, "history[0].occurrences[1].on")).isEmpty();
        assertThat(page.select("form#history > input[name=version]").attr("value"))
                .isEqualTo("0");
        assertThat(page(path).html()).doesNotContain("spring");
    }

    @Test
    void removingARowTakesThatRowOnly() throws Exception {
        fillPerson();
        Document page = html(send(post(path + "/statements")
                .param("version", "0")
                .param("statements[0].on", "first")
                .param("statements[1].on", "second")
                .param("statements[2].on", "third")
                .param("remove", "statements[1]")));
        assertThat(value(page, "statements[0].on")).isEqualTo("first");
        assertThat(value(page, "statements[1].on")).isEqualTo("third");
        assertThat(page.select("[value=second]")).isEmpty();
    }

    @Test
    void aConflictShowsBothSidesAndKeepsMine() throws Exception {
        fillPerson();
        Document page = html(send(post(path + "/person")
                        .param("version", "0")
                        .param("sex", "male")
                        .param("bornOn", "1950"))
                .andExpect(status().isConflict()));
        assertThat(value(page, "bornOn")).isEqualTo("1950");
        assertThat(page.select("form#person [value=1961-02-03]")).isNotEmpty();
        assertThat(page.select("form#person > input[name=version]").attr("value"))
                .isEqualTo("1");
        assertThat(value(page(path), "bornOn")).isEqualTo("1961-02-03");
    }

    @Test
    void aRowTooManyIsRefusedRatherThanDropped() throws Exception {
        send(post(path + "/statements").param("version", "0").param("statements[1000].on", "2020"))
                .andExpect(status().isContentTooLarge());
    }

    @Test
    void aCaseIsRecordedAndTheAssessmentOpens() throws Exception {
        fillPerson();
        send(post(path + "/assessments")).andExpect(redirectedUrl(path + "/assessments/1"));
        assertThat(page(path + "/assessments/1").select("svg")).isNotEmpty();
        assertThat(page(path).select("a[href='" + path + "/assessments/1']")).isNotEmpty();
        send(get(path + "/assessments/2")).andExpect(status().isNotFound());
        send(get(path + "/assessments/zero")).andExpect(status().isNotFound());
        assertThat(page(path + "/trail").text()).contains("pages.underwriter");
    }

    @Test
    void aNewCaseWithABadReferenceKeepsWhatIsTyped() throws Exception {
        Document page =
                html(send(post("/cases").param("caseRef", "no spaces please").param("dueOn", "tomorrow"))
                        .andExpect(status().isUnprocessableContent()));
        assertThat(page.select("[name=caseRef]").attr("value")).isEqualTo("no spaces please");
        assertThat(page.select("[name=dueOn]").attr("value")).isEqualTo("tomorrow");
        assertThat(page.select("[aria-invalid=true]")).hasSize(2);
    }

    @Test
    void theListFindsTheCase() throws Exception {
        String ref = path.substring("/cases/".length());
        String link = "a[href='" + path + "']";
        assertThat(page("/cases?q=" + ref).select(link)).isNotEmpty();
        assertThat(page("/cases?q=nothing&sort=colour&page=-3").select(link)).isEmpty();
    }
}
