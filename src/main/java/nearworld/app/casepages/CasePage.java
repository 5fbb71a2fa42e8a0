package nearworld.app.casepages;

import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import nearworld.app.artefacts.PackChoices;
import nearworld.app.assessments.Assessments;
import nearworld.app.assessments.Calculated;
import nearworld.app.assessments.Calculations;
import nearworld.app.cases.CaseComposing;
import nearworld.app.cases.CaseView;
import nearworld.app.cases.Cases;
import nearworld.app.cases.SectionConflict;
import nearworld.app.forms.CaseForms;
import nearworld.app.forms.PersonForm;
import nearworld.app.forms.Section;
import nearworld.app.results.ResultViews;
import org.springframework.stereotype.Component;
import org.springframework.ui.Model;

/** Fills the model of the case page. */
@Component
class CasePage {
    static final String TEMPLATE = "cases/case";
    private static final PackChoices NOTHING =
            new PackChoices(List.of(), List.of(), List.of(), List.of(), List.of(), List.of());

    private final Cases cases;
    private final CaseComposing composing;
    private final Calculations calculations;
    private final Assessments assessments;
    private final ResultViews results;

    CasePage(
            Cases cases,
            CaseComposing composing,
            Calculations calculations,
            Assessments assessments,
            ResultViews results) {
        this.cases = cases;
        this.composing = composing;
        this.calculations = calculations;
        this.assessments = assessments;
        this.results = results;
    }

    /** The page of a case with what is typed in it, saved or not. */
    String fill(Model model, CaseView view, CaseForms typed, Locale locale) {
        PackChoices choices = composing.pack(typed).map(p -> p.choices(locale)).orElse(NOTHING);
        CaseForms forms = withAllBehaviours(typed, choices);
        Calculations.Worked worked = calculations.of(view.ref(), forms, locale);
        Map<String, Long> versions = new HashMap<>();
        view.sections().forEach(s -> versions.put(s.section().id(), s.version()));
        model.addAttribute("case", view);
        model.addAttribute("forms", forms);
        model.addAttribute("versions", versions);
        model.addAttribute("faults", worked.faults());
        model.addAttribute("choices", choices);
        model.addAttribute("occurrences", OccurrenceChoice.of(forms.history()));
        model.addAttribute("calculation", worked.calculation());
        model.addAttribute(
                "result",
                worked.calculation() instanceof Calculated calculated ? results.of(calculated, locale) : null);
        model.addAttribute("assessments", assessments.of(view.ref()));
        for (String absent : List.of("saved", "editing", "conflict", "theirs", "recordRefused")) {
            if (!model.containsAttribute(absent)) {
                model.addAttribute(absent, absent.equals("recordRefused") ? Boolean.FALSE : null);
            }
        }
        return TEMPLATE;
    }

    /** The page after somebody else saved the section first: mine in the form, theirs beside it. */
    String fillConflict(Model model, String ref, SectionConflict conflict, Object mine, Locale locale) {
        model.addAttribute("conflict", conflict);
        model.addAttribute("theirs", conflict.theirs());
        return fill(model, cases.view(ref), conflict.theirs().with(conflict.section(), mine), locale);
    }

    /** A row for each behaviour of the pack, in its order; rows of behaviours that it does not know come last. */
    private static CaseForms withAllBehaviours(CaseForms forms, PackChoices choices) {
        Map<String, PersonForm.BehaviourRow> typed = new java.util.LinkedHashMap<>();
        choices.behaviours().forEach(b -> typed.put(b.id(), new PersonForm.BehaviourRow(b.id(), "", "", "")));
        forms.person().behaviours().forEach(row -> typed.put(row.behaviour(), row));
        PersonForm person = forms.person();
        return forms.with(
                Section.PERSON,
                new PersonForm(person.sex(), person.bornOn(), person.assessedOn(), List.copyOf(typed.values())));
    }
}
