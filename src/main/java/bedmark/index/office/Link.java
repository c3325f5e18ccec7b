package bedmark.index.office;

import java.sql.Array;
import java.sql.Connection;
import java.sql.PreparedStatement;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.ArrayList;
import java.util.Collection;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.function.Supplier;

/** One connection, used by one thread; every failure is an {@link OfficeBroken}. */
final class Link implements AutoCloseable {
    private static final int FETCH = 10_000;
    /** How long an answer may take (s). */
    private static final int ANSWERS_WITHIN = 5;

    private final Connection connection;
    private final Map<String, PreparedStatement> statements = new HashMap<>();

    Link(Connection connection) {
        this.connection = connection;
        guarded(() -> {
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
        guarded(() -> {
            PreparedStatement statement = prepared(sql, arguments);
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
        return guarded(() -> prepared(sql, arguments).executeUpdate());
    }

    /** Takes a row into the statement's batch. */
    void batch(String sql, Object... arguments) {
        guarded(() -> {
            PreparedStatement statement = prepared(sql, arguments);
            statement.addBatch();
            return statement;
        });
    }

    /** Runs what {@link #batch} took; nothing happens where it took nothing. */
    void runBatch(String sql) {
        guarded(() -> {
            PreparedStatement statement = statements.get(sql);
            return statement == null ? new int[0] : statement.executeBatch();
        });
    }

    /** Texts as one argument, each once. */
    Array texts(Collection<String> texts) {
        return guarded(() -> connection.createArrayOf("varchar", texts.stream().distinct().toArray()));
    }

    /** Does work whole, or not at all. */
    <T> T whole(Supplier<T> work) {
        try {
            T result = work.get();
            guarded(() -> {
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
            for (PreparedStatement statement : statements.values()) {
                statement.clearBatch();
            }
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

    /** Work on the database. */
    @FunctionalInterface
    private interface Work<T> {
        T run() throws SQLException;
    }

    /** A damaged file makes the database, or whoever reads its rows, fail in ways that nobody wraps. */
    private static <T> T guarded(Work<T> work) {
        try {
            return work.run();
        } catch (OfficeBroken e) {
            throw e;
        } catch (SQLException | RuntimeException | OutOfMemoryError | StackOverflowError e) {
            throw new OfficeBroken(e);
        }
    }

    private PreparedStatement prepared(String sql, Object... arguments) throws SQLException {
        PreparedStatement statement = statements.get(sql);
        if (statement == null) {
            statement = connection.prepareStatement(sql);
            statements.put(sql, statement);
        }
        for (int i = 0; i < arguments.length; i++) {
            if (arguments[i] instanceof byte[] bytes) {
                statement.setBytes(i + 1, bytes);
            } else {
                statement.setObject(i + 1, arguments[i]);
            }
        }
        return statement;
    }

    @Override
    public void close() {
        guarded(() -> {
            connection.close();
            return true;
        });
    }
}
