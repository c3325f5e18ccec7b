package bedmark.command;

import bedmark.diary.Diary;
import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.index.Store;
import bedmark.index.StoreCheck;
import bedmark.journal.FileLayer;
import bedmark.journal.NamedPath;
import bedmark.pack.SafeFile;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** Writes what whoever helps needs to know into one text file that a person can read before sending it. */
@Command(name = "support", mixinStandardHelpOptions = true,
        description = "Writes versions, counts, defects and the diary of a store into one text file, without answers "
                + "or names; read it before you send it.",
        footer = {"", "Exit codes: 0 written; 3 there is no store, or the file cannot be written."})
final class SupportCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Parameters(paramLabel = "DIR", description = "The store's folder.")
    private Path folder;

    @Option(names = "--out", required = true, paramLabel = "FILE", description = "The text file to write.")
    private Path out;

    @Mixin
    private PassphraseOption passphrase = new PassphraseOption();

    SupportCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() throws IOException {
        NamedPath.requireFolder(folder);
        InputFile.requireNoOffice(folder, "support");
        NamedPath.requireTarget(out);
        List<String> lines = new ArrayList<>();
        lines.add("bedmark " + ProgramVersion.number());
        for (String property : List.of("java.version", "java.vendor.version", "os.name", "os.version", "os.arch",
                "file.encoding")) {
            lines.add(property + " " + System.getProperty(property, "-"));
        }
        lines.add("processors " + Runtime.getRuntime().availableProcessors());
        lines.add("memory " + Runtime.getRuntime().maxMemory() + " B");
        StoreCheck check;
        try (ProgressLine progress = new ProgressLine(surroundings)) {
            check = Store.check(folder, FileLayer.disk(), passphrase.of(folder, surroundings), progress::at);
        }
        lines.add("free " + Files.getFileStore(folder).getUsableSpace() + " B");
        lines.add(String.format(Locale.ROOT, "segments %d entries %d photos %d torn %d defects %d", check.segments(),
                check.entries(), check.photos(), check.torn().size(), check.defects().size()));
        // Of a defect only its code: the place and the details may hold what a person wrote.
        check.defects().forEach(defect -> lines.add("defect " + defect.code()));
        lines.add("");
        lines.addAll(Diary.read(folder));
        write(String.join(System.lineSeparator(), lines) + System.lineSeparator());
        surroundings.say("command.support.written", out);
        return ExitCode.FINE;
    }

    private void write(String text) {
        try {
            new SafeFile(FileLayer.disk(), out, false).write(file -> file.write(text.getBytes(StandardCharsets.UTF_8)));
        } catch (IOException e) {
            throw new Refused(Defect.in("", "file-unwritable", out.toString()), e);
        }
    }
}
