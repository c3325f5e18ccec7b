package bedmark.wording;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.Engine;
import bedmark.form.FieldForm;
import bedmark.json.BundleReader;
import bedmark.json.FormReader;
import bedmark.quantity.UnitSystem;
import bedmark.survey.Assessor;
import bedmark.survey.Assessor.Assessed;
import bedmark.survey.Bundle;
import bedmark.survey.InspectionStatus;
import bedmark.words.Words;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Set;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** The demo plant's sheets, as a person gets to read them. */
class CalculationSheetTest {
    private static final int PAGE = 116;
    private static final Pattern KEY = Pattern.compile("(?:Formula\\.of|new Formula)\\(\"([a-z0-9-]+)\"");

    private static List<List<String>> sheets(String round, Locale language, UnitSystem units) throws IOException {
        Bundle bundle = BundleReader.read(Files.readAllBytes(Path.of("sample-surveys", round)));
        FieldForm form = FormReader.read(bundle.forms().get(0));
        Assessor assessor = new Assessor(bundle.register());
        CalculationSheet sheet = new CalculationSheet(new Wording(new Words(language), units), form);
        List<List<String>> sheets = new ArrayList<>();
        for (Assessed one : assessor.assess(bundle.surveys())) {
            if (one.survey().inspectionStatus() == InspectionStatus.INSPECTED) {
                sheets.add(sheet.lines(one.survey(), one.assessment(),
                        Engine.explain(assessor.zone(one.survey()), assessor.settings())));
            }
        }
        return sheets;
    }

    @Test
    void everySheetIsAPageOfThatWidth() throws IOException {
        for (Locale language : Words.LANGUAGES) {
            for (UnitSystem units : UnitSystem.values()) {
                for (List<String> sheet : sheets("round-2026-03.json", language, units)) {
                    assertTrue(sheet.size() <= PAGE, sheet.size() + " lines: " + sheet.get(1));
                    sheet.forEach(line -> assertTrue(line.length() <= CalculationSheet.WIDTH, line));
                }
            }
        }
    }

    @Test
    void noPlaceholderNoPointerAndNoCodeIsLeft() throws IOException {
        for (Locale language : Words.LANGUAGES) {
            for (List<String> sheet : sheets("round-under-way.json", language, UnitSystem.METRIC)) {
                String text = String.join("\n", sheet);
                assertFalse(text.contains("{0}") || text.contains("/readings/") || text.contains("NaN"), text);
            }
        }
    }

    @Test
    void numbersStandInBothUnitSystems() throws IOException {
        String metric = String.join("\n", sheets("round-2026-03.json", Locale.ENGLISH, UnitSystem.METRIC).get(1));
        String us = String.join("\n", sheets("round-2026-03.json", Locale.ENGLISH, UnitSystem.US).get(1));
        Pattern both = Pattern.compile("F = Fm \\+ Fs = .* = [0-9.\u00a0]+N[^\\n]* \\([0-9.\u00a0]+lbf[^)]*\\)");
        assertTrue(both.matcher(metric).find(), metric);
        assertTrue(both.matcher(us).find(), us);
        assertTrue(Pattern.compile("F = Fm \\+ Fs = .*N ± [0-9. ]+ \\(").matcher(metric).find(), metric);
        assertTrue(Pattern.compile("F = Fm \\+ Fs = .*lbf ± [0-9. ]+\\)").matcher(us).find(), us);
    }

    @Test
    void spanishWritesItsDecimalSign() throws IOException {
        String text = String.join("\n", sheets("round-2026-03.json", Words.LANGUAGES.get(1), UnitSystem.METRIC).get(1));
        assertTrue(text.contains("22620,59479·Cs·J2"), text);
        assertTrue(text.contains("max(") && text.contains("; "), text);
    }

    @Test
    void methodsFeedsAndRemediesStandOnIt() throws IOException {
        List<String> sheet = sheets("round-under-way.json", Locale.ENGLISH, UnitSystem.METRIC).stream()
                .filter(lines -> String.join("", lines).contains("- Free the bed:")
                        && lines.contains("  - At design feed: Overloaded."))
                .findFirst().orElseThrow();
        String text = String.join(" ", sheet).replaceAll("[ \u00a0\u202f]+", " ");
        for (String part : List.of("Methods apart \\[D\\] [A-Za-z0-9 ]+ / [A-Za-z0-9 ]+ = [0-9.]+ = .*which depth is read ×",
                "OVERLOADED Bed against the depth laid out .*over 1.25 \\(100 %\\), at design 1.9 OVERLOADED",
                "nd of 2 = 2, near 0", "- Free the bed: .* F = [0-9.]+ N \\([0-9.]+ lbf\\); Pd = [0-9.]+ W")) {
            assertTrue(Pattern.compile(part).matcher(text).find(), part + " in " + text);
        }
    }

    @Test
    void everyFormulaHasAName() throws IOException {
        Set<String> codes = new HashSet<>();
        try (Stream<Path> files = Files.walk(Path.of("src/main/java/bedmark/engine"))) {
            for (Path file : files.filter(path -> path.toString().endsWith(".java")).toList()) {
                codes.addAll(KEY.matcher(Files.readString(file)).results().map(match -> match.group(1))
                        .collect(Collectors.toSet()));
            }
        }
        assertTrue(codes.size() > 35, codes.toString());
        for (Locale language : Words.LANGUAGES) {
            Words words = new Words(language);
            assertEquals(List.of(), codes.stream().filter(code -> !words.has("working.formula." + code)).toList());
        }
    }
}
