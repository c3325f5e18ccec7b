package bedmark.command;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.command.Terminal.Result;
import bedmark.document.Branch;
import bedmark.json.JsonReader;
import bedmark.office.Offices;
import bedmark.office.Received;
import bedmark.quantity.UnitSystem;
import bedmark.survey.Bundle;
import bedmark.wording.Wording;
import bedmark.words.Words;
import java.io.IOException;
import java.math.BigDecimal;
import java.net.StandardProtocolFamily;
import java.net.UnixDomainSocketAddress;
import java.nio.channels.ServerSocketChannel;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The commands of the office as a script calls them. */
class OfficeCommandsTest {
    @TempDir
    private Path folder;

    private Path packs;

    @BeforeEach
    void packs() {
        packs = folder.resolve("packs");
        Offices.pack(Offices.sample("round-under-way"), folder.resolve("tablet"), packs.resolve("a.zip"));
        Offices.pack(Offices.sample("round-2026-03"), folder.resolve("tablet"), packs.resolve("b.zip"));
    }

    private Result office(String... arguments) {
        List<String> all = new ArrayList<>(List.of("office"));
        all.addAll(List.of(arguments));
        all.addAll(List.of("--store", folder.resolve("office").toString()));
        return Terminal.run(all.toArray(String[]::new));
    }

    private Branch worst() {
        return JsonReader.read(office("rank", "--json", "--limit", "1").out().getBytes(StandardCharsets.UTF_8)).root();
    }

    private Result received() {
        return office("receive", packs.toString(), "--trust", Offices.fingerprint(folder.resolve("tablet")));
    }

    @Test
    void anUnknownDeviceIsRefusedAndATrustedOneReceivedWithReceipts() throws IOException {
        Result refused = office("receive", packs.resolve("a.zip").toString());
        assertEquals(3, refused.code());
        assertTrue(refused.err().contains(Offices.fingerprint(folder.resolve("tablet"))), refused::err);
        assertEquals(1, refused.err().lines().count());
        assertEquals(2, office("receive", packs.toString(), "--trust", "nonsense").code());
        Path cut = Files.write(folder.resolve("cut.zip"), new byte[] {'P', 'K', 3, 4, 5});
        Result damaged = office("receive", cut.toString());
        assertTrue(damaged.err().strip().endsWith("Nothing proves which tablet it is from."), damaged::err);
        Result received = received();
        assertEquals(0, received.code(), received::err);
        try (var files = Files.list(packs)) {
            assertEquals(2, files.filter(file -> file.toString().endsWith(".receipt.json")).count());
        }
        Result again = office("receive", packs.toString());
        assertEquals(0, again.code());
        assertTrue(again.out().contains("received before"), again::out);
    }

