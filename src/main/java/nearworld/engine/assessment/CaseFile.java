package nearworld.engine.assessment;

import java.math.BigDecimal;
import java.time.LocalDate;
import java.util.List;
import nearworld.engine.basics.PartialDate;
import nearworld.engine.basics.Sex;
import org.jspecify.annotations.Nullable;

/**
 * A case as it was taken down, names resolved against one evidence pack: every {@code int} named after a thing of the
 * pack is that thing's index in the pack's list.
 *
 * <p>Callers hand in cases that keep the rules of the exchange format (names known, dates in order, windows apart); the
 * engine takes a broken rule for a programming mistake. What only the calculation can find out is a {@link Refusal}.
 */
public record CaseFile(
        String caseRef,
        LocalDate assessedOn,
        Sex sex,
        PartialDate bornOn,
        List<BehaviourReport> behaviours,
        List<Statement> statements,
        List<FindingReport> findings,
        List<History> history,
        @Nullable Death death,
        @Nullable Cover cover,
        List<WhatIf> whatIfs) {

    public CaseFile {
        behaviours = List.copyOf(behaviours);
        statements = List.copyOf(statements);
        findings = List.copyOf(findings);
        history = List.copyOf(history);
        whatIfs = List.copyOf(whatIfs);
    }

    /**
     * A behaviour whose level is known.
     *
     * @param since when the habit was given up; null: not said
     * @param left the level that was given up, or -1: the level with the highest ratio
     */
    public record BehaviourReport(
            int behaviour, int level, @Nullable PartialDate since, int left) {}

    /** What a source said about a condition, when ({@code on}), and since when the condition is there ({@code onset}). */
    public record Statement(
            int condition,
            boolean present,
            int source,
            @Nullable PartialDate on,
            @Nullable PartialDate onset) {}

    /** A finding's level, and the day it speaks of; null: today. */
    public record FindingReport(
            int finding, int level, @Nullable PartialDate on) {}

    /** Occurrences of one type of event, and the window in which all of them are known; both ends or none. */
    public record History(
            int event, @Nullable PartialDate from, @Nullable PartialDate to, List<Occurrence> occurrences) {
        public History {
            occurrences = List.copyOf(occurrences);
        }
    }

    /** @param outcome index in the event's outcomes, or -1 where it is not given (the occurrence of a death) */
    public record Occurrence(PartialDate on, int outcome) {}

    /** How the person died. */
    public record Death(
            PartialDate on,
            Cause cause,
            int event,
            @Nullable PartialDate occurrence) {}

    /** The cause of a death. */
    public enum Cause {
        EVENT,
        OTHER,
        UNKNOWN
    }

    /**
     * The cover applied for.
     *
     * @param years the term; null for the whole of life
     * @param interest per year, for example 0.03; null where none is given
     */
    public record Cover(
            CoverKind kind,
            @Nullable Integer years,
            @Nullable BigDecimal sumAssured,
            @Nullable String currency,
            @Nullable Double interest) {}

    /** The kinds of cover. */
    public enum CoverKind {
        TERM,
        WHOLE_OF_LIFE,
        ENDOWMENT,
        LIFE_ANNUITY
    }

    /** A named list of changes, all applied together. */
    public record WhatIf(String name, List<Change> changes) {
        public WhatIf {
            changes = List.copyOf(changes);
        }
    }

    /** One change of a what-if. */
    public sealed interface Change {
        /** The change's name in the exchange format. */
        String kind();
    }

    /** The occurrence did not happen. */
    public record Remove(int event, PartialDate on) implements Change {
        @Override
        public String kind() {
            return "remove";
        }
    }

    /** The occurrence happened on another day. */
    public record Move(int event, PartialDate on, PartialDate to) implements Change {
        @Override
        public String kind() {
            return "move";
        }
    }

    /** The occurrence had another outcome. */
    public record OtherOutcome(int event, PartialDate on, int to) implements Change {
        @Override
        public String kind() {
            return "outcome";
        }
    }

    /** The condition is absent: never there ({@code from} null), or cured from a day on. */
    public record Without(int condition, @Nullable PartialDate from) implements Change {
        @Override
        public String kind() {
            return "without";
        }
    }

    /** The behaviour is at a level: always ({@code from} null), or from a day on. */
    public record ChangedBehaviour(
            int behaviour, int level, @Nullable PartialDate from) implements Change {
        @Override
        public String kind() {
            return "behaviour";
        }
    }

    /** A treatment is started, today ({@code from} null) or from a day on. */
    public record Treat(int treatment, @Nullable PartialDate from) implements Change {
        @Override
        public String kind() {
            return "treat";
        }
    }

    /** An event happens in the future; {@code outcome} -1: not known. */
    public record Add(int event, PartialDate on, int outcome) implements Change {
        @Override
        public String kind() {
            return "add";
        }
    }
}
