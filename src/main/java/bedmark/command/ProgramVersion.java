package bedmark.command;

import java.util.Optional;
import picocli.CommandLine.IVersionProvider;

/** The program's version, from the manifest of its jar. */
final class ProgramVersion implements IVersionProvider {

    /** The version; outside of a jar there is none. */
    static String number() {
        return Optional.ofNullable(ProgramVersion.class.getPackage().getImplementationVersion())
                .orElse("(not packaged)");
    }

    @Override
    public String[] getVersion() {
        return new String[] {"bedmark " + number()};
    }
}
