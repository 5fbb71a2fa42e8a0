package nearworld.app.casepages;

import java.time.LocalDate;
import java.time.format.DateTimeParseException;
import java.util.ArrayList;
import java.util.List;
import nearworld.app.cases.CaseQuery;
import nearworld.app.cases.CaseRefTakenException;
import nearworld.app.cases.Cases;
import nearworld.app.cases.NewCase;
import nearworld.app.forms.FieldFault;
import nearworld.app.forms.FieldFaults;
import nearworld.app.forms.Section;
import nearworld.app.people.Permissions;
import nearworld.engine.basics.Fault;
import org.jspecify.annotations.Nullable;
import org.springframework.http.HttpStatus;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.util.UriComponentsBuilder;

/** The list of cases, and new ones. */
@Controller
class CaseListController {
    private static final int LONGEST_EXTERNAL_REF = 100;

    private final Cases cases;
    private final Permissions permissions;

    CaseListController(Cases cases, Permissions permissions) {
        this.cases = cases;
        this.permissions = permissions;
    }

    @GetMapping("/")
    String home() {
        return permissions.may("case.list") ? "redirect:/cases" : "redirect:/artefacts";
    }

    @GetMapping("/cases")
    String list(
            @RequestParam(defaultValue = "") String q,
            @RequestParam(defaultValue = "") String state,
            @RequestParam(defaultValue = "") String owner,
            @RequestParam(defaultValue = "") String sort,
            @RequestParam(defaultValue = "1") String page,
            Model model) {
        model.addAttribute("cases", cases.list(new CaseQuery(q, state, owner, sort, PageNumber.parse(page))));
        return "cases/list";
    }

    @GetMapping("/cases/new")
    String blank(Model model) {
        return form(new NewCaseForm("", "", ""), FieldFaults.none(), model);
    }

    @PostMapping("/cases")
    Object create(
            @ModelAttribute("form") NewCaseForm form, Model model, jakarta.servlet.http.HttpServletResponse response) {
        List<FieldFault> faults = new ArrayList<>();
        String ref = form.caseRef().strip();
        if (!ref.isEmpty() && (!ref.matches(NewCase.REF_PATTERN) || ref.equals("new"))) {
            faults.add(fault("caseRef", Fault.of("caseRefPattern", "$.caseRef", "value", ref)));
        }
        if (form.externalRef().strip().length() > LONGEST_EXTERNAL_REF) {
            faults.add(fault("externalRef", Fault.of("tooLong", "$.externalRef", "bound", LONGEST_EXTERNAL_REF)));
        }
        LocalDate dueOn = day(form.dueOn(), faults);
        if (faults.isEmpty()) {
            try {
                String made = cases.create(new NewCase(ref, form.externalRef(), dueOn));
                return "redirect:"
                        + UriComponentsBuilder.fromPath("/cases/{ref}").build(made);
            } catch (CaseRefTakenException e) {
                faults.add(fault("caseRef", Fault.of("caseRefTaken", "$.caseRef", "value", ref)));
            }
        }
        response.setStatus(HttpStatus.UNPROCESSABLE_CONTENT.value());
        return form(form, new FieldFaults(faults), model);
    }

    private static @Nullable LocalDate day(String typed, List<FieldFault> faults) {
        if (typed.isBlank()) {
            return null;
        }
        try {
            return LocalDate.parse(typed.strip());
        } catch (DateTimeParseException e) {
            faults.add(fault("dueOn", Fault.of("notADay", "$.dueOn", "value", typed)));
            return null;
        }
    }

    private static FieldFault fault(String field, Fault fault) {
        return new FieldFault(Section.PERSON, field, fault);
    }

    private String form(NewCaseForm form, FieldFaults faults, Model model) {
        model.addAttribute("form", form);
        model.addAttribute("faults", faults);
        return "cases/new";
    }
}
