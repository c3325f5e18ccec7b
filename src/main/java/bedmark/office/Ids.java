package bedmark.office;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.survey.Register;
import bedmark.survey.Survey;
import java.util.Collection;
import java.util.List;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/**
 * Ids as far as the tables keep them as texts or keys. Every database that an office may use takes what these bounds
 * let through, so that a pack fares alike in all of them. Only what comes in anew is asked: what an earlier program
 * took in stays.
 */
public final class Ids {
    /** In characters; no index holds a key of any length, and a zone's is made of two ids. */
    static final int LONGEST = 200;
    /** How much of a long id is told. */
    private static final int TOLD = 40;

    private Ids() {
    }

    /**
     * Proves the ids of a register and of surveys.
     *
     * @throws Refused {@code id-too-long}, {@code id-control-character}
     */
    public static void prove(Register register, Collection<Survey> surveys) {
        Branch plant = register.document();
        check("/plant/id", plant.text("id").stream().toList());
        for (String list : List.of("areas", "conveyors", "transfers", "materials")) {
            check("/plant/" + list, plant.branches(list).stream().flatMap(row -> row.text("id").stream()).toList());
        }
        check("/surveys", surveys.stream().flatMap(survey -> Stream.concat(Stream.of(survey.transfer()),
                survey.round().stream())).toList());
    }

    private static void check(String where, List<String> ids) {
        for (String id : ids) {
            if (id.length() > LONGEST) {
                throw new Refused(Defect.in(where, "id-too-long", id.substring(0, TOLD), Integer.toString(LONGEST)));
            }
            if (id.chars().anyMatch(Character::isISOControl)) {
                throw new Refused(Defect.in(where, "id-control-character", visible(id)));
            }
        }
    }

    private static String visible(String id) {
        return id.chars().mapToObj(one -> Character.isISOControl(one) ? "?" : Character.toString(one))
                .collect(Collectors.joining());
    }
}
