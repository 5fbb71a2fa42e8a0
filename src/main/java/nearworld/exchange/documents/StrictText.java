package nearworld.exchange.documents;

import java.nio.ByteBuffer;
import java.nio.CharBuffer;
import java.nio.charset.CharsetDecoder;
import java.nio.charset.CoderResult;
import java.nio.charset.CodingErrorAction;
import java.nio.charset.StandardCharsets;
import java.util.Locale;
import nearworld.engine.basics.Fault;
import nearworld.exchange.faults.FaultList;
import nearworld.exchange.faults.JsonPath;
import nearworld.exchange.faults.Place;
import org.jspecify.annotations.Nullable;

/** Bytes as text: UTF-8 and nothing else, no control characters, within a size. A byte order mark is passed over. */
public final class StrictText {
    private static final char BYTE_ORDER_MARK = '\uFEFF';

    private StrictText() {}

    /**
     * @param mostBytes the greatest size
     * @param firstLine number of the text's first line within its file
     * @return the text, null where a fault was added
     */
    public static @Nullable String decode(byte[] bytes, int mostBytes, int firstLine, FaultList faults) {
        if (bytes.length > mostBytes) {
            faults.add(tooLarge(mostBytes));
            return null;
        }
        CharsetDecoder decoder = StandardCharsets.UTF_8
                .newDecoder()
                .onMalformedInput(CodingErrorAction.REPORT)
                .onUnmappableCharacter(CodingErrorAction.REPORT);
        ByteBuffer in = ByteBuffer.wrap(bytes);
        CharBuffer out = CharBuffer.allocate(bytes.length + 1);
        CoderResult result = decoder.decode(in, out, true);
        String text = out.flip().toString();
        if (result.isError()) {
            String found = String.format(Locale.ROOT, "0x%02X", bytes[in.position()]);
            faults.add(
                    Fault.of("notUtf8", JsonPath.ROOT, "found", found, "offset", in.position()),
                    place(text, text.length(), firstLine));
            return null;
        }
        for (int i = 0; i < text.length(); i++) {
            char c = text.charAt(i);
            if (c < ' ' && c != '\n' && c != '\r' && c != '\t') {
                String found = String.format(Locale.ROOT, "U+%04X", (int) c);
                faults.add(Fault.of("controlCharacter", JsonPath.ROOT, "found", found), place(text, i, firstLine));
                return null;
            }
        }
        return !text.isEmpty() && text.charAt(0) == BYTE_ORDER_MARK ? text.substring(1) : text;
    }

    /** The fault of an input that is greater than its kind may be. */
    public static Fault tooLarge(int mostBytes) {
        return Fault.of("tooLarge", JsonPath.ROOT, "bound", mostBytes);
    }

    private static Place place(String text, int index, int firstLine) {
        int line = firstLine;
        int start = 0;
        for (int i = 0; i < index; i++) {
            if (text.charAt(i) == '\n') {
                line++;
                start = i + 1;
            }
        }
        return new Place(line, index - start + 1);
    }
}
