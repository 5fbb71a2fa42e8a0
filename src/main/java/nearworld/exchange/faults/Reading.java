package nearworld.exchange.faults;

import java.util.List;
import nearworld.engine.basics.Fault;

/**
 * What comes of reading an input: the value, or every fault that it has.
 *
 * @param <T> what is read
 */
public sealed interface Reading<T> {
    /** True where there is a value. */
    boolean isAccepted();

    /** The value; a programming mistake where there is none. */
    T value();

    /** The faults in the order of their places; empty where there is a value. */
    List<LocatedFault> located();

    /** The faults without their places in the text. */
    default List<Fault> faults() {
        return located().stream().map(LocatedFault::fault).toList();
    }

    /** An input without fault. */
    record Accepted<T>(T value) implements Reading<T> {
        @Override
        public boolean isAccepted() {
            return true;
        }

        @Override
        public List<LocatedFault> located() {
            return List.of();
        }
    }

    /** An input with at least one fault. */
    record Refused<T>(List<LocatedFault> located) implements Reading<T> {
        public Refused {
            located = List.copyOf(located);
            if (located.isEmpty()) {
                throw new IllegalArgumentException("a refusal needs a fault");
            }
        }

        @Override
        public boolean isAccepted() {
            return false;
        }

        @Override
        public T value() {
            throw new IllegalStateException(
                    "the input was refused: " + located.get(0).fault());
        }
    }

    static <T> Reading<T> accepted(T value) {
        return new Accepted<>(value);
    }

    static <T> Reading<T> refused(List<LocatedFault> faults) {
        return new Refused<>(faults);
    }
}
