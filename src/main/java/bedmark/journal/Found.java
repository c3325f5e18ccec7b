package bedmark.journal;

/** A stretch of a segment: a sound frame, or bytes that are none. */
sealed interface Found {
    long offset();

    long length();

    /** A sound frame. */
    record Good(Frame frame, long offset, Digest hash) implements Found {
        @Override
        public long length() {
            return frame.length();
        }
    }

    /** Bytes up to the next sound frame, or to the end. */
    record Bad(long offset, long length) implements Found {
    }
}
