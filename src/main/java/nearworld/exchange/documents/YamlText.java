package nearworld.exchange.documents;

import java.util.Iterator;
import java.util.Optional;
import java.util.regex.Pattern;
import nearworld.engine.basics.Fault;
import nearworld.exchange.faults.FaultList;
import nearworld.exchange.faults.JsonPath;
import nearworld.exchange.faults.Place;
import org.jspecify.annotations.Nullable;
import org.snakeyaml.engine.v2.api.LoadSettings;
import org.snakeyaml.engine.v2.api.lowlevel.Parse;
import org.snakeyaml.engine.v2.events.AliasEvent;
import org.snakeyaml.engine.v2.events.CollectionStartEvent;
import org.snakeyaml.engine.v2.events.Event;
import org.snakeyaml.engine.v2.events.ScalarEvent;
import org.snakeyaml.engine.v2.exceptions.Mark;
import org.snakeyaml.engine.v2.exceptions.MarkedYamlEngineException;
import org.snakeyaml.engine.v2.exceptions.YamlEngineException;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.node.JsonNodeFactory;

/**
 * Reads YAML 1.2 (core schema, section 10.3.2 of its specification) as a document: {@code yes} and {@code no} are texts. Aliases
 * and tags are refused, so nothing expands and nothing is of another type than it looks. JSON is read as well.
 */
public final class YamlText {
    private static final JsonNodeFactory NODES = JsonNodeFactory.instance;
    private static final Pattern NULL = Pattern.compile("null|Null|NULL|~|");
    private static final Pattern TRUE = Pattern.compile("true|True|TRUE");
    private static final Pattern FALSE = Pattern.compile("false|False|FALSE");
    private static final Pattern NUMBER =
            Pattern.compile("[-+]?[0-9]+|[-+]?(\\.[0-9]+|[0-9]+(\\.[0-9]*)?)([eE][-+]?[0-9]+)?");
    private static final Pattern OTHER_BASE = Pattern.compile("0o[0-7]{1,15}|0x[0-9a-fA-F]{1,12}");
    private static final Pattern NOT_FINITE = Pattern.compile("[-+]?\\.(inf|Inf|INF)|\\.(nan|NaN|NAN)");
    private static final int OCTAL = 8;
    private static final int HEXADECIMAL = 16;

    private final FaultList faults;
    private final TreeBuilder tree;
    private boolean documentEnded;

    private YamlText(FaultList faults) {
        this.faults = faults;
        this.tree = new TreeBuilder(faults);
    }

    /** @param mostBytes the greatest size */
    public static Document read(byte[] bytes, int mostBytes) {
        FaultList faults = new FaultList();
        String text = StrictText.decode(bytes, mostBytes, 1, faults);
        Document document = new Document(null, faults);
        if (text != null) {
            document = json(text, faults);
            document = document == null ? new Document(new YamlText(faults).root(text), faults) : document;
        }
        faults.endStage();
        return document;
    }

    /** What opens like JSON and is JSON; null where YAML has to be tried. */
    private static @Nullable Document json(String text, FaultList faults) {
        if (!text.stripLeading().startsWith("{")) {
            return null;
        }
        FaultList own = new FaultList();
        Document document = JsonText.read(text, 1, own);
        if (document.root() == null) {
            return null;
        }
        own.sorted().forEach(f -> faults.add(f.fault(), f.place()));
        own.copyPlacesTo(faults);
        return new Document(document.root(), faults);
    }

