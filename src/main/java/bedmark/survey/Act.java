package bedmark.survey;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import java.util.UUID;

/** One thing that a person did: the payload of one journal entry. Nothing is ever overwritten; a survey is a fold. */
public sealed interface Act {

    /** The code of the act in the journal. */
    String code();

    /** The survey that the act belongs to, where it belongs to one alone. */
    default Optional<UUID> about() {
        return Optional.empty();
    }

    /**
     * A register, its forms and its rounds were taken into the store; the latest one holds.
     *
     * @param register an object with {@code plant}, {@code forms} and {@code rounds} as in a bundle
     */
    record RegisterTaken(Branch register) implements Act {
        public RegisterTaken {
            Objects.requireNonNull(register);
        }

        @Override
        public String code() {
            return "register-taken";
        }
    }

    /** A finished survey came from elsewhere, whole; it is the last result of its transfer point. */
    record SurveyTaken(UUID survey, Branch document) implements Act {
        public SurveyTaken {
            Objects.requireNonNull(survey);
            Objects.requireNonNull(document);
        }

        @Override
        public String code() {
            return "survey-taken";
        }

        @Override
        public Optional<UUID> about() {
            return Optional.of(survey);
        }
    }

    /** A walk began: the person of the entry has read the caution. */
    record WalkStarted(String round) implements Act {
        public WalkStarted {
            Objects.requireNonNull(round);
        }

        @Override
        public String code() {
            return "walk-started";
        }
    }

    /** A walk ended. */
    record WalkFinished(String round) implements Act {
        public WalkFinished {
            Objects.requireNonNull(round);
        }

        @Override
        public String code() {
            return "walk-finished";
        }
    }

    /**
     * A survey was opened at a transfer point.
     *
     * @param document the survey as it starts, without answers
     */
    record SurveyOpened(UUID survey, Branch document) implements Act {
        public SurveyOpened {
            Objects.requireNonNull(survey);
            Objects.requireNonNull(document);
        }

        @Override
        public String code() {
            return "survey-opened";
        }

        @Override
        public Optional<UUID> about() {
            return Optional.of(survey);
        }
    }

    /**
     * A completed survey is corrected by a new one with the next revision number.
     *
     * @param supersedes the corrected survey
     * @param why        the person's reason
     * @param document   the new survey as it starts: the corrected one's content, revision n+1
     */
    record RevisionOpened(UUID survey, UUID supersedes, String why, Branch document) implements Act {
        public RevisionOpened {
            Objects.requireNonNull(survey);
            Objects.requireNonNull(supersedes);
            Objects.requireNonNull(why);
            Objects.requireNonNull(document);
        }

        @Override
        public String code() {
            return "revision-opened";
        }

        @Override
        public Optional<UUID> about() {
            return Optional.of(survey);
        }
    }

    /**
     * An answer was set or cleared.
     *
     * @param where  the place in the survey, such as {@code /readings/beltSpeed}; a list is set whole
     * @param answer the new value; nothing clears it
     */
    record AnswerSet(UUID survey, Pointer where, Optional<Node> answer) implements Act {
        public AnswerSet {
            Objects.requireNonNull(survey);
            Objects.requireNonNull(where);
            Objects.requireNonNull(answer);
            if (where.isRoot()) {
                throw new IllegalArgumentException("an answer has a place");
            }
        }

        @Override
        public String code() {
            return "answer-set";
        }

        @Override
        public Optional<UUID> about() {
            return Optional.of(survey);
        }
    }

    /**
     * An answer was taken back.
     *
     * @param undone the sequence number of the {@link AnswerSet} that no longer counts
     */
    record AnswerUndone(UUID survey, long undone) implements Act {
        public AnswerUndone {
            Objects.requireNonNull(survey);
        }

        @Override
        public String code() {
            return "answer-undone";
        }

        @Override
        public Optional<UUID> about() {
            return Optional.of(survey);
        }
    }

    /** A photo was attached; its file is already safe in the store. */
    record PhotoAttached(UUID survey, Branch photo) implements Act {
        public PhotoAttached {
            Objects.requireNonNull(survey);
            Objects.requireNonNull(photo);
        }

        @Override
        public String code() {
            return "photo-attached";
        }

