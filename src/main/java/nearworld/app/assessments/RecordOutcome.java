package nearworld.app.assessments;

/** What comes of recording an assessment. */
public sealed interface RecordOutcome {
    /** It is recorded under this number of the case. */
    record Recorded(int number) implements RecordOutcome {}

    /** Something is typed that cannot be counted in, or the case cannot be calculated; nothing was recorded. */
    record NotRecorded() implements RecordOutcome {}
}
