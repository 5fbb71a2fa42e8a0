package nearworld.app.artefacts;

/** The kinds of artefact that are stored with their content. */
public enum ArtefactKind {
    TABLE("table"),
    PACK("pack"),
    BANDS("bands");

    private final String id;

    ArtefactKind(String id) {
        this.id = id;
    }

    /** The name in the database and in message keys. */
    public String id() {
        return id;
    }
}
