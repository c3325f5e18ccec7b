package bedmark.dispatch;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.document.Branch;
import bedmark.index.Store;
import bedmark.index.StoredPhoto;
import bedmark.index.SurveyLine;
import bedmark.journal.NotSaved;
import bedmark.journal.Progress;
import bedmark.pack.DeviceKey;
import bedmark.pack.PackWriter;
import bedmark.pack.PhotoSource;
import bedmark.pack.WrittenPack;
import bedmark.survey.Act;
import bedmark.survey.Bundle;
import bedmark.survey.QueueState;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Path;
import java.time.format.DateTimeFormatter;
import java.util.List;
import java.util.Locale;
import java.util.UUID;

/**
 * Brings surveys onto a folder or stick. They change their state only once the whole pack is forced there; an export
 * that was cut short leaves them queued, and doing it again makes the same pack under the same name.
 */
public final class Dispatch {
    private static final DateTimeFormatter NAME_TIME = DateTimeFormatter.ofPattern("yyyyMMdd-HHmmss");

    /** How the names of packs end: desktops tell files by what follows, and any archive ends with {@code .zip}. */
    private static final String ENDING = ".pack.zip";

    private final Store store;

    public Dispatch(Store store) {
        this.store = store;
    }

    /**
     * Exports queued surveys, or once more those that left already.
     *
     * @param notice the caution in one sentence
     * @throws Refused  {@code act-unfit} where one is not queued, and those of {@link PackWriter}
     * @throws NotSaved where the pack stands there and the store could not note it; exporting again makes it good
     */
    public WrittenPack export(List<UUID> surveys, Path folder, String notice, String person, Progress progress) {
        surveys.forEach(this::requireReady);
        Bundle bundle = new Departure(store).bundle(surveys, notice);
        DeviceKey key = DeviceKey.of(store.folder());
        WrittenPack pack = PackWriter.write(bundle, photos(), key, folder.resolve(fileName(bundle)), progress);
        store.append(person, new Act.PackExported(surveys, pack.file().getFileName().toString(), pack.sha256(),
                folder.toString()));
        return pack;
    }

    private void requireReady(UUID survey) {
        QueueState state = store.survey(survey).map(SurveyLine::state).orElseThrow(() ->
                new Refused(Defect.in(survey.toString(), "survey-unknown")));
        if (!state.leadsTo(QueueState.EXPORTED)) {
            throw new Refused(Defect.in(survey.toString(), "act-unfit", "pack-exported",
                    state.name().toLowerCase(Locale.ROOT)));
        }
    }

    /** The pack's name: when its surveys were ready, and the bundle's id. */
    static String fileName(Bundle bundle) {
        return "bedmark-" + NAME_TIME.format(bundle.document().time("createdAt").orElseThrow()) + "-"
                + bundle.document().text("id").orElseThrow().substring(0, 8) + ENDING;
    }

    private PhotoSource photos() {
        return (name, sha256) -> store.photo(Branch.EMPTY.with("file", "photos/" + name)).map(Dispatch::photo);
    }

    private static PhotoSource.Photo photo(StoredPhoto stored) {
        return new PhotoSource.Photo() {
            @Override
            public long size() throws IOException {
                return stored.size();
            }

            @Override
            public InputStream open() throws IOException {
                return stored.open();
            }
        };
    }
}
