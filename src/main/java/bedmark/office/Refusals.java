package bedmark.office;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.index.office.OfficeTables;
import bedmark.index.office.RefusalRow;
import bedmark.json.JsonReader;
import bedmark.json.JsonWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.function.Predicate;
import java.util.stream.Stream;

/**
 * The packs that were refused, for whoever looks in after the night. They are notes beside the office's records: what
 * came in does not depend on them, and no export holds them. A pack goes from here once it is in.
 */
public final class Refusals {
    /** How long one is kept after it was refused last; nobody asks for it any more. */
    public static final Duration KEPT = Duration.ofDays(90);

    private final OfficeStore store;
    private final Clock clock;

    public Refusals(OfficeStore store, Clock clock) {
        this.store = store;
        this.clock = clock;
    }

    /** Those that are not in yet, the last refused at the head. */
    public List<Refusal> open() {
        long since = clock.millis() - KEPT.toMillis();
        return store.ask(tables -> {
            Minutes known = store.minutes(tables);
            return tables.refusals().all().stream().filter(row -> row.last() >= since)
                    .map(row -> read(row, known::trusts)).toList();
        });
    }

    /** Nobody waits for it any more; refused once more, it is here again. */
    public void putAway(Refusal refusal) {
        store.ask(tables -> {
            tables.refusals().settle(List.of(key(refusal.turned())));
            return true;
        });
    }

    /** Notes what was refused; one that can't be noted is told as it came, with that. */
    List<Received> noted(List<Received> received) {
        List<Received.Turned> turned = received.stream().flatMap(Refusals::refused).toList();
        List<String> in = received.stream().filter(one -> !(one instanceof Received.Turned))
                .map(one -> unread(one.file())).toList();
        if (store.note(tables -> note(tables, turned, in))) {
            return received;
        }
        return received.stream().map(one -> refused(one).findFirst().<Received>map(Received.Turned::unkept)
                .orElse(one)).toList();
    }

    /** What was refused for itself: not what is not there, nor what the office had no room or no server for. */
    private static Stream<Received.Turned> refused(Received one) {
        return Stream.of(one).filter(Received.Turned.class::isInstance).map(Received.Turned.class::cast)
                .filter(turned -> turned.content().isPresent() || Files.exists(turned.file()))
                .filter(turned -> Stream.of("store-", "not-saved-", "office-")
                        .noneMatch(turned.why().code()::startsWith));
    }

    private void note(OfficeTables tables, List<Received.Turned> turned, List<String> in) {
        if (turned.isEmpty()) {
            tables.refusals().settle(in);
            return;
        }
        // Before any row is touched: another desk that thins them would wait for this one, and this one for it.
        tables.alone();
        tables.refusals().settle(in);
        long now = clock.millis();
        turned.stream().filter(one -> one.content().filter(content -> tables.hasPack(content.sha256())).isEmpty())
                .forEach(one -> tables.refusals().note(row(one, now)));
        tables.refusals().thin(now - KEPT.toMillis());
    }

    private static RefusalRow row(Received.Turned turned, long now) {
        Optional<Received.Content> content = turned.content();
        return new RefusalRow(key(turned), whole(turned.file()), content.map(Received.Content::sha256),
                content.map(one -> OptionalLong.of(one.bytes())).orElse(OptionalLong.empty()),
                turned.sender().flatMap(Sender::name), turned.fingerprint(), text(turned.why()), now, now);
    }

    /** What a refused pack is told apart by: one that is refused again is the same one. */
    public static String key(Received.Turned turned) {
        return turned.content().map(Received.Content::sha256).orElseGet(() -> unread(turned.file()));
    }

    /** What a file is told apart by that could not be read to its end; no digest looks so. */
    private static String unread(Path file) {
        return "file " + whole(file);
    }

    private static String whole(Path file) {
        return file.toAbsolutePath().normalize().toString();
    }

    private Refusal read(RefusalRow row, Predicate<String> trusted) {
        Optional<Received.Content> content = row.sha256().map(sha256 ->
                new Received.Content(sha256, row.bytes().orElse(0)));
        Sender sender = new Sender(row.device(), row.fingerprint(), row.fingerprint().filter(trusted).isPresent());
        return new Refusal(new Received.Turned(path(row.file()), why(row.why()), content, content.map(one -> sender)),
                at(row.first()), at(row.last()));
    }

    /** Another machine's desk may name files as no file can be named here. */
    private static Path path(String file) {
        try {
            return Path.of(file);
        } catch (InvalidPathException e) {
            return Path.of(file.replaceAll("[^\\p{L}\\p{N} ._/-]", "_"));
        }
    }

    private OffsetDateTime at(long millis) {
        return OffsetDateTime.ofInstant(Instant.ofEpochMilli(millis), clock.getZone());
    }

    private static String text(Defect why) {
        return new String(JsonWriter.compact(Branch.EMPTY.with("code", why.code()).with("where", why.where())
                .with("details", new Node.Series(why.details().stream().map(Node::text).toList()))),
                StandardCharsets.UTF_8);
    }

    private static Defect why(String text) {
        Branch why = JsonReader.read(text.getBytes(StandardCharsets.UTF_8)).root();
        return new Defect(why.text("code").orElse(""), why.text("where").orElse(""), why.series("details").stream()
                .map(detail -> detail instanceof Node.Text one ? one.value() : "").toList());
    }
}
