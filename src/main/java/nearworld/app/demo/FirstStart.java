package nearworld.app.demo;

import org.springframework.context.SmartLifecycle;
import org.springframework.stereotype.Component;

/** Fills an empty installation before the first request is served: with the demo, or with its first admin. */
@Component
class FirstStart implements SmartLifecycle {
    /** Long before the web server, which comes last. */
    private static final int PHASE = 0;

    private final Demo demo;
    private final FirstAdmin firstAdmin;
    private volatile boolean running;

    FirstStart(Demo demo, FirstAdmin firstAdmin) {
        this.demo = demo;
        this.firstAdmin = firstAdmin;
    }

    @Override
    public void start() {
        if (demo.wanted()) {
            demo.load();
        } else {
            firstAdmin.ensure();
        }
        running = true;
    }

    @Override
    public void stop() {
        running = false;
    }

    @Override
    public boolean isRunning() {
        return running;
    }

    @Override
    public int getPhase() {
        return PHASE;
    }
}
