package bedmark.pack;

/** Numbers of the ZIP format (APPNOTE 6.3.10) as far as packs use it: one disk, no ZIP64, stored or deflated. */
final class Zip {
    static final int LOCAL = 0x04034b50;
    static final int CENTRAL = 0x02014b50;
    static final int END = 0x06054b50;
    static final int DESCRIPTOR = 0x08074b50;
    static final int ZIP64_LOCATOR = 0x07064b50;

    static final int LOCAL_BYTES = 30;
    static final int CENTRAL_BYTES = 46;
    static final int END_BYTES = 22;
    static final int ZIP64_LOCATOR_BYTES = 20;

    static final int STORED = 0;
    static final int DEFLATED = 8;

    /** Set with any kind of encryption: classic, strong, hidden headers. */
    static final int FLAGS_ENCRYPTED = 0x2041;
    static final int FLAG_DESCRIPTOR = 0x0008;
    static final int FLAG_UTF8 = 0x0800;
    /** The first two say how hard a deflater tried. */
    static final int FLAGS_KNOWN = 0x0006 | FLAG_DESCRIPTOR | FLAG_UTF8;

    /** 1980-01-01, the first day that the format knows: no entry has a time of its own. */
    static final int FIRST_DAY = 0x0021;

    private Zip() {
    }
}
