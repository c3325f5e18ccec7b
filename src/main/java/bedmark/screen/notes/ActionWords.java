package bedmark.screen.notes;

import bedmark.quantity.Quantity;
import bedmark.survey.PlannedAction;
import bedmark.wording.Wording;
import java.util.ArrayList;
import java.util.List;

/** An action in one person's words. */
final class ActionWords {
    private final Wording wording;

    ActionWords(Wording wording) {
        this.wording = wording;
    }

    /** Who, by when, under which order, and which seal: what stands below what is to be done. */
    String details(PlannedAction action) {
        List<String> parts = new ArrayList<>();
        if (!action.who().isEmpty()) {
            parts.add(action.who());
        }
        action.by().ifPresent(by -> parts.add(wording.text("notes.by", wording.day(by))));
        if (!action.workOrder().isEmpty()) {
            parts.add(action.workOrder());
        }
        action.seal().map(this::seal).filter(words -> !words.isEmpty()).ifPresent(parts::add);
        return String.join(" \u00B7 ", parts);
    }

    private String seal(PlannedAction.SealOrder seal) {
        List<String> parts = new ArrayList<>();
        seal.type().filter(code -> wording.words().has("notes.seal." + code))
                .ifPresent(code -> parts.add(wording.text("notes.seal." + code)));
        List<String> size = new ArrayList<>();
        seal.width().map(wording::entered).ifPresent(size::add);
        seal.thickness().map(wording::entered).ifPresent(size::add);
        if (!size.isEmpty()) {
            parts.add(String.join(" \u00D7 ", size));
        }
        seal.length().map(length -> pieces(seal, length)).ifPresent(parts::add);
        return String.join(", ", parts);
    }

    private String pieces(PlannedAction.SealOrder seal, Quantity length) {
        return seal.pieces().isPresent() ? wording.format().computed(seal.pieces().getAsInt(), 0) + " \u00D7 "
                + wording.entered(length) : wording.entered(length);
    }
}
