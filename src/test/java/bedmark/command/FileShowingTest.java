package bedmark.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.command.Terminal.Result;
import bedmark.office.OfficeStore;
import bedmark.office.Offices;
import bedmark.office.RoundDesk;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** {@code bedmark FILE}, with and without a display. */
class FileShowingTest {
    @TempDir
    private Path folder;

    private Path pack;
    private final List<Path> shown = new ArrayList<>();

    @BeforeEach
    void pack() {
        pack = Offices.pack(Offices.sample("round-2026-03"), folder.resolve("tablet"), folder.resolve("march.zip"));
    }

    private Result withDisplay(String... arguments) {
        return Terminal.run(shown::add, arguments);
    }

    @Test
    void fileIsShownInAWindow() {
        for (String[] call : List.of(new String[] {pack.toString()}, new String[] {"open", pack.toString()})) {
            shown.clear();
            assertEquals(new Result(ExitCode.FINE, "", ""), withDisplay(call));
            assertEquals(List.of(pack), shown);
        }
    }

    @Test
    void damagedPackIsShownTooSinceItsWindowSaysWhatIsWrong() throws IOException {
        Files.write(pack, new byte[0]);
        assertEquals(ExitCode.FINE, withDisplay(pack.toString()).code());
        assertEquals(1, shown.size());
    }

    @Test
    void withoutADisplayThePackIsVerifiedInTheTerminal() {
        Result result = Terminal.run(pack.toString());
        assertEquals(ExitCode.FINE, result.code(), result.err());
        assertTrue(result.out().startsWith("There is no display here"), result.out());
        assertTrue(result.out().endsWith(Terminal.run("pack", "verify", pack.toString()).out()), result.out());
    }

    @Test
    void withoutADisplayABadPackIsRefusedAsVerifyDoes() throws IOException {
        Files.write(pack, Arrays.copyOf(Files.readAllBytes(pack), 4000));
        Result result = Terminal.run(pack.toString());
        Result verified = Terminal.run("pack", "verify", pack.toString());
        assertEquals(verified.code(), result.code());
        assertEquals(verified.err(), result.err());
        assertEquals(ExitCode.UNREADABLE, result.code());
    }

    @Test
    void withoutADisplayRoundFileAndReceiptSayWhereTheyBelong() {
        Path round = folder.resolve("next.round.json");
        Path receipt;
        try (OfficeStore store = Offices.trusting(folder.resolve("office"), folder.resolve("tablet"))) {
            receipt = store.write(store.receive(pack, "Ida Marsh").confirmed().orElseThrow(), folder);
            new RoundDesk(store).send("ostermere", List.of(), round, OffsetDateTime.now(Offices.NOW), "Ida Marsh");
        }
        Result told = Terminal.run(round.toString());
        assertEquals(ExitCode.FINE, told.code(), told.err());
        assertTrue(told.out().contains("Ostermere Lime and Clinker Works")
                && told.out().contains("“Take in the office's round”"), told.out());
        told = Terminal.run(receipt.toString());
        assertEquals(ExitCode.FINE, told.code(), told.err());
        assertTrue(told.out().contains("25 surveys") && told.out().contains("“To the office”"), told.out());
    }

    @ParameterizedTest
    @ValueSource(strings = {"letter.txt", "bundle.json"})
    void foreignFileIsRefusedInOneSentence(String name) throws IOException {
        Path file = Files.writeString(folder.resolve(name), "{\"format\": \"bedmark.bundle\"}");
        Result result = Terminal.run(file.toString());
        assertEquals(ExitCode.UNREADABLE, result.code());
        assertEquals("", result.out());
        assertTrue(result.err().startsWith("bedmark: " + file + ": this is no pack"), result.err());
        assertEquals(1, result.err().lines().count(), result.err());
    }

    @Test
    void missingFileAndFolderAreUnreadableButAMistypedCommandIsBadUse() {
        assertEquals(ExitCode.UNREADABLE, withDisplay(folder.resolve("gone.zip").toString()).code());
        assertEquals(ExitCode.UNREADABLE, withDisplay(folder.toString()).code());
        assertEquals(ExitCode.BAD_USE, withDisplay("asses").code());
        assertEquals(ExitCode.BAD_USE, withDisplay("open", pack.toString(), "--demo").code());
        assertEquals(List.of(), shown);
    }
}
