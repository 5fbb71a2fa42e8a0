package nearworld.app.artefacts;

import java.nio.charset.StandardCharsets;
import java.sql.Date;
import java.time.Clock;
import java.time.LocalDate;
import java.time.temporal.ChronoUnit;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.ConcurrentHashMap;
import nearworld.app.trail.NewEntry;
import nearworld.app.trail.Trail;
import nearworld.exchange.documents.Sha256;
import org.jspecify.annotations.Nullable;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;

/** Tables, packs and bands by version and checksum, and which of them new calculations take. */
@Service
public class Artefacts {
    /** The action of the trail's entries about publishing. */
    static final String PUBLISHED = "artefact.published";

    /** The kind of cover whose defaults hold as long as a case has no cover. */
    private static final String NO_COVER = "term";

    private final ArtefactRepository repository;
    private final JdbcClient jdbc;
    private final Trail trail;
    private final Clock clock;
    private final Map<String, LoadedTable> tables = new ConcurrentHashMap<>();
    private final Map<String, LoadedPack> packs = new ConcurrentHashMap<>();

    Artefacts(ArtefactRepository repository, JdbcClient jdbc, Trail trail, Clock clock) {
        this.repository = repository;
        this.jdbc = jdbc;
        this.trail = trail;
        this.clock = clock;
    }

    /**
     * Stores a table as published.
     *
     * @param content as the exchange format has it
     * @param by sign-in name of who publishes
     */
    @Transactional
    public ArtefactView publishTable(String content, int version, String by) {
        String title = ArtefactReading.table(content).name();
        return publish(ArtefactKind.TABLE, title, version, title, content, by);
    }

    /** Stores a pack as published, under its own id and version. */
    @Transactional
    public ArtefactView publishPack(String content, String by) {
        LoadedPack pack = ArtefactReading.pack(content, sha256(content));
        return publish(
                ArtefactKind.PACK, pack.pack().id(), pack.pack().version(), pack.title(Locale.ENGLISH), content, by);
    }

    private ArtefactView publish(ArtefactKind kind, String name, int version, String title, String content, String by) {
        String sha256 = sha256(content);
        ArtefactEntity stored = repository.saveAndFlush(new ArtefactEntity(
                kind, name, version, title, sha256, content, clock.instant().truncatedTo(ChronoUnit.MICROS)));
        trail.append(NewEntry.of(
                by,
                PUBLISHED,
                Map.of("kind", kind.id(), "name", name, "version", Integer.toString(version), "sha256", sha256)));
        return stored.view(false);
    }

    /** Makes an artefact the one that new calculations take from a day on. */
    @Transactional
    public void makeDefault(ArtefactKind kind, String sha256, String coverKind, LocalDate fromDay) {
        ArtefactEntity artefact = stored(kind, sha256);
        jdbc.sql("""
                        insert into artefact_default (kind, cover_kind, from_day, artefact_id)
                        values (:kind, :coverKind, :fromDay, :artefact)
                        """)
                .param("kind", kind.id())
                .param("coverKind", coverKind)
                .param("fromDay", Date.valueOf(fromDay))
                .param("artefact", artefact.id())
                .update();
    }

    /** The table for a kind of cover today; empty where none is published. */
    @Transactional(readOnly = true)
    public Optional<LoadedTable> currentTable(@Nullable String coverKind) {
        return current(ArtefactKind.TABLE, coverKind).map(this::table);
    }

    /** The pack for a kind of cover today; empty where none is published. */
    @Transactional(readOnly = true)
    public Optional<LoadedPack> currentPack(@Nullable String coverKind) {
        return current(ArtefactKind.PACK, coverKind).map(this::pack);
    }

    private Optional<String> current(ArtefactKind kind, @Nullable String coverKind) {
        return repository.defaultSha256(kind.id(), coverKind == null ? NO_COVER : coverKind, LocalDate.now(clock));
    }

    /** The table of that checksum, whether or not it is still the default. */
    @Transactional(readOnly = true)
    public LoadedTable table(String sha256) {
        return tables.computeIfAbsent(sha256, key -> {
            String content = stored(ArtefactKind.TABLE, key).content();
            return new LoadedTable(ArtefactReading.table(content), key);
        });
    }

    /** The pack of that checksum, whether or not it is still the default. */
    @Transactional(readOnly = true)
    public LoadedPack pack(String sha256) {
        return packs.computeIfAbsent(
                sha256,
                key -> ArtefactReading.pack(stored(ArtefactKind.PACK, key).content(), key));
    }

    private ArtefactEntity stored(ArtefactKind kind, String sha256) {
        ArtefactEntity entity = repository
                .findFirstByKindAndSha256OrderById(kind.id(), sha256)
                .orElseThrow(() -> new IllegalStateException("no " + kind.id() + " has the checksum " + sha256));
        if (!sha256(entity.content()).equals(sha256)) {
            throw new IllegalStateException(
                    "the stored " + kind.id() + " no longer has its checksum " + sha256 + ": it was tampered with");
        }
        return entity;
    }

    /** All artefacts, by kind, name and falling version. */
    @Transactional(readOnly = true)
    public List<ArtefactView> list() {
        Set<Long> defaults = new HashSet<>(repository.defaultIds(LocalDate.now(clock)));
        return repository.findAllByOrderByKindAscNameAscVersionDesc().stream()
                .map(a -> a.view(defaults.contains(a.id())))
                .toList();
    }

    static String sha256(String content) {
        return Sha256.hex(content.getBytes(StandardCharsets.UTF_8));
    }
}
