package nearworld.app.demo;

import org.springframework.boot.diagnostics.AbstractFailureAnalyzer;
import org.springframework.boot.diagnostics.FailureAnalysis;

/** Says how to name the first admin, in place of a stack trace. */
class FirstAdminMissingAnalyzer extends AbstractFailureAnalyzer<FirstAdminMissingException> {
    @Override
    protected FailureAnalysis analyze(Throwable rootFailure, FirstAdminMissingException cause) {
        return new FailureAnalysis(
                "The database holds no people yet, so nobody could sign in.",
                "Start once with --first-admin=NAME (or NEARWORLD_FIRST_ADMIN=NAME); the password is made at random and"
                        + " printed. For a demo with invented people and cases, set NEARWORLD_DEMO=true instead.",
                cause);
    }
}
