package nearworld.exchange.faults;

/**
 * A place in a text.
 *
 * @param line from 1; 0 where the input was no text
 * @param column from 1; 0 where it is not known
 */
public record Place(int line, int column) implements Comparable<Place> {
    /** No place in a text. */
    public static final Place NOWHERE = new Place(0, 0);

    @Override
    public int compareTo(Place other) {
        return line != other.line ? Integer.compare(line, other.line) : Integer.compare(column, other.column);
    }
}
