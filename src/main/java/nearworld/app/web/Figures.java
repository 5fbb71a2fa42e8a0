package nearworld.app.web;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.text.NumberFormat;
import java.time.Instant;
import java.time.LocalDate;
import java.time.YearMonth;
import java.time.ZoneId;
import java.time.format.DateTimeFormatter;
import java.time.temporal.TemporalAccessor;
import java.util.Locale;
import nearworld.engine.basics.PartialDate;
import org.springframework.context.MessageSource;
import org.springframework.stereotype.Component;

/** Numbers and dates as words with their units, in a language. Templates know it as {@code figures}. */
@Component
public class Figures {
    /** Probabilities below this, or above its complement, are not told apart: the evidence does not carry more. */
    private static final double LEAST_TOLD = 0.001;

    private static final double WHOLE_PERCENT_FROM = 0.095;

    private final MessageSource words;

    Figures(MessageSource words) {
        this.words = words;
    }

    /** Years with one decimal and the unit, for example "8.1 years". */
    public String years(double years, Locale locale) {
        return words.getMessage("figure.years", new Object[] {decimal(years, 1, locale)}, locale);
    }

    /** Years with one decimal, for a column whose head names the unit. */
    public String bareYears(double years, Locale locale) {
        return decimal(years, 1, locale);
    }

    /** A difference in years with its sign, for a column whose head names the unit. */
    public String difference(double years, Locale locale) {
        double rounded = round(years, 1);
        String sign = rounded > 0 ? "+" : rounded < 0 ? "−" : "±";
        return sign + decimal(Math.abs(rounded), 1, locale);
    }

    /** A range of years, for example "4.4 to 12.1". */
    public String range(double from, double to, Locale locale) {
        Object[] ends = {decimal(from, 1, locale), decimal(to, 1, locale)};
        return words.getMessage("figure.range", ends, locale);
    }

    /** A probability in per cent; 0 and 1 stand only for what is certain. */
    public String probability(double p, Locale locale) {
        if (p > 0 && p < LEAST_TOLD) {
            return words.getMessage("figure.under", new Object[] {percent(LEAST_TOLD, 1, locale)}, locale);
        }
        if (p < 1 && p > 1 - LEAST_TOLD) {
            return words.getMessage("figure.over", new Object[] {percent(1 - LEAST_TOLD, 1, locale)}, locale);
        }
        boolean fine = (p > 0 && p < WHOLE_PERCENT_FROM) || (p < 1 && p > 0.99);
        return percent(p, fine ? 1 : 0, locale);
    }

    /** A mortality ratio in per cent of the table, for example "316%". */
    public String ratio(double ratio, Locale locale) {
        return percent(ratio, 0, locale);
    }

    /** A quotient of two ratios, for example "× 1.31". */
    public String factor(double factor, Locale locale) {
        return "× " + decimal(factor, 2, locale);
    }

    /** Extra deaths per thousand a year with one decimal, for a column whose head names the unit. */
    public String perMille(double perMille, Locale locale) {
        double rounded = round(perMille, 1);
        return (rounded < 0 ? "−" : "") + decimal(Math.abs(rounded), 1, locale);
    }

    /** A date as exactly as it is known: a day, a month or a year. */
    public String date(PartialDate date, Locale locale) {
        LocalDate first = date.earliest();
        if (date.isExact()) {
            return day(first, locale);
        }
        boolean oneMonth = YearMonth.from(first).equals(YearMonth.from(date.latest()));
        return oneMonth ? month(first, locale) : format("date.year", first, locale);
    }

    /** A day, for example "10 May 2024". */
    public String day(LocalDate day, Locale locale) {
        return format("date.day", day, locale);
    }

    /** Month and year, for example "May 2024". */
    public String month(LocalDate day, Locale locale) {
        return format("date.month", day, locale);
    }

    /** A moment, in the server's zone. */
    public String moment(Instant instant, Locale locale) {
        return format("date.moment", instant.atZone(ZoneId.systemDefault()), locale);
    }

    /** A whole number with its thousands apart. */
    public String count(long number, Locale locale) {
        return NumberFormat.getIntegerInstance(locale).format(number);
    }

    private String format(String key, TemporalAccessor when, Locale locale) {
        String pattern = words.getMessage(key, null, locale);
        return DateTimeFormatter.ofPattern(pattern, locale).format(when);
    }

    private static String decimal(double value, int digits, Locale locale) {
        NumberFormat format = NumberFormat.getNumberInstance(locale);
        format.setMinimumFractionDigits(digits);
        format.setMaximumFractionDigits(digits);
        format.setRoundingMode(RoundingMode.HALF_UP);
        return format.format(round(value, digits));
    }

    private static String percent(double share, int digits, Locale locale) {
        NumberFormat format = NumberFormat.getPercentInstance(locale);
        format.setMinimumFractionDigits(digits);
        format.setMaximumFractionDigits(digits);
        format.setRoundingMode(RoundingMode.HALF_UP);
        return format.format(share);
    }

    /** Rounded half up, and never a negative zero. */
    public static double round(double value, int digits) {
        double rounded =
                BigDecimal.valueOf(value).setScale(digits, RoundingMode.HALF_UP).doubleValue();
        return rounded == 0 ? 0 : rounded;
    }
}
