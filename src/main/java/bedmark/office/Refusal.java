package bedmark.office;

import java.time.OffsetDateTime;

/**
 * A pack that was refused and did not come in since.
 *
 * @param turned what came of it when it was last tried
 * @param first  when it was refused first, by the office's clock
 * @param last   when it was refused last
 */
public record Refusal(Received.Turned turned, OffsetDateTime first, OffsetDateTime last) {
}