    @Test
    void whatWasRefusedIsListedUntilItIsIn() throws IOException {
        assertEquals("No refused pack waits.", office("refused").out().strip());
        assertEquals("", office("refused", "--json").out());
        byte[] changed = Files.readAllBytes(packs.resolve("a.zip"));
        Matcher photo = Pattern.compile("PK\3\4.{26}data/photos/", Pattern.DOTALL)
                .matcher(new String(changed, StandardCharsets.ISO_8859_1));
        assertTrue(photo.find());
        changed[photo.end() + 200] ^= 1;
        Path damaged = Files.write(packs.resolve("c.zip"), changed);
        assertEquals(3, office("receive", packs.toString()).code());
        assertEquals(3, office("receive", damaged.toString()).code());
        Result text = office("refused");
        assertEquals(0, text.code(), text::err);
        assertEquals(3, text.out().lines().count(), text::out);
        assertTrue(text.out().lines().anyMatch(line -> line.contains(damaged + ": ") && line.contains("Tablet 3")
                && line.contains("a key that this office does not trust")), text::out);
        Result in = office("receive", "--json", packs.resolve("a.zip").toString(), packs.resolve("b.zip").toString(),
                "--trust", Offices.fingerprint(folder.resolve("tablet")));
        assertEquals(0, in.code(), in::err);
        assertTrue(in.out().lines().allMatch(line -> line.contains("\"outcome\":\"received\"")), in::out);
        Result lines = office("receive", "--json", packs.resolve("a.zip").toString(), damaged.toString());
        assertEquals(3, lines.code());
        assertEquals(1, lines.err().lines().count(), lines::err);
        List<Branch> told = lines.out().lines().map(line ->
                JsonReader.read(line.getBytes(StandardCharsets.UTF_8)).root()).toList();
        assertEquals(List.of("known", "refused"), told.stream().map(one -> one.text("outcome").orElseThrow()).toList());
        assertTrue(Files.exists(Path.of(told.get(0).text("receipt").orElseThrow())));
        assertEquals(Optional.of("Tablet 3"), told.get(1).text("tablet"));
        assertEquals(Optional.of("trusted"), told.get(1).text("sender"));
        Branch left = JsonReader.read(office("refused", "--json").out().getBytes(StandardCharsets.UTF_8)).root();
        assertEquals(damaged.toString(), left.text("file").orElseThrow());
        assertEquals("trusted", left.text("sender").orElseThrow());
        assertEquals("Tablet 3", left.text("tablet").orElseThrow());
        assertEquals(Optional.of(new BigDecimal(changed.length)), left.number("bytes"));
        for (String key : List.of("sha256", "fingerprint", "code", "reason", "firstAt", "lastAt")) {
            assertTrue(left.text(key).isPresent(), key);
        }
        assertEquals(2, office("refused", "--put-away", "never.zip").code());
        assertEquals("No refused pack waits.", office("refused", "--put-away", damaged.toString()).out().strip());
        assertEquals(3, office("receive", damaged.toString()).code());
        assertEquals("", office("refused", "--json", "--put-away", left.text("sha256").orElseThrow()).out());
    }

    @Test
    void aTabletWithoutANameIsNotToldByItsFingerprintTwice() {
        ReceivedJson lines = new ReceivedJson(new Wording(new Words(Locale.ENGLISH), UnitSystem.METRIC));
        assertEquals("{\"outcome\":\"known\",\"file\":\"a.zip\",\"sha256\":\"ab12\",\"fingerprint\":\"F1\"}",
                lines.line(new Received.AlreadyHere(Path.of("a.zip"), "ab12", "F1", "F1", Optional.empty()),
                        Optional.empty()));
    }

    @Test
    void theListTellsItsWorstPlaceByTheExitCode() {
        received();
        Result text = office("rank", "--limit", "3");
        assertEquals(1, text.code(), text::err);
        assertTrue(text.out().startsWith("1. Overloaded: "), text::out);
        Result json = office("rank", "--json");
        assertEquals(24, json.out().lines().count());
        json.out().lines().forEach(line -> JsonReader.read(line.getBytes(StandardCharsets.UTF_8)));
        Result csv = office("rank", "--csv");
        assertEquals(25, csv.out().split("\r\n").length);
        assertTrue(office("rank", "--finding", "seal-defect").out().lines().filter(line ->
                line.contains("State of the seals")).count() > 1);
        assertEquals(2, office("rank", "--finding", "moon").code());
        assertEquals(2, office("rank", "--stale-after", "0").code());
        assertTrue(office("rank", "--area", "Biomass yard").out().lines().noneMatch(line -> line.contains("C3")));
    }

