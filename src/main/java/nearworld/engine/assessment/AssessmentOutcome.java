package nearworld.engine.assessment;

/** What comes of an assessment: a result, or a refusal with its reasons. */
public sealed interface AssessmentOutcome permits AssessmentResult, Refusal {
    /** True where there is a result. */
    boolean isResult();
}
