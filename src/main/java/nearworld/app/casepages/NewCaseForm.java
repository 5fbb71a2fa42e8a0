package nearworld.app.casepages;

/** A case to be made, as typed. */
record NewCaseForm(String caseRef, String externalRef, String dueOn) {
    NewCaseForm {
        caseRef = caseRef == null ? "" : caseRef;
        externalRef = externalRef == null ? "" : externalRef;
        dueOn = dueOn == null ? "" : dueOn;
    }
}