    @Test
    void aFindingIsAcceptedWithReasonPersonAndDay() {
        received();
        Branch first = worst();
        String worst = first.text("transfer").orElseThrow();
        String rule = first.branches("findings").get(0).text("code").orElseThrow();
        assertEquals(2, office("accept", worst, rule).code());
        assertEquals(3, office("accept", worst, rule, "--reason", "r", "--until", "2020-01-01").code());
        assertEquals(3, office("accept", worst, rule, "--reason", "r", "--shelve").code());
        assertEquals(3, office("accept", "TP-77", rule, "--reason", "r").code());
        Result accepted = office("accept", worst, rule, "--reason", "boards on order", "--until", "2026-12-31",
                "--person", "Ida Marsh");
        assertEquals(0, accepted.code(), accepted::err);
        assertTrue(office("rank").out().contains("accepted by Ida Marsh, until 2026-12-31: boards on order"));
        assertEquals(0, office("accept", worst, rule, "--reason", "again", "--reopen").code());
        assertTrue(!office("rank").out().contains("boards on order"));
    }

    @Test
    void actionsGoToTheMaintenanceSystemAndBackToTheTablets() {
        received();
        Result added = office("action", "TP-08", "--text", "Renew the seals", "--owner", "Otto Vane", "--due",
                "2026-11-01", "--work-order", "WO-1", "--person", "Ida Marsh");
        assertEquals(0, added.code(), added::err);
        String csv = office("action").out();
        assertTrue(csv.contains("OST-LZ-008") && csv.contains("WO-1") && csv.contains("2026-11-01"), csv);
        assertEquals(0, office("action", "--change", added.out().strip().substring(0, 8), "--done").code());
        assertTrue(office("action").out().contains("WO-1,true"));
        Path round = folder.resolve("next.round.json");
        assertEquals(0, office("round", "--out", round.toString()).code());
        assertEquals(3, office("round", "--out", round.toString(), "--round", "never").code());
    }

    @Test
    void trendEnergyAndExportAreTold() {
        received();
        Result trend = office("trend", "TP-08");
        assertEquals(0, trend.code(), trend::err);
        assertTrue(trend.out().contains("Too few surveys to say"), trend::out);
        JsonReader.read(office("trend", "TP-08", "--json").out().getBytes(StandardCharsets.UTF_8));
        assertEquals(3, office("trend", "TP-99").code());
        assertTrue(office("energy").out().startsWith("##"));
        assertTrue(office("energy", "--by-area", "--csv").out().lines().count() >= 4);
        Result export = office("export", "--out", folder.resolve("export").toString());
        assertEquals(0, export.code(), export::err);
        assertEquals(3, office("export", "--out", folder.resolve("export").toString()).code());
    }

    @Test
    void aRegisterComesAsTablesAndGoesAsTables() throws IOException {
        received();
        Path tables = folder.resolve("tables");
        assertEquals(0, office("export-register", "--out", tables.toString()).code());
        Result same = office("import-register", tables.toString(), "--check");
        assertEquals(0, same.code(), same::err);
        assertTrue(same.out().contains("0 changed"), same::out);
        Files.writeString(tables.resolve("transfers.csv"), "id,conveyor,skirtSpacing\nTP-01,C1,800 mm\nTP-02,C77,1\n");
        Result bad = office("import-register", tables.resolve("transfers.csv").toString());
        assertEquals(3, bad.code());
        assertTrue(bad.err().contains("transfers.csv:3 conveyor") && bad.err().contains("transfers.csv:3 skirtSpacing"),
                bad::err);
        assertTrue(bad.err().lines().reduce("", (before, line) -> line).contains("Nothing was taken in"), bad::err);
        assertTrue(office("export-register", "--out", folder.resolve("after").toString()).code() == 0);
        assertTrue(Files.readString(folder.resolve("after/transfers.csv")).contains("TP-01"));
        assertTrue(!Files.readString(folder.resolve("after/transfers.csv")).contains("800 mm"));
        Result fresh = office("import-register", "--plant", "newplant", Files.writeString(folder.resolve("areas.csv"),
                "id;name\na1;North\n").toString());
        assertEquals(0, fresh.code(), fresh::err);
        assertEquals(3, office("round", "--out", folder.resolve("x.round.json").toString()).code(), "which plant?");
    }

