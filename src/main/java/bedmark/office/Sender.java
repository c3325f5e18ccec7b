package bedmark.office;

import bedmark.pack.PackSender;
import java.util.Optional;
import java.util.Set;

/**
 * The tablet that a refused pack came from, as far as the pack's signature proves it.
 *
 * @param name        what it calls itself in what it signed; nothing where that can't be read or can't be shown
 * @param fingerprint of the key that signed; nothing where no signature is proved
 * @param trusted     whether the office trusts that key; a name that a key tells that nobody vouched for is a claim
 */
public record Sender(Optional<String> name, Optional<String> fingerprint, boolean trusted) {
    /** Nobody can say. */
    public static final Sender UNPROVED = new Sender(Optional.empty(), Optional.empty(), false);

    static Sender of(PackSender signer, Set<String> trusted) {
        String fingerprint = signer.fingerprint().text();
        return new Sender(signer.name().filter(Sender::shows), Optional.of(fingerprint),
                trusted.contains(fingerprint));
    }

    /** Nobody checked the bundle that says it. */
    private static boolean shows(String name) {
        return !name.isBlank() && name.length() <= Ids.LONGEST && name.chars().noneMatch(Character::isISOControl);
    }

    /** How it is told, as the words know it. */
    public String code() {
        if (fingerprint.isEmpty()) {
            return "unproved";
        }
        return (trusted ? "trusted" : "untrusted") + (name.isEmpty() ? "-nameless" : "");
    }

    /** What the words name, in their order: the name and the fingerprint; empty where there is none. */
    public Object[] told() {
        return new Object[] {name.orElse(""), fingerprint.orElse("")};
    }
}
