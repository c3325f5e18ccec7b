package bedmark.index.office;

import java.util.AbstractList;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.RandomAccess;

/**
 * Very many zones, held in the blocks that the table keeps them in; each is made when it is asked for. As objects of
 * their own they would cost more memory, and the memory more time, than all the rest of a ranking. Once filled, any
 * thread may read it.
 */
final class PackedZones extends AbstractList<PackedZone> implements RandomAccess {
    private final List<byte[]> blocks = new ArrayList<>();
    /** Of each zone, the block in the upper half and the place in it in the lower. */
    private long[] places = new long[256];
    private int size;

    void add(byte[] block) {
        PackedReader in = ZoneBlock.proved(block);
        while (!in.atEnd()) {
            if (size == places.length) {
                places = Arrays.copyOf(places, 2 * size);
            }
            places[size++] = (long) blocks.size() << Integer.SIZE | in.at();
            PackedZone.pass(in);
        }
        blocks.add(block);
    }

    @Override
    public PackedZone get(int index) {
        return new PackedZone(blocks.get((int) (places[index] >>> Integer.SIZE)), (int) places[index]);
    }

    @Override
    public int size() {
        return size;
    }
}
