package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.Fault;
import bedmark.journal.FileLayer;
import java.io.IOException;
import java.nio.channels.ClosedByInterruptException;
import java.nio.file.Path;

/** Finds out why a folder took no pack, so that the person can be told what to do. */
final class WriteFailure {

    private WriteFailure() {
    }

    static Refused of(Exception failure, Path folder, FileLayer disk) {
        if (failure instanceof ClosedByInterruptException) {
            return new Refused(Defect.in("", "pack-cancelled"), failure);
        }
        Fault fault = failure instanceof IOException known ? Fault.of(known, disk, folder) : Fault.READ_ONLY;
        String where = folder.toString();
        return new Refused(switch (fault) {
            case VANISHED -> Defect.in(where, "pack-folder-missing");
            case DISK_FULL -> Defect.in(where, "pack-disk-full");
            case READ_ONLY -> Defect.in(where, "pack-folder-read-only");
            case FORCE_FAILED, FAILED -> Defect.in(where, "pack-not-saved", Fault.reason(failure));
        }, failure);
    }
}
