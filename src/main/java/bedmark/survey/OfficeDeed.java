package bedmark.survey;

import bedmark.document.Branch;
import bedmark.survey.merge.ZoneId;
import java.time.LocalDate;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import java.util.UUID;

/** One thing that the office did: what an office store's journal holds. */
public sealed interface OfficeDeed {

    /** The code of the deed in the journal. */
    String code();

    /**
     * A pack was taken in whole; its file lies in the store under its digest.
     *
     * @param sha256      digest of the file, hexadecimal
     * @param file        the name under which it came
     * @param bytes       the size of the file
     * @param fingerprint of the key that signed it
     * @param bundle      the bundle's id, where it has one
     * @param createdAt   when the bundle was made, by the tablet's own clock
     * @param device      the tablet
     * @param deviceName  its name; may be empty
     */
    record PackReceived(String sha256, String file, long bytes, String fingerprint, Optional<UUID> bundle,
                        Optional<OffsetDateTime> createdAt, Optional<UUID> device, String deviceName)
            implements OfficeDeed {
        public PackReceived {
            Objects.requireNonNull(sha256);
            Objects.requireNonNull(file);
            Objects.requireNonNull(fingerprint);
            Objects.requireNonNull(bundle);
            Objects.requireNonNull(createdAt);
            Objects.requireNonNull(device);
            Objects.requireNonNull(deviceName);
        }

        @Override
        public String code() {
            return "pack-received";
        }
    }

    /** A device's key is trusted from now on. */
    record DeviceTrusted(String fingerprint, String name) implements OfficeDeed {
        public DeviceTrusted {
            Objects.requireNonNull(fingerprint);
            Objects.requireNonNull(name);
        }

        @Override
        public String code() {
            return "device-trusted";
        }
    }

    /** How a finding was put away. */
    enum Answer {
        /** The site lives with it. */
        ACCEPTED("accepted"),
        /** It is looked at again later. */
        SHELVED("shelved");

        private final String code;

        Answer(String code) {
            this.code = code;
        }

        public String code() {
            return code;
        }

        public static Optional<Answer> ofCode(String code) {
            return List.of(values()).stream().filter(answer -> answer.code.equals(code)).findFirst();
        }
    }

    /**
     * A finding was accepted or shelved. It comes back when it is worse, or when the day has passed.
     *
     * @param finding the rule's code
     * @param answer  whether the site lives with it or looks again
     * @param reason  why; never blank
     * @param until   the last day on which it stays away; nothing for as long as it is not worse
     * @param survey  the content that it was answered for
     * @param before  how it stood then: {@code level}, {@code observed} and {@code standardUncertainty} of the worse of
     *                both feeds, and the same of each in {@code today} and {@code atDesignFeed}
     */
    record FindingAnswered(ZoneId zone, String finding, Answer answer, String reason, Optional<LocalDate> until,
                           String survey, Branch before) implements OfficeDeed {
        public FindingAnswered {
            Objects.requireNonNull(zone);
            Objects.requireNonNull(finding);
            Objects.requireNonNull(answer);
            Objects.requireNonNull(reason);
            Objects.requireNonNull(until);
            Objects.requireNonNull(survey);
            Objects.requireNonNull(before);
        }

        @Override
        public String code() {
            return "finding-answered";
        }
    }

    /** An answer to a finding was taken back. */
    record FindingReopened(ZoneId zone, String finding, String reason) implements OfficeDeed {
        public FindingReopened {
            Objects.requireNonNull(zone);
            Objects.requireNonNull(finding);
            Objects.requireNonNull(reason);
        }

        @Override
        public String code() {
            return "finding-reopened";
        }
    }

    /**
     * An action was written down or changed; the latest of the same id holds.
     *
     * @param text      what is to be done
     * @param owner     who sees to it; may be empty
     * @param due       by when
     * @param workOrder number in the site's maintenance system; may be empty
     * @param done      whether it was done
     */
    record ActionSet(UUID action, ZoneId zone, String finding, String text, String owner, Optional<LocalDate> due,
                     String workOrder, boolean done) implements OfficeDeed {
        public ActionSet {
            Objects.requireNonNull(action);
            Objects.requireNonNull(zone);
            Objects.requireNonNull(finding);
            Objects.requireNonNull(text);
            Objects.requireNonNull(owner);
            Objects.requireNonNull(due);
            Objects.requireNonNull(workOrder);
        }

        @Override
        public String code() {
            return "action-set";
        }
    }

    /**
     * A plant's register was changed in the office; the latest holds, and surveys that were made before are still
     * judged by theirs.
     *
     * @param plant the plant's id
     * @param head  an object with {@code plant}, {@code forms} and {@code rounds} as in a bundle
     * @param why   what was changed, in a few words
     */
    record RegisterChanged(String plant, Branch head, String why) implements OfficeDeed {
        public RegisterChanged {
            Objects.requireNonNull(plant);
            Objects.requireNonNull(head);
            Objects.requireNonNull(why);
        }

        @Override
        public String code() {
            return "register-changed";
        }
    }

    /**
     * A person decided between contents that clash.
     *
     * @param setAside digests of the contents that no longer count
     */
    record ClashSettled(ZoneId zone, List<String> setAside, String reason) implements OfficeDeed {
        public ClashSettled {
            Objects.requireNonNull(zone);
            setAside = List.copyOf(setAside);
            Objects.requireNonNull(reason);
        }

        @Override
        public String code() {
            return "clash-settled";
        }
    }

    /** A round file was written for tablets. */
    record RoundSent(String plant, String file, String sha256) implements OfficeDeed {
        public RoundSent {
            Objects.requireNonNull(plant);
            Objects.requireNonNull(file);
            Objects.requireNonNull(sha256);
        }

        @Override
        public String code() {
            return "round-sent";
        }
    }
}
