package nearworld.app.gallery;

import java.util.List;
import java.util.Locale;
import nearworld.app.assessments.NotCalculated;
import nearworld.app.cases.CaseQuery;
import nearworld.app.cases.SectionConflict;
import nearworld.app.forms.FieldFault;
import nearworld.app.forms.FieldFaults;
import nearworld.app.forms.Section;
import nearworld.app.results.ResultViews;
import nearworld.app.trail.TrailPage;
import nearworld.app.trail.Verification;
import nearworld.engine.basics.Fault;
import org.jspecify.annotations.Nullable;
import org.springframework.boot.test.context.TestComponent;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PathVariable;

/** Serves every page in every state from samples. */
@Controller
@TestComponent
class GalleryController {
    private final ResultViews results;

    GalleryController(ResultViews results) {
        this.results = results;
    }

    /** Reads as the real one does: reference, external reference, due date. */
    record NewCaseForm(String caseRef, String externalRef, String dueOn) {}

    @ModelAttribute
    void everyPage(Model model) {
        model.addAttribute("me", Samples.ME);
        model.addAttribute("mayList", true);
        model.addAttribute("maySeeTrail", true);
        model.addAttribute("maySeeArtefacts", true);
        model.addAttribute("demo", true);
    }

    @GetMapping("/gallery")
    String gallery(Model model, Locale locale) {
        model.addAttribute("faults", Samples.faults());
        model.addAttribute("choices", Samples.choices());
        model.addAttribute("forms", Samples.forms());
        model.addAttribute("result", results.of(Samples.crowded(), locale));
        model.addAttribute("calculation", Samples.crowded());
        return "gallery/gallery";
    }

    @GetMapping("/gallery/sign-in/{problem}")
    String signIn(@PathVariable String problem, Model model) {
        model.addAttribute("me", null);
        model.addAttribute("problem", problem.equals("none") ? null : problem);
        return "people/sign-in";
    }

    @GetMapping("/gallery/list/{state}")
    String list(@PathVariable String state, Model model) {
        CaseQuery query = state.equals("filtered") ? new CaseQuery("SP&1", "open", "ada", "due", 2) : CaseQuery.all();
        model.addAttribute("cases", Samples.caseList(query, !state.equals("full")));
        return "cases/list";
    }

    @GetMapping("/gallery/new/{state}")
    String newCase(@PathVariable String state, Model model) {
        boolean bad = state.equals("bad");
        FieldFault fault =
                new FieldFault(Section.PERSON, "caseRef", Fault.of("caseRefTaken", "$.caseRef", "value", "SP-1042"));
        model.addAttribute("form", new NewCaseForm(bad ? "SP-1042" : "", "", ""));
        model.addAttribute("faults", bad ? new FieldFaults(List.of(fault)) : FieldFaults.none());
        return "cases/new";
    }

    @GetMapping("/gallery/case/{state}")
    String casePage(@PathVariable String state, Model model, Locale locale) {
        boolean bad = state.equals("bad");
        boolean calculated = !state.equals("waiting");
        model.addAttribute("case", Samples.caseView(!state.equals("read-only")));
        model.addAttribute("forms", Samples.forms());
        model.addAttribute("versions", Samples.versions());
        model.addAttribute("faults", bad ? Samples.faults() : FieldFaults.none());
        model.addAttribute("choices", Samples.choices());
        model.addAttribute(
                "calculation",
                calculated ? Samples.calculated() : new NotCalculated(List.of(Fault.of("personIncomplete", "$"))));
        model.addAttribute("result", calculated ? results.of(Samples.calculated(), locale) : null);
        model.addAttribute("assessments", calculated ? Samples.assessments() : List.of());
        model.addAttribute("saved", state.equals("saved") ? "person" : null);
        model.addAttribute("editing", state.equals("editing") ? "history" : null);
        model.addAttribute("recordRefused", bad);
        model.addAttribute("conflict", state.equals("conflict") ? conflict() : null);
        return "cases/case";
    }

    private static @Nullable SectionConflict conflict() {
        return new SectionConflict(Section.HISTORY, "ben", Samples.NOW, 7, Samples.forms());
    }

    @GetMapping("/gallery/assessment/{state}")
    String assessment(@PathVariable String state, Model model, Locale locale) {
        var calculated = state.equals("crowded") ? Samples.crowded() : Samples.calculated();
        model.addAttribute("case", Samples.caseView(true));
        model.addAttribute("assessment", Samples.assessments().get(0));
        model.addAttribute("calculation", calculated);
        model.addAttribute("result", results.of(calculated, locale));
        return "assessments/assessment";
    }

    @GetMapping("/gallery/trail/{state}")
    String trail(@PathVariable String state, Model model) {
        if (state.equals("case")) {
            model.addAttribute("case", Samples.caseView(true));
            model.addAttribute("entries", Samples.trail());
            return "trail/case";
        }
        model.addAttribute("trail", new TrailPage(Samples.trail(), 1, 3, 1200));
        model.addAttribute(
                "verification",
                switch (state) {
                    case "intact" -> new Verification(true, 1200, null, null, 14);
                    case "broken" -> new Verification(false, 1200, 411L, "hash", 14);
                    default -> null;
                });
        return "trail/all";
    }

    @GetMapping("/gallery/artefacts")
    String artefacts(Model model) {
        model.addAttribute("artefacts", Samples.artefacts());
        return "artefacts/list";
    }

    @GetMapping("/gallery/error/{code}")
    String error(@PathVariable String code, Model model) {
        model.addAttribute("status", code.equals("other") ? null : code);
        model.addAttribute("reference", code.equals("500") ? "7f3a-91c2" : null);
        return code.equals("other") ? "error" : "error/" + code;
    }
}
