package bedmark.command;

import bedmark.index.StoreFolder;
import bedmark.index.StoreOptions;
import bedmark.vault.Passphrase;
import java.io.Console;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.Optional;
import picocli.CommandLine.Option;

/**
 * The passphrase of an encrypted store: from a file, or asked for at the terminal. It never stands on the command line,
 * where every other program of the machine reads it.
 */
final class PassphraseOption {

    @Option(names = "--passphrase-file", paramLabel = "FILE",
            description = "File that holds the passphrase of an encrypted store; without it the terminal asks.")
    private Optional<Path> file;

    /** The passphrase; nothing where the store takes none and none is given, or where nobody can be asked. */
    Optional<Passphrase> of(Path store, Surroundings surroundings) {
        if (file.isPresent() || !new StoreFolder(store, StoreOptions.of("")).sealed()) {
            return file.map(PassphraseOption::read);
        }
        return ask(surroundings.words().text("store.passphrase")).map(Passphrase::of);
    }

    /** A passphrase that a file holds. */
    static Passphrase read(Path file) {
        return Passphrase.of(text(file));
    }

    /** A file's text. */
    static String text(Path file) {
        return new String(InputFile.read(file), StandardCharsets.UTF_8).strip();
    }

    /** Asks at the terminal without showing what is typed; nothing where there is none. */
    static Optional<String> ask(String what) {
        return Optional.ofNullable(System.console()).flatMap(console -> typed(console, what));
    }

    private static Optional<String> typed(Console console, String what) {
        return Optional.ofNullable(console.readPassword("%s: ", what)).map(String::new);
    }
}
