package nearworld.app.results;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.function.Function;
import nearworld.app.assessments.Calculated;
import nearworld.app.drawing.Format;
import nearworld.app.drawing.Lifeline;
import nearworld.app.drawing.LifelineDrawing;
import nearworld.app.drawing.SurvivalCurves;
import nearworld.app.drawing.SurvivalPlot;
import nearworld.app.web.Figures;
import nearworld.engine.assessment.AssessmentResult.WorldResult;
import nearworld.engine.assessment.CaseFile;
import org.springframework.context.MessageSource;

/** The drawings of a result. */
final class ResultDrawings {
    private final Calculated calculated;
    private final List<World> worlds;
    private final MessageSource words;
    private final Figures figures;
    private final Locale locale;

    ResultDrawings(Calculated calculated, List<World> worlds, MessageSource words, Figures figures, Locale locale) {
        this.calculated = calculated;
        this.worlds = worlds;
        this.words = words;
        this.figures = figures;
        this.locale = locale;
    }

    ResultView.Drawings lifeline(HistoryWords history, List<String> sentences) {
        Lifeline lifeline = new Lifeline(
                lifelineWords(String.join(" ", sentences)),
                calculated.file().assessedOn(),
                calculated.file().bornOn().middle(),
                history.lanes(),
                history.flags(),
                worlds.stream().map(this::strip).toList());
        return each(format -> LifelineDrawing.svg(lifeline, format));
    }

    ResultView.Drawings curves() {
        List<SurvivalCurves.Curve> curves = new ArrayList<>();
        for (World world : worlds) {
            curves.add(new SurvivalCurves.Curve(
                    world.kind(), world.letter(), title(world), world.numbers().monthly()));
        }
        SurvivalCurves plot = new SurvivalCurves(
                say("curves.title"),
                say("curves.description", figures.bareYears(calculated.result().age(), locale)),
                calculated.result().age(),
                say("curves.years"),
                say("lifeline.age"),
                say("curves.alive"),
                curves);
        return each(format -> SurvivalPlot.svg(plot, format));
    }

    private static ResultView.Drawings each(Function<Format, String> draw) {
        return new ResultView.Drawings(draw.apply(Format.WIDE), draw.apply(Format.MEDIUM), draw.apply(Format.NARROW));
    }

    private Lifeline.Words lifelineWords(String sentences) {
        CaseFile file = calculated.file();
        String today = say(
                "lifeline.today",
                figures.day(file.assessedOn(), locale),
                figures.bareYears(calculated.result().age(), locale));
        return new Lifeline.Words(
                say("lifeline.title", file.caseRef()),
                say("lifeline.description", worlds.size(), sentences),
                today,
                say("lifeline.year"),
                say("lifeline.age"),
                say("lifeline.knownSince"),
                say("lifeline.mildest"),
                say("lifeline.severest"),
                say("lifeline.watched"),
                say("lifeline.median"),
                say("lifeline.middleHalf"),
                say("lifeline.middleMost"),
                say("lifeline.tableBehind"),
                say("lifeline.parts"));
    }

    private Lifeline.Strip strip(World world) {
        WorldResult n = world.numbers();
        String letter = world.letter().isEmpty() ? "" : world.letter() + "  ";
        return new Lifeline.Strip(
                world.kind(),
                letter + title(world),
                note(world),
                figures.years(n.expectation(), locale),
                say(
                        "lifeline.figureNote",
                        figures.bareYears(n.median(), locale),
                        figures.ratio(n.mortalityRatio(), locale)),
                n.monthly(),
                new Lifeline.Spread(
                        n.deciles().get(0),
                        n.lowerQuartile(),
                        n.median(),
                        n.upperQuartile(),
                        n.deciles().get(8)),
                world.parting(calculated.file()));
    }

    String title(World world) {
        CaseFile.WhatIf whatIf = world.whatIf();
        return whatIf == null ? say("world." + world.key()) : whatIf.name();
    }

    /** What a world is; of a what-if, where it parts from the recorded one. */
    String note(World world) {
        Lifeline.Parting parting = world.parting(calculated.file());
        if (world.whatIf() == null || parting == null) {
            return say("world." + world.key() + ".note");
        }
        if (parting.on() == null) {
            return say("world.whatIf.always");
        }
        boolean today = parting.on().equals(calculated.file().assessedOn());
        return today ? say("world.whatIf.today") : say("world.whatIf.from", figures.day(parting.on(), locale));
    }

    private String say(String key, Object... values) {
        return words.getMessage(key, values, locale);
    }
}
