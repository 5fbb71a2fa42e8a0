package nearworld.app.people;

import org.jspecify.annotations.Nullable;
import org.springframework.web.bind.annotation.ControllerAdvice;
import org.springframework.web.bind.annotation.ModelAttribute;

/** What the frame around every page needs: who is signed in and where that person may go. */
@ControllerAdvice
class PageFrame {
    private final CurrentPerson current;
    private final PermissionMatrix matrix;

    PageFrame(CurrentPerson current, PermissionMatrix matrix) {
        this.current = current;
        this.matrix = matrix;
    }

    @ModelAttribute("me")
    @Nullable
    PersonView me() {
        return current.get().orElse(null);
    }

    @ModelAttribute("mayList")
    boolean mayList() {
        return may("case.list");
    }

    @ModelAttribute("maySeeTrail")
    boolean maySeeTrail() {
        return may("trail.view");
    }

    @ModelAttribute("maySeeArtefacts")
    boolean maySeeArtefacts() {
        return may("artefact.list");
    }

    private boolean may(String action) {
        return current.get()
                .map(person -> !matrix.scopes(action, person.role()).isEmpty())
                .orElse(false);
    }
}
