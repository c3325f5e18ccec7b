package bedmark.index;

import bedmark.document.Node;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import java.nio.file.Path;
import java.util.Optional;
import java.util.UUID;

/** A program of its own that types and saves until it is killed, and tells of every saved entry. */
final class TypingChild {
    private TypingChild() {
    }

    /** @param arguments the store's folder, a word that no other child uses, and whether the store is sealed */
    public static void main(String[] arguments) {
        try (Store store = Store.open(Path.of(arguments[0]), StoreOptions.of("tablet").withSegmentBytes(8192)
                .withPassphrase(Boolean.parseBoolean(arguments[2]) ? Optional.of(StoreScript.SECRET)
                        : Optional.empty()))) {
            say("open");
            for (int i = 0; ; i++) {
                UUID survey = UUID.randomUUID();
                say(store.append(StoreScript.PERSON, StoreScript.opened(survey, "T1")), "");
                for (int j = 0; j < 8; j++) {
                    String note = arguments[1] + "-" + i + "-" + j;
                    say(store.append(StoreScript.PERSON, StoreScript.answer(survey, "/notes", Node.text(note))), note);
                }
                say(store.attachPhoto(StoreScript.photo(arguments[1] + i), survey, StoreScript.PERSON,
                        StoreScript.NOON, ""), "");
                say(store.append(StoreScript.PERSON, new Act.SurveyCompleted(survey, StoreScript.PERSON)), "");
            }
        }
    }

    private static void say(Entry entry, String note) {
        say("saved " + entry.sequence() + " " + entry.act().code() + " " + note);
    }

    private static void say(String line) {
        System.out.println(line);
        System.out.flush();
    }
}
