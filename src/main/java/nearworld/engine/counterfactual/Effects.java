package nearworld.engine.counterfactual;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;

/**
 * The after-effects at work on a strand, in the order of their occurrences. Reached from one root, equal sets are the same
 * object, so that strands are told apart by identity.
 */
final class Effects {
    private final List<Effect> all;
    private final Map<Effect, Effects> longer = new LinkedHashMap<>();

    private Effects(List<Effect> all) {
        this.all = List.copyOf(all);
    }

    /** A root: no after-effect. */
    static Effects none() {
        return new Effects(List.of());
    }

    List<Effect> all() {
        return all;
    }

    /** These and one more; the same where there is none. */
    Effects and(@Nullable Effect effect) {
        if (effect == null) {
            return this;
        }
        Effects known = longer.get(effect);
        if (known == null) {
            List<Effect> more = new ArrayList<>(all);
            more.add(effect);
            known = new Effects(more);
            longer.put(effect, known);
        }
        return known;
    }
}
