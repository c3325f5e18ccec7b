package bedmark.document;

import bedmark.quantity.Quantity;
import java.util.AbstractMap;
import java.util.AbstractSet;
import java.util.Arrays;
import java.util.Iterator;
import java.util.Map;
import java.util.NoSuchElementException;
import java.util.Objects;
import java.util.Set;
import java.util.function.Supplier;

/**
 * What an object of a document holds, in its written order, and never changed. Documents are made of very many small
 * objects, so that each is two arrays; keys are compared one by one where there are few of them.
 */
public final class Members extends AbstractMap<String, Node> {
    /** Up to so many keys are compared faster than they are looked up. */
    private static final int COMPARED = 8;
    /** Up to so many are sorted fastest by taking each to its place. */
    private static final int INSERTED = 24;
    private static final Members NONE = new Members(new String[0], new Node[0]);

    private final String[] keys;
    private final Node[] values;
    /** By the hash of each key its place, and one more; absent where keys are compared. */
    private final int[] places;
    /**
     * What the members were read as. Whoever judges a survey after a key reads all its quantities anew, of which the
     * key changed one; two threads that read at once write the same.
     */
    private Quantity quantity;

    /** The arrays are this object's own from now on. */
    private Members(String[] keys, Node[] values) {
        this.keys = keys;
        this.values = values;
        this.places = keys.length > COMPARED ? places(keys, keys.length) : null;
    }

    /** The same members as a map's, in its order. */
    static Members of(Map<String, Node> map) {
        if (map instanceof Members members) {
            return members;
        }
        Gathering gathering = new Gathering();
        map.forEach((key, value) -> {
            gathering.key(key);
            gathering.value(value);
        });
        return gathering.members();
    }

    private static int[] places(String[] keys, int size) {
        int[] places = new int[Integer.highestOneBit(size) << 2];
        for (int i = 0; i < size; i++) {
            put(places, keys[i], i);
        }
        return places;
    }

    private static void put(int[] places, String key, int place) {
        int slot = slot(places, key);
        while (places[slot] != 0) {
            slot = slot + 1 & places.length - 1;
        }
        places[slot] = place + 1;
    }

    private static int slot(int[] places, String key) {
        int hash = key.hashCode();
        return (hash ^ hash >>> 16) & places.length - 1;
    }

    /** The place of a key, or -1. */
    private static int find(String key, String[] keys, int size, int[] places) {
        if (places == null) {
            int hash = key.hashCode();
            for (int i = 0; i < size; i++) {
                if (keys[i].hashCode() == hash && keys[i].equals(key)) {
                    return i;
                }
            }
            return -1;
        }
        for (int slot = slot(places, key); places[slot] != 0; slot = slot + 1 & places.length - 1) {
            if (keys[places[slot] - 1].equals(key)) {
                return places[slot] - 1;
            }
        }
        return -1;
    }

    /** Gathers members one after the other. */
    public static final class Gathering {
        private String[] keys = new String[COMPARED];
        private Node[] values = new Node[COMPARED];
        private int[] places;
        private int size;

        /**
         * Takes a key, whose value comes next.
         *
         * @return false where it was taken before, and is not taken again
         */
        public boolean key(String key) {
            if (find(key, keys, size, places) >= 0) {
                return false;
            }
            if (size == keys.length) {
                keys = Arrays.copyOf(keys, 2 * size);
                values = Arrays.copyOf(values, 2 * size);
                places = places(keys, size);
            }
            if (places != null) {
                put(places, key, size);
            }
            keys[size++] = key;
            return true;
        }

        /** The value of the key that was taken last. */
        public void value(Node value) {
            values[size - 1] = Objects.requireNonNull(value);
        }

        Members members() {
            return size == 0 ? NONE : new Members(Arrays.copyOf(keys, size), Arrays.copyOf(values, size));
        }
    }

    /** The same with a value set: in its place, or after all others. */
    Members with(String key, Node value) {
        Objects.requireNonNull(value);
        int place = find(key, keys, keys.length, places);
        int size = place < 0 ? keys.length + 1 : keys.length;
        String[] newKeys = place < 0 ? Arrays.copyOf(keys, size) : keys;
        Node[] newValues = Arrays.copyOf(values, size);
        newKeys[place < 0 ? size - 1 : place] = key;
        newValues[place < 0 ? size - 1 : place] = value;
        return new Members(newKeys, newValues);
    }

    Members without(String key) {
        int place = find(key, keys, keys.length, places);
        if (place < 0) {
            return this;
        }
        String[] newKeys = Arrays.copyOf(keys, keys.length - 1);
        Node[] newValues = Arrays.copyOf(values, keys.length - 1);
        System.arraycopy(keys, place + 1, newKeys, place, newKeys.length - place);
        System.arraycopy(values, place + 1, newValues, place, newKeys.length - place);
        return new Members(newKeys, newValues);
    }

    /** The same by the order of their keys. */
    public Members sorted() {
        for (int i = 1; i < keys.length; i++) {
            if (keys[i - 1].compareTo(keys[i]) > 0) {
                return keys.length > INSERTED ? sortedMany() : inserted(i);
            }
        }
        return this;
    }

    /** @param from the place of the first key that is out of order */
    private Members inserted(int from) {
        String[] sorted = keys.clone();
        Node[] beside = values.clone();
        for (int i = from; i < sorted.length; i++) {
            String key = sorted[i];
            Node value = beside[i];
            int place = i;
            for (; place > 0 && sorted[place - 1].compareTo(key) > 0; place--) {
                sorted[place] = sorted[place - 1];
                beside[place] = beside[place - 1];
            }
            sorted[place] = key;
            beside[place] = value;
        }
        return new Members(sorted, beside);
    }

    private Members sortedMany() {
        String[] sorted = keys.clone();
        Arrays.sort(sorted);
        Node[] beside = new Node[sorted.length];
        Arrays.setAll(beside, each -> get(sorted[each]));
        return new Members(sorted, beside);
    }

    /** The members as a quantity: what they were read as before, else what the reader makes of them now. */
    Quantity quantity(Supplier<Quantity> reader) {
        Quantity read = quantity;
        if (read == null) {
            read = reader.get();
            quantity = read;
        }
        return read;
    }

    /** @param place 0 or more and less than {@link #size()} */
    public String key(int place) {
        return keys[place];
    }

    /** @param place 0 or more and less than {@link #size()} */
    public Node value(int place) {
        return values[place];
    }

    @Override
    public int size() {
        return keys.length;
    }

    @Override
    public Node get(Object key) {
        int place = key instanceof String text ? find(text, keys, keys.length, places) : -1;
        return place < 0 ? null : values[place];
    }

    @Override
    public boolean containsKey(Object key) {
        return get(key) != null;
    }

    @Override
    public Set<Entry<String, Node>> entrySet() {
        return new AbstractSet<>() {
            @Override
            public int size() {
                return keys.length;
            }

            @Override
            public Iterator<Entry<String, Node>> iterator() {
                return new Iterator<>() {
                    private int next;

                    @Override
                    public boolean hasNext() {
                        return next < keys.length;
                    }

                    @Override
                    public Entry<String, Node> next() {
                        if (next == keys.length) {
                            throw new NoSuchElementException();
                        }
                        return Map.entry(keys[next], values[next++]);
                    }
                };
            }
        };
    }
}
