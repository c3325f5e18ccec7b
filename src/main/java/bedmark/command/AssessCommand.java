package bedmark.command;

import static bedmark.command.BedmarkCommand.in;
import static bedmark.document.Refused.below;

import bedmark.document.Pointer;
import bedmark.engine.verdict.Level;
import bedmark.json.AssessmentWriter;
import bedmark.json.JsonWriter;
import bedmark.json.ReferenceData;
import bedmark.quantity.UnitSystem;
import bedmark.survey.Assessor.Assessed;
import bedmark.survey.Assessor.AssessedConveyor;
import bedmark.survey.Assessor;
import bedmark.survey.Bundle;
import bedmark.survey.Register;
import bedmark.survey.Survey;
import bedmark.wording.Wording;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.UUID;
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

    @Option(names = "--reference", paramLabel = "DIR",
            description = "Reference files of a site in the place of the shipped ones; what a plant decides wins.")
    private Path reference;

    /** One way of printing. */
    static final class Output {
        @Option(names = "--json", description = "Print JSON.")
        private boolean json;

        @Option(names = "--csv", description = "Print CSV (RFC 4180).")
        private boolean csv;

        @Option(names = "--explain", description = "Print the working of each survey as a calculation sheet.")
        private boolean explain;
    }

    /**
     * The surveys of one bundle with their assessments.
     *
     * @param assessor   who made them
     * @param conveyors  their conveyors as a whole
     * @param superseded the surveys that a later revision in the bundle replaces; they are judged all the same
     */
    record Judged(Bundle bundle, Assessor assessor, List<Assessed> surveys,
                  List<AssessedConveyor> conveyors, Set<UUID> superseded) {
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
        Optional<ReferenceData> data = Optional.ofNullable(reference).map(ReferenceData::read);
        List<Judged> judged = new ArrayList<>();
        for (BundleSource.Named named : BundleSource.read(from)) {
            judged.add(in(named.file(), () -> named.judge(bundle -> judge(bundle, data))));
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
        } else if (output.explain) {
            ExplainedText text = new ExplainedText(wording, notice);
            judged.forEach(one -> text.print(one.bundle().register(), one.assessor(), one.surveys(),
                    one.bundle().forms(), surroundings.out()));
        } else {
            new AssessmentText(wording).print(judged, notice, surroundings.out());
        }
        surroundings.out().flush();
        return exitCode(all);
    }

    /** Judges by the register; what a site keeps in files of its own takes the place of what is built in. */
    private static Judged judge(Bundle bundle, Optional<ReferenceData> data) {
        Assessor assessor = below(Pointer.of("plant"), () -> data
                .map(own -> new Assessor(new Register(own.filled(bundle.register().document())), own.settings()))
                .orElseGet(() -> new Assessor(bundle.register())));
        Assessor.Judged judged = assessor.judge(bundle.surveys());
        return new Judged(bundle, assessor, judged.surveys(), judged.conveyors(), Survey.superseded(bundle.surveys()));
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
