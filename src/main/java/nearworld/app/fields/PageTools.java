package nearworld.app.fields;

import nearworld.app.web.FaultWords;
import nearworld.app.web.Figures;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.ControllerAdvice;
import org.springframework.web.bind.annotation.ModelAttribute;

/**
 * Gives every page its tools: {@code figures}, {@code faultWords}, {@code fields} and {@code options}. They stand in the
 * model because templates may not name beans where they build addresses or call fragments.
 */
@ControllerAdvice
class PageTools {
    private final Figures figures;
    private final FaultWords faultWords;
    private final FieldIds fields;
    private final Options options;

    PageTools(Figures figures, FaultWords faultWords, FieldIds fields, Options options) {
        this.figures = figures;
        this.faultWords = faultWords;
        this.fields = fields;
        this.options = options;
    }

    @ModelAttribute
    void tools(Model model) {
        model.addAttribute("figures", figures);
        model.addAttribute("faultWords", faultWords);
        model.addAttribute("fields", fields);
        model.addAttribute("options", options);
    }
}