    @Test
    void everyCommandOfTheOfficeHasHelp() {
        for (String command : List.of("receive", "refused", "rank", "trend", "energy", "accept", "action", "settle",
                "export", "import-register", "export-register", "round")) {
            Result help = Terminal.run("office", command, "--help");
            assertEquals(0, help.code());
            assertTrue(help.out().startsWith("Usage: bedmark office " + command), help::out);
            assertTrue(command.equals("action") || help.out().contains("Exit codes: 0 "), help::out);
        }
        assertEquals(2, Terminal.run("office").code());
    }

    @Test
    void anOfficeIsProvedAndMadeAnewAndNotMadeByLookingAtIt() throws IOException {
        String absent = folder.resolve("nowhere").toString();
        assertEquals(3, Terminal.run("office", "check", absent).code());
        assertEquals(3, Terminal.run("office", "rebuild", absent).code());
        assertTrue(Files.notExists(Path.of(absent)));
        assertEquals(0, received().code());
        String office = folder.resolve("office").toString();
        Result sound = Terminal.run("office", "check", office);
        assertEquals(0, sound.code(), sound::err);
        assertTrue(sound.out().startsWith("2 packs, "), sound::out);
        assertEquals(0, Terminal.run("office", "rebuild", office).code());
        try (var files = Files.list(folder.resolve("office/packs"))) {
            Files.delete(files.findFirst().orElseThrow());
        }
        Result damaged = Terminal.run("office", "check", office);
        assertEquals(3, damaged.code());
        assertTrue(damaged.err().contains("gone"), damaged::err);
    }

    @Test
    void whatIsGivenWithoutAnActionIsNotDropped() {
        received();
        for (String[] bad : new String[][] {{"--text", "Renew"}, {"--done"}, {"--finding", "seal-defect"},
            {"--due", "2027-01-01"}, {"TP-08", "--text", "Renew", "--done"}, {"TP-08", "--change", "a", "--text", "b"},
            {"TP-08", "--text", "Renew", "--finding", "nope"}}) {
            List<String> line = new ArrayList<>(List.of("action"));
            line.addAll(List.of(bad));
            Result refused = office(line.toArray(String[]::new));
            assertEquals(2, refused.code(), line.toString());
            assertEquals(1, refused.err().lines().count(), refused.err());
            assertEquals("", refused.out());
        }
        assertEquals(1, office("action").out().lines().count());
    }

    @Test
    void anAnswerIsGivenOrTakenBackAndWhatWasNeverAnsweredIsNot() {
        received();
        String[] finding = {"accept", "TP-08", "seal-defect", "--reason", "r"};
        Result nothing = office(with(finding, "--reopen"));
        assertEquals(3, nothing.code());
        assertTrue(nothing.err().contains("nothing to take back"), nothing.err());
        assertEquals(2, office(with(finding, "--reopen", "--shelve")).code());
        assertEquals(2, office(with(finding, "--reopen", "--until", "2027-01-01")).code());
        Result day = office(with(finding, "--until", "tomorrow"));
        assertEquals(2, day.code());
        assertTrue(day.err().contains("'tomorrow' is no day") && !day.err().contains("Exception"), day.err());
    }

    @Test
    void aFindingThatIsAcceptedForGoodIsToldWithoutADay() {
        received();
        Branch first = worst();
        String worst = first.text("transfer").orElseThrow();
        String rule = first.branches("findings").get(0).text("code").orElseThrow();
        assertTrue(office("accept", worst, rule, "--reason", "r").out().contains("accepted until it is worse"));
        assertTrue(office("rank").out().lines().anyMatch(line -> line.endsWith("until it is worse: r")));
    }

    private static String[] with(String[] line, String... more) {
        return Stream.concat(Stream.of(line), Stream.of(more)).toArray(String[]::new);
    }

