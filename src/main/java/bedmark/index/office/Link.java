package bedmark.index.office;

import bedmark.index.Statements;
import java.sql.Array;
import java.sql.Connection;
import java.sql.PreparedStatement;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collection;
import java.util.Collections;
import java.util.List;
import java.util.function.Supplier;

/** One connection, used by one thread; every failure is an {@link OfficeBroken}. */
final class Link implements AutoCloseable {
    private static final int FETCH = 10_000;
    /** Rows that go in by one statement. */
    private static final int TOGETHER = 50;
    /** How long an answer may take (s). */
    private static final int ANSWERS_WITHIN = 5;

    private final Connection connection;
    private final Statements statements;

    Link(Connection connection) {
        this.connection = connection;
        this.statements = new Statements(connection, OfficeBroken.class, OfficeBroken::new);
        statements.guarded(() -> {
            connection.setAutoCommit(false);
            return true;
        });
    }

    /** Reads a row. */
    @FunctionalInterface
    interface RowReader<T> {
        T read(ResultSet row) throws SQLException;
    }

    /** Takes a row. */
    @FunctionalInterface
    interface RowTaker {
        void take(ResultSet row) throws SQLException;
    }

    <T> List<T> rows(String sql, RowReader<T> reader, Object... arguments) {
        List<T> rows = new ArrayList<>();
        each(sql, row -> rows.add(reader.read(row)), arguments);
        return rows;
    }

    void each(String sql, RowTaker taker, Object... arguments) {
        statements.guarded(() -> {
            PreparedStatement statement = statements.with(sql, arguments);
            statement.setFetchSize(FETCH);
            try (ResultSet result = statement.executeQuery()) {
                while (result.next()) {
                    taker.take(result);
                }
            }
            return true;
        });
    }

    int run(String sql, Object... arguments) {
        return statements.run(sql, arguments);
    }

    /** Takes a row into the statement's batch. */
    void batch(String sql, Object... arguments) {
        statements.batch(sql, arguments);
    }

    /** Runs what {@link #batch} took; nothing happens where it took nothing. */
    void runBatch(String sql) {
        statements.runBatch(sql);
    }

    /**
     * Inserts rows, many by each statement: much of what a database does for one it does for each statement.
     *
     * @param sql  up to where the values stand
     * @param rows each of as many values
     */
    void insert(String sql, List<Object[]> rows) {
        int from = 0;
        for (; rows.size() - from >= TOGETHER; from += TOGETHER) {
            run(values(sql, rows.get(0).length, TOGETHER),
                    rows.subList(from, from + TOGETHER).stream().flatMap(Arrays::stream).toArray());
        }
        if (from < rows.size()) {
            String single = values(sql, rows.get(0).length, 1);
            rows.subList(from, rows.size()).forEach(row -> batch(single, row));
            runBatch(single);
        }
    }

    private static String values(String sql, int columns, int rows) {
        String row = "(" + String.join(", ", Collections.nCopies(columns, "?")) + ")";
        return sql + String.join(", ", Collections.nCopies(rows, row));
    }

    /** Texts as one argument, each once. */
    Array texts(Collection<String> texts) {
        return statements.guarded(() -> connection.createArrayOf("varchar", texts.stream().distinct().toArray()));
    }

    /** Does work whole, or not at all. */
    <T> T whole(Supplier<T> work) {
        try {
            T result = work.get();
            statements.guarded(() -> {
                connection.commit();
                return true;
            });
            return result;
        } catch (RuntimeException | Error e) {
            undo(e);
            throw e;
        }
    }

    private void undo(Throwable failure) {
        try {
            statements.clearBatches();
            connection.rollback();
        } catch (SQLException | RuntimeException e) {
            failure.addSuppressed(e);
        }
    }

    /** Whether the database still answers. */
    boolean alive() {
        try {
            return connection.isValid(ANSWERS_WITHIN);
        } catch (SQLException | RuntimeException e) {
            return false;
        }
    }

    @Override
    public void close() {
        statements.guarded(() -> {
            connection.close();
            return true;
        });
    }
}
