package bedmark.index.office;

import java.util.OptionalDouble;
import java.util.OptionalLong;

/**
 * What a zone is put in order by, without the rest of its row.
 *
 * @param registered whether the register that holds today still has it
 * @param visited    whether somebody was there, or should have been
 * @param inspected  whether the last visit inspected it
 * @param surveyed   whether there is a content that it is judged by
 * @param moment     when that was completed (ms since 1970)
 * @param level      of the verdict, as {@link Verdict#level()}; that of {@link Verdict#NONE} where there is none
 * @param driveShare of rated power, 0–1
 * @param saving     of the best remedy (Wh in a year); nothing where there is no remedy
 * @param findings   whether something is not within its limits
 */
public record ZoneGist(boolean registered, boolean visited, boolean inspected, boolean surveyed, OptionalLong moment,
                       int level, OptionalDouble driveShare, OptionalDouble saving, boolean findings) {
}
