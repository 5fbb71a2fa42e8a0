package nearworld.cli;

import java.io.BufferedInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.util.List;
import java.util.function.Consumer;
import nearworld.engine.basics.Fault;
import nearworld.exchange.cases.CaseReader;
import nearworld.exchange.documents.JsonText;
import nearworld.exchange.documents.StrictText;
import nearworld.exchange.faults.JsonPath;
import nearworld.exchange.faults.LocatedFault;
import nearworld.exchange.faults.Place;
import org.jspecify.annotations.Nullable;

/**
 * Takes files apart into cases: {@code .json} is one case, {@code .jsonl} one a line; what is neither, and standard input, is one
 * case a line where its first line is a JSON value by itself. Reads as it goes: files may be longer than memory.
 */
final class CaseTexts {
    private static final int MOST = CaseReader.MOST_BYTES;
    private static final String STANDARD_INPUT = "-";

    private final InputStream standardInput;
    private final Consumer<CaseText> sink;

    CaseTexts(InputStream standardInput, Consumer<CaseText> sink) {
        this.standardInput = standardInput;
        this.sink = sink;
    }

    void read(String file) {
        try (InputStream in = new BufferedInputStream(open(file))) {
            if (file.endsWith(".json")) {
                sink.accept(new CaseText(file, 1, in.readNBytes(MOST + 1), List.of()));
            } else if (file.endsWith(".jsonl")) {
                lines(file, in, 1);
            } else {
                either(file, in);
            }
        } catch (IOException e) {
            sink.accept(unreadable(file, e));
        }
    }

    /** The fault of a file that cannot be read. */
    static Fault fault(IOException e) {
        String detail = e instanceof NoSuchFileException ? "no such file" : String.valueOf(e.getMessage());
        return Fault.of("unreadable", JsonPath.ROOT, "detail", detail);
    }

    private static CaseText unreadable(String file, IOException e) {
        return new CaseText(file, 1, new byte[0], List.of(new LocatedFault(fault(e), Place.NOWHERE)));
    }

    private InputStream open(String file) throws IOException {
        return file.equals(STANDARD_INPUT) ? standardInput : Files.newInputStream(Path.of(file));
    }

    private void either(String file, InputStream in) throws IOException {
        byte[] line = line(in);
        ByteArrayOutputStream before = new ByteArrayOutputStream();
        int number = 1;
        while (line != null && isBlank(line)) {
            before.writeBytes(line);
            before.write('\n');
            line = line(in);
            number++;
        }
        if (line == null) {
            sink.accept(new CaseText(file, 1, before.toByteArray(), List.of()));
        } else if (isOneDocument(line)) {
            before.writeBytes(line);
            before.write('\n');
            before.writeBytes(in.readNBytes(MOST + 1));
            sink.accept(new CaseText(file, 1, before.toByteArray(), List.of()));
        } else {
            one(file, line, number);
            lines(file, in, number + 1);
        }
    }

    /** What does not begin with a whole object is one document, or none: its faults are told once, not line by line. */
    private static boolean isOneDocument(byte[] firstLine) {
        String text = new String(firstLine, StandardCharsets.UTF_8);
        return firstLine.length > MOST
                || !text.replace("\uFEFF", "").stripLeading().startsWith("{")
                || JsonText.isUnfinished(text);
    }

    private void lines(String file, InputStream in, int firstLine) throws IOException {
        int number = firstLine;
        for (byte[] line = line(in); line != null; line = line(in)) {
            if (!isBlank(line)) {
                one(file, line, number);
            }
            number++;
        }
    }

    private void one(String file, byte[] line, int number) {
        List<LocatedFault> faults = line.length > MOST
                ? List.of(new LocatedFault(StrictText.tooLarge(MOST), new Place(number, 1)))
                : List.of();
        sink.accept(new CaseText(file, number, line, faults));
    }

    /** The next line without its end, cut behind the greatest size; null at the end. */
    private static byte @Nullable [] line(InputStream in) throws IOException {
        ByteArrayOutputStream line = new ByteArrayOutputStream();
        int b = in.read();
        if (b < 0) {
            return null;
        }
        while (b >= 0 && b != '\n') {
            if (line.size() <= MOST) {
                line.write(b);
            }
            b = in.read();
        }
        return line.toByteArray();
    }

    private static boolean isBlank(byte[] line) {
        for (byte b : line) {
            if (b != ' ' && b != '\t' && b != '\r') {
                return false;
            }
        }
        return true;
    }
}
