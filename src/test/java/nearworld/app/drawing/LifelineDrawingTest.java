package nearworld.app.drawing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;

import java.io.StringReader;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import javax.xml.parsers.DocumentBuilderFactory;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.w3c.dom.NodeList;
import org.xml.sax.InputSource;

class LifelineDrawingTest {
    private static final LocalDate TODAY = LocalDate.of(2026, 12, 1);

    @ParameterizedTest
    @EnumSource(Format.class)
    void isXmlWithTitleAndDescriptionAndWithoutStyleOrScript(Format format) throws Exception {
        Document svg = parse(LifelineDrawing.svg(lifeline("A & <b> \u0001 \"c\"", TODAY.minusYears(3)), format));
        Element root = svg.getDocumentElement();
        String[] ids = root.getAttribute("aria-labelledby").split(" ");
        assertThat(root.getElementsByTagName("title").item(0).getTextContent()).startsWith("A & <b>");
        assertThat(((Element) root.getElementsByTagName("title").item(0)).getAttribute("id"))
                .isEqualTo(ids[0]);
        assertThat(((Element) root.getElementsByTagName("desc").item(0)).getAttribute("id"))
                .isEqualTo(ids[1]);
        NodeList all = svg.getElementsByTagName("*");
        for (int i = 0; i < all.getLength(); i++) {
            assertThat(((Element) all.item(i)).hasAttribute("style")).isFalse();
            assertThat(all.item(i).getNodeName()).isNotIn("style", "script", "foreignObject", "image", "a");
        }
    }

    @ParameterizedTest
    @EnumSource(Format.class)
    void theSameInputGivesTheSameBytes(Format format) {
        assertThat(LifelineDrawing.svg(lifeline("x", TODAY), format))
                .isEqualTo(LifelineDrawing.svg(lifeline("x", TODAY), format));
    }

    @ParameterizedTest
    @EnumSource(Format.class)
    void nothingLiesOutsideTheDrawing(Format format) throws Exception {
        Document svg = parse(LifelineDrawing.svg(lifeline("x", LocalDate.of(1970, 1, 1)), format));
        double height = Double.parseDouble(svg.getDocumentElement().getAttribute("height"));
        NodeList texts = svg.getElementsByTagName("text");
        assertThat(texts.getLength()).isGreaterThan(20);
        for (int i = 0; i < texts.getLength(); i++) {
            Element text = (Element) texts.item(i);
            assertThat(Double.parseDouble(text.getAttribute("x"))).isBetween(0.0, format.width());
            assertThat(Double.parseDouble(text.getAttribute("y"))).isBetween(0.0, height);
        }
    }

    @Test
    void theAxisIsOneScaleFromTheFirstEventToTheLastYears() {
        TimeScale time = TimeScale.of(lifeline("x", TODAY.minusYears(10)), Format.WIDE);
        double tenBack = time.today() - time.x(TODAY.minusYears(10));
        double tenOn = time.x(TODAY.plusYears(10)) - time.today();
        assertThat(tenBack).isCloseTo(tenOn, org.assertj.core.data.Offset.offset(0.2));
        assertThat(time.x(TODAY.minusYears(10))).isGreaterThan(time.left());
    }

    @Test
    void aWorldThatPartsInTheFutureIsDrawnAsRecordedUntilThen() throws Exception {
        assertThat(stripsDrawnAsRecorded(TODAY.plusYears(5))).isEqualTo(1);
        assertThat(stripsDrawnAsRecorded(TODAY.minusYears(5))).isZero();
    }

    private static int stripsDrawnAsRecorded(LocalDate parts) throws Exception {
        NodeList paths =
                parse(LifelineDrawing.svg(lifeline("x", parts), Format.WIDE)).getElementsByTagName("path");
        int shared = 0;
        for (int i = 0; i < paths.getLength(); i++) {
            shared += ((Element) paths.item(i)).getAttribute("class").equals("f-contrast") ? 1 : 0;
        }
        return shared;
    }

    @Test
    void aLifelineNeedsExactlyOneRecordedWorld() {
        Lifeline good = lifeline("x", TODAY);
        assertThatIllegalArgumentException()
                .isThrownBy(() -> new Lifeline(
                        good.words(),
                        TODAY,
                        TODAY,
                        List.of(),
                        List.of(),
                        good.strips().subList(0, 1)))
                .withMessageContaining("recorded");
    }

    private static Document parse(String svg) throws Exception {
        return DocumentBuilderFactory.newInstance().newDocumentBuilder().parse(new InputSource(new StringReader(svg)));
    }

    private static Lifeline lifeline(String title, LocalDate parts) {
        Lifeline.Words words = new Lifeline.Words(
                title,
                "description",
                "today",
                "year",
                "age",
                "since",
                "mild",
                "severe",
                "watched",
                "median",
                "half",
                "most",
                "table",
                "parts");
        List<Lifeline.Mark> marks = new ArrayList<>();
        for (int i = 0; i < 24; i++) {
            marks.add(new Lifeline.Mark(TODAY.minusDays(30 + 91L * i), i % 4, "ward, " + i, "w" + i));
        }
        Lifeline.Lane lane = new Lifeline.Lane("Admission", TODAY.minusYears(8), TODAY, marks);
        Lifeline.Flag flag = new Lifeline.Flag(TODAY.minusYears(4), "Diabetes 2022", "2022");
        return new Lifeline(
                words,
                TODAY,
                LocalDate.of(1962, 3, 9),
                List.of(lane),
                List.of(flag),
                List.of(
                        strip(Lifeline.Kind.TABLE, 0.02, null),
                        strip(Lifeline.Kind.RECORDED, 0.06, null),
                        strip(Lifeline.Kind.WHAT_IF, 0.04, new Lifeline.Parting(parts)),
                        strip(Lifeline.Kind.WHAT_IF, 0.03, new Lifeline.Parting(null))));
    }

    private static Lifeline.Strip strip(
            Lifeline.Kind kind, double hazard, Lifeline.@org.jspecify.annotations.Nullable Parting parting) {
        List<Double> monthly = new ArrayList<>();
        for (int month = 0; month <= 660; month++) {
            monthly.add(Math.exp(-hazard * month / 12 * (1 + month / 240.0)));
        }
        return new Lifeline.Strip(
                kind,
                "A world of its own",
                "note",
                "8 years",
                "median 7",
                monthly,
                new Lifeline.Spread(2, 4, 7, 12, 18),
                parting);
    }
}
