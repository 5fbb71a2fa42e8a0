package nearworld.app.cases;

/** Another case has that reference already. */
public class CaseRefTakenException extends RuntimeException {
    private static final long serialVersionUID = 1L;

    public CaseRefTakenException() {
        super("another case has that reference");
    }
}
