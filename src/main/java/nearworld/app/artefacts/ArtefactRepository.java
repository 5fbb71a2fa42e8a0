package nearworld.app.artefacts;

import java.time.LocalDate;
import java.util.List;
import java.util.Optional;
import org.springframework.data.jpa.repository.Query;
import org.springframework.data.repository.Repository;

/** Artefacts; nothing is ever deleted. */
interface ArtefactRepository extends Repository<ArtefactEntity, Long> {
    ArtefactEntity saveAndFlush(ArtefactEntity entity);

    Optional<ArtefactEntity> findByKindAndNameAndVersion(String kind, String name, int version);

    Optional<ArtefactEntity> findFirstByKindAndSha256OrderById(String kind, String sha256);

    long countByState(String state);

    List<ArtefactEntity> findAllByOrderByKindAscNameAscVersionDesc();

    @Query(nativeQuery = true, value = """
                    select a.sha256 from artefact_default d join artefact a on a.id = d.artefact_id
                    where d.kind = :kind and d.cover_kind = :coverKind and d.from_day <= :day
                    order by d.from_day desc limit 1
                    """)
    Optional<String> defaultSha256(String kind, String coverKind, LocalDate day);

    @Query(nativeQuery = true, value = """
                    select distinct on (d.kind, d.cover_kind) d.artefact_id from artefact_default d
                    where d.from_day <= :day order by d.kind, d.cover_kind, d.from_day desc
                    """)
    List<Long> defaultIds(LocalDate day);
}
