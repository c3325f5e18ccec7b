package bedmark.screen;

import java.awt.image.BufferedImage;
import java.awt.image.DataBuffer;
import java.awt.image.IndexColorModel;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/** The colours of a picture: the most frequent 256 are kept as they are, the others become the nearest of those. */
final class Palette {
    private static final int MOST = 256;

    private final Map<Integer, Integer> indexes = new HashMap<>();
    private final int[] kept;

    private Palette(List<Integer> byFrequency) {
        kept = byFrequency.stream().limit(MOST).mapToInt(Integer::intValue).toArray();
        for (int i = 0; i < byFrequency.size(); i++) {
            indexes.put(byFrequency.get(i), i < MOST ? i : nearest(byFrequency.get(i)));
        }
    }

    /** The palette of a picture, the same for the same pixels. */
    static Palette of(int[] pixels) {
        Map<Integer, Integer> counts = new HashMap<>();
        for (int start = 0, end; start < pixels.length; start = end) {
            end = start + 1;
            while (end < pixels.length && pixels[end] == pixels[start]) {
                end++;
            }
            counts.merge(pixels[start] & 0xFFFFFF, end - start, Integer::sum);
        }
        return new Palette(counts.entrySet().stream().sorted(Map.Entry.<Integer, Integer>comparingByValue(
                Comparator.reverseOrder()).thenComparing(Map.Entry.comparingByKey())).map(Map.Entry::getKey).toList());
    }

    private int nearest(int colour) {
        int best = 0;
        for (int i = 1; i < kept.length; i++) {
            if (distance(kept[i], colour) < distance(kept[best], colour)) {
                best = i;
            }
        }
        return best;
    }

    private static int distance(int one, int other) {
        int sum = 0;
        for (int shift = 0; shift <= 16; shift += 8) {
            int apart = (one >> shift & 0xFF) - (other >> shift & 0xFF);
            sum += apart * apart;
        }
        return sum;
    }

    boolean holds(int colour) {
        return indexes.containsKey(colour);
    }

    int colours() {
        return indexes.size();
    }

    BufferedImage paint(int[] pixels, int width, int height) {
        BufferedImage image = new BufferedImage(width, height, BufferedImage.TYPE_BYTE_INDEXED,
                new IndexColorModel(8, kept.length, kept, 0, false, -1, DataBuffer.TYPE_BYTE));
        int[] painted = new int[pixels.length];
        for (int i = 0; i < pixels.length; i++) {
            painted[i] = i > 0 && pixels[i] == pixels[i - 1] ? painted[i - 1] : indexes.get(pixels[i] & 0xFFFFFF);
        }
        image.getRaster().setPixels(0, 0, width, height, painted);
        return image;
    }
}
