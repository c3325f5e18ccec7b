package bedmark.screen.zone;

import java.util.Optional;

/**
 * What was typed last, and what it came to: a key asks several times, and a reading keeps its time from then until it
 * is saved.
 */
final class LastTyping {
    private Optional<Taken> taken = Optional.empty();

    /** What is typed, and all that decides what it comes to. */
    private record Typed(Typing typing, ZoneModel.InHand inHand, String signs, boolean suspect) {
    }

    private record Taken(Typed typed, Typing.Read read) {
    }

    /** As {@link Typing#read}; the same until something of it changes. */
    Typing.Read read(Typing typing, ZoneModel.InHand inHand, String signs, boolean suspect) {
        Typed now = new Typed(typing, inHand, signs, suspect);
        if (taken.filter(before -> before.typed().equals(now)).isEmpty()) {
            taken = Optional.of(new Taken(now, typing.read(inHand, signs, suspect)));
        }
        return taken.get().read();
    }

    /** Lets it go: nothing is typed any more, and the same signs would be another reading. */
    void forget() {
        taken = Optional.empty();
    }
}
