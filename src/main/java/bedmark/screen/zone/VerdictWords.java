package bedmark.screen.zone;

import bedmark.document.Defect;
import bedmark.document.Pointer;
import bedmark.engine.Assessment;
import bedmark.engine.verdict.Level;
import bedmark.form.FieldForm;
import bedmark.screen.part.Figure;
import bedmark.screen.part.Verdict;
import bedmark.screen.theme.LevelShape;
import bedmark.wording.Telling;
import bedmark.wording.Told;
import bedmark.wording.Wording;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;

/** Puts what a survey comes to into the words and numbers of the verdict block. */
final class VerdictWords {
    private final FieldForm form;
    private final Wording wording;
    private final Telling telling;

    VerdictWords(FieldForm form, Wording wording) {
        this.form = form;
        this.wording = wording;
        this.telling = new Telling(wording, form);
    }

    Verdict of(Outcome outcome) {
        return outcome.assessment().map(this::of).orElseGet(() -> impossible(outcome));
    }

    private Verdict of(Assessment found) {
        Told told = telling.tell(found);
        List<String> advice = new ArrayList<>();
        if (found.level() == Level.INCOMPLETE && !found.missingRequired().isEmpty()) {
            advice.add(wording.text("screen.zone.still-to-read", found.missingRequired().stream()
                    .map(name -> wording.asked(name, form)).distinct().collect(Collectors.joining(" \u00B7 "))));
        }
        told.repeat().ifPresent(advice::add);
        told.action().ifPresent(advice::add);
        List<Verdict.Remark> remarks = new ArrayList<>();
        told.against().map(words -> new Verdict.Remark(Optional.empty(), words)).ifPresent(remarks::add);
        told.atDesign().map(words -> new Verdict.Remark(found.levelAtDesignFeed()
                .map(level -> LevelShape.valueOf(level.name())), words)).ifPresent(remarks::add);
        return new Verdict(LevelShape.valueOf(found.level().name()),
                wording.text("verdict.level." + found.level().code()), told.sentence(), told.sure().orElse(""),
                remarks, told.figures().stream()
                        .map(figure -> new Figure(figure.label(), figure.number(), figure.rest())).toList(),
                advice.isEmpty() ? Optional.empty() : Optional.of(String.join(" ", advice)));
    }

    /** A defect with the field by its name, where it has one: the place in the document means nothing to a person. */
    private Defect named(Defect defect) {
        return Optional.of(defect.where()).filter(where -> where.startsWith("/"))
                .flatMap(where -> form.fieldAt(Pointer.parse(where)))
                .map(field -> new Defect(defect.code(), field.head().label().in(wording.words().language()),
                        defect.details())).orElse(defect);
    }

    private Verdict impossible(Outcome outcome) {
        String why = outcome.impossible().map(refused -> wording.sentence(named(refused.defect()))).orElse("");
        return new Verdict(LevelShape.INCOMPLETE, wording.text("verdict.level.incomplete"),
                wording.text("verdict.impossible", why), "", List.of(), Optional.empty());
    }
}
