package bedmark.command;

import bedmark.document.Refused;
import bedmark.journal.NamedPath;
import bedmark.office.OfficeStore;
import bedmark.office.PackFolder;
import bedmark.office.Received;
import bedmark.pack.Fingerprint;
import bedmark.pack.Receipt;
import bedmark.survey.merge.Clash;
import bedmark.survey.merge.Copy;
import bedmark.wording.Wording;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Spec;

/** Takes packs into an office store and writes receipts for the tablets. */
@Command(name = "receive", mixinStandardHelpOptions = true,
        description = "Takes packs in, each whole or not at all; the same pack again changes nothing.",
        footer = {"", "Exit codes: 0 everything is in; 1 something that came clashes with what was here;",
            "2 bad use; 3 at least one pack was refused, the others are in."})
final class OfficeReceiveCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Spec
    private CommandSpec spec;

    @Mixin
    private OfficeDesk desk;

    @Parameters(paramLabel = "PACK|FOLDER", arity = "1..*", description = "Packs (.zip), or folders that hold some.")
    private List<Path> packs;

    @Option(names = "--trust", paramLabel = "FINGERPRINT",
            description = "Trust the device whose key has this fingerprint, from now on; may stand several times.")
    private List<String> trusted = List.of();

    @Option(names = "--receipts", paramLabel = "DIR",
            description = "Folder for the receipts (default: beside each pack).")
    private Path receipts;

    @Option(names = "--json", description = "Print JSON lines, one pack each; refusals also go to standard error.")
    private boolean json;

    OfficeReceiveCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() {
        List<String> fingerprints = trusted.stream().map(this::fingerprint).toList();
        List<Path> files = new ArrayList<>();
        packs.forEach(pack -> files.addAll(held(pack)));
        if (receipts != null) {
            NamedPath.requireFolder(receipts);
        }
        try (ProgressLine progress = new ProgressLine(surroundings); OfficeStore store = desk.open(surroundings,
                progress)) {
            fingerprints.forEach(fingerprint -> store.trust(fingerprint, "", desk.person()));
            List<Received> received = store.receive(files, desk.person(), progress::at);
            progress.done();
            received.forEach(one -> tell(store, one));
            return exitCode(received);
        }
    }

    private List<Path> held(Path given) {
        if (!Files.isDirectory(given)) {
            return List.of(given);
        }
        List<Path> files = PackFolder.packs(given);
        if (files.isEmpty()) {
            (json ? surroundings.err() : surroundings.out()).println(Wording.plain(surroundings.words()
                    .text("office.receive.no-packs", given)));
        }
        return files;
    }

    private String fingerprint(String typed) {
        return Fingerprint.parse(typed).orElseThrow(() ->
                new ParameterException(spec.commandLine(), "--trust '" + typed + "' is no fingerprint")).text();
    }

    private void tell(OfficeStore store, Received received) {
        if (received instanceof Received.Turned turned) {
            surroundings.err().println("bedmark: " + new RefusalText(surroundings.wording()).about(turned));
        }
        if (json) {
            Optional<Path> receipt = received.confirmed().flatMap(one -> written(store, received.file(), one));
            surroundings.out().println(new ReceivedJson(surroundings.wording()).line(received, receipt));
            return;
        }
        if (received instanceof Received.Taken taken) {
            say("", "office.receive.taken", taken.file(), taken.device(), taken.fresh(), taken.known());
            taken.clashes().forEach(this::tell);
            if (taken.clock() > 0) {
                say("  ", "office.receive.clock", taken.clockTold());
            }
        } else if (received instanceof Received.AlreadyHere here) {
            say("", "office.receive.here", here.file(), here.device());
        }
        received.confirmed().ifPresent(receipt -> written(store, received.file(), receipt).ifPresent(file ->
                say("  ", "office.receive.receipt-of", file,
                        OfficeNameCommand.named(surroundings, receipt.office().name()))));
    }

    private void tell(Clash clash) {
        Copy first = clash.sides().get(0);
        say("  ", "office.clash." + clash.kind().code(), first.zone().transfer(), first.id(), first.revision());
        clash.sides().forEach(side -> say("    ", "office.clash.side", side.digest().substring(0, 12), side.id(),
                side.revision(), Instant.ofEpochMilli(side.moment())));
    }

    /** A receipt that can't be written loses nothing: the same pack received again writes it again. */
    private Optional<Path> written(OfficeStore store, Path pack, Receipt receipt) {
        Path into = receipts == null ? pack.toAbsolutePath().getParent() : receipts;
        try {
            return Optional.of(store.write(receipt, into));
        } catch (Refused e) {
            surroundings.err().println("bedmark: " + surroundings.wording().sentence(e.defect()));
            return Optional.empty();
        }
    }

    private void say(String before, String key, Object... details) {
        surroundings.out().println(before + Wording.plain(surroundings.words().text(key, details)));
    }

    private static int exitCode(List<Received> received) {
        if (received.stream().anyMatch(one -> one instanceof Received.Turned)) {
            return ExitCode.UNREADABLE;
        }
        return received.stream().anyMatch(one -> one instanceof Received.Taken taken && !taken.clashes().isEmpty())
                ? ExitCode.OVERLOADED : ExitCode.FINE;
    }
}
