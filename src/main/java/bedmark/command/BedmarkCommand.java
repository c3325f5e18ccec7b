package bedmark.command;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.wording.Wording;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import java.time.format.DateTimeParseException;
import java.util.Optional;
import java.util.concurrent.Callable;
import java.util.regex.Pattern;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;
import picocli.CommandLine.TypeConversionException;

/** The program's one command and its ways of failing: one sentence on standard error and the right exit code. */
@Command(name = "bedmark", mixinStandardHelpOptions = true, versionProvider = ProgramVersion.class,
        description = "Loading-zone surveys of belt conveyors: recorded on a tablet, judged on the spot.",
        footer = {"", "Without a command the tablet app opens; with a file a window shows what is in it.",
            "Exit codes: 0 fine, 1 something overloaded, 2 bad use, 3 unreadable input,",
            "4 something undecided or incomplete."})
public final class BedmarkCommand implements Callable<Integer> {
    /** What is more likely a command mistyped than a file. */
    private static final Pattern WORD = Pattern.compile("[\\p{L}-]+");

    private final Surroundings surroundings;

    @Spec
    private CommandSpec spec;

    @Parameters(paramLabel = "FILE", arity = "0..1",
            description = "A pack, round file or receipt to look at, and to receive.")
    private Optional<Path> file;

    private BedmarkCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    /**
     * Runs the program.
     *
     * @return its exit code
     */
    public static int run(Surroundings surroundings, String... arguments) {
        try {
            return arguments.length == 0 ? open(surroundings) : execute(surroundings, arguments);
        } catch (OutOfMemoryError e) {
            return failed(surroundings, new Refused(Defect.in("", "memory-short"), e));
        }
    }

    /** As the desktop starts it: there is no line to be read, and making ready for one would hold up the window. */
    private static int open(Surroundings surroundings) {
        int code;
        try {
            code = OpenCommand.open(surroundings, OpenCommand.ownStore(), false);
        } catch (Exception e) {
            code = failed(surroundings, e);
        }
        flush(surroundings);
        return code;
    }

    private static void flush(Surroundings surroundings) {
        surroundings.out().flush();
        surroundings.err().flush();
    }

    private static int execute(Surroundings surroundings, String... arguments) {
        CommandLine line = new CommandLine(new BedmarkCommand(surroundings))
                .addSubcommand(new OpenCommand(surroundings))
                .addSubcommand(new AssessCommand(surroundings))
                .addSubcommand(new SupportCommand(surroundings))
                .addSubcommand(new CommandLine(new Group.PackGroup())
                        .addSubcommand(new PackVerifyCommand(surroundings))
                        .addSubcommand(new PackMakeCommand(surroundings)))
                .addSubcommand(new CommandLine(new Group.FormsGroup())
                        .addSubcommand(new FormsCheckCommand(surroundings)))
                .addSubcommand(new CommandLine(new Group.ReferenceGroup())
                        .addSubcommand(new ReferenceCheckCommand(surroundings))
                        .addSubcommand(new ReferenceWriteCommand(surroundings)))
                .addSubcommand(OfficeCommands.line(surroundings))
                .addSubcommand(new CommandLine(new Group.StoreGroup())
                        .addSubcommand(new StoreCheckCommand(surroundings))
                        .addSubcommand(new StoreRebuildCommand(surroundings))
                        .addSubcommand(new StoreBackupCommand(surroundings))
                        .addSubcommand(new StoreRestoreCommand(surroundings))
                        .addSubcommand(new StoreReceiptCommand(surroundings))
                        .addSubcommand(new StoreEncryptCommand(surroundings)))
                .registerConverter(LocalDate.class, BedmarkCommand::day)
                .setOut(surroundings.out())
                .setErr(surroundings.err())
                .setParameterExceptionHandler(BedmarkCommand::badUse)
                .setExecutionExceptionHandler((failure, failed, parsed) -> failed(surroundings, failure));
        int code = line.execute(arguments);
        flush(surroundings);
        return code;
    }

    @Override
    public Integer call() throws Exception {
        if (file.isPresent()) {
            if (WORD.matcher(file.get().toString()).matches() && !Files.exists(file.get())) {
                throw new ParameterException(spec.commandLine(),
                        "'" + file.get() + "' is neither a command nor a file");
            }
            return new FileShowing(surroundings).show(file.get());
        }
        return OpenCommand.open(surroundings, OpenCommand.ownStore(), false);
    }

    private static LocalDate day(String typed) {
        try {
            return LocalDate.parse(typed);
        } catch (DateTimeParseException e) {
            throw new TypeConversionException("'" + typed + "' is no day; write it like 2027-01-31");
        }
    }

    private static int badUse(ParameterException failure, String[] arguments) {
        CommandLine line = failure.getCommandLine();
        String first = failure.getMessage() == null ? "" : failure.getMessage().lines().findFirst().orElse("");
        line.getErr().println("bedmark: " + first + " (see '" + line.getCommandSpec().qualifiedName() + " --help')");
        return ExitCode.BAD_USE;
    }

    private static int failed(Surroundings surroundings, Exception failure) {
        surroundings.err().println("bedmark: " + sentence(surroundings, failure));
        return ExitCode.UNREADABLE;
    }

    private static String sentence(Surroundings surroundings, Exception failure) {
        if (failure instanceof Misread misread) {
            Defect defect = misread.refused.defect();
            return about(misread.file, defect, surroundings.wording().sentence(defect));
        }
        return surroundings.wording().sentence(Refused.reason(failure));
    }

    /** A sentence that says which file it is about; one whose place is the file says so itself. */
    static String about(Path file, Defect defect, String sentence) {
        return defect.where().equals(file.toString()) ? sentence : Wording.plain(file.toString()) + ": " + sentence;
    }

    /** A refusal, and the file that it is about. */
    private static final class Misread extends RuntimeException {
        private final transient Path file;
        private final transient Refused refused;

        Misread(Path file, Refused refused) {
            super(file.toString(), refused);
            this.file = file;
            this.refused = refused;
        }
    }

    /** Reads something of a file, so that a refusal names it. */
    static <T> T in(Path file, Callable<T> reading) throws Exception {
        try {
            return reading.call();
        } catch (Refused e) {
            throw new Misread(file, e);
        }
    }
}
