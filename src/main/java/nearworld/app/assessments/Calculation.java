package nearworld.app.assessments;

/** What comes of calculating a case as it stands. */
public sealed interface Calculation permits Calculated, NotCalculated {}
