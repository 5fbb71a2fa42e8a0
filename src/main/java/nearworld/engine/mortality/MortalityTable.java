package nearworld.engine.mortality;

import java.util.ArrayList;
import java.util.List;
import nearworld.engine.basics.Sex;
import org.jspecify.annotations.Nullable;

/**
 * A mortality table as published: yearly probabilities of death by sex and integer age, ultimate rates only.
 *
 * @param population that the table describes, compared with the pack's
 * @param columns one for each sex, or for each sex and smoking class
 */
public record MortalityTable(
        String name, AgeBasis ageBasis, WithinYear withinYear, String population, List<Column> columns) {

    public MortalityTable {
        columns = List.copyOf(columns);
        if (columns.isEmpty()) {
            throw new IllegalArgumentException("a table needs rates");
        }
    }

    /** What the integer ages of a table mean for a life of exact age a. */
    public enum AgeBasis {
        /** Reads at a. */
        EXACT,
        /** Age nearest birthday: reads at a. */
        NEAREST,
        /** Age last birthday: reads at a − ½. */
        LAST
    }

    /** How deaths spread over a year of age. */
    public enum WithinYear {
        /** The force of mortality is constant. */
        CONSTANT_FORCE,
        /** Deaths are uniformly distributed. */
        UNIFORM,
        /** Balducci: the probability of dying in the rest of the year is linear. */
        BALDUCCI
    }

    /**
     * Rates of one sex, and of one smoking class where the table is split.
     *
     * @param smokingLevels the levels of the pack's behaviour {@code smoking} that the class stands for; empty: all
     * @param firstAge the integer age of the first rate
     * @param qx yearly probabilities of death within [0, 1], one for each age from the first on; a rate of 1 only last
     */
    public record Column(Sex sex, List<String> smokingLevels, int firstAge, List<Double> qx) {
        public Column {
            smokingLevels = List.copyOf(smokingLevels);
            qx = List.copyOf(qx);
            for (int i = 0; i < qx.size(); i++) {
                double q = qx.get(i);
                if (!(q >= 0 && q <= 1) || (q == 1 && i < qx.size() - 1)) {
                    throw new IllegalArgumentException("q must lie within [0, 1] and be 1 only at the last age, is " + q
                            + " at age " + (firstAge + i));
                }
            }
            if (qx.isEmpty() || firstAge < 0 || firstAge + qx.size() > LifeTable.LAST_CLOSING_AGE + 1) {
                throw new IllegalArgumentException("ages must lie within 0.." + LifeTable.LAST_CLOSING_AGE);
            }
        }
    }

    /** True where the rates are split by smoking. */
    public boolean isSmokingDistinct() {
        return columns.stream().anyMatch(c -> !c.smokingLevels().isEmpty());
    }

    /** The column for a sex and (where the table is split) a level of smoking; null where the table has none. */
    public @Nullable Column column(Sex sex, @Nullable String smokingLevel) {
        for (Column c : columns) {
            if (c.sex() == sex
                    && (c.smokingLevels().isEmpty() || c.smokingLevels().contains(smokingLevel))) {
                return c;
            }
        }
        return null;
    }

    /** The rates as one life reads them. */
    public LifeTable life(Column column) {
        List<Double> q = new ArrayList<>(column.qx());
        boolean closed = q.get(q.size() - 1) == 1;
        while (!closed && column.firstAge() + q.size() <= LifeTable.LAST_CLOSING_AGE) {
            q.add(q.get(q.size() - 1));
        }
        double shift = ageBasis == AgeBasis.LAST ? 0.5 : 0;
        return new LifeTable(
                column.firstAge(), q.stream().mapToDouble(Double::doubleValue).toArray(), withinYear, shift, !closed);
    }
}
