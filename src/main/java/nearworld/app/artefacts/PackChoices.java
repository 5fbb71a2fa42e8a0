package nearworld.app.artefacts;

import java.util.List;

/** What a person can pick from an evidence pack, in one language. Lists and their places are the pack's own. */
public record PackChoices(
        List<BehaviourChoice> behaviours,
        List<Choice> conditions,
        List<FindingChoice> findings,
        List<EventChoice> events,
        List<Choice> sources,
        List<Choice> treatments) {

    public PackChoices {
        behaviours = List.copyOf(behaviours);
        conditions = List.copyOf(conditions);
        findings = List.copyOf(findings);
        events = List.copyOf(events);
        sources = List.copyOf(sources);
        treatments = List.copyOf(treatments);
    }

    /** A thing of the pack and its title. */
    public record Choice(String id, String title) {}

    /** A behaviour and its levels. */
    public record BehaviourChoice(String id, String title, List<Choice> levels) {
        public BehaviourChoice {
            levels = List.copyOf(levels);
        }
    }

    /** A finding, its unit (empty: none) and its levels. */
    public record FindingChoice(String id, String title, String unit, List<Choice> levels) {
        public FindingChoice {
            levels = List.copyOf(levels);
        }
    }

    /** An event and its outcomes. */
    public record EventChoice(String id, String title, List<OutcomeChoice> outcomes) {
        public EventChoice {
            outcomes = List.copyOf(outcomes);
        }
    }

    /** An outcome; a fatal one cannot be picked for a living person. */
    public record OutcomeChoice(String id, String title, boolean fatal) {}
}
