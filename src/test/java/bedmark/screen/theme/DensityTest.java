package bedmark.screen.theme;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class DensityTest {

    @Test
    void targetOfTheDefaultScreenIsEightyEightPixels() {
        assertEquals(88, Density.standard().target());
        assertEquals(71, Density.standard().secondary());
        assertEquals(118, new Density(149, Hand.GLOVED).target());
    }

    @ParameterizedTest
    @ValueSource(doubles = {96, 120, 149, 160, 224, 299})
    void targetIsNeverSmallerThanAsked(double dpi) {
        for (Hand hand : Hand.values()) {
            Density density = new Density(dpi, hand);
            assertTrue(density.target() / dpi * 25.4 >= hand.target() - 1e-6);
            assertTrue(density.secondary() / dpi * 25.4 >= hand.secondary() - 1e-6);
        }
    }

    @Test
    void denserGlassWithScaledPixelsKeepsTheLogicalSize() {
        assertEquals(Density.standard().target(), Density.of(298, 2, Hand.BARE).target());
        assertEquals(Density.standard().mm(2.72), Density.of(223.5, 1.5, Hand.BARE).mm(2.72));
    }

    @Test
    void sheetIsWrittenOutInPixels() {
        assertEquals("a { -fx-min-height: 88px; -fx-font-size: 16px; -fx-line-spacing: -3px; b: secondary; }",
                Density.standard().transcribe("a { -fx-min-height: target-height; -fx-font-size: 2.72mm; "
                        + "-fx-line-spacing: -0.5mm; b: secondary; }"));
        assertFalse(Density.standard().transcribe("12.5mm").contains("mm"));
    }
}
