package nearworld.app.cases;

import java.util.UUID;
import nearworld.app.forms.CaseForms;

/**
 * A case that is locked for the rest of the transaction, for features that change it together with something of their
 * own.
 *
 * @param id internal number
 * @param keyId the key that everything personal of the case is encrypted by
 */
public record CaseRecord(long id, String ref, UUID keyId, CaseForms forms) {}
