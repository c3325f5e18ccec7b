package bedmark.office;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertNotNull;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import bedmark.document.Branch;
import bedmark.document.Refused;
import bedmark.journal.Digest;
import bedmark.journal.Progress;
import bedmark.office.register.Draft;
import bedmark.office.register.RegisterChange;
import bedmark.office.register.RegisterDesk;
import bedmark.office.register.RegisterImport;
import bedmark.quantity.UnitSystem;
import bedmark.report.ReportContent;
import bedmark.report.ReportFile;
import bedmark.report.ReportOptions;
import bedmark.report.paper.PaperSize;
import bedmark.wording.Wording;
import bedmark.words.Words;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import java.util.Set;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.CyclicBarrier;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.TimeUnit;
import java.util.zip.ZipEntry;
import java.util.zip.ZipFile;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** An office that several desks share, on a real PostgreSQL that the test starts. */
@Tag("outside-tool")
class SharedOfficeTest {
    private static final int DESKS = 8;
    /** Whoever is refused before the others are ready must not keep them waiting for ever. */
    private static final int PATIENCE_SECONDS = 60;
    private static PostgresServer server;

    @TempDir
    private Path folder;

    @BeforeAll
    static void startServer() throws Exception {
        assumeTrue(PostgresServer.possible(), "needs Linux on amd64 with tar, xz and, as root, setpriv");
        server = PostgresServer.start();
    }

    @AfterAll
    static void endServer() throws Exception {
        if (server != null) {
            server.close();
        }
    }

    private OfficeStore desk(int number) {
        return OfficeStore.open(server.url(), folder.resolve("desk" + number), OfficeOptions.of(Offices.NOW));
    }

    /**
     * Eight desks receive overlapping packs, each in an order of its own, while the server is ended without warning and
     * started again. A folder that received the same packs is the measure: nothing is lost and nothing doubled, and the
     * export for analysis and the report are the same.
     */
    @Test
    void eightDesksAndARestartLoseNothingAndDoubleNothing() throws Exception {
        Tablets tablets = new Tablets(20260302);
        List<Path> packs = tablets.packs(folder, 4);
        Path[] keys = {tablets.key(folder, 0), tablets.key(folder, 1), tablets.key(folder, 2)};
        try (OfficeStore first = desk(99)) {
            for (Path key : keys) {
                first.trust(Offices.fingerprint(key), "", "Ida Marsh");
            }
        }
        CountDownLatch halfWay = new CountDownLatch(DESKS * packs.size() / 3);
        ExecutorService desks = Executors.newFixedThreadPool(DESKS);
        List<Future<List<Received>>> work = new ArrayList<>();
        for (int i = 0; i < DESKS; i++) {
            int number = i;
            work.add(desks.submit(() -> receive(number, packs, halfWay)));
        }
        halfWay.await();
        server.restart();
        List<Received> all = new ArrayList<>();
        for (Future<List<Received>> one : work) {
            all.addAll(one.get());
        }
        desks.shutdown();
        assertEquals(DESKS * packs.size(), all.size());
        assertTrue(all.stream().noneMatch(one -> one instanceof Received.Turned), all::toString);
        try (OfficeStore shared = desk(0); OfficeStore alone = Offices.trusting(folder.resolve("alone"), keys)) {
            packs.forEach(pack -> assertInstanceOf(Received.Taken.class, alone.receive(pack, "Ida Marsh")));
            assertEquals(packs.size(), shared.packs().size());
            assertEquals(Offices.told(alone), Offices.told(shared));
            new OfficeExport(alone).write(folder.resolve("export-alone"), Progress.NONE);
            new OfficeExport(shared).write(folder.resolve("export-shared"), Progress.NONE);
            assertEquals(Offices.files(folder.resolve("export-alone")), Offices.files(folder.resolve("export-shared")));
            assertEquals(report(alone, folder.resolve("report-alone")), report(shared, folder.resolve("report-shared")));
            desksThatChangeOneRegisterDoNotReplaceEachOther(shared);
            whatOneDeskRefusedAnotherSees(shared);
            new IdBounds(shared, keys[0], folder).prove();
        }
    }

