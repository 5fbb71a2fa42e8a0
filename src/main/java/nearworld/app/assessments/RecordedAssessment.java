package nearworld.app.assessments;

/** A recorded assessment, opened exactly as it was. */
public record RecordedAssessment(AssessmentView assessment, Calculated calculated) {}
