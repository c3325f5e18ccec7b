package bedmark;

import bedmark.command.BedmarkCommand;
import bedmark.command.Surroundings;
import bedmark.document.Refused;
import bedmark.index.Store;
import bedmark.index.StoreFolder;
import bedmark.index.StoreOptions;
import bedmark.office.OfficeOptions;
import bedmark.office.OfficeStore;
import bedmark.pack.FileKind;
import bedmark.screen.BedmarkApp;
import bedmark.screen.Preferences;
import bedmark.screen.PreferencesFile;
import bedmark.screen.RefusalWindow;
import bedmark.screen.arrival.ArrivalApp;
import bedmark.screen.arrival.ArrivalModel;
import bedmark.screen.office.OfficeApp;
import bedmark.words.Words;
import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.time.Clock;
import java.util.Locale;
import java.util.Optional;
import java.util.function.Supplier;

/** The program: wires its parts by hand and hands over to a command or to the screen. */
public final class Bedmark {
    private static final Clock CLOCK = new MachineClock();

    private Bedmark() {
    }

    public static void main(String... arguments) {
        Optional<Path> home = Optional.ofNullable(System.getProperty("bedmark.home")).map(Path::of);
        Surroundings surroundings = new Surroundings(new PrintWriter(System.out, true, StandardCharsets.UTF_8),
                new PrintWriter(System.err, true, StandardCharsets.UTF_8), home, CLOCK,
                new Words(Locale.ENGLISH), Bedmark::open, Bedmark::show);
        System.exit(BedmarkCommand.run(surroundings, arguments));
    }

    /** A window needs a display: on Linux an X or Wayland server that the environment names. */
    private static boolean hasDisplay() {
        boolean linux = System.getProperty("os.name", "").toLowerCase(Locale.ROOT).contains("linux");
        return !linux || System.getenv("DISPLAY") != null || System.getenv("WAYLAND_DISPLAY") != null;
    }

    /** Opens what a window is to show; who started the program by its icon has no terminal to read why it fails. */
    private static <T> T opened(Supplier<Preferences> preferences, Supplier<T> opening) {
        try {
            return opening.get();
        } catch (RuntimeException e) {
            BedmarkApp.awaitToolkit();
            RefusalWindow.show(preferences.get(), Refused.reason(e), CLOCK);
            throw e;
        }
    }

    private static boolean show(Path file) {
        if (!hasDisplay()) {
            return false;
        }
        Path home = Path.of(System.getProperty("user.home"));
        FileKind kind = opened(() -> ArrivalModel.preferences(home), () -> FileKind.of(file));
        return ArrivalApp.open(file, kind, home, CLOCK);
    }

    private static boolean open(Path folder, Optional<Path> samples, boolean load) {
        if (!hasDisplay()) {
            return false;
        }
        Supplier<Preferences> preferences = () -> new PreferencesFile(folder).read();
        if (OfficeStore.isOffice(folder)) {
            return OfficeApp.open(opened(preferences, () -> OfficeStore.open(folder, OfficeOptions.of(CLOCK))), CLOCK);
        }
        BedmarkApp.prepare(folder, CLOCK);
        StoreOptions options = BedmarkApp.options(CLOCK);
        if (opened(preferences, () -> new StoreFolder(folder, options).sealed())) {
            return BedmarkApp.unlock(folder, passphrase -> Store.open(folder,
                    options.withPassphrase(Optional.of(passphrase))), CLOCK, samples);
        }
        try (Store store = opened(preferences, () -> Store.open(folder, options))) {
            return BedmarkApp.open(store, CLOCK, samples, load);
        }
    }
}
