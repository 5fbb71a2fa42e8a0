package nearworld.app.cases;

import java.util.List;
import org.springframework.data.jpa.repository.Query;
import org.springframework.data.repository.Repository;

/** The sections of cases. */
interface SectionRepository extends Repository<SectionEntity, SectionEntity.Key> {
    SectionEntity save(SectionEntity section);

    @Query("select s from SectionEntity s where s.key.caseId = :caseId")
    List<SectionEntity> ofCase(long caseId);
}
