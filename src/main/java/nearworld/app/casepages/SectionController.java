package nearworld.app.casepages;

import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.util.Locale;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import nearworld.app.cases.CaseView;
import nearworld.app.cases.Cases;
import nearworld.app.cases.SaveOutcome;
import nearworld.app.cases.SectionConflict;
import nearworld.app.forms.CoverForm;
import nearworld.app.forms.HistoryForm;
import nearworld.app.forms.PersonForm;
import nearworld.app.forms.Section;
import nearworld.app.forms.StatementsForm;
import nearworld.app.forms.WhatIfsForm;
import org.springframework.http.HttpStatus;
import org.springframework.security.access.AccessDeniedException;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.WebDataBinder;
import org.springframework.web.bind.annotation.InitBinder;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.server.ResponseStatusException;
import org.springframework.web.util.UriComponentsBuilder;

/** Saves the sections of a case, one at a time, or shows one again with a row more or less. */
@Controller
class SectionController {
    private static final int MOST_ROWS = 1000;

    /** An index of four digits or more: 1000 is the first that does not fit. */
    private static final Pattern LONG_INDEX = Pattern.compile("\\[[0-9]{4,}]");

    private final Cases cases;
    private final CasePage page;

    SectionController(Cases cases, CasePage page) {
        this.cases = cases;
        this.page = page;
    }

    @PostMapping("/cases/{ref}/person")
    String person(
            @PathVariable String ref,
            @ModelAttribute("typed") PersonForm form,
            Model model,
            @ModelAttribute("posted") Posted posted) {
        return handle(ref, Section.PERSON, form, model, posted);
    }

    @PostMapping("/cases/{ref}/statements")
    String statements(
            @PathVariable String ref,
            @ModelAttribute("typed") StatementsForm form,
            Model model,
            @ModelAttribute("posted") Posted posted) {
        return handle(ref, Section.STATEMENTS, form, model, posted);
    }

    @PostMapping("/cases/{ref}/history")
    String history(
            @PathVariable String ref,
            @ModelAttribute("typed") HistoryForm form,
            Model model,
            @ModelAttribute("posted") Posted posted) {
        return handle(ref, Section.HISTORY, form, model, posted);
    }

    @PostMapping("/cases/{ref}/what-ifs")
    String whatIfs(
            @PathVariable String ref,
            @ModelAttribute("typed") WhatIfsForm form,
            Model model,
            @ModelAttribute("posted") Posted posted) {
        return handle(ref, Section.WHAT_IFS, form, model, posted);
    }

    @PostMapping("/cases/{ref}/cover")
    String cover(
            @PathVariable String ref,
            @ModelAttribute("typed") CoverForm form,
            Model model,
            @ModelAttribute("posted") Posted posted) {
        return handle(ref, Section.COVER, form, model, posted);
    }

    @InitBinder("typed")
    void takeLongLists(WebDataBinder binder) {
        binder.setAutoGrowCollectionLimit(MOST_ROWS);
    }

    /** What comes with every section: the version edited and the button pressed, and where to answer. */
    @ModelAttribute("posted")
    Posted posted(HttpServletRequest request, HttpServletResponse response, Locale locale) {
        refuseTooManyRows(request);
        return new Posted(
                request.getParameter("version"),
                RowEdit.of(request.getParameter("add"), request.getParameter("remove")),
                response,
                locale);
    }

    /** Beyond its limit the binder would drop the whole list; nothing typed may vanish so. */
    private static void refuseTooManyRows(HttpServletRequest request) {
        for (String name : request.getParameterMap().keySet()) {
            Matcher index = LONG_INDEX.matcher(name);
            if (index.find()) {
                throw new ResponseStatusException(
                        HttpStatus.CONTENT_TOO_LARGE, "a list of a section has at most " + MOST_ROWS + " rows");
            }
        }
    }

    private String handle(String ref, Section section, Object form, Model model, Posted posted) {
        RowEdit edit = posted.edit();
        if (edit != null) {
            CaseView view = cases.view(ref);
            if (!view.mayEdit()) {
                throw new AccessDeniedException("case.edit");
            }
            model.addAttribute("editing", section.id());
            return page.fill(model, view, cases.forms(ref).with(section, edit.apply(form)), posted.locale());
        }
        SaveOutcome outcome = cases.save(ref, section, posted.versionNumber(), form);
        if (outcome instanceof SectionConflict conflict) {
            posted.response().setStatus(HttpStatus.CONFLICT.value());
            return page.fillConflict(model, ref, conflict, form, posted.locale());
        }
        return "redirect:"
                + UriComponentsBuilder.fromPath("/cases/{ref}")
                        .queryParam("saved", section.id())
                        .fragment(section.id())
                        .build(ref);
    }
}
