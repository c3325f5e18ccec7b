package bedmark.command;

import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParameterException;

/** How a command may be used. */
final class Usage {
    private Usage() {
    }

    /**
     * Holds a command to its use.
     *
     * @param otherwise what is wrong where it is not met, in a sentence without an end
     * @throws ParameterException where it is not met
     */
    static void require(CommandSpec spec, boolean met, String otherwise) {
        if (!met) {
            throw new ParameterException(spec.commandLine(), otherwise);
        }
    }
}
