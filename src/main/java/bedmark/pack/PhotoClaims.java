package bedmark.pack;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.survey.Bundle;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.SortedMap;
import java.util.TreeMap;

/** The photos that a bundle's surveys name. One file may belong to several surveys, if they say the same of it. */
final class PhotoClaims {
    private static final String FOLDER = "photos/";

    private PhotoClaims() {
    }

    /**
     * The claims by name, in the order of the names. A name is the photo's {@code file} without a leading
     * {@code photos/}.
     *
     * @throws Refused {@code key-absent}, {@code pack-photo-claim-wrong}, {@code pack-photo-claims-differ},
     *                 {@code zip-name-clash}, {@code name-…}
     */
    static SortedMap<String, PackedPhoto> of(Bundle bundle) {
        SortedMap<String, PackedPhoto> claims = new TreeMap<>();
        Map<String, String> byFold = new HashMap<>();
        List<Branch> surveys = bundle.document().branches("surveys");
        for (int i = 0; i < surveys.size(); i++) {
            Pointer survey = Pointer.of("surveys").child(i);
            List<Branch> photos = photos(surveys.get(i), survey);
            for (int j = 0; j < photos.size(); j++) {
                Pointer place = survey.child("photos").child(j);
                PackedPhoto claim = claim(photos.get(j), place);
                PackedPhoto earlier = claims.putIfAbsent(claim.name(), claim);
                if (earlier != null && !earlier.equals(claim)) {
                    throw new Refused(Defect.at(place, "pack-photo-claims-differ", claim.name()));
                }
                String clash = byFold.putIfAbsent(EntryName.folded(claim.name()), claim.name());
                if (clash != null && !clash.equals(claim.name())) {
                    throw new Refused(Defect.in(claim.name(), "zip-name-clash", clash));
                }
            }
        }
        return claims;
    }

    private static List<Branch> photos(Branch survey, Pointer place) {
        try {
            return survey.branches("photos");
        } catch (Refused e) {
            throw new Refused(e.defect().below(place), e);
        }
    }

    private static PackedPhoto claim(Branch photo, Pointer place) {
        String file = required(photo, "file", place);
        String sha256 = required(photo, "sha256", place).toLowerCase(Locale.ROOT);
        if (!sha256.matches("[0-9a-f]{64}")) {
            throw new Refused(Defect.at(place.child("sha256"), "pack-photo-claim-wrong"));
        }
        return new PackedPhoto(EntryName.safe(file.startsWith(FOLDER) ? file.substring(FOLDER.length()) : file),
                sha256, bytes(photo, place));
    }

    private static String required(Branch photo, String key, Pointer place) {
        try {
            return photo.text(key).orElseThrow(() -> new Refused(Defect.at(Pointer.of(key), "key-absent", key)));
        } catch (Refused e) {
            throw new Refused(e.defect().below(place), e);
        }
    }

    private static long bytes(Branch photo, Pointer place) {
        try {
            return photo.number("bytes").orElseThrow(
                    () -> new Refused(Defect.at(Pointer.of("bytes"), "key-absent", "bytes"))).longValueExact();
        } catch (ArithmeticException e) {
            throw new Refused(Defect.at(place.child("bytes"), "pack-photo-claim-wrong"), e);
        } catch (Refused e) {
            throw new Refused(e.defect().below(place), e);
        }
    }
}