    @Test
    void whatNoRegisterHoldsIsRefusedNamingWhatItHolds() {
        received();
        for (String[] bad : new String[][] {{"rank", "--plant", "nope"}, {"rank", "--area", "nope"},
            {"rank", "--material", "nope"}, {"energy", "--plant", "nope"},
            {"report", "--area", "nope", "--out", folder.resolve("r.pdf").toString()},
            {"report", "--plant", "nope", "--out", folder.resolve("r.pdf").toString()}}) {
            Result refused = office(bad);
            assertEquals(2, refused.code(), String.join(" ", bad));
            assertEquals("", refused.out());
            assertTrue(refused.err().contains("knows no 'nope'; known: "), refused.err());
        }
        assertTrue(office("rank", "--plant", "nope").err().contains("ostermere"));
        assertTrue(office("rank", "--area", "nope").err().contains("Biomass yard"));
        assertTrue(Files.notExists(folder.resolve("r.pdf")));
    }

    /** The tables that were written are made those of another plant, as a person would. */
    private void ofWesterly() throws IOException {
        Path plant = folder.resolve("tables/plant.csv");
        Files.writeString(plant, Files.readString(plant).replace("ostermere,Ostermere", "westerly,Westerly"));
    }

    @Test
    void aZoneThatTwoPlantsHaveIsNamedWithItsPlant() throws IOException {
        received();
        String tables = folder.resolve("tables").toString();
        assertEquals(0, office("export-register", "--out", tables).code());
        Result other = office("import-register", tables, "--plant", "westerly");
        assertEquals(3, other.code());
        assertTrue(other.err().contains("ostermere is not the plant whose register this is (westerly)"), other.err());
        ofWesterly();
        Result second = office("import-register", tables, "--plant", "westerly");
        assertEquals(0, second.code(), second::err);
        for (String[] line : new String[][] {{"trend", "TP-08"}, {"action", "TP-08", "--text", "Renew the seals"},
            {"accept", "TP-08", "seal-defect", "--reason", "r"}, {"settle", "TP-08", "abc", "--reason", "r"}}) {
            Result unclear = office(line);
            assertEquals(3, unclear.code(), line[0]);
            assertTrue(unclear.err().contains("ostermere") && unclear.err().contains("westerly"), unclear.err());
            assertEquals(2, office(with(line, "--plant", "nope")).code(), line[0]);
        }
        assertEquals(0, office("trend", "TP-08", "--plant", "ostermere").code());
        assertEquals(0, office("action", "TP-08", "--text", "Renew", "--plant", "westerly").code());
        assertTrue(office("action").out().contains(",westerly,TP-08,"));
        assertEquals(2, office("action", "--plant", "westerly").code());
    }

    @Test
    void aFastClockIsToldInMinutesOrInDays() {
        Bundle bundle = Offices.sample("round-2026-03");
        List<Branch> one = bundle.document().branches("surveys").subList(0, 1);
        Offices.pack(Offices.with(bundle, "two hours", "2026-10-01T11:42:07Z", one), folder.resolve("tablet"),
                packs.resolve("c.zip"));
        Offices.pack(Offices.with(bundle, "nine days", "2026-10-10T20:42:07Z", one), folder.resolve("tablet"),
                packs.resolve("d.zip"));
        String told = received().out();
        assertTrue(told.contains("was 120 minutes ahead of this office's") && told.contains("was 9 days ahead"), told);
    }

