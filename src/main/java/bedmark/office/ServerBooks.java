package bedmark.office;

import bedmark.index.office.OfficeBroken;
import bedmark.index.office.OfficeTables;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import java.time.Duration;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Optional;
import java.util.UUID;
import java.util.concurrent.locks.LockSupport;
import java.util.function.Supplier;

/**
 * An office that several desks share: the server's own log is the truth. Each deed is one transaction, and desks write
 * one after the other. Where the server goes away in between, the desk connects again and does what is not done.
 */
final class ServerBooks implements Books {
    /** How long a desk waits for a server that went away. */
    private static final Duration PATIENCE = Duration.ofSeconds(60);
    private static final Duration PAUSE = Duration.ofMillis(200);

    private final String url;
    private final OfficeOptions options;
    private final UUID device;
    private final Effect effect;
    private final Runnable cutOff;
    private Optional<OfficeTables> tables;

    /** @param cutOff told when something was undone that may have been read */
    ServerBooks(String url, OfficeOptions options, UUID device, Effect effect, Runnable cutOff) {
        this.url = url;
        this.options = options;
        this.device = device;
        this.effect = effect;
        this.cutOff = cutOff;
        this.tables = Optional.of(OfficeTables.of(url));
    }

    /** One at a time: other desks wait for no more than that. */
    @Override
    public List<Optional<Entry>> keep(List<Deed> deeds) {
        return List.of(keep(deeds.get(0)));
    }

    private Optional<Entry> keep(Deed deed) {
        // One moment for all attempts: it tells whether an earlier one arrived before the server went away.
        OffsetDateTime at = OffsetDateTime.now(options.clock()).plusNanos(Math.floorMod(System.nanoTime(), 1_000_000));
        boolean[] tried = {false};
        return patiently(() -> tables().whole(() -> {
            tables().alone();
            if (tried[0] && tables().did(device, at.toString(), deed.deed().code())) {
                return Optional.of(new Entry(tables().lastDeed(), at, deed.person(), device,
                        new Act.OfficeActed(deed.deed())));
            }
            tried[0] = true;
            if (effect.needless(tables(), deed)) {
                return Optional.<Entry>empty();
            }
            effect.prove(tables(), deed);
            effect.prepare(List.of(deed));
            Entry entry = new Entry(tables().lastDeed() + 1, at, deed.person(), device,
                    new Act.OfficeActed(deed.deed()));
            tables().add(FolderBooks.row(entry));
            // At once: another desk may ask for them as soon as this is done.
            effect.stand(tables(), effect.of(tables(), List.of(new Done(entry, deed.pack().map(Pack::intake)))));
            return Optional.of(entry);
        }));
    }

    @Override
    public <T> T ask(Supplier<T> question) {
        return patiently(() -> tables().whole(question));
    }

    @Override
    public <T> T look(Supplier<T> question) {
        return ask(question);
    }

    private <T> T patiently(Supplier<T> work) {
        long until = System.nanoTime() + PATIENCE.toNanos();
        while (true) {
            try {
                return work.get();
            } catch (OfficeBroken e) {
                cutOff.run();
                if (tables.isPresent() && tables.get().alive() || System.nanoTime() - until > 0) {
                    throw e;
                }
                connectAgain();
            }
        }
    }

    private void connectAgain() {
        tables.ifPresent(ServerBooks::closeQuietly);
        tables = Optional.empty();
        LockSupport.parkNanos(PAUSE.toNanos());
        try {
            tables = Optional.of(OfficeTables.of(url));
        } catch (OfficeBroken e) {
            // It is still away; whoever waits decides for how long.
            tables = Optional.empty();
        }
    }

    private static void closeQuietly(OfficeTables broken) {
        try {
            broken.close();
        } catch (OfficeBroken e) {
            // The server has ended it already.
            return;
        }
    }

    @Override
    public OfficeTables tables() {
        return tables.orElseThrow(OfficeTables::away);
    }

    @Override
    public void close() {
        tables.ifPresent(ServerBooks::closeQuietly);
        tables = Optional.empty();
    }
}
