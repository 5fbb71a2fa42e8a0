package nearworld.exchange.cases;

import java.time.DateTimeException;
import java.time.LocalDate;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import nearworld.engine.basics.Fault;
import nearworld.engine.basics.PartialDate;
import nearworld.exchange.documents.Spot;
import nearworld.exchange.faults.FaultList;
import org.jspecify.annotations.Nullable;

/** Dates of a case, and the rules about before and after. */
final class Dates {
    private static final Pattern FORM = Pattern.compile("([0-9]{4})(?:-([0-9]{2})(?:-([0-9]{2}))?)?");
    private static final int MONTH = 2;
    private static final int DAY = 3;

    private final PartialDate born;
    private final LocalDate today;
    private final FaultList faults;

    Dates(PartialDate born, LocalDate today, FaultList faults) {
        this.born = born;
        this.today = today;
        this.faults = faults;
    }

    /** A date of any precision; null where there is none or it is not in the calendar. */
    static @Nullable PartialDate read(Spot spot, FaultList faults) {
        String text = spot.text();
        if (text == null) {
            return null;
        }
        Matcher m = FORM.matcher(text);
        if (!m.matches()) {
            // The schema has said so.
            return null;
        }
        int year = Integer.parseInt(m.group(1));
        try {
            if (m.group(MONTH) == null) {
                return PartialDate.ofYear(year);
            }
            int month = Integer.parseInt(m.group(MONTH));
            return m.group(DAY) == null
                    ? PartialDate.ofMonth(year, month)
                    : PartialDate.ofDay(LocalDate.of(year, month, Integer.parseInt(m.group(DAY))));
        } catch (DateTimeException e) {
            faults.add(Fault.of("noSuchDay", spot.path(), "value", text));
            return null;
        }
    }

    /** A date between birth and the assessment day. */
    @Nullable
    PartialDate past(Spot spot) {
        PartialDate date = read(spot, faults);
        if (date == null) {
            return null;
        }
        if (date.latest().isBefore(born.earliest())) {
            faults.add(Fault.of("dateBeforeBirth", spot.path(), "value", spot.shown(), "bornOn", born.earliest()));
            return null;
        }
        if (date.earliest().isAfter(today)) {
            faults.add(Fault.of("dateAfterAssessment", spot.path(), "value", spot.shown(), "assessedOn", today));
            return null;
        }
        return date;
    }

    /** A date on the assessment day or later. */
    @Nullable
    PartialDate ahead(Spot spot) {
        PartialDate date = read(spot, faults);
        if (date != null && date.latest().isBefore(today) && !today.equals(LocalDate.MAX)) {
            faults.add(Fault.of("dateBeforeAssessment", spot.path(), "value", spot.shown(), "assessedOn", today));
            return null;
        }
        return date;
    }

    /** The day that the calculation takes for a past date: its middle, at the latest the assessment day. */
    LocalDate day(PartialDate date) {
        return date.middle().isAfter(today) ? today : date.middle();
    }
}
