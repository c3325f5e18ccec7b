package bedmark.bench;

import java.util.List;

/** A group of measurements that are made together. */
interface Suite {
    /** A name by which it can be chosen. */
    String name();

    List<Row> run() throws Exception;
}
