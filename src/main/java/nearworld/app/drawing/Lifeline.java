package nearworld.app.drawing;

import java.time.LocalDate;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * What a lifeline shows, in the reader's words: left of today the history, right of it one strip for each world.
 *
 * @param today the assessment day
 * @param born the day of birth, for the scale of ages
 * @param lanes one for each type of event, with its watched window and its occurrences
 * @param flags onsets of conditions
 * @param strips worlds from top to bottom; the table first, exactly one {@link Kind#RECORDED}
 */
public record Lifeline(
        Words words, LocalDate today, LocalDate born, List<Lane> lanes, List<Flag> flags, List<Strip> strips) {

    public Lifeline {
        lanes = List.copyOf(lanes);
        flags = List.copyOf(flags);
        strips = List.copyOf(strips);
        if (strips.stream().filter(s -> s.kind() == Kind.RECORDED).count() != 1) {
            throw new IllegalArgumentException("strips must hold exactly one recorded world");
        }
    }

    /** The words around the drawing. The legend's words explain its signs. */
    public record Words(
            String title,
            String description,
            String today,
            String year,
            String age,
            String knownSince,
            String mildest,
            String severest,
            String watched,
            String median,
            String middleHalf,
            String middleMost,
            String tableBehind,
            String parts) {}

    /**
     * One type of event.
     *
     * @param from first day of the watched window, null where none is recorded
     * @param to its last day
     */
    public record Lane(
            String title,
            @Nullable LocalDate from,
            @Nullable LocalDate to,
            List<Mark> marks) {
        public Lane {
            marks = List.copyOf(marks);
            if ((from == null) != (to == null)) {
                throw new IllegalArgumentException("a window has both ends or none, has " + from + " and " + to);
            }
        }
    }

    /**
     * One occurrence.
     *
     * @param severity 0 for the mildest outcome, 1, 2, …; from 3 on all look alike
     * @param brief the label where there is little room
     */
    public record Mark(LocalDate on, int severity, String label, String brief) {
        public Mark {
            if (severity < 0) {
                throw new IllegalArgumentException("severity must be 0 or more, is " + severity);
            }
        }
    }

    /** The day since when a condition is known. */
    public record Flag(LocalDate on, String label, String brief) {}

    /** What a strip stands for, which decides its ink. */
    public enum Kind {
        TABLE(Ink.TABLE),
        REVEALED(Ink.REVEALED),
        RECORDED(Ink.RECORDED),
        WHAT_IF(Ink.WHAT_IF),
        CONTRAST(Ink.CONTRAST);

        private final Ink ink;

        Kind(Ink ink) {
            this.ink = ink;
        }

        Ink ink() {
            return ink;
        }
    }

    /**
     * One world.
     *
     * @param figure its headline number with its unit, for example "8.1 years"
     * @param monthly the probability of being alive after 0, 1, 2, … months from today
     * @param spread quantiles of the remaining lifetime
     * @param parting where the world leaves the recorded one; null where it does not (table, recorded)
     */
    public record Strip(
            Kind kind,
            String title,
            String note,
            String figure,
            String figureNote,
            List<Double> monthly,
            Spread spread,
            @Nullable Parting parting) {
        public Strip {
            monthly = List.copyOf(monthly);
            if (monthly.size() < 2) {
                throw new IllegalArgumentException("a world needs its curve, has " + monthly.size() + " months");
            }
        }
    }

    /** Years from today by which 10%, 25%, 50%, 75% and 90% have died. */
    public record Spread(double tenth, double quarter, double half, double threeQuarters, double nineTenths) {}

    /**
     * The moment at which a world leaves the recorded one.
     *
     * @param on null: always was different
     */
    public record Parting(@Nullable LocalDate on) {}
}