        @Override
        public Optional<UUID> about() {
            return Optional.of(survey);
        }
    }

    /**
     * A photo's caption was written or changed.
     *
     * @param photo   the photo's id
     * @param caption empty takes it away
     */
    record PhotoCaptioned(UUID survey, String photo, String caption) implements Act {
        public PhotoCaptioned {
            Objects.requireNonNull(survey);
            Objects.requireNonNull(photo);
            Objects.requireNonNull(caption);
        }

        @Override
        public String code() {
            return "photo-captioned";
        }

        @Override
        public Optional<UUID> about() {
            return Optional.of(survey);
        }
    }

    /** A photo was taken off a survey; its file stays in the store, as everything does. */
    record PhotoDetached(UUID survey, String photo) implements Act {
        public PhotoDetached {
            Objects.requireNonNull(survey);
            Objects.requireNonNull(photo);
        }

        @Override
        public String code() {
            return "photo-detached";
        }

        @Override
        public Optional<UUID> about() {
            return Optional.of(survey);
        }
    }

    /**
     * A transfer point was found in the field that the register does not hold. The office decides about it; the last
     * proposal of an id stands.
     *
     * @param proposal as {@code proposals} of a bundle; an empty one withdraws it
     */
    record PointProposed(UUID id, Branch proposal) implements Act {
        public PointProposed {
            Objects.requireNonNull(id);
            Objects.requireNonNull(proposal);
        }

        @Override
        public String code() {
            return "point-proposed";
        }
    }

    /**
     * A survey was completed.
     *
     * @param signedOffBy the person who signed it off; empty where nobody did
     * @param completedAt when, where that was before the entry: a survey that was completed elsewhere
     */
    record SurveyCompleted(UUID survey, String signedOffBy, Optional<OffsetDateTime> completedAt) implements Act {
        public SurveyCompleted {
            Objects.requireNonNull(survey);
            Objects.requireNonNull(signedOffBy);
            Objects.requireNonNull(completedAt);
        }

        /** A survey is completed here and now. */
        public SurveyCompleted(UUID survey, String signedOffBy) {
            this(survey, signedOffBy, Optional.empty());
        }

        @Override
        public String code() {
            return "survey-completed";
        }

        @Override
        public Optional<UUID> about() {
            return Optional.of(survey);
        }
    }

    /** Completed surveys were put into the export queue. */
    record SurveysQueued(List<UUID> surveys) implements Act {
        public SurveysQueued {
            surveys = List.copyOf(surveys);
        }

        @Override
        public String code() {
            return "surveys-queued";
        }
    }

    /**
     * Queued surveys left in a pack.
     *
     * @param pack   the pack's file name
     * @param sha256 the pack's digest, hexadecimal
     * @param folder where it was put
     */
    record PackExported(List<UUID> surveys, String pack, String sha256, String folder) implements Act {
        public PackExported {
            surveys = List.copyOf(surveys);
            Objects.requireNonNull(pack);
            Objects.requireNonNull(sha256);
            Objects.requireNonNull(folder);
        }

        @Override
        public String code() {
            return "pack-exported";
        }
    }

    /**
     * A backup of the whole store was made and proved.
     *
     * @param folder where it lies
     * @param upTo   the last entry that it holds
     * @param sha256 digest of its list of files, hexadecimal
     */
    record BackupMade(String folder, long upTo, String sha256) implements Act {
        public BackupMade {
            Objects.requireNonNull(folder);
            Objects.requireNonNull(sha256);
        }

        @Override
        public String code() {
            return "backup-made";
        }
    }

    /** The office's receipt for exported surveys was read back. */
    record ReceiptNoted(List<UUID> surveys, Branch receipt) implements Act {
        public ReceiptNoted {
            surveys = List.copyOf(surveys);
            Objects.requireNonNull(receipt);
        }

        @Override
        public String code() {
            return "receipt-noted";
        }
    }

    /** The office did something; only an office store's journal holds such acts. */
    record OfficeActed(OfficeDeed deed) implements Act {
        public OfficeActed {
            Objects.requireNonNull(deed);
        }

        @Override
        public String code() {
            return deed.code();
        }
    }
}
