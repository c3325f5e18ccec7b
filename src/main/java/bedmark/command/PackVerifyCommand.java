package bedmark.command;

import bedmark.journal.NamedPath;
import bedmark.json.BundleReader;
import bedmark.pack.PackLimits;
import bedmark.pack.PackReader;
import bedmark.pack.ReadPack;
import java.nio.file.Path;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Parameters;

/** Proves a pack: archive, bag, digests, signature, bundle, photos. */
@Command(name = "verify", mixinStandardHelpOptions = true,
        description = "Proves a pack in every respect and prints the fingerprint of the device that signed it.",
        footer = {"", "Exit codes: 0 sound; 3 any defect, with the reason in one line."})
final class PackVerifyCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Parameters(paramLabel = "PACK", description = "The pack (.zip).")
    private Path pack;

    PackVerifyCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() throws Exception {
        NamedPath.requireFile(pack);
        return verify(surroundings, pack);
    }

    static int verify(Surroundings surroundings, Path pack) throws Exception {
        ReadPack read;
        try (ProgressLine progress = new ProgressLine(surroundings)) {
            read = BedmarkCommand.in(pack, () ->
                    new PackReader(PackLimits.STANDARD, BundleReader::read).open(pack, progress::at));
        }
        surroundings.say("command.pack.sound", pack,
                read.bundle().surveys().size(), read.photos().size(), read.fingerprint());
        return ExitCode.FINE;
    }
}