    private @Nullable JsonNode root(String text) {
        LoadSettings settings = LoadSettings.builder()
                .setCodePointLimit(Integer.MAX_VALUE)
                .setUseMarks(true)
                .build();
        try {
            Iterator<Event> events = new Parse(settings).parseString(text).iterator();
            while (events.hasNext()) {
                if (!step(events.next())) {
                    return null;
                }
            }
            if (tree.root() == null) {
                faults.add(Fault.of("emptyDocument", JsonPath.ROOT), new Place(1, 1));
            }
            return tree.root();
        } catch (TreeBuilder.TooDeepException e) {
            faults.add(Fault.of("tooDeep", JsonPath.ROOT, "bound", TreeBuilder.DEEPEST), e.place);
        } catch (MarkedYamlEngineException e) {
            Optional<Mark> mark = e.getProblemMark();
            faults.add(
                    Fault.of("notYaml", JsonPath.ROOT, "detail", e.getProblem()),
                    mark.map(YamlText::place).orElse(Place.NOWHERE));
        } catch (YamlEngineException e) {
            faults.add(Fault.of("notYaml", JsonPath.ROOT, "detail", firstLineOf(e)));
        }
        return null;
    }

    private static String firstLineOf(YamlEngineException e) {
        return String.valueOf(e.getMessage()).lines().findFirst().orElse("");
    }

    /** False where reading cannot go on. */
    private boolean step(Event event) {
        Place place = event.getStartMark().map(YamlText::place).orElse(Place.NOWHERE);
        if (event.getEventId() == Event.ID.DocumentStart && documentEnded) {
            faults.add(Fault.of("severalDocuments", JsonPath.ROOT), place);
            return false;
        }
        documentEnded |= event.getEventId() == Event.ID.DocumentEnd;
        if (event instanceof AliasEvent) {
            faults.add(Fault.of("aliasRefused", tree.awaitsKey() ? JsonPath.ROOT : tree.nextPath()), place);
            return false;
        }
        String tag = tag(event);
        if (tag != null) {
            String path = tree.awaitsKey() ? JsonPath.ROOT : tree.nextPath();
            faults.add(Fault.of("tagRefused", path, "found", tag), place);
            return false;
        }
        if (event instanceof CollectionStartEvent start && tree.awaitsKey()) {
            faults.add(
                    Fault.of("keyNotText", JsonPath.ROOT),
                    start.getStartMark().map(YamlText::place).orElse(place));
            return false;
        }
        build(event, place);
        return true;
    }

    private static @Nullable String tag(Event event) {
        if (event instanceof ScalarEvent scalar) {
            return scalar.getTag().orElse(null);
        }
        return event instanceof CollectionStartEvent start ? start.getTag().orElse(null) : null;
    }

    private void build(Event event, Place place) {
        switch (event.getEventId()) {
            case MappingStart -> tree.startObject(place);
            case SequenceStart -> tree.startArray(place);
            case MappingEnd, SequenceEnd -> tree.end();
            case Scalar -> {
                ScalarEvent scalar = (ScalarEvent) event;
                if (tree.awaitsKey()) {
                    tree.key(scalar.getValue(), place);
                } else {
                    tree.value(scalar.isPlain() ? plain(scalar.getValue(), place) : text(scalar), place);
                }
            }
            default -> {
                // The stream's and the documents' ends carry nothing.
            }
        }
    }

    private static JsonNode text(ScalarEvent scalar) {
        return NODES.stringNode(scalar.getValue());
    }

    private JsonNode plain(String value, Place place) {
        if (NUMBER.matcher(value).matches()) {
            return Numbers.of(value.startsWith("+") ? value.substring(1) : value, tree.nextPath(), place, faults);
        }
        if (NOT_FINITE.matcher(value).matches()) {
            faults.add(Fault.of("notFinite", tree.nextPath(), "value", value), place);
            return NODES.nullNode();
        }
        if (OTHER_BASE.matcher(value).matches()) {
            int base = value.charAt(1) == 'o' ? OCTAL : HEXADECIMAL;
            return NODES.numberNode(Long.parseLong(value.substring(2), base));
        }
        if (TRUE.matcher(value).matches() || FALSE.matcher(value).matches()) {
            return NODES.booleanNode(TRUE.matcher(value).matches());
        }
        return NULL.matcher(value).matches() ? NODES.nullNode() : NODES.stringNode(value);
    }

    private static Place place(Mark mark) {
        return new Place(mark.getLine() + 1, mark.getColumn() + 1);
    }
}
