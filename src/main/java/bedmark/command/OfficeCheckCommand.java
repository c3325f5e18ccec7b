package bedmark.command;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.NamedPath;
import bedmark.office.OfficeOptions;
import bedmark.office.OfficeProof;
import bedmark.office.OfficeStore;
import java.nio.file.Path;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Parameters;

/** Proves an office in a folder. */
@Command(name = "check", mixinStandardHelpOptions = true,
        description = {"Proves an office in a folder: the journal, every pack, and every row of the tables against those",
            "that are made anew beside them."},
        footer = {"", "Exit codes: 0 sound; 3 something is wrong, each in one line."})
final class OfficeCheckCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Parameters(paramLabel = "DIR", description = "The office's folder.")
    private Path folder;

    OfficeCheckCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() {
        require(folder);
        OfficeProof proof;
        try (ProgressLine progress = new ProgressLine(surroundings)) {
            proof = OfficeProof.of(folder, OfficeOptions.of(surroundings.clock()).withProgress(progress::at));
        }
        surroundings.say("command.office.counts", proof.packs(), proof.rows());
        proof.defects().forEach(defect -> surroundings.err().println("bedmark: "
                + surroundings.wording().sentence(defect)));
        if (proof.defects().isEmpty()) {
            surroundings.say("command.office.sound", folder);
        }
        return proof.defects().isEmpty() ? ExitCode.FINE : ExitCode.UNREADABLE;
    }

    /** An office that is not there is not made by looking at it. */
    static void require(Path folder) {
        if (!OfficeStore.isOffice(folder)) {
            NamedPath.requireFolder(folder);
            throw new Refused(Defect.in(folder.toString(), "office-absent"));
        }
    }
}