    @Test
    void conflictsAreListedWithTheDigestByWhichEachSideIsChosen() {
        Bundle bundle = Offices.sample("round-2026-03");
        Branch original = bundle.document().branches("surveys").get(0);
        Offices.pack(Offices.with(bundle, "two", "2026-03-18T14:00:00+01:00",
                List.of(original.with("notes", "told otherwise"))), folder.resolve("tablet"), packs.resolve("c.zip"));
        assertEquals("No conflict waits.", office("settle").out().strip());
        assertEquals(1, received().code());
        Result text = office("settle");
        assertEquals(0, text.code(), text::err);
        Branch conflict = JsonReader.read(office("settle", "--json").out().getBytes(StandardCharsets.UTF_8)).root();
        assertEquals("same-revision", conflict.text("kind").orElseThrow());
        assertEquals(original.text("transfer"), conflict.text("transfer"));
        assertEquals(2, conflict.branches("sides").size());
        conflict.branches("sides").forEach(side -> assertTrue(text.out().lines().anyMatch(line ->
                line.contains(side.text("digest").orElseThrow())
                        && line.contains(original.text("inspector").orElseThrow())), text::out));
        assertEquals(4, text.out().lines().count(), text::out);
        List<String> said = text.out().lines().toList();
        assertTrue(said.get(0).endsWith(": One revision of a survey came with different contents."), said.get(0));
        assertTrue(said.get(1).matches(" +[0-9a-f]{64} {2}Revision 1, completed \\d+ Mar 2026, \\d\\d:\\d\\d; By .+, "
                + "from Tablet 3; Within limits; drag of the skirts .+N"), said.get(1));
        String zone = conflict.text("transfer").orElseThrow();
        String side = conflict.branches("sides").get(1).text("digest").orElseThrow();
        assertEquals(2, office("settle", zone, side).code());
        assertEquals(2, office("settle", "--reason", "r").code());
        assertEquals(0, office("settle", zone, side, "--reason", "r", "--person", "Ida Marsh").code());
        assertEquals("", office("settle", "--json").out());
    }

    @Test
    void anOfficeIsNamedAndItsReceiptsCarryTheName() throws IOException {
        assertEquals(0, received().code());
        assertEquals("without a name", office("name").out().strip());
        assertEquals(2, office("name", " ").code());
        Result tooLong = office("name", "o".repeat(81));
        assertEquals(3, tooLong.code());
        assertTrue(tooLong.err().contains("81 characters and 80 are the most"), tooLong.err());
        assertEquals(3, office("name", "Ostermere\nworks").code());
        assertEquals("Ostermere works office", office("name", "Ostermere works office").out().strip());
        assertTrue(office("receive", packs.toString()).out().contains("Ostermere works office"));
        try (var files = Files.list(packs)) {
            for (Path file : files.filter(one -> one.toString().endsWith(".receipt.json")).toList()) {
                assertTrue(Files.readString(file).contains("Ostermere works office"), file.toString());
            }
        }
        assertEquals("Ostermere works office", office("name").out().strip());
    }

    @Test
    void energyThatNothingTellsIsUnknownAndPlantsAreToldApart() throws IOException {
        received();
        assertTrue(!office("energy").out().contains("Ostermere"), "one plant needs no name");
        office("energy", "--by-area").out().lines().forEach(line ->
                assertTrue(line.split("Biomass yard", -1).length <= 2, line));
        String tables = folder.resolve("tables").toString();
        assertEquals(0, office("export-register", "--out", tables).code());
        ofWesterly();
        assertEquals(0, office("import-register", tables, "--plant", "westerly").code());
        String csv = office("energy", "--csv", "--plant", "westerly").out();
        assertTrue(csv.lines().count() > 1);
        csv.lines().skip(1).forEach(line -> assertTrue(line.matches(".*,,,,,,,,,,0,\\d+"), line));
        List<String> text = office("energy", "--plant", "westerly").out().lines().toList();
        assertTrue(text.stream().allMatch(line -> line.contains("- MWh a year, best remedies save - MWh")),
                text.toString());
        String names = String.join(" ", office("rank", "--csv").out().lines().map(line -> line.split(",")[1])
                .distinct().toList());
        assertTrue(office("energy").out().lines().allMatch(line ->
                Stream.of(names.split(" ")).anyMatch(line::contains)), names);
    }

