package nearworld.app.assessments;

import java.util.List;
import java.util.Optional;
import org.springframework.data.jpa.repository.Query;
import org.springframework.data.repository.Repository;

/** Recorded assessments: added and read, nothing else. */
interface AssessmentRepository extends Repository<AssessmentEntity, Long> {
    AssessmentEntity saveAndFlush(AssessmentEntity assessment);

    List<AssessmentEntity> findByCaseIdOrderByNumberDesc(long caseId);

    Optional<AssessmentEntity> findByCaseIdAndNumber(long caseId, int number);

    @Query(
            nativeQuery = true,
            value =
                    "select a.* from assessment a join cases c on c.id = a.case_id where c.ref = :ref and a.number = :number")
    Optional<AssessmentEntity> findByCaseRef(String ref, int number);

    @Query("select coalesce(max(a.number), 0) from AssessmentEntity a where a.caseId = :caseId")
    int lastNumber(long caseId);

    long count();
}
