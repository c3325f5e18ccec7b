package bedmark.office;

import bedmark.document.Defect;
import bedmark.document.Refused;

/** The name that an office's receipts and round files carry, as a tablet shows it. */
public final class OfficeName {
    /** In characters; a tablet has one line for it. */
    public static final int LONGEST = 80;

    private OfficeName() {
    }

    /**
     * The name without what stands around it.
     *
     * @throws Refused {@code office-name-absent}, {@code office-name-too-long}, {@code office-name-control}
     */
    public static String proved(String typed) {
        String name = typed.strip();
        if (name.isEmpty()) {
            throw new Refused(Defect.in("", "office-name-absent"));
        } else if (name.codePointCount(0, name.length()) > LONGEST) {
            throw new Refused(Defect.in("", "office-name-too-long",
                    Integer.toString(name.codePointCount(0, name.length())), Integer.toString(LONGEST)));
        } else if (name.chars().anyMatch(Character::isISOControl)) {
            throw new Refused(Defect.in("", "office-name-control"));
        }
        return name;
    }
}
