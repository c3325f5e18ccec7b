package bedmark.screen;

import static org.junit.jupiter.api.Assertions.assertEquals;

import bedmark.office.Offices;
import bedmark.screen.ScreenScanTest.Look;
import bedmark.screen.arrival.ArrivalWindow;
import bedmark.screen.theme.Density;
import bedmark.screen.theme.Hand;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import javafx.scene.Scene;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The window of a pack that is opened by itself, in the looks of {@link ScreenScanTest}; it knows no gloves. */
class ArrivalScanTest {
    @TempDir
    private Path temp;

    private final List<String> findings = new ArrayList<>();

    @Test
    void arrivedPack() throws Exception {
        Path home = Files.createDirectories(temp.resolve("home"));
        Path pack = Offices.pack(Offices.sample("round-under-way"), temp.resolve("tablet"), temp.resolve("round.zip"));
        Path cut = Files.write(temp.resolve("cut.zip"), Arrays.copyOf(Files.readAllBytes(pack), 5000));
        try (ArrivalWindow window = new ArrivalWindow(pack, home, 1280, 800)) {
            window.chooses(Files.createDirectories(home.resolve("office")));
            scan("arrived", true, window);
            window.click("receive");
            scan("untrusted", true, window);
            window.click("trust");
            scan("received", true, window);
        }
        try (ArrivalWindow window = new ArrivalWindow(cut, home, 1280, 800)) {
            scan("refused", false, window);
        }
        assertEquals(List.of(), findings);
    }

    private void scan(String screen, boolean caution, ArrivalWindow window) throws Exception {
        for (Look look : ScreenScanTest.LOOKS) {
            for (boolean portrait : List.of(false, true)) {
                Glass.on(() -> {
                    Scene scene = window.scene();
                    window.prefer(look.night(), look.language(), look.dpi(), portrait);
                    double width = look.scale() * (portrait ? 800 : 1280);
                    double height = look.scale() * (portrait ? 1280 : 800);
                    ScreenScan.of(scene.getRoot(), new Density(look.dpi(), Hand.BARE), Math.rint(width),
                            Math.rint(height)).forEach(finding -> findings.add("\n" + screen + " " + look
                            + (portrait ? " portrait: " : ": ") + finding));
                    if (caution && !ScreenScan.hasCaution(scene)) {
                        findings.add("\n" + screen + " " + look + ": the caution is absent");
                    }
                    scene.getRoot().resize(scene.getWidth(), scene.getHeight());
                    return null;
                });
            }
        }
        Glass.on(() -> {
            window.prefer(false, Locale.ENGLISH, Density.DEFAULT_DPI, false);
            return null;
        });
        window.settle();
    }
}
