package nearworld.app.drawing;

/** Writes SVG text. Numbers have at most one decimal, so that the same input gives the same bytes everywhere. */
final class Svg {
    private final StringBuilder out = new StringBuilder(1 << 14);

    /** Opens the drawing, named by its title and described by its description. */
    Svg open(String idPrefix, double width, double height, String title, String description) {
        out.append("<svg xmlns=\"http://www.w3.org/2000/svg\" class=\"nw-drawing\" role=\"img\" viewBox=\"0 0 ")
                .append(n(width))
                .append(' ')
                .append(n(height))
                .append("\" width=\"")
                .append(n(width))
                .append("\" height=\"")
                .append(n(height))
                .append("\" font-family=\"Helvetica, Arial, sans-serif\" aria-labelledby=\"")
                .append(idPrefix)
                .append("-title ")
                .append(idPrefix)
                .append("-desc\">\n<title id=\"")
                .append(idPrefix)
                .append("-title\">")
                .append(escape(title))
                .append("</title>\n<desc id=\"")
                .append(idPrefix)
                .append("-desc\">")
                .append(escape(description))
                .append("</desc>\n");
        return this;
    }

    /** Opens a drawing that only repeats what stands beside it. */
    void openSilent(double width, double height) {
        out.append("<svg xmlns=\"http://www.w3.org/2000/svg\" class=\"nw-small\" aria-hidden=\"true\" viewBox=\"0 0 ")
                .append(n(width))
                .append(' ')
                .append(n(height))
                .append("\" width=\"")
                .append(n(width))
                .append("\" height=\"")
                .append(n(height))
                .append("\">\n");
    }

    String close() {
        return out.append("</svg>\n").toString();
    }

    void rect(double x, double y, double width, double height, Ink fill) {
        element("rect")
                .a("x", x)
                .a("y", y)
                .a("width", Math.max(0, width))
                .a("height", height)
                .fill(fill)
                .end();
    }

    /** A patch of paper behind a text, so that lines under it do not run through its letters. */
    void patch(double x, double y, double width, double height, Ink paper) {
        element("rect")
                .a("x", x)
                .a("y", y)
                .a("width", width)
                .a("height", height)
                .fill(paper)
                .a("opacity", "0.86")
                .end();
    }

    void line(double x1, double y1, double x2, double y2, Ink ink, double width) {
        element("line")
                .a("x1", x1)
                .a("y1", y1)
                .a("x2", x2)
                .a("y2", y2)
                .stroke(ink, width)
                .end();
    }

    void fill(String path, Ink ink) {
        element("path").a("d", path).fill(ink).end();
    }

    /** A sign in the colour of the text, with a rim of paper that keeps it off its neighbours. */
    void sign(String path) {
        element("path").a("d", path).fill(Ink.TEXT).stroke(Ink.PAPER, 0.8).end();
    }

    void stroke(String path, Ink ink, double width, String dashes) {
        Element e = element("path").a("d", path).fill(Ink.NONE).stroke(ink, width);
        (dashes.isEmpty() ? e : e.a("stroke-dasharray", dashes)).end();
    }

    void circle(double x, double y, double radius, Ink fill, Ink stroke, double width) {
        element("circle")
                .a("cx", x)
                .a("cy", y)
                .a("r", radius)
                .fill(fill)
                .stroke(stroke, width)
                .end();
    }

    /** @param anchor start, middle or end */
    void text(double x, double y, double size, Ink ink, String anchor, String words) {
        text(x, y, size, ink, anchor, words, false);
    }

    void text(double x, double y, double size, Ink ink, String anchor, String words, boolean strong) {
        Element e = element("text").a("x", x).a("y", y).a("font-size", size).fill(ink);
        if (!anchor.equals("start")) {
            e.a("text-anchor", anchor);
        }
        (strong ? e.a("font-weight", "600") : e).end(words);
    }

    private Element element(String name) {
        out.append('<').append(name);
        return new Element(name);
    }

    /** One element, attribute by attribute. */
    private final class Element {
        private final String name;
        private final StringBuilder classes = new StringBuilder();

        Element(String name) {
            this.name = name;
        }

        Element a(String key, double value) {
            return a(key, n(value));
        }

        Element a(String key, String value) {
            out.append(' ').append(key).append("=\"").append(value).append('"');
            return this;
        }

        Element fill(Ink ink) {
            classes.append(classes.isEmpty() ? "" : " ").append("f-").append(ink.key());
            return a("fill", ink.colour());
        }

        Element stroke(Ink ink, double width) {
            classes.append(classes.isEmpty() ? "" : " ").append("s-").append(ink.key());
            return a("stroke", ink.colour()).a("stroke-width", width);
        }

        void end() {
            a("class", classes.toString());
            out.append("/>\n");
        }

        void end(String words) {
            a("class", classes.toString());
            out.append('>').append(escape(words)).append("</").append(name).append(">\n");
        }
    }

    /** A number with at most one decimal and a point. */
    static String n(double value) {
        long tenths = Math.round(value * 10);
        long rest = Math.abs(tenths % 10);
        String whole = (tenths < 0 && tenths > -10 ? "-" : "") + tenths / 10;
        return rest == 0 ? whole : whole + "." + rest;
    }

    /** Text for XML; control characters, which XML 1.0 forbids, become spaces. */
    static String escape(String words) {
        StringBuilder b = new StringBuilder(words.length() + 16);
        words.codePoints().forEach(c -> {
            switch (c) {
                case '&' -> b.append("&amp;");
                case '<' -> b.append("&lt;");
                case '>' -> b.append("&gt;");
                case '"' -> b.append("&quot;");
                default -> b.appendCodePoint(allowed(c) ? c : ' ');
            }
        });
        return b.toString();
    }

    private static boolean allowed(int c) {
        return c >= 0x20 && c != 0x7f && !(c >= 0xd800 && c <= 0xdfff) && c != 0xfffe && c != 0xffff;
    }
}
