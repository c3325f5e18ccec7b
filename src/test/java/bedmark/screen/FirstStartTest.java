package bedmark.screen;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.json.JsonReader;
import bedmark.pack.DeviceKey;
import bedmark.pack.RoundFile;
import bedmark.survey.Register;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.UUID;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A store without a plant begins with the office's round or with a new plant; every screen on the way is scanned. */
class FirstStartTest {
    private static final Clock CLOCK = Clock.fixed(Instant.parse("2026-09-22T14:20:00Z"), ZoneOffset.ofHours(2));
    private static final Locale SPANISH = Locale.forLanguageTag("es");

    @TempDir
    private Path temp;
    private TabletApp app;
    private final List<String> findings = new ArrayList<>();

    private TabletApp open(double width, double height) throws Exception {
        Files.createDirectories(temp.resolve("stick"));
        return new TabletApp(temp.resolve("store"), Optional.of(Path.of("sample-surveys")), temp.resolve("stick"),
                CLOCK, width, height);
    }

    private void roundFile(String name, String createdAt, boolean withRounds) throws Exception {
        Branch bundle = JsonReader.read(Files.readAllBytes(Path.of("sample-surveys/round-2026-03.json"))).root();
        Branch file = Branch.EMPTY.with("format", "bedmark.round").with("version", Node.number(1))
                .with("id", UUID.nameUUIDFromBytes(name.getBytes()).toString()).with("createdAt", createdAt)
                .with("office", Branch.EMPTY.with("id", "0d5c2a4e-6c1e-4c43-9a8f-6f1d5f7f1a11").with("name", "Office"))
                .with("plant", bundle.get("plant").orElseThrow()).with("forms", bundle.get("forms").orElseThrow())
                .with("rounds", withRounds ? bundle.get("rounds").orElseThrow() : new Node.Series(List.of()))
                .with("lastResults", new Node.Series(List.of())).with("notes", new Node.Series(List.of()));
        Path office = Files.createDirectories(temp.resolve("office"));
        RoundFile.write(file, DeviceKey.of(office), temp.resolve("stick").resolve(name + RoundFile.ENDING));
    }

    @Test
    void theFirstScreensFitAnUprightTablet() throws Exception {
        try (TabletApp opened = open(800, 1280)) {
            app = opened;
            scan("first", "portrait");
            app.click("new-plant");
            scan("new-plant", "portrait");
        }
        assertEquals(List.of(), findings);
    }

    @Test
    void aNewPlantIsWalkedAtOnce() throws Exception {
        String orientation = "landscape";
        try (TabletApp opened = open(1280, 800)) {
            app = opened;
            scan("first", orientation);
            app.click("new-plant");
            scan("new-plant", orientation);
            app.click("make-plant");
            assertTrue(app.words("plant-trouble").startsWith("Still to say: Name of the plant, Tag of the belt"),
                    app.words("plant-trouble"));
            write("plant-plant", "Holm Quarry");
            write("plant-belt", "B1");
            write("plant-tag", "T1");
            app.click("plant-width");
            for (String keys : List.of("800", "20", "900")) {
                keys(keys);
            }
            choose("material-limestone-crushed");
            app.click("make-plant");
            app.until(() -> app.words("plant-trouble").contains("as wide as the belt"));
            scan("new-plant-trouble", orientation);
            app.click("plant-centre-roll");
            keys("380");
            app.click("make-plant");
            app.until(() -> app.has("person"));
            Site site = app.workplace().site();
            Register.Transfer point = site.register().transfer("T1").orElseThrow();
            assertEquals("Holm Quarry", site.register().name());
            assertEquals("380 mm", size(site.register().conveyorOf(point).document(), "centreRollLength"));
            Branch material = site.register().materials().get("limestone-crushed").document();
            assertEquals("limestone-crushed", material.text("reference").orElseThrow());
            assertEquals("87.5 [lb_av]/[cft_i]", size(material, "bulkDensity"));
            start();
            app.click("stop-T1");
            app.until(() -> app.has("verdict"));
        }
        assertEquals(List.of(), findings);
    }

