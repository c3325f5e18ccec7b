package bedmark.index;

import java.sql.Connection;
import java.sql.PreparedStatement;
import java.sql.SQLException;
import java.util.HashMap;
import java.util.Map;
import java.util.function.Function;

/** The statements of one connection, each prepared once; used by one thread. Every failure is of one kind. */
public final class Statements {
    private final Connection connection;
    private final Class<? extends RuntimeException> broken;
    private final Function<Throwable, RuntimeException> breaking;
    private final Map<String, PreparedStatement> prepared = new HashMap<>();

    /**
     * The statements of a connection.
     *
     * @param broken   the kind of every failure
     * @param breaking makes one of that kind
     */
    public <T extends RuntimeException> Statements(Connection connection, Class<T> broken,
                                                   Function<Throwable, T> breaking) {
        this.connection = connection;
        this.broken = broken;
        this.breaking = breaking::apply;
    }

    /** Work on the database. */
    @FunctionalInterface
    public interface Work<T> {
        T run() throws SQLException;
    }

    /** A damaged file makes the database, or whoever reads its rows, fail in ways that nobody wraps. */
    public <T> T guarded(Work<T> work) {
        try {
            return work.run();
        } catch (SQLException | RuntimeException | OutOfMemoryError | StackOverflowError e) {
            throw broken.isInstance(e) ? broken.cast(e) : breaking.apply(e);
        }
    }

    /** A statement with its arguments. */
    public PreparedStatement with(String sql, Object... arguments) throws SQLException {
        PreparedStatement statement = prepared.get(sql);
        if (statement == null) {
            statement = connection.prepareStatement(sql);
            prepared.put(sql, statement);
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

    /** Changes rows, and tells how many. */
    public int run(String sql, Object... arguments) {
        return guarded(() -> with(sql, arguments).executeUpdate());
    }

    /** Takes a row into the statement's batch. */
    public void batch(String sql, Object... arguments) {
        guarded(() -> {
            PreparedStatement statement = with(sql, arguments);
            statement.addBatch();
            return statement;
        });
    }

    /** Runs what {@link #batch} took; nothing happens where it took nothing. */
    public void runBatch(String sql) {
        guarded(() -> {
            PreparedStatement statement = prepared.get(sql);
            return statement == null ? new int[0] : statement.executeBatch();
        });
    }

    /** Forgets what waits in any batch. */
    public void clearBatches() throws SQLException {
        for (PreparedStatement statement : prepared.values()) {
            statement.clearBatch();
        }
    }
}
