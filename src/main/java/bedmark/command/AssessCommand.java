package bedmark.command;

import static bedmark.command.BedmarkCommand.in;

import bedmark.engine.verdict.Level;
import bedmark.json.AssessmentWriter;
import bedmark.json.JsonWriter;
import bedmark.quantity.UnitSystem;
import bedmark.survey.Assessor;
import bedmark.survey.Assessor.Assessed;
import bedmark.survey.Assessor.AssessedConveyor;
import bedmark.survey.Bundle;
import bedmark.wording.Wording;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Callable;
import picocli.CommandLine.ArgGroup;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** Recomputes every survey from its readings. */
@Command(name = "assess", mixinStandardHelpOptions = true,
        description = "Recomputes every survey of a bundle, a pack or a folder of them from its readings.",
        footer = {"", "Exit codes: 0 nothing overloaded, undecided or incomplete; 1 something overloaded;",
            "4 none overloaded, but something undecided or incomplete; 2 bad use; 3 unreadable input."})
final class AssessCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Spec
    private CommandSpec spec;

    @Parameters(paramLabel = "BUNDLE|PACK|SURVEY-FOLDER", description = "A bundle (.json), a pack (.zip), or a folder.")
    private Path input;

    @ArgGroup
    private Output output = new Output();

    @Option(names = "--units", paramLabel = "metric|us", defaultValue = "metric",
            description = "Units of the text and the CSV (default: ${DEFAULT-VALUE}); JSON is always SI.")
    private String units;

    /** One way of printing. */
    static final class Output {
        @Option(names = "--json", description = "Print JSON.")
        private boolean json;

        @Option(names = "--csv", description = "Print CSV (RFC 4180).")
        private boolean csv;
    }

    /** The surveys and conveyors of one bundle with their assessments. */
    record Judged(Bundle bundle, List<Assessed> surveys, List<AssessedConveyor> conveyors) {
        static Judged of(Bundle bundle) {
            Assessor.Judged judged = new Assessor(bundle.register()).judge(bundle.surveys());
            return new Judged(bundle, judged.surveys(), judged.conveyors());
        }
    }

    AssessCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() throws Exception {
        UnitSystem system = UnitSystem.ofCode(units).orElseThrow(() ->
                new ParameterException(spec.commandLine(), "--units is metric or us, not '" + units + "'"));
        return assess(input, system);
    }

    /** Prints the assessment of an input as text, in metric units. */
    int assess(Path from) throws Exception {
        return assess(from, UnitSystem.METRIC);
    }

    private int assess(Path from, UnitSystem system) throws Exception {
        List<Judged> judged = new ArrayList<>();
        for (BundleSource.Named named : BundleSource.read(from)) {
            judged.add(in(named.file(), () -> Judged.of(named.bundle())));
        }
        List<Assessed> all = judged.stream().flatMap(one -> one.surveys().stream()).toList();
        Wording wording = new Wording(surroundings.words(), system);
        String notice = surroundings.words().text("command.notice");
        if (output.json) {
            List<AssessedConveyor> conveyors = judged.stream().flatMap(one -> one.conveyors().stream()).toList();
            byte[] json = JsonWriter.indented(AssessmentWriter.list(all, conveyors, notice));
            surroundings.out().print(new String(json, StandardCharsets.UTF_8));
        } else if (output.csv) {
            new AssessmentTable(wording).print(judged, notice, surroundings.out());
        } else {
            new AssessmentText(wording).print(judged, notice, surroundings.out());
        }
        surroundings.out().flush();
        return exitCode(all);
    }

    private static int exitCode(List<Assessed> all) {
        Level worst = all.stream().map(one -> one.assessment().level()).max(Level::compareTo).orElse(Level.WITHIN);
        return switch (worst) {
            case OVERLOADED -> ExitCode.OVERLOADED;
            case UNDECIDED, INCOMPLETE -> ExitCode.UNSETTLED;
            case NEAR, WITHIN -> ExitCode.FINE;
        };
    }
}
