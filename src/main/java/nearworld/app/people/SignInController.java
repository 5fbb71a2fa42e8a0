package nearworld.app.people;

import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.RequestParam;

/** The page to sign in at; Spring Security takes what it posts. */
@Controller
class SignInController {
    @GetMapping("/sign-in")
    String page(
            @RequestParam(required = false) @Nullable String error,
            @RequestParam(required = false) @Nullable String out,
            Model model) {
        model.addAttribute("problem", error != null ? "wrong" : out != null ? "out" : null);
        return "people/sign-in";
    }
}
