package bedmark.screen.office;

import static org.junit.jupiter.api.Assertions.assertEquals;

import bedmark.office.OfficeOptions;
import bedmark.office.OfficeStore;
import bedmark.office.Offices;
import bedmark.office.RoundDesk;
import bedmark.screen.Glass;
import bedmark.screen.arrival.ArrivalWindow;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Takes the pictures of the office's screens for {@code src/site/screens/office.md}, in both orientations. */
class OfficePicturesTest {
    private static final Path FOLDER = Path.of("src", "site", "screens");
    private static final Path PICTURES = Path.of(System.getProperty("bedmark.screens", FOLDER.toString()));
    private static final List<String> FEW = List.of("landscape-day-en", "portrait-night-es");
    private static final Map<String, String> TOLD = new LinkedHashMap<>();
    private static final List<String> ARRIVALS = List.of("pack", "pack-untrusted", "pack-received", "pack-refused",
            "next-round");

    static {
        TOLD.put("worst", "All loading zones of all plants, worst first.");
        TOLD.put("zone", "One zone: findings to accept or shelve, actions, the trend with its uncertainty and limits.");
        TOLD.put("receive", "What came, from which tablet, and what was refused and why.");
        TOLD.put("energy", "What the skirts take in a year, and what the best remedies save.");
        TOLD.put("register", "The register as tables, edited in place.");
        TOLD.put("report", "The report, as a file of one's choice.");
        TOLD.put("pack", "A pack that was opened by itself, before the office has it.");
        TOLD.put("pack-untrusted", "The office does not know the tablet yet: its fingerprint is compared once.");
        TOLD.put("pack-received", "The pack is in, and the office can be opened.");
        TOLD.put("pack-refused", "A pack that was changed after it was signed.");
        TOLD.put("next-round", "A round file that was opened by itself, and where it belongs.");
    }

    @TempDir
    private Path folder;

    @Test
    void everyScreenOfTheOfficeHasItsPictures() throws Exception {
        Files.createDirectories(PICTURES);
        Path packs = folder.resolve("packs");
        for (String sample : List.of("round-2025-09", "round-2026-03", "round-under-way")) {
            Offices.pack(Offices.sample(sample), folder.resolve("tablet"), packs.resolve(sample + ".zip"));
        }
        for (double[] size : List.of(new double[] {1280, 800}, new double[] {800, 1280})) {
            String shape = size[0] > size[1] ? "landscape" : "portrait";
            try (OfficeWindow window = new OfficeWindow(folder.resolve("office-" + shape), size[0], size[1])) {
                window.desk().store().trust(Offices.fingerprint(folder.resolve("tablet")), "", "Ida Marsh");
                window.click("room-receive");
                window.chooses(packs);
                window.click("receive-folder");
                for (String look : List.of("day-en", "day-es", "night-en", "night-es")) {
                    for (String room : TOLD.keySet()) {
                        if (!ARRIVALS.contains(room) && looks(room).contains(shape + "-" + look)) {
                            take(window, room, look, shape + "-" + look);
                        }
                    }
                }
            }
            arrivals(packs, size, FEW.stream().filter(look -> look.startsWith(shape)).findFirst().orElseThrow());
        }
        assertEquals(Files.readString(FOLDER.resolve("office.md")), page(),
                "src/site/screens/office.md names other pictures than are taken");
    }

    /** What a person sees who opens a file by itself. */
    private void arrivals(Path packs, double[] size, String look) throws Exception {
        Path home = Files.createDirectories(folder.resolve("home-" + look));
        Path office = Files.createDirectories(home.resolve("office"));
        try (ArrivalWindow window = new ArrivalWindow(packs.resolve("round-under-way.zip"), home, size[0], size[1])) {
            window.chooses(office);
            picture(window, "pack", look);
            window.click("receive");
            picture(window, "pack-untrusted", look);
            window.click("trust");
            picture(window, "pack-received", look);
        }
        Path round = home.resolve("ostermere-2026-10.round.json");
        try (OfficeStore store = OfficeStore.open(office, OfficeOptions.of(Offices.NOW))) {
            new RoundDesk(store).send("ostermere", List.of(), round, OffsetDateTime.now(Offices.NOW), "Ida Marsh");
        }
        byte[] bytes = Files.readAllBytes(packs.resolve("round-2026-03.zip"));
        bytes[bytes.length / 2] ^= 1;
        Path changed = Files.write(home.resolve("changed.zip"), bytes);
        for (Map.Entry<Path, String> file : Map.of(changed, "pack-refused", round, "next-round").entrySet()) {
            try (ArrivalWindow window = new ArrivalWindow(file.getKey(), home, size[0], size[1])) {
                picture(window, file.getValue(), look);
            }
        }
    }

    private static void picture(ArrivalWindow window, String name, String look) throws Exception {
        Glass.on(() -> {
            window.prefer(look.contains("night"), Locale.forLanguageTag(look.substring(look.length() - 2)));
            return null;
        });
        window.settle();
        Glass.on(() -> {
            Glass.write(PICTURES.resolve("office-" + name + "-" + look + ".png"), window.scene());
            return null;
        });
    }

    private static List<String> looks(String room) {
        List<String> all = new ArrayList<>();
        for (String shape : List.of("landscape", "portrait")) {
            for (String look : List.of("day-en", "night-en", "day-es", "night-es")) {
                all.add(shape + "-" + look);
            }
        }
        return room.equals("worst") ? all : FEW;
    }

    private static void take(OfficeWindow window, String room, String look, String name) throws Exception {
        Glass.on(() -> {
            window.desk().preferencesProperty().set(window.desk().preferences().withNight(look.startsWith("night"))
                    .withLocale(Locale.forLanguageTag(look.substring(look.length() - 2))));
            if (room.equals("zone")) {
                window.shell().zone(window.desk().store().rank().get(0).zone());
            } else {
                window.shell().open(OfficeShell.Room.valueOf(room.toUpperCase(Locale.ROOT)));
            }
            return null;
        });
        window.settle();
        Glass.on(() -> {
            Glass.write(PICTURES.resolve("office-" + room + "-" + name + ".png"), window.shell().scene());
            return null;
        });
    }

    private static String page() {
        StringBuilder page = new StringBuilder("# The office's screens\n\nMade by `OfficePicturesTest`.\n");
        TOLD.forEach((room, told) -> {
            page.append("\n## ").append(room).append("\n\n").append(told).append("\n\n");
            looks(room).forEach(look -> page.append("![office ").append(room).append(' ')
                    .append(look.replace('-', ' ')).append("](office-").append(room).append('-').append(look)
                    .append(".png)\n"));
        });
        return page.toString();
    }
}
