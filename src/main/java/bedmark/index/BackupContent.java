package bedmark.index;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.Cover;
import bedmark.journal.FileLayer;
import bedmark.journal.JournalProof;
import bedmark.journal.JournalVisitor;
import bedmark.journal.Place;
import bedmark.json.EntryCodec;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import bedmark.survey.SurveyHistory;
import bedmark.vault.DataKey;
import bedmark.vault.Passphrase;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.UUID;

/** What a proved backup holds: its surveys as they stood, its register, its photos. */
final class BackupContent implements JournalVisitor {
    private final Path folder;
    private final FileLayer files;
    private final Map<String, Path> byName = new HashMap<>();
    private final Optional<DataKey> key;
    private final Map<UUID, List<Histories.Placed>> entries = new LinkedHashMap<>();
    private final Map<UUID, Act.RevisionOpened> revisions = new HashMap<>();
    private Optional<Branch> register = Optional.empty();

    /** @throws Refused {@code store-sealed}, {@code store-not-sealed}, {@code passphrase-wrong} */
    BackupContent(Path folder, BackupList list, FileLayer files, Optional<Passphrase> passphrase) throws IOException {
        this.folder = folder;
        this.files = files;
        list.items().forEach(item -> byName.put(item.file(), folder.resolve(item.as())));
        FileLayer named = new NamedFiles(files, folder, byName);
        this.key = Keys.look(folder, named, list.sealed() ? passphrase : Optional.empty());
        JournalProof.of(folder.resolve(Ledger.JOURNAL), named, Cover.of(key), Optional.empty(), this);
    }

    @Override
    public void entry(long sequence, Place place, byte[] payload) {
        Entry entry;
        try {
            entry = EntryCodec.read(payload);
        } catch (Refused e) {
            // Of a later program; it comes along in a whole copy, and is left out of what is taken over.
            return;
        }
        if (entry.act() instanceof Act.RegisterTaken taken) {
            register = Optional.of(taken.register());
        } else if (entry.act() instanceof Act.RevisionOpened revision) {
            revisions.put(revision.survey(), revision);
        }
        Fold.touched(entry.act()).forEach(survey -> entries.computeIfAbsent(survey, one -> new ArrayList<>())
                .add(new Histories.Placed(entry, place)));
    }

    @Override
    public void flaw(Defect flaw) {
        // The bytes are those of the store that was backed up; its own check names this.
    }

    @Override
    public void walked(long done, long total) {
        // Told by the proof of the files before.
    }

    /** The surveys in the order in which they were opened. */
    List<UUID> surveys() {
        return entries.keySet().stream().filter(survey -> history(survey).isPresent()).toList();
    }

    Optional<SurveyHistory> history(UUID survey) {
        return Histories.fold(survey, entries.getOrDefault(survey, List.of()), new ArrayList<>()).history();
    }

    /** How a revision was opened. */
    Optional<Act.RevisionOpened> revision(UUID survey) {
        return Optional.ofNullable(revisions.get(survey));
    }

    Optional<Branch> register() {
        return register;
    }

    /** A photo of a survey; nothing where the backup lacks it. */
    Optional<InputStream> photo(Branch photo) throws IOException {
        String name = photo.text("file").orElse("") + (key.isPresent() ? PhotoShelf.SEALED : "");
        Path file = byName.get(name);
        return file == null ? Optional.empty() : Optional.of(Sealed.read(files, file, key));
    }

    Path folder() {
        return folder;
    }
}
