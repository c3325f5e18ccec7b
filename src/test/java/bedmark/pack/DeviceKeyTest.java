package bedmark.pack;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Refused;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.PosixFilePermissions;
import java.util.Base64;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.junit.jupiter.api.Assumptions;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class DeviceKeyTest {
    private static final byte[] MESSAGE = "digest  path\n".getBytes(StandardCharsets.UTF_8);

    @TempDir
    Path folder;

    @Test
    void theKeyMadeFirstIsTheKeyLaterOn() throws IOException {
        Path store = folder.resolve("new/store");
        DeviceKey made = DeviceKey.of(store);
        DeviceKey loaded = DeviceKey.of(store);
        assertEquals(made.fingerprint(), loaded.fingerprint());
        assertArrayEquals(made.sign(MESSAGE), loaded.sign(MESSAGE));
        assertEquals(List.of(DeviceKey.FILE), Packs.names(store));
    }

    @Test
    void everyStoreHasItsOwnKey() {
        assertNotEquals(DeviceKey.of(folder.resolve("a")).fingerprint(),
                DeviceKey.of(folder.resolve("b")).fingerprint());
    }

    @Test
    void signaturesProveMessageAndDevice() {
        DeviceKey key = DeviceKey.of(folder.resolve("a"));
        DeviceIdentity identity = DeviceIdentity.read(key.publicText(), "");
        byte[] signature = key.sign(MESSAGE);
        assertEquals(64, signature.length);
        assertTrue(identity.proves(MESSAGE, signature));
        assertFalse(identity.proves("digest  other\n".getBytes(StandardCharsets.UTF_8), signature));
        assertFalse(DeviceIdentity.read(DeviceKey.of(folder.resolve("b")).publicText(), "")
                .proves(MESSAGE, signature));
    }

    @Test
    void onlyTheOwnerMayReadTheKey() throws IOException {
        Assumptions.assumeTrue(folder.getFileSystem().supportedFileAttributeViews().contains("posix"),
                "no POSIX rights here");
        DeviceKey.of(folder);
        assertEquals("rw-------",
                PosixFilePermissions.toString(Files.getPosixFilePermissions(folder.resolve(DeviceKey.FILE))));
    }

    @Test
    void aDamagedKeyIsRefusedAndKept() throws IOException {
        DeviceKey.of(folder);
        Path file = folder.resolve(DeviceKey.FILE);
        byte[] sound = Files.readAllBytes(file);
        for (int i = 0; i < sound.length; i += 3) {
            byte[] damaged = sound.clone();
            damaged[i] ^= 1;
            Files.write(file, damaged);
            assertEquals("device-key-damaged",
                    assertThrows(Refused.class, () -> DeviceKey.of(folder), "at " + i).defect().code());
            assertArrayEquals(damaged, Files.readAllBytes(file));
        }
        Files.write(file, new byte[0]);
        assertEquals("device-key-damaged",
                assertThrows(Refused.class, () -> DeviceKey.of(folder)).defect().code());
    }

    @Test
    void aKeyThatCanNotBeSavedIsNotUsed() throws IOException {
        FailingDisk counting = new FailingDisk(0, false, IOException::new);
        DeviceKey.of(folder.resolve("counted"), counting);
        for (int step = 1; step < counting.steps.size(); step++) {
            FailingDisk failing = new FailingDisk(step, true, () -> new IOException("Input/output error"));
            Path store = Files.createDirectories(folder.resolve("store"));
            assertEquals("device-key-not-saved",
                    assertThrows(Refused.class, () -> DeviceKey.of(store, failing)).defect().code());
            assertEquals(List.of(), Packs.names(store));
        }
    }

    @Test
    void fingerprintsAreReadInEveryUsualWriting() {
        Fingerprint fingerprint = DeviceKey.of(folder).fingerprint();
        assertTrue(fingerprint.text().matches("([0-9a-f]{4}-){15}[0-9a-f]{4}"));
        String digits = fingerprint.text().replace("-", "");
        assertEquals(Sha256.hex(decoded(DeviceKey.of(folder))), digits);
        for (String typed : List.of(fingerprint.text(), digits, digits.toUpperCase(Locale.ROOT),
                fingerprint.text().replace('-', ':'), " " + fingerprint.text().replace('-', ' ') + "\n")) {
            assertEquals(Optional.of(fingerprint), Fingerprint.parse(typed));
        }
        for (String typed : List.of("", digits.substring(1), digits + "0", "x" + digits.substring(1))) {
            assertEquals(Optional.empty(), Fingerprint.parse(typed));
        }
    }

    private static byte[] decoded(DeviceKey key) {
        return Base64.getDecoder().decode(
                new String(key.publicText(), StandardCharsets.US_ASCII).lines().toList().get(1));
    }
}
