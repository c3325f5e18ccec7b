package bedmark.screen.zone;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.form.SpeedField;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;

/** The way in which the belt speed is read, where the survey does not tell yet: the last one that was chosen. */
final class SpeedWays {
    private final Map<SpeedField, SpeedField.Way> chosen = new HashMap<>();

    /** The way that the survey shows, else the chosen one, else the direct one. */
    SpeedField.Way of(SpeedField field, Branch survey) {
        return field.ways(survey).stream().findFirst()
                .orElseGet(() -> chosen.getOrDefault(field, SpeedField.Way.DIRECT));
    }

    /**
     * Chooses a way.
     *
     * @param answer the way's key
     * @return what is to be cleared: the answers of the other ways; nothing at all where that is no way
     */
    Optional<List<Answers.Change>> choose(SpeedField field, Optional<Node> answer, Branch survey) {
        Optional<SpeedField.Way> way = answer.flatMap(node -> Stream.of(SpeedField.Way.values())
                .filter(one -> node.equals(Node.text(one.key()))).findFirst());
        way.ifPresent(one -> chosen.put(field, one));
        return way.map(one -> Stream.of(SpeedField.Way.values())
                .filter(other -> other != one && survey.at(other.where()).isPresent())
                .map(other -> new Answers.Change(other.where(), Optional.empty())).toList());
    }
}
