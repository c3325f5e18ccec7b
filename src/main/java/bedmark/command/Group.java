package bedmark.command;

import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/** A command that only holds others: alone it is bad use. */
abstract class Group implements Callable<Integer> {
    @Spec
    private CommandSpec spec;

    @Override
    public Integer call() {
        throw new ParameterException(spec.commandLine(),
                "name one of " + String.join(", ", spec.subcommands().keySet()));
    }

    /** Packs. */
    @Command(name = "pack", mixinStandardHelpOptions = true, description = "Makes and verifies packs.")
    static final class PackGroup extends Group {
    }

    /** Field forms. */
    @Command(name = "forms", mixinStandardHelpOptions = true, description = "Checks field forms.")
    static final class FormsGroup extends Group {
    }

    /** Reference data. */
    @Command(name = "reference", mixinStandardHelpOptions = true,
            description = "Checks and writes reference data: materials, limits, seal rates, belt speeds, instruments.")
    static final class ReferenceGroup extends Group {
    }

    /** The office. */
    @Command(name = "office", mixinStandardHelpOptions = true,
            description = "The maintenance office: receives packs, ranks the zones, reports, sends rounds out.")
    static final class OfficeGroup extends Group {
    }

    /** Stores. */
    @Command(name = "store", mixinStandardHelpOptions = true, 
            description = "Proves, rebuilds, backs up, restores and encrypts a store; reads the office's receipts.")
    static final class StoreGroup extends Group {
    }
}
