package bedmark.index;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.sql.Connection;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Properties;
import org.h2.Driver;
import org.h2.api.ErrorCode;

/**
 * One H2 database with one connection, used by one thread that is never interrupted: an interrupted thread would close
 * the whole database. Every failure is an {@link IndexBroken}.
 */
final class Database implements AutoCloseable {

    /** The name of the database's files, without their ending. */
    static final String NAME = "bedmark";
    private static final String FILE = "jdbc:h2:file:";
    private static final String MEMORY = "jdbc:h2:mem:";
    private static final String SETTINGS = ";WRITE_DELAY=0;DB_CLOSE_ON_EXIT=FALSE;TRACE_LEVEL_FILE=0";
    private static final String ENCRYPTED = ";CIPHER=AES";
    private static final String READ_ONLY = ";ACCESS_MODE_DATA=r;IFEXISTS=TRUE";
    private static final String SCHEMA = "schema.sql";

    private final Connection connection;
    private final Statements statements;

    private Database(Connection connection) {
        this.connection = connection;
        this.statements = new Statements(connection, IndexBroken.class, IndexBroken::new);
    }

    /** Reads a row. */
    @FunctionalInterface
    interface RowReader<T> {
        T read(ResultSet row) throws SQLException;
    }

    /**
     * Opens the database of a folder, and makes an empty one where there is none.
     *
     * @param password of the file's own encryption; a file with another one, or with none, is broken
     * @throws Refused {@code store-locked} where another program has it open
     */
    static Database open(Path folder, Optional<String> password) {
        return connect(FILE + path(folder) + SETTINGS + (password.isPresent() ? ENCRYPTED : ""), folder, password);
    }

    /** The same without a password. */
    static Database open(Path folder) {
        return open(folder, Optional.empty());
    }

    /** Opens the database of a folder without writing a byte. */
    static Database openToRead(Path folder, Optional<String> password) {
        return connect(FILE + path(folder) + SETTINGS + READ_ONLY + (password.isPresent() ? ENCRYPTED : ""), folder,
                password);
    }

    /** The same without a password. */
    static Database openToRead(Path folder) {
        return openToRead(folder, Optional.empty());
    }

    /** An empty database that ends with the program, for when the disk takes none. */
    static Database inMemory() {
        return connect(MEMORY + SETTINGS, Path.of(""), Optional.empty());
    }

    /**
     * Refuses a folder whose path would be read as database settings.
     *
     * @throws Refused {@code store-folder-unfit}
     */
    static void requireFit(Path folder) {
        path(folder);
    }

    private static String path(Path folder) {
        String path = folder.toAbsolutePath().normalize().resolve(NAME).toString();
        if (path.contains(";")) {
            throw new Refused(Defect.in(folder.toString(), "store-folder-unfit", ";"));
        }
        return path;
    }

    private static Database connect(String url, Path folder, Optional<String> password) {
        Properties person = new Properties();
        person.setProperty("user", "");
        // The file's password and the person's, who has none.
        person.setProperty("password", password.map(word -> word + " ").orElse(""));
        try {
            Connection connection = new Driver().connect(url, person);
            connection.setAutoCommit(false);
            return new Database(connection);
        } catch (SQLException e) {
            if (e.getErrorCode() == ErrorCode.DATABASE_ALREADY_OPEN_1) {
                throw new Refused(Defect.in(folder.toString(), "store-locked"), e);
            }
            throw new IndexBroken(e);
        } catch (RuntimeException | OutOfMemoryError | StackOverflowError e) {
            // A damaged file makes the database fail in ways that it does not wrap.
            throw new IndexBroken(e);
        }
    }

    /** Makes the tables. */
    void layOut() {
        try (InputStream schema = Database.class.getResourceAsStream(SCHEMA);
             Statement statement = connection.createStatement()) {
            String text = new String(schema.readAllBytes(), StandardCharsets.UTF_8).replaceAll("(?m)^--.*$", "");
            for (String command : text.split(";")) {
                if (!command.isBlank()) {
                    statement.execute(command);
                }
            }
            connection.commit();
        } catch (SQLException e) {
            throw new IndexBroken(e);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    <T> List<T> rows(String sql, RowReader<T> reader, Object... arguments) {
        return statements.guarded(() -> {
            List<T> rows = new ArrayList<>();
            try (ResultSet result = statements.with(sql, arguments).executeQuery()) {
                while (result.next()) {
                    rows.add(reader.read(result));
                }
            }
            return rows;
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

    void commit() {
        statements.guarded(() -> {
            connection.commit();
            return connection;
        });
    }

    /** Closes cleanly; a database that can't be closed is noticed when it is opened. */
    @Override
    public void close() {
        try {
            connection.close();
        } catch (SQLException e) {
            throw new IndexBroken(e);
        }
    }
}
