package bedmark.vault;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Refused;
import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.HexFormat;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Sealed is sealed: nothing is read without the key, and nothing that was changed. */
class VaultTest {
    private static final HexFormat HEX = HexFormat.of();
    private static final DataKey KEY = DataKey.random();

    private static byte[] content(int length) {
        byte[] content = new byte[length];
        new Random(length).nextBytes(content);
        return content;
    }

    private static byte[] seal(byte[] content, int atOnce) throws IOException {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        SealedOutput output = new SealedOutput(bytes, KEY);
        for (int at = 0; at < content.length; at += atOnce) {
            output.write(content, at, Math.min(atOnce, content.length - at));
        }
        output.finish();
        return bytes.toByteArray();
    }

    private static byte[] open(byte[] sealed, DataKey key) throws IOException {
        try (SealedInput input = new SealedInput(new ByteArrayInputStream(sealed), key)) {
            return input.readAllBytes();
        }
    }

    private static void damaged(byte[] sealed, DataKey key) {
        assertThrows(SealedInput.Damaged.class, () -> open(sealed, key));
    }

    @Test
    void publishedValuesComeOut() {
        // RFC 7914, 11: PBKDF2-HMAC-SHA-256 of "passwd" and "salt", one round; the first 32 of 64 bytes.
        assertEquals("55ac046e56e3089fec1691c22544b605f94185216dde0465e68b9d57c20dacbc", HEX.formatHex(
                Passphrase.of("passwd").derive("salt".getBytes(StandardCharsets.US_ASCII), 1)));
        // RFC 5869, A.1: the first 32 of 42 bytes.
        assertEquals("3cb25f25faacd57a90434f64d0362f2a2d2d0a90cf1a5a4c5db02d56ecc4c5bf", HEX.formatHex(Hkdf.expand(
                HEX.parseHex("077709362c2e32df0ddc3f0dc47bba6390b6c73bb50f9c3122ec844ad7c2b3e5"),
                HEX.parseHex("f0f1f2f3f4f5f6f7f8f9"))));
        // The GCM specification's test case 14: AES-256, key, nonce and plain text all zero.
        assertEquals("cea7403d4d606b6e074ec5d3baf39d18d0d1c8a799996bf0265b98b5d48ab919", HEX.formatHex(
                Gcm.seal(new byte[32], new byte[12], new byte[0], new byte[16], 16)));
    }

    @ParameterizedTest
    @ValueSource(ints = {0, 1, 65_535, 65_536, 65_537, 131_072, 200_000})
    void filesOfAnyLengthComeBackWhole(int length) throws IOException {
        byte[] content = content(length);
        byte[] sealed = seal(content, 10_007);
        assertArrayEquals(content, open(sealed, KEY));
        assertEquals(length, SealedInput.plainLength(sealed.length));
        damaged(sealed, DataKey.random());
        damaged(Arrays.copyOf(sealed, sealed.length + 1), KEY);
        for (int cut : new int[] {0, 46, 47, 63, sealed.length - 65_552, sealed.length - 1}) {
            if (cut >= 0 && cut < sealed.length) {
                damaged(Arrays.copyOf(sealed, cut), KEY);
            }
        }
    }

    @Test
    void everyFlippedBitAndEveryMovedPieceIsNoticed() throws IOException {
        byte[] sealed = seal(content(200_000), 65_536);
        Random random = new Random(7);
        for (int i = 0; i < 300; i++) {
            byte[] flipped = sealed.clone();
            int at = i < 100 ? i : random.nextInt(sealed.length);
            flipped[at] ^= (byte) (1 << random.nextInt(8));
            damaged(flipped, KEY);
        }
        int piece = 65_536 + 16;
        byte[] swapped = sealed.clone();
        System.arraycopy(sealed, 47, swapped, 47 + piece, piece);
        System.arraycopy(sealed, 47 + piece, swapped, 47, piece);
        damaged(swapped, KEY);
        byte[] other = seal(content(200_000), 65_536);
        System.arraycopy(other, 47, swapped = sealed.clone(), 47, piece);
        damaged(swapped, KEY);
    }

    @Test
    void anEntryOpensOnlyUnderItsOwnNumberAndKey() {
        byte[] payload = content(100);
        byte[] sealed = KEY.seal(payload, 7);
        assertArrayEquals(payload, KEY.open(sealed, 7).orElseThrow());
        assertTrue(KEY.open(sealed, 8).isEmpty());
        assertTrue(DataKey.random().open(sealed, 7).isEmpty());
        assertTrue(KEY.open(new byte[27], 7).isEmpty());
        assertFalse(Arrays.equals(sealed, KEY.seal(payload, 7)), "each time under another nonce");
        for (int i = 0; i < sealed.length * 8; i++) {
            byte[] flipped = sealed.clone();
            flipped[i / 8] ^= (byte) (1 << i % 8);
            assertTrue(KEY.open(flipped, 7).isEmpty(), "bit " + i);
        }
    }

    @Test
    void theKeyIsThereForTheRightPassphraseAlone() {
        WrappedKey wrapped = WrappedKey.wrap(KEY, Passphrase.chosen("skirt and board"), 1000);
        WrappedKey read = WrappedKey.read(wrapped.text(), "passphrase.json");
        assertEquals(wrapped, read);
        byte[] sealed = KEY.seal(content(10), 1);
        assertArrayEquals(content(10), read.unwrap(Passphrase.of("skirt and board\n")).open(sealed, 1).orElseThrow());
        assertEquals("passphrase-wrong", assertThrows(Refused.class,
                () -> read.unwrap(Passphrase.of("Skirt and board"))).defect().code());
        assertEquals("passphrase-too-short", assertThrows(Refused.class,
                () -> Passphrase.chosen("seven77")).defect().code());
        assertTrue(Passphrase.of("nin\u0303o").sameAs(Passphrase.of("ni\u00f1o")), "one letter or two marks");
        assertFalse(Passphrase.of("skirt").toString().contains("skirt"));
    }

    @Test
    void aDamagedFileIsToldFromAWrongPassphrase() {
        byte[] text = WrappedKey.wrap(KEY, Passphrase.chosen("skirt and board"), 1000).text();
        for (int i = 0; i < text.length; i++) {
            byte[] flipped = text.clone();
            flipped[i] ^= (byte) (1 << i % 8);
            if (!new String(flipped, StandardCharsets.ISO_8859_1).strip()
                    .equals(new String(text, StandardCharsets.ISO_8859_1).strip())) {
                assertEquals("passphrase-file-damaged", assertThrows(Refused.class,
                        () -> WrappedKey.read(flipped, "passphrase.json"), "byte " + i).defect().code());
            }
        }
    }
}
