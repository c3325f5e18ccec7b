package bedmark.wording;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.Datum;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.seal.SealType;
import bedmark.engine.verdict.Component;
import bedmark.engine.verdict.Level;
import bedmark.engine.verdict.Rule;
import bedmark.quantity.BeltState;
import bedmark.quantity.Quality;
import bedmark.survey.InspectionStatus;
import bedmark.words.Words;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** Whatever code names in words has its words, in both languages. */
class EveryWordTest {
    private static final Pattern KEY = Pattern.compile("(?:[tT]ext|say)\\(\\s*\"([a-z]+\\.[a-z0-9.-]+)\"\\s*[,)]");
    private static final Pattern DEFECT =
            Pattern.compile("(?:Defect\\.(?:at|in)\\([^;]*?|ImpossibleReading\\()\"([a-z0-9]+(?:-[a-z0-9]+)+)\"");
    private static final Pattern ASSUMPTION = Pattern.compile("Assumption\\.of\\(\"([a-z-]+)\"");
    private static final Pattern UNFIT = Pattern.compile("unfit\\(\"([a-z-]+)\"");
    private static final Pattern REMEDY = Pattern.compile("(?:remedy|seals|otherSpeed)\\(\"([a-z-]+)\"");

    private static List<String> sources() {
        try (Stream<Path> files = Files.walk(Path.of("src/main/java"))) {
            List<String> texts = new ArrayList<>();
            for (Path file : files.filter(path -> path.toString().endsWith(".java")).toList()) {
                texts.add(Files.readString(file));
            }
            return texts;
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private static List<String> named(Pattern pattern) {
        List<String> names = new ArrayList<>();
        for (String source : sources()) {
            Matcher matcher = pattern.matcher(source);
            while (matcher.find()) {
                names.add(matcher.group(1) == null ? matcher.group(2) : matcher.group(1));
            }
        }
        assertTrue(names.size() > 4, "the search itself finds something");
        return names;
    }

    private static void requireAll(Stream<String> keys) {
        List<String> wanted = keys.distinct().sorted().toList();
        for (Locale language : Words.LANGUAGES) {
            Words words = new Words(language);
            assertEquals(List.of(), wanted.stream().filter(key -> !words.has(key)).toList(), language.toString());
        }
    }

    @Test
    void everyKeyInTheCodeHasWords() {
        requireAll(named(KEY).stream());
    }

    @Test
    void everyDefectHasASentence() {
        requireAll(named(DEFECT).stream().map(code -> "defect." + code));
    }

    @Test
    void everyAssumptionAndRemedyHasASentence() {
        requireAll(named(ASSUMPTION).stream().map(code -> "assumption." + code));
        requireAll(named(UNFIT).stream().map(code -> "assumption.word." + code));
        requireAll(named(REMEDY).stream().map(code -> "remedy." + code));
    }

    @Test
    void everyCodeOfTheEngineHasWords() {
        requireAll(Stream.of(Rule.values()).flatMap(rule -> Stream.of("rule." + rule.code(),
                "rule." + rule.code() + ".clause", "action." + rule.action())));
        requireAll(Stream.of(Level.values()).map(level -> "verdict.level." + level.code()));
        requireAll(Stream.of(Component.values()).map(component -> "figure.leads." + component.code()));
        requireAll(Stream.of(SealType.values()).map(type -> "assumption.word." + type.code()));
        requireAll(Stream.of(SealCondition.values()).map(condition -> "assumption.word." + condition.code()));
        requireAll(Stream.of(SealCondition.values()).filter(SealCondition::isDefect)
                .map(condition -> "screen.seal." + condition.code()));
        requireAll(Stream.of(Datum.values()).filter(datum -> !datum.isReading())
                .map(datum -> "register." + datum.pointer().substring(datum.pointer().lastIndexOf('/') + 1)));
    }

    @Test
    void everyMarkOfAReadingHasWords() {
        requireAll(Stream.of(Quality.values()).map(quality -> "screen.quality." + quality.code()));
        requireAll(Stream.of(BeltState.values()).map(state -> "screen.belt." + state.code()));
        requireAll(Stream.of(InspectionStatus.values()).map(status -> "screen.status." + status.code()));
    }
}
