package nearworld.app.forms;

import java.math.BigDecimal;
import nearworld.app.forms.CaseDraft.Place;
import org.jspecify.annotations.Nullable;
import tools.jackson.databind.node.ObjectNode;

/** Writes the cover into a draft. */
final class CoverDraft {
    private static final int PER_CENT_DIGITS = 2;

    private CoverDraft() {}

    static void write(CaseDraft draft, CoverForm form) {
        Place place = new Place(Section.COVER, "cover", "kind", true);
        if (form.isBlank() || !draft.keeps(place)) {
            return;
        }
        ObjectNode cover = draft.json().putObject("cover");
        draft.remember("$.cover", place);
        draft.require(form.kind(), place);
        draft.put(cover, "$.cover", "kind", form.kind(), place);
        number(draft, cover, "years", form.years(), place.at("years"));
        number(draft, cover, "sumAssured", form.sumAssured(), place.at("sumAssured"));
        draft.put(cover, "$.cover", "currency", form.currency(), place.at("currency"));
        Place interest = place.at("interestPercent");
        BigDecimal percent = value(draft, form.interestPercent(), "$.cover.interest", interest);
        draft.remember("$.cover.interest", interest);
        if (percent != null) {
            cover.put("interest", percent.movePointLeft(PER_CENT_DIGITS));
        }
    }

    private static void number(CaseDraft draft, ObjectNode cover, String name, String typed, Place place) {
        String path = "$.cover." + name;
        draft.remember(path, place);
        BigDecimal value = value(draft, typed, path, place);
        if (value == null) {
            return;
        }
        if (value.stripTrailingZeros().scale() <= 0) {
            cover.put(name, value.toBigInteger());
        } else {
            cover.put(name, value);
        }
    }

    private static @Nullable BigDecimal value(CaseDraft draft, String typed, String path, Place place) {
        if (typed.isBlank()) {
            return null;
        }
        TypedNumber number = TypedNumber.parse(typed, path);
        if (number.fault() != null) {
            draft.fault(place, number.fault());
        }
        return number.value();
    }
}
