package bedmark.command;

import bedmark.journal.NamedPath;
import bedmark.json.FormsChecker;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Parameters;

/** Checks the field forms of a folder. */
@Command(name = "check", mixinStandardHelpOptions = true,
        description = "Checks the field forms of a folder; names file, line, key and the fix.",
        footer = {"", "Exit codes: 0 all sound; 3 something is wrong."})
final class FormsCheckCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Parameters(paramLabel = "DIR", description = "The folder.")
    private Path folder;

    FormsCheckCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() {
        NamedPath.requireFolder(folder);
        return report(FormsChecker.check(folder));
    }

    private int report(List<FormsChecker.Finding> findings) {
        findings.forEach(finding -> surroundings.err().println(place(finding)
                + surroundings.wording().sentence(finding.defect())));
        if (findings.isEmpty()) {
            surroundings.say("command.forms.sound", folder);
        }
        return findings.isEmpty() ? ExitCode.FINE : ExitCode.UNREADABLE;
    }

    /** File, line, column and key, as compilers write them. */
    private static String place(FormsChecker.Finding finding) {
        return finding.file().isEmpty() ? "bedmark: " : finding.file() + ":" + finding.line() + ":" + finding.column()
                + ": " + (finding.key().isEmpty() ? "" : finding.key() + ": ");
    }
}
