package nearworld.app.demo;

import org.springframework.web.bind.annotation.ControllerAdvice;
import org.springframework.web.bind.annotation.ModelAttribute;

/** Tells every page whether this installation is the demo, so that it says so. */
@ControllerAdvice
class DemoNotice {
    private final Demo demo;

    DemoNotice(Demo demo) {
        this.demo = demo;
    }

    @ModelAttribute("demo")
    boolean demo() {
        return demo.wanted();
    }
}
