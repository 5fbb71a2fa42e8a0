package nearworld.app.forms;

/**
 * The section about the cover, as typed.
 *
 * @param kind term, wholeOfLife, endowment or lifeAnnuity
 * @param years the term in whole years; empty for the whole of life
 * @param sumAssured in {@code currency}
 * @param currency three letters
 * @param interestPercent per cent a year: 3 means 0.03
 */
public record CoverForm(String kind, String years, String sumAssured, String currency, String interestPercent) {
    public CoverForm {
        kind = Typed.text(kind);
        years = Typed.text(years);
        sumAssured = Typed.text(sumAssured);
        currency = Typed.text(currency);
        interestPercent = Typed.text(interestPercent);
    }

    /** A form in which nothing is typed. */
    public static CoverForm empty() {
        return new CoverForm("", "", "", "", "");
    }

    boolean isBlank() {
        return Typed.allBlank(kind, years, sumAssured, interestPercent);
    }
}
