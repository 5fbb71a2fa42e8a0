package nearworld.app.casepages;

import java.util.Map;
import nearworld.app.people.CurrentPerson;
import nearworld.app.people.Permissions;
import nearworld.app.trail.NewEntry;
import nearworld.app.trail.Trail;
import nearworld.app.trail.TrailVerifier;
import nearworld.app.trail.Verification;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;

/** The trail of the whole installation. */
@Controller
class TrailController {
    private final Trail trail;
    private final TrailVerifier verifier;
    private final Permissions permissions;
    private final CurrentPerson current;

    TrailController(Trail trail, TrailVerifier verifier, Permissions permissions, CurrentPerson current) {
        this.trail = trail;
        this.verifier = verifier;
        this.permissions = permissions;
        this.current = current;
    }

    @GetMapping("/trail")
    String all(@RequestParam(defaultValue = "1") String page, Model model) {
        permissions.require("trail.view");
        model.addAttribute("trail", trail.page(PageNumber.parse(page), permissions.may("trail.accessLog")));
        model.addAttribute("verification", null);
        return "trail/all";
    }

    @PostMapping("/trail/verify")
    String verify(Model model) {
        permissions.require("trail.verify");
        Verification verification = verifier.verify();
        trail.append(NewEntry.of(
                current.required().name(),
                "trail.verified",
                Map.of(
                        "intact", Boolean.toString(verification.intact()),
                        "entries", Long.toString(verification.entries()))));
        model.addAttribute("verification", verification);
        model.addAttribute("trail", trail.page(1, permissions.may("trail.accessLog")));
        return "trail/all";
    }
}
