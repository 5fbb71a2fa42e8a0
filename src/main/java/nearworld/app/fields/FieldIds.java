package nearworld.app.fields;

import org.springframework.stereotype.Component;

/** Ids of fields and rows in a page, so that a fault's link finds them. Templates know it as {@code fields}. */
@Component
public class FieldIds {
    /** For example {@code history-history-0-occurrences-1-on}. */
    public String id(String section, String field) {
        return section + "-" + field.replace("[", "-").replace("]", "").replace(".", "-");
    }
}
