package nearworld.oracle;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;

/** The texts under {@code src/test/resources/oracles}; its README names their sources. */
public final class Oracles {
    private Oracles() {}

    /** The text of a file, named from that folder, such as {@code worked/case-1.json}. */
    public static String text(String name) {
        try (InputStream in = Oracles.class.getResourceAsStream("/oracles/" + name)) {
            if (in == null) {
                throw new IllegalArgumentException("no check values named " + name);
            }
            return new String(in.readAllBytes(), StandardCharsets.UTF_8);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
