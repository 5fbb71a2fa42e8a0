package nearworld.app.people;

import jakarta.persistence.LockModeType;
import java.util.List;
import java.util.Optional;
import org.springframework.data.jpa.repository.Lock;
import org.springframework.data.jpa.repository.Query;
import org.springframework.data.repository.Repository;

/** People by name and number; nobody is ever deleted. */
interface PersonRepository extends Repository<PersonEntity, Long> {
    PersonEntity save(PersonEntity person);

    Optional<PersonEntity> findById(long id);

    Optional<PersonEntity> findByName(String name);

    /** Locks the row, so that failures at the same time are all counted. */
    @Lock(LockModeType.PESSIMISTIC_WRITE)
    @Query("select p from PersonEntity p where p.name = :name")
    Optional<PersonEntity> lockByName(String name);

    List<PersonEntity> findAllByOrderByName();

    long count();
}