    @Test
    void aMappedColumnThatIsNotThereOrHoldsNothingKnownIsRefused() throws IOException {
        received();
        String table = Files.writeString(folder.resolve("areas.csv"), "id,label\na1,North\n").toString();
        Result head = office("import-register", table, "--map", "lable=name");
        assertEquals(3, head.code());
        assertTrue(head.err().contains("lable") && head.err().contains("id, label"), head.err());
        Result key = office("import-register", table, "--map", "label=nmae");
        assertEquals(3, key.code());
        assertTrue(key.err().contains("nmae") && key.err().contains("id, name"), key.err());
        Result right = office("import-register", table, "--map", "label=name");
        assertEquals(0, right.code(), right::err);
        assertTrue(right.out().lines().noneMatch(line -> line.endsWith(" ")), right.out());
    }

    @Test
    void aNumberThatIsOutOfRangeIsNamedWithItsRange() {
        assertTrue(office("rank", "--limit", "0").err().contains("--limit is a number of zones from 1 on, not 0"));
        assertTrue(office("rank", "--older-than", "-1").err().contains("from 0 on, not -1"));
        assertTrue(office("rank", "--stale-after", "0").err().contains("--stale-after"));
    }

    @Test
    void aFolderWithoutPacksIsSaidToHaveNone() throws IOException {
        Path empty = Files.createDirectory(folder.resolve("empty"));
        Result result = office("receive", empty.toString());
        assertEquals(0, result.code(), result::err);
        assertTrue(result.out().contains(empty + ": there were no packs"), result::out);
    }

    @Test
    void whatIsNoPackFileIsRefusedForWhatItIs() throws IOException {
        Path absent = folder.resolve("none.zip");
        Path plain = Files.createFile(folder.resolve("plain"));
        for (String[] given : new String[][] {{absent.toString(), absent + ": there is no such file; check the path."},
            {"/dev/null", "/dev/null: this is a device or a pipe and no file; name a file."},
            {plain.toString(), plain + ": The file is no ZIP file and so no pack; choose a pack."}}) {
            Result refused = office("receive", given[0]);
            assertEquals(3, refused.code());
            assertEquals("bedmark: " + given[1] + System.lineSeparator(), refused.err());
            assertEquals("", refused.out());
        }
        Result beside = office("receive", packs.toString(), "--receipts", plain.toString());
        assertTrue(beside.err().contains(plain + ": this is a file; name a folder."), beside::err);
    }

    private static List<String> names(Path folder) throws IOException {
        try (Stream<Path> files = Files.list(folder)) {
            return files.map(file -> file.getFileName().toString()).sorted().toList();
        }
    }

    /** A socket stands for every device: under root nothing else refuses to be written. */
    @Test
    void aRoundFileThatCanNotBeWrittenIsRefusedAndTheEarlierOneIsWhole() throws IOException {
        received();
        Path rounds = Files.createDirectories(folder.resolve("rounds/empty.round.json")).getParent();
        Path earlier = rounds.resolve("next.round.json");
        assertEquals(0, office("round", "--out", earlier.toString()).code());
        byte[] whole = Files.readAllBytes(earlier);
        Path device = rounds.resolve("s");
        try (ServerSocketChannel socket = ServerSocketChannel.open(StandardProtocolFamily.UNIX)) {
            socket.bind(UnixDomainSocketAddress.of(device));
            String[][] refusals = {{rounds.resolve("empty.round.json").toString(), "this is a folder; name a file"},
                {rounds.toString(), "this is a folder; name a file"}, {"/", "/: this is a folder; name a file"},
                {rounds.resolve("gone/next.round.json").toString(), "gone: there is no such folder"},
                {earlier.resolve("next.round.json").toString(), "next.round.json: there is no such folder"},
                {device.toString(), "this is a device or a pipe and no file"}};
            for (String[] refusal : refusals) {
                Result refused = office("round", "--out", refusal[0]);
                assertEquals(3, refused.code(), refusal[0]);
                assertEquals(1, refused.err().lines().count(), refused.err());
                assertTrue(refused.err().contains(refusal[1]), refused.err());
                assertEquals("", refused.out());
            }
            for (String[] line : new String[][] {{"report", "--out", device + ".pdf"}, {"export", "--out", "" + device},
                {"export-register", "--out", "" + device}}) {
                Files.deleteIfExists(rounds.resolve("s.pdf"));
                Files.createSymbolicLink(rounds.resolve("s.pdf"), device);
                Result refused = office(line);
                assertEquals(3, refused.code(), line[0]);
                assertEquals(1, refused.err().lines().count(), refused.err());
            }
            assertFalse(Files.isRegularFile(device));
            assertArrayEquals(whole, Files.readAllBytes(earlier));
            assertEquals(List.of("empty.round.json", "next.round.json", "s", "s.pdf"), names(rounds));
        }
    }

