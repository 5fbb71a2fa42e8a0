package nearworld.app.cases;

import jakarta.persistence.LockModeType;
import java.util.Optional;
import org.springframework.data.jpa.repository.Lock;
import org.springframework.data.jpa.repository.Query;
import org.springframework.data.repository.Repository;

/** Cases by reference. */
interface CaseRepository extends Repository<CaseEntity, Long> {
    CaseEntity saveAndFlush(CaseEntity entity);

    Optional<CaseEntity> findByRef(String ref);

    /** Locks the case, so that two changes of it never mix. */
    @Lock(LockModeType.PESSIMISTIC_WRITE)
    @Query("select c from CaseEntity c where c.ref = :ref")
    Optional<CaseEntity> lockByRef(String ref);

    boolean existsByRef(String ref);

    @Query(value = "select nextval('case_number')", nativeQuery = true)
    long nextNumber();
}
