package bedmark.report;

import bedmark.office.JudgedZone;
import java.util.Optional;

/** Where the photos of a report come from. */
@FunctionalInterface
public interface ReportPhotos {
    /** No photo at all. */
    ReportPhotos NONE = (zone, sha256) -> Optional.empty();

    /** The bytes of a photo of a survey; nothing where it is not there any more. */
    Optional<byte[]> bytes(JudgedZone zone, String sha256);
}
