package bedmark.command;

import bedmark.journal.NamedPath;
import bedmark.json.BundleReader;
import bedmark.pack.DeviceKey;
import bedmark.pack.PackWriter;
import bedmark.pack.PhotoSource;
import bedmark.pack.WrittenPack;
import bedmark.survey.Bundle;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** Makes a signed pack of a bundle and its photos. */
@Command(name = "make", mixinStandardHelpOptions = true,
        description = "Makes a pack of a bundle and its photos, signed with the key of a store's device.")
final class PackMakeCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Parameters(paramLabel = "BUNDLE", description = "The bundle (.json).")
    private Path bundle;

    @Option(names = "--photos", paramLabel = "DIR", required = true, description = "Folder that holds the photos.")
    private Path photos;

    @Option(names = "--out", paramLabel = "PACK", required = true, description = "The pack to write.")
    private Path out;

    @Option(names = "--store", paramLabel = "DIR",
            description = "Store whose device key signs (default: your own store); the key is made on first use.")
    private Optional<Path> store;

    PackMakeCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() throws Exception {
        byte[] text = InputFile.read(bundle);
        Bundle read = BedmarkCommand.in(bundle, () -> BundleReader.read(text));
        NamedPath.requireFolder(photos);
        if (!Files.isDirectory(out)) {
            NamedPath.requireFolder(out.toAbsolutePath().normalize().getParent());
        }
        Path keys = store.orElseGet(OpenCommand::ownStore);
        NamedPath.requireFolderOrNothing(keys);
        DeviceKey key = DeviceKey.of(keys);
        WrittenPack written;
        try (ProgressLine progress = new ProgressLine(surroundings)) {
            written = PackWriter.write(read, PhotoSource.folder(photos), key, out, progress::at);
        }
        surroundings.say("command.pack.made", written.file(),
                read.surveys().size(), written.photos(), written.sha256(), written.fingerprint());
        return ExitCode.FINE;
    }
}
