package nearworld.app.artefacts;

import java.util.List;
import java.util.Locale;
import nearworld.engine.network.EvidencePack;
import nearworld.exchange.packs.Pack;
import nearworld.exchange.packs.PackTexts;

/** Puts the names of a pack together with their titles. */
final class PackWords {
    private final EvidencePack pack;
    private final PackTexts texts;
    private final Locale locale;

    private PackWords(Pack pack, Locale locale) {
        this.pack = pack.evidence();
        this.texts = pack.texts();
        this.locale = locale;
    }

    /** What a person can pick from the pack, in a language. */
    static PackChoices choices(Pack pack, Locale locale) {
        PackWords words = new PackWords(pack, locale);
        return new PackChoices(
                words.behaviours(),
                words.conditions(),
                words.findings(),
                words.events(),
                words.sources(),
                words.treatments());
    }

    private List<PackChoices.BehaviourChoice> behaviours() {
        return pack.behaviours().stream()
                .map(b -> new PackChoices.BehaviourChoice(
                        b.id(),
                        texts.behaviour(b.id(), locale),
                        b.levels().stream()
                                .map(l -> new PackChoices.Choice(l.id(), texts.level(b.id(), l.id(), locale)))
                                .toList()))
                .toList();
    }

    private List<PackChoices.Choice> conditions() {
        return pack.conditions().stream()
                .map(c -> new PackChoices.Choice(c.id(), texts.condition(c.id(), locale)))
                .toList();
    }

    private List<PackChoices.FindingChoice> findings() {
        return pack.findings().stream()
                .map(f -> new PackChoices.FindingChoice(
                        f.id(),
                        texts.finding(f.id(), locale),
                        texts.unit(f.id()),
                        f.levels().stream()
                                .map(l -> new PackChoices.Choice(l.id(), texts.findingLevel(f.id(), l.id(), locale)))
                                .toList()))
                .toList();
    }

    private List<PackChoices.EventChoice> events() {
        return pack.events().stream()
                .map(e -> new PackChoices.EventChoice(
                        e.id(),
                        texts.event(e.id(), locale),
                        e.outcomes().stream()
                                .map(o -> new PackChoices.OutcomeChoice(
                                        o.id(), texts.outcome(e.id(), o.id(), locale), o.fatal()))
                                .toList()))
                .toList();
    }

    private List<PackChoices.Choice> sources() {
        return pack.sources().stream()
                .map(s -> new PackChoices.Choice(s.id(), texts.source(s.id(), locale)))
                .toList();
    }

    private List<PackChoices.Choice> treatments() {
        return pack.treatments().stream()
                .map(t -> new PackChoices.Choice(t.id(), texts.treatment(t.id(), locale)))
                .toList();
    }
}
