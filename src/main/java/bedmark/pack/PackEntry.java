package bedmark.pack;

import bedmark.document.Defect;
import java.util.Map;
import java.util.Optional;

/**
 * An entry whose content was read once.
 *
 * @param slot    where it lies in the file
 * @param name    within the bag, without a base folder
 * @param digests of the content, hexadecimal, by the algorithms' names in a bag
 * @param doubt   what speaks against the content itself; said only after the bag was found whole
 */
record PackEntry(ZipSlot slot, String name, Map<String, String> digests, Optional<Defect> doubt) {

    String sha256() {
        return digests.get(Sha256.BAG_NAME);
    }
}
