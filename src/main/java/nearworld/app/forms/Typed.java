package nearworld.app.forms;

import java.util.List;
import java.util.Objects;
import org.jspecify.annotations.Nullable;

/** What a browser leaves out becomes an empty text or an empty list, so that forms hold no nulls. */
final class Typed {
    private Typed() {}

    static String text(@Nullable String typed) {
        return typed == null ? "" : typed;
    }

    static <T> List<T> rows(@Nullable List<T> typed) {
        return typed == null
                ? List.of()
                : typed.stream().filter(Objects::nonNull).toList();
    }

    static boolean allBlank(String... texts) {
        for (String text : texts) {
            if (!text.isBlank()) {
                return false;
            }
        }
        return true;
    }
}
