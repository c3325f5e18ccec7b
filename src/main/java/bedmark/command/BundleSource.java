package bedmark.command;

import static bedmark.command.BedmarkCommand.in;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.NamedPath;
import bedmark.journal.Progress;
import bedmark.json.BundleReader;
import bedmark.json.JsonReader;
import bedmark.pack.FileKind;
import bedmark.pack.PackLimits;
import bedmark.pack.PackReader;
import bedmark.survey.Bundle;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Function;
import java.util.function.UnaryOperator;
import java.util.stream.Stream;

/** Bundles from wherever a person points: a bundle, a pack, an unpacked pack, or a folder of bundles and packs. */
final class BundleSource {
    private static final String PAYLOAD = "data/bundle.json";

    private BundleSource() {
    }

    /**
     * A bundle and the file that it came from.
     *
     * @param placing adds line and column to a defect of the bundle, where the file is its text
     */
    record Named(Path file, Bundle bundle, UnaryOperator<Defect> placing) {

        /** Judges the bundle, so that a refusal names the place in the file. */
        <T> T judge(Function<Bundle, T> judging) {
            try {
                return judging.apply(bundle);
            } catch (Refused e) {
                throw new Refused(placing.apply(e.defect()), e);
            }
        }
    }

    /**
     * Reads all bundles, in the order of their file names.
     *
     * @throws Refused where something can't be read; its place begins with the file
     */
    static List<Named> read(Path input) throws Exception {
        if (!Files.isDirectory(input)) {
            return List.of(one(input));
        }
        if (Files.isRegularFile(input.resolve(PAYLOAD))) {
            return List.of(one(input.resolve(PAYLOAD)));
        }
        List<Named> bundles = new ArrayList<>();
        for (Path file : files(input)) {
            bundles.add(one(file));
        }
        if (bundles.isEmpty()) {
            throw new Refused(Defect.in(input.toString(), "folder-without-bundles"));
        }
        return bundles;
    }

    private static List<Path> files(Path folder) {
        try (Stream<Path> files = Files.list(folder)) {
            return files.filter(Files::isRegularFile)
                    .filter(file -> file.toString().endsWith(".json") || file.toString().endsWith(".zip"))
                    .sorted().toList();
        } catch (IOException e) {
            throw new Refused(Defect.in(folder.toString(), "folder-unreadable"), e);
        }
    }

    private static Named one(Path file) throws Exception {
        NamedPath.requireFile(file);
        if (FileKind.isArchive(file)) {
            return in(file, () -> new Named(file,
                    new PackReader(PackLimits.STANDARD, BundleReader::read).open(file, Progress.NONE).bundle(),
                            UnaryOperator.identity()));
        }
        byte[] bytes = InputFile.read(file);
        return in(file, () -> new Named(file, BundleReader.read(bytes),
                defect -> JsonReader.read(bytes).placed(defect)));
    }
}
