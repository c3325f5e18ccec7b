package bedmark.screen.arrival;

import bedmark.document.Branch;
import bedmark.document.Refused;
import bedmark.journal.Progress;
import bedmark.json.BundleReader;
import bedmark.pack.FileKind;
import bedmark.pack.Fingerprint;
import bedmark.pack.PackLimits;
import bedmark.pack.PackReader;
import bedmark.pack.ReadPack;
import bedmark.pack.ReceiptReader;
import bedmark.pack.RoundFile;
import bedmark.pack.SignedReceipt;
import bedmark.survey.Bundle;
import bedmark.survey.Round;
import bedmark.survey.Survey;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;

/** A file that was found sound; whether its signer is trusted is for the office or the tablet to decide. */
public sealed interface Arrived {

    /** Whose key signed it. */
    Fingerprint fingerprint();

    /**
     * A tablet's pack.
     *
     * @param device  the tablet's name; empty where it has none
     * @param plant   the plant's name
     * @param rounds  the names of the rounds that its surveys were made on
     * @param photos  how many came with them
     * @param madeAt  when the last survey was ready to leave, by the tablet's clock
     * @param surveys worst first
     */
    record Pack(Fingerprint fingerprint, String device, String plant, List<String> rounds, int photos,
                Optional<OffsetDateTime> madeAt, List<ArrivedSurvey> surveys) implements Arrived {
        public Pack {
            rounds = List.copyOf(rounds);
            surveys = List.copyOf(surveys);
        }

        static Pack of(ReadPack read) {
            Bundle bundle = read.bundle();
            Branch document = bundle.document();
            Set<String> walked = bundle.surveys().stream().map(Survey::round).flatMap(Optional::stream)
                    .collect(Collectors.toSet());
            return new Pack(read.fingerprint(), name(document, "device"), bundle.register().name(),
                    bundle.rounds().stream().filter(round -> walked.contains(round.id())).map(Round::name).toList(),
                    read.photos().size(), document.time("createdAt"), ArrivedSurvey.judged(bundle));
        }
    }

    /**
     * An office's next round.
     *
     * @param office  the office's name; empty where it has none
     * @param results last results of loading zones
     * @param notes   what the office wants to be known at the points
     */
    record NextRound(Fingerprint fingerprint, String office, String plant, List<String> rounds, int results,
                     int notes, Optional<OffsetDateTime> madeAt) implements Arrived {
        public NextRound {
            rounds = List.copyOf(rounds);
        }

        static NextRound of(RoundFile read) {
            Branch document = read.document();
            return new NextRound(read.fingerprint(), name(document, "office"), name(document, "plant"),
                    document.branches("rounds").stream().map(round -> new Round(round).name()).toList(),
                    document.branches("lastResults").size(), document.branches("notes").size(),
                    document.time("createdAt"));
        }
    }

    /**
     * An office's receipt for one pack.
     *
     * @param office  the office's name; empty where it has none
     * @param pack    the id of the pack's bundle
     * @param surveys how many of it the office has
     */
    record Receipt(Fingerprint fingerprint, String office, String pack, int surveys, OffsetDateTime receivedAt)
            implements Arrived {
        static Receipt of(SignedReceipt read) {
            return new Receipt(read.fingerprint(), read.receipt().office().name(), read.receipt().pack().toString(),
                    read.receipt().items().size(), read.receipt().receivedAt());
        }
    }

    /**
     * Reads a file.
     *
     * @throws Refused where it is not sound, with the one reason; {@code pack-cancelled}
     */
    static Arrived read(Path file, FileKind kind, Progress progress) {
        return switch (kind) {
            case PACK -> Pack.of(new PackReader(PackLimits.STANDARD, BundleReader::read).open(file, progress));
            case ROUND -> NextRound.of(RoundFile.read(file));
            case RECEIPT -> Receipt.of(ReceiptReader.read(file));
        };
    }

    private static String name(Branch document, String of) {
        return document.branch(of).flatMap(one -> one.text("name")).orElse("");
    }
}