    private static String size(Branch holder, String key) {
        return holder.quantity(key).map(size -> size.value().toPlainString() + " " + size.unit().code()).orElseThrow();
    }

    private void write(String id, String text) throws Exception {
        app.click(id);
        app.type(text);
    }

    /** Types a number by the pad and goes on to the next box. */
    private void keys(String number) throws Exception {
        for (char digit : number.toCharArray()) {
            app.click("pad-digit-" + digit);
        }
        app.click("pad-next");
    }

    private void choose(String id) throws Exception {
        app.click(id);
        assertTrue(app.node(id).getPseudoClassStates().toString().contains("selected"), id);
    }

    private void start() throws Exception {
        write("person", "A. Vale");
        app.click("caution-read");
        app.click("start-walk");
        app.until(() -> app.has("search"));
    }

    @Test
    void aMaterialOfOnesOwnIsNamedAndMeasured() throws Exception {
        try (TabletApp opened = open(1280, 800)) {
            app = opened;
            app.click("new-plant");
            choose("material-cement-clinker");
            choose("material-own");
            write("plant-material", "Slag sand");
            write("plant-plant", "Holm");
            write("plant-belt", "B1");
            write("plant-tag", "T1");
            app.click("plant-width");
            keys("650");
            keys("0");
            app.click("make-plant");
            assertEquals("Still to say: Bulk density, Surcharge angle.", app.words("plant-trouble"));
            keys("1200");
            keys("20");
            app.click("make-plant");
            app.until(() -> app.has("person"));
            Branch plant = app.workplace().site().register().document();
            assertEquals("Slag sand", plant.branches("materials").get(0).text("name").orElseThrow());
            assertEquals("1200 kg/m3", size(plant.branches("materials").get(0), "bulkDensity"));
            assertFalse(plant.branches("conveyors").get(0).has("centreRollLength"), "a flat belt has no centre roll");
        }
    }

    @Test
    void theOfficeIsAcceptedOnceAndItsNextRoundComesInByItself() throws Exception {
        try (TabletApp opened = open(1280, 800)) {
            app = opened;
            app.click("take-round");
            app.until(() -> app.has("not-taken"));
            assertTrue(app.words("not-taken").contains("holds no round file"), app.words("not-taken"));
            roundFile("a", "2026-09-20T08:00:00Z", false);
            app.click("take-round");
            app.until(() -> app.has("accept-office"));
            scan("office-asked", "landscape");
            app.click("accept-office");
            app.until(() -> app.has("person"));
            assertTrue(app.words("taken").startsWith("Taken in: no round"), app.words("taken"));
            scan("no-round", "landscape");
            Files.delete(temp.resolve("stick/a.round.json"));
            roundFile("b", "2026-09-21T08:00:00Z", true);
            app.click("take-round");
            app.until(() -> app.words("taken").startsWith("Taken in: one round"));
            assertFalse(app.has("accept-office"), "the office is known");
            start();
            app.until(() -> app.has("stop-TP-01"));
        }
        assertEquals(List.of(), findings);
    }

    private void scan(String name, String orientation) throws Exception {
        for (Locale language : List.of(Locale.ENGLISH, SPANISH)) {
            look(language, language.equals(SPANISH));
            if (Boolean.getBoolean("bedmark.pictures")) {
                app.picture(Path.of("target/pictures/first", name + "-" + orientation + "-" + language + ".png"));
            }
            Glass.on(() -> findings.addAll(ScreenScan.of(app.shell().scene(),
                    Shell.density(app.workplace().preferences())).stream().map(finding -> "\n" + name + " "
                            + orientation + " " + language + ": " + finding).toList()));
        }
        look(Locale.ENGLISH, false);
    }

    private void look(Locale language, boolean night) throws Exception {
        Glass.on(() -> {
            app.workplace().preferencesProperty().set(app.workplace().preferences().withLocale(language)
                    .withNight(night));
            return null;
        });
        app.settle();
    }
}
