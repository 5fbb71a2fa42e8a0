package nearworld.app.assessments;

import java.time.Instant;

/**
 * A recorded assessment in a list.
 *
 * @param number counts from 1 within the case
 * @param mortalityRatio of the recorded world over the term, 1 = table
 * @param expectation of the recorded world, in years
 */
public record AssessmentView(
        int number,
        Instant recordedAt,
        String recordedBy,
        String tableName,
        String packId,
        int packVersion,
        String engine,
        double mortalityRatio,
        double expectation) {}
