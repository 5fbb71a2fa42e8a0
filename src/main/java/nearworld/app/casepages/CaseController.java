package nearworld.app.casepages;

import jakarta.servlet.http.HttpServletResponse;
import java.util.Locale;
import nearworld.app.assessments.Assessments;
import nearworld.app.assessments.RecordOutcome;
import nearworld.app.assessments.RecordedAssessment;
import nearworld.app.cases.CaseView;
import nearworld.app.cases.Cases;
import nearworld.app.cases.NoSuchCaseException;
import nearworld.app.people.Permissions;
import nearworld.app.results.ResultViews;
import nearworld.app.trail.Trail;
import org.springframework.http.HttpStatus;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.util.UriComponentsBuilder;

/** A case: its page, its recorded assessments and its trail. */
@Controller
class CaseController {
    private final Cases cases;
    private final Assessments assessments;
    private final Trail trail;
    private final Permissions permissions;
    private final CasePage page;
    private final ResultViews results;

    CaseController(
            Cases cases,
            Assessments assessments,
            Trail trail,
            Permissions permissions,
            CasePage page,
            ResultViews results) {
        this.cases = cases;
        this.assessments = assessments;
        this.trail = trail;
        this.permissions = permissions;
        this.page = page;
        this.results = results;
    }

    @GetMapping("/cases/{ref}")
    String show(@PathVariable String ref, @RequestParam(defaultValue = "") String saved, Model model, Locale locale) {
        CaseView view = cases.view(ref);
        cases.viewed(ref);
        boolean known = view.sections().stream().anyMatch(s -> s.section().id().equals(saved));
        model.addAttribute("saved", known ? saved : null);
        return page.fill(model, view, cases.forms(ref), locale);
    }

    @PostMapping("/cases/{ref}/assessments")
    String record(@PathVariable String ref, Model model, Locale locale, HttpServletResponse response) {
        RecordOutcome outcome = assessments.record(ref);
        if (outcome instanceof RecordOutcome.Recorded recorded) {
            return "redirect:"
                    + UriComponentsBuilder.fromPath("/cases/{ref}/assessments/{number}")
                            .build(ref, recorded.number());
        }
        response.setStatus(HttpStatus.UNPROCESSABLE_CONTENT.value());
        model.addAttribute("recordRefused", true);
        return page.fill(model, cases.view(ref), cases.forms(ref), locale);
    }

    @GetMapping("/cases/{ref}/assessments/{number}")
    String assessment(@PathVariable String ref, @PathVariable String number, Model model, Locale locale) {
        if (!number.matches("[1-9][0-9]{0,8}")) {
            throw new NoSuchCaseException();
        }
        CaseView view = cases.view(ref);
        RecordedAssessment opened = assessments.open(ref, Integer.parseInt(number), locale);
        model.addAttribute("case", view);
        model.addAttribute("assessment", opened.assessment());
        model.addAttribute("calculation", opened.calculated());
        model.addAttribute("result", results.of(opened.calculated(), locale));
        return "assessments/assessment";
    }

    @GetMapping("/cases/{ref}/trail")
    String trail(@PathVariable String ref, Model model) {
        model.addAttribute("case", cases.viewForTrail(ref));
        model.addAttribute("entries", trail.ofCase(ref, permissions.may("trail.accessLog")));
        return "trail/case";
    }
}
