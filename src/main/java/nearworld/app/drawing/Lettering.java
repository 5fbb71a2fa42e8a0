package nearworld.app.drawing;

import java.util.List;

/**
 * How wide words will be, estimated from classes of letters of a common sans serif: the reader's font is not known
 * here, and measuring one of this machine would make the drawing differ between machines. Errs on the wide side.
 */
final class Lettering {
    private static final String NARROW = "iljtfrI.,:;'’|!()[]/· -";
    private static final String WIDE = "mwMWÄÖÜ@%—…";

    private Lettering() {}

    /** The estimated width at a font size, in the same unit as the size. */
    static double width(String words, double size) {
        double ems = words.codePoints().mapToDouble(Lettering::ems).sum();
        return ems * size;
    }

    private static double ems(int c) {
        if (NARROW.indexOf(c) >= 0) {
            return 0.34;
        }
        if (WIDE.indexOf(c) >= 0) {
            return 0.88;
        }
        return Character.isUpperCase(c) ? 0.70 : c > 0x2e80 ? 1.0 : 0.57;
    }

    /** The words, cut with an ellipsis where they would be wider than that. */
    static String fit(String words, double size, double width) {
        if (width(words, size) <= width) {
            return words;
        }
        int end = words.length();
        while (end > 0 && width(words.substring(0, end) + "…", size) > width) {
            end = words.offsetByCodePoints(end, -1);
        }
        return words.substring(0, end).stripTrailing() + "…";
    }

    /** The words on one line, or on two where they are wider; what does not fit on the second is cut. */
    static List<String> wrap(String words, double size, double width) {
        if (width(words, size) <= width) {
            return List.of(words);
        }
        int space = words.indexOf(' ');
        int last = -1;
        while (space > 0 && width(words.substring(0, space), size) <= width) {
            last = space;
            space = words.indexOf(' ', space + 1);
        }
        if (last < 0) {
            return List.of(fit(words, size, width));
        }
        return List.of(words.substring(0, last), fit(words.substring(last + 1), size, width));
    }
}