    @Test
    void aRegisterOfWhichATableCanNotBeWrittenLeavesTheEarlierTables() throws IOException {
        received();
        Path out = folder.resolve("register");
        assertEquals(0, office("export-register", "--out", out.toString()).code());
        List<String> tables = names(out);
        Files.writeString(out.resolve("areas.csv"), "mine");
        Files.delete(out.resolve("transfers.csv"));
        Files.createDirectory(out.resolve("transfers.csv"));
        Result refused = office("export-register", "--out", out.toString());
        assertEquals(3, refused.code());
        assertTrue(refused.err().contains("transfers.csv: this is a folder; name a file"), refused.err());
        assertEquals("mine", Files.readString(out.resolve("areas.csv")));
        assertEquals(tables, names(out));
    }

    @Test
    void aStoreThatIsNoFolderAndNoKnownServerIsRefused() throws IOException {
        Result server = Terminal.run("office", "rank", "--store", "jdbc:mysql:bedmark");
        assertEquals(2, server.code());
        assertTrue(server.err().contains("'jdbc:mysql:bedmark' names a server that is not known"), server.err());
        assertFalse(Files.exists(Path.of("jdbc:mysql:bedmark")));
        Result device = Terminal.run("office", "rank", "--store", "/dev/null");
        assertEquals(3, device.code());
        assertTrue(device.err().contains("/dev/null is a file and no folder"), device.err());
    }

    @Test
    void aWorkbookThatIsCutOffIsSaidToBeNone() throws IOException {
        received();
        Path whole = folder.resolve("report.xlsx");
        assertEquals(0, office("report", "--out", whole.toString()).code());
        byte[] bytes = Files.readAllBytes(whole);
        for (int length : new int[] {0, 1, bytes.length / 2}) {
            Path cut = Files.write(folder.resolve("cut.xlsx"), Arrays.copyOf(bytes, length));
            Result refused = office("import-register", cut.toString());
            assertEquals(3, refused.code());
            assertTrue(refused.err().contains("cut.xlsx is no workbook that can be read"), refused::err);
        }
    }

    @Test
    void aTrustThatIsNoFingerprintIsBadUseOfAReceipt() {
        received();
        Path tablet = folder.resolve("tablet");
        assertEquals(2, Terminal.run("store", "receipt", tablet.toString(), packs.toString(), "--trust", "nonsense")
                .code());
    }

    @Test
    void anOfficeWithoutPlantsSaysThatItKnowsNoneYet() {
        for (String command : List.of("round", "export-register")) {
            Result refused = office(command, "--out", folder.resolve("out.round.json").toString());
            assertEquals(3, refused.code());
            assertTrue(refused.err().contains("knows no plant yet"), refused.err());
        }
    }

    @Test
    void aPackIsNotMadeIntoAFolderThatIsNotThere() {
        Result refused = Terminal.run("pack", "make", "sample-surveys/round-2026-03.json", "--photos",
                "sample-surveys/photos", "--out", folder.resolve("gone/march.zip").toString(), "--store",
                folder.resolve("tablet").toString());
        assertEquals(3, refused.code());
        assertTrue(refused.err().contains("gone") && !refused.err().contains("queued"), refused.err());
    }
}
