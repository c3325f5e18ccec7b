package bedmark.office;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.journal.FailingLayer;
import bedmark.journal.FileLayer;
import bedmark.journal.PowerCutDisk;
import bedmark.journal.PowerCutDisk.Fate;
import bedmark.journal.Progress;
import bedmark.survey.Act;
import bedmark.survey.Bundle;
import bedmark.survey.OfficeDeed;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Packs that are received in one call come to what they come to one by one, wherever it is cut short. */
class ReceivedTogetherTest {
    private static final int EVERY = Integer.getInteger("bedmark.office.cuts.every", 11);
    private static final int PACKS = 5;

    @TempDir
    private Path folder;

    private final List<Path> packs = new ArrayList<>();
    private Path office;
    private String told;

    /** An office that trusts the tablet, and what it says once it has all packs. */
    @BeforeEach
    void makeOffice() {
        Bundle sample = Offices.sample("round-2026-03");
        List<Branch> surveys = sample.document().branches("surveys");
        for (int i = 0; i < PACKS; i++) {
            packs.add(Offices.pack(Offices.with(sample, "bundle" + i, "2026-03-18T14:00:00+01:00",
                    List.of(surveys.get(i).without("photos"))), folder.resolve("tablet"), folder.resolve(i + ".zip")));
        }
        office = folder.resolve("office");
        Offices.trusting(office, folder.resolve("tablet")).close();
        Path whole = copy("whole");
        try (OfficeStore store = OfficeStore.open(whole, OfficeOptions.of(Offices.NOW))) {
            packs.forEach(pack -> assertInstanceOf(Received.Taken.class, store.receive(pack, "Ida Marsh")));
            told = Offices.told(store);
        }
    }

    private Path copy(String name) {
        Path copy = folder.resolve(name);
        try (Stream<Path> files = Files.walk(office)) {
            for (Path file : files.toList()) {
                Files.copy(file, copy.resolve(office.relativize(file).toString()));
            }
        } catch (IOException e) {
            throw new IllegalStateException(e);
        }
        return copy;
    }

    @Test
    void whatComesOfEachIsWhatComesOfItAlone() {
        Tablets tablets = new Tablets(20260302);
        List<Path> many = tablets.packs(folder.resolve("many"), 4);
        Path[] keys = {tablets.key(folder.resolve("many"), 0), tablets.key(folder.resolve("many"), 1),
            tablets.key(folder.resolve("many"), 2)};
        many.add(5, many.get(2));
        many.add(7, folder.resolve("absent.zip"));
        many.add(9, packs.get(0));
        try (OfficeStore alone = Offices.trusting(folder.resolve("alone"), keys);
                OfficeStore together = Offices.trusting(folder.resolve("together"), keys)) {
            List<Received> expected = many.stream().map(pack -> alone.receive(pack, "Ida Marsh")).toList();
            List<Received> received = together.receive(many, "Ida Marsh", Progress.NONE);
            assertEquals(expected.stream().map(ReceivedTogetherTest::shown).toList(),
                    received.stream().map(ReceivedTogetherTest::shown).toList());
            assertEquals(2, received.stream().filter(one -> one instanceof Received.Turned).count());
            assertEquals(1, received.stream().filter(one -> one instanceof Received.AlreadyHere).count());
            assertTrue(received.stream().anyMatch(one -> one instanceof Received.Taken taken
                    && !taken.clashes().isEmpty()), "some clash");
            assertEquals(Offices.told(alone), Offices.told(together));
        }
    }

    /** All but the receipt, which names the office. */
    private static String shown(Received one) {
        return one instanceof Received.Taken taken ? List.of(taken.file(), taken.pack(), taken.device(), taken.fresh(),
                taken.known(), taken.clashes(), taken.clock()).toString()
                : one instanceof Received.AlreadyHere here ? here.file() + " is here" : one.toString();
    }

    @ParameterizedTest
    @ValueSource(booleans = {false, true})
    void whicheverOperationFailsWhatWasTakenIsThereAndTheRestMayComeAgain(boolean forGood) {
        FailingLayer sound = new FailingLayer(0, false, "");
        assertEquals(PACKS, taken(copy("sound"), sound).size());
        for (long failing = 1; failing <= sound.operations(); failing += forGood ? 3 * EVERY : EVERY) {
            Path home = copy((forGood ? "good" : "once") + failing);
            Set<String> taken = taken(home, new FailingLayer(failing, forGood, "Input/output error"));
            assertSound(home, taken, "operation " + failing);
        }
    }

    /** The digests of the packs that were said to be taken in. */
    private Set<String> taken(Path home, FileLayer files) {
        try (OfficeStore store = OfficeStore.open(home, OfficeOptions.of(Offices.NOW).withFiles(files))) {
            return store.receive(packs, "Ida Marsh", Progress.NONE).stream()
                    .flatMap(one -> one instanceof Received.Taken taken ? Stream.of(taken.pack()) : Stream.empty())
                    .collect(Collectors.toSet());
        } catch (Refused e) {
            // It could not be opened, and took nothing in.
            return Set.of();
        }
    }

