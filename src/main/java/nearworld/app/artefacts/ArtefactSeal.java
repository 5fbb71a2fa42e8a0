package nearworld.app.artefacts;

import nearworld.app.trail.TrailEntryView;
import nearworld.app.trail.Vouched;
import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Component;

/** Checks published artefacts against the entries that tell of their publishing. */
@Component
class ArtefactSeal implements Vouched {
    private final ArtefactRepository repository;

    ArtefactSeal(ArtefactRepository repository) {
        this.repository = repository;
    }

    @Override
    public String action() {
        return Artefacts.PUBLISHED;
    }

    @Override
    public @Nullable String faultOf(TrailEntryView entry) {
        boolean intact = repository
                .findByKindAndNameAndVersion(
                        entry.details().getOrDefault("kind", ""),
                        entry.details().getOrDefault("name", ""),
                        Integer.parseInt(entry.details().getOrDefault("version", "0")))
                .filter(a ->
                        Artefacts.sha256(a.content()).equals(entry.details().get("sha256")))
                .isPresent();
        return intact ? null : "artefact";
    }

    @Override
    public long stored() {
        return repository.countByState(ArtefactEntity.PUBLISHED);
    }
}
