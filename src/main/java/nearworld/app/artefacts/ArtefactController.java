package nearworld.app.artefacts;

import nearworld.app.people.Permissions;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;

/** The list of artefacts. */
@Controller
class ArtefactController {
    private final Artefacts artefacts;
    private final Permissions permissions;

    ArtefactController(Artefacts artefacts, Permissions permissions) {
        this.artefacts = artefacts;
        this.permissions = permissions;
    }

    @GetMapping("/artefacts")
    String list(Model model) {
        permissions.require("artefact.list");
        model.addAttribute("artefacts", artefacts.list());
        return "artefacts/list";
    }
}