    @Test
    void whereverThePowerIsCutWhatWasTakenIsThereAndTheRestMayComeAgain() throws IOException {
        Path home = copy("live");
        PowerCutDisk disk = new PowerCutDisk(home);
        int opened;
        Set<String> first;
        int between;
        try (OfficeStore store = OfficeStore.open(home, OfficeOptions.of(Offices.NOW).withFiles(disk))) {
            opened = disk.operations();
            first = store.receive(packs.subList(0, 2), "Ida Marsh", Progress.NONE).stream()
                    .map(one -> ((Received.Taken) one).pack()).collect(Collectors.toSet());
            between = disk.operations();
            assertEquals(3, store.receive(packs.subList(2, PACKS), "Ida Marsh", Progress.NONE).size());
        }
        Random random = new Random(4);
        Fate[] fates = {Fate.MIXED, Fate.LOST, Fate.MIXED, Fate.KEPT};
        int image = 0;
        for (int cut = opened; cut <= disk.operations(); cut += Math.max(1, EVERY / 3)) {
            Path laid = folder.resolve("image" + image);
            Fate fate = fates[image++ % fates.length];
            disk.layOut(cut, fate, random, laid);
            assertSound(laid, cut >= between ? first : Set.of(), "after operation " + cut + ", " + fate);
        }
    }
    /** Whatever stops it after the first packs: their surveys are in, and how their zones stand is not told yet. */
    @Test
    void whatWasTakenBeforeItBrokeOffStandsWhenTheOfficeIsOpenedNext() {
        Path home = copy("broken");
        Path alone = copy("alone");
        try (OfficeStore store = OfficeStore.open(home, OfficeOptions.of(Offices.NOW))) {
            assertThrows(IllegalStateException.class, () -> store.receive(packs, "Ida Marsh", (done, total) -> {
                if (done == total - 1) {
                    throw new IllegalStateException("it broke off");
                }
            }));
        }
        try (OfficeStore expected = OfficeStore.open(alone, OfficeOptions.of(Offices.NOW));
                OfficeStore store = OfficeStore.open(home, OfficeOptions.of(Offices.NOW))) {
            packs.subList(0, PACKS - 1).forEach(pack -> expected.receive(pack, "Ida Marsh"));
            assertEquals(PACKS - 1, store.packs().size());
            assertEquals(Offices.told(expected), Offices.told(store));
            assertInstanceOf(Received.Taken.class, store.receive(packs.get(PACKS - 1), "Ida Marsh"));
            assertEquals(told, Offices.told(store));
        }
        assertEquals(List.of(), OfficeProof.of(home, OfficeOptions.of(Offices.NOW)).defects());
    }

    /** Two contents of one revision clash until a pack brings a revision above both. */
    @Test
    void aClashIsToldWithThePackThatBroughtItThoughALaterOneEndsIt() {
        Bundle sample = Offices.sample("round-2026-03");
        Branch first = sample.document().branches("surveys").get(0).without("photos");
        List<Path> three = new ArrayList<>();
        for (Branch survey : List.of(first, first.with("inspector", "Ida Marsh"), first.with("revision",
                Node.number(2)))) {
            three.add(Offices.pack(Offices.with(sample, "clash" + three.size(), "2026-03-18T14:00:00+01:00",
                    List.of(survey)), folder.resolve("tablet"), folder.resolve("clash" + three.size() + ".zip")));
        }
        try (OfficeStore store = OfficeStore.open(copy("clash"), OfficeOptions.of(Offices.NOW))) {
            assertEquals(List.of(0, 1, 0), store.receive(three, "Ida Marsh", Progress.NONE).stream()
                    .map(one -> ((Received.Taken) one).clashes().size()).toList());
        }
    }

    private void assertSound(Path home, Set<String> taken, String where) {
        try (OfficeStore store = OfficeStore.open(home, OfficeOptions.of(Offices.NOW))) {
            Set<String> there = store.packs().stream().map(entry -> ((OfficeDeed.PackReceived)
                    ((Act.OfficeActed) entry.act()).deed()).sha256()).collect(Collectors.toSet());
            assertTrue(there.containsAll(taken), where);
            store.receive(packs, "Ida Marsh", Progress.NONE).forEach(one -> assertEquals(there.contains(
                    one instanceof Received.Taken fresh ? fresh.pack() : ((Received.AlreadyHere) one).pack()),
                    one instanceof Received.AlreadyHere, where));
            assertEquals(told, Offices.told(store), where);
        }
        assertEquals(List.of(), OfficeProof.of(home, OfficeOptions.of(Offices.NOW)).defects(), where);
    }
}