    /** Of as many desks as begin from the same register one changes it; the others are told, and lose nothing. */
    private void desksThatChangeOneRegisterDoNotReplaceEachOther(OfficeStore shared) throws Exception {
        String plant = shared.registers().keySet().iterator().next();
        Branch before = shared.head(plant).orElseThrow();
        CyclicBarrier together = new CyclicBarrier(DESKS);
        ExecutorService desks = Executors.newFixedThreadPool(DESKS);
        List<Future<Optional<String>>> work = new ArrayList<>();
        for (int i = 1; i <= DESKS; i++) {
            int number = i;
            work.add(desks.submit(() -> change(number, before, together)));
        }
        List<String> refused = new ArrayList<>();
        for (Future<Optional<String>> one : work) {
            one.get().ifPresent(refused::add);
        }
        desks.shutdown();
        assertEquals(Collections.nCopies(DESKS - 1, "register-changed-since"), refused);
        assertEquals(before.branch("plant").orElseThrow().branches("materials").size() + 1,
                shared.registers().get(plant).materials().size());
    }

    private void whatOneDeskRefusedAnotherSees(OfficeStore shared) throws IOException {
        Path broken = Files.write(folder.resolve("broken.zip"), new byte[] {1, 2, 3});
        try (OfficeStore second = desk(1)) {
            Received refused = second.receive(broken, "Desk 1");
            assertEquals(List.of(refused), new Refusals(shared, Offices.NOW).open().stream().map(Refusal::turned)
                    .toList());
        }
    }

    /** Adds a material of a desk's own; why it was refused, where it was. */
    private Optional<String> change(int number, Branch before, CyclicBarrier together) throws Exception {
        try (OfficeStore store = desk(number)) {
            Draft draft = RegisterImport.changed(before, new RegisterChange("materials", Optional.empty(),
                    Map.of("id", "of-desk-" + number)));
            together.await(PATIENCE_SECONDS, TimeUnit.SECONDS);
            new RegisterDesk(store).take(draft, "edit", "Desk " + number);
            return Optional.empty();
        } catch (Refused e) {
            return Optional.of(e.defect().code());
        }
    }

    private List<Received> receive(int number, List<Path> packs, CountDownLatch halfWay) {
        List<Path> own = new ArrayList<>(packs);
        Collections.shuffle(own, new Random(number));
        List<Received> received = new ArrayList<>();
        try (OfficeStore store = desk(number)) {
            for (Path pack : own) {
                received.add(store.receive(pack, "Desk " + number));
                halfWay.countDown();
            }
        }
        return received;
    }

    /** The report as every kind of file; a workbook also keeps the moment at which it was written. */
    private static Map<String, String> report(OfficeStore store, Path into) throws IOException {
        ReportContent content = ReportContent.of(store, RankQuery.ALL, OffsetDateTime.now(Offices.NOW), Progress.NONE)
                .orElseThrow();
        ReportOptions options = new ReportOptions(new Wording(new Words(Locale.ENGLISH), UnitSystem.METRIC),
                PaperSize.A4, store::photo, "Bedmark", Progress.NONE);
        Files.createDirectories(into);
        for (ReportFile.Kind kind : ReportFile.Kind.values()) {
            ReportFile.write(into.resolve("report" + kind.ending()), kind, content, options);
        }
        Map<String, String> digests = Offices.files(into);
        assertEquals(Set.of("report.pdf", "report.xlsx", "report.csv"), digests.keySet());
        digests.remove("report.xlsx");
        try (ZipFile workbook = new ZipFile(into.resolve("report.xlsx").toFile())) {
            for (ZipEntry part : Collections.list(workbook.entries())) {
                digests.put(part.getName(), Digest.of(workbook.getInputStream(part).readAllBytes()).hex());
            }
        }
        assertNotNull(digests.remove("docProps/core.xml"));
        return digests;
    }
}
