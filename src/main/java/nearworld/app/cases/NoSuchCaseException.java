package nearworld.app.cases;

import org.springframework.http.HttpStatus;
import org.springframework.web.bind.annotation.ResponseStatus;

/** There is no such case, or the person who asks may not see it: both look alike. */
@ResponseStatus(HttpStatus.NOT_FOUND)
public class NoSuchCaseException extends RuntimeException {
    private static final long serialVersionUID = 1L;

    public NoSuchCaseException() {
        super("no such case");
    }
}
