package nearworld.app.database;

import org.springframework.boot.diagnostics.AbstractFailureAnalyzer;
import org.springframework.boot.diagnostics.FailureAnalysis;

/** Shows the message of a refused database instead of the trace of a failed start; named in spring.factories. */
class DatabaseRefusalAnalyzer extends AbstractFailureAnalyzer<DatabaseRefusedException> {
    @Override
    protected FailureAnalysis analyze(Throwable rootFailure, DatabaseRefusedException cause) {
        return new FailureAnalysis(cause.getMessage(), null, cause);
    }
}
