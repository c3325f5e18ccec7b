package bedmark.index.office;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.nio.file.Path;
import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.SQLException;
import java.util.Map;
import java.util.Properties;
import org.flywaydb.core.Flyway;
import org.flywaydb.core.api.FlywayException;
import org.h2.api.ErrorCode;

/** Where an office's tables lie: a folder's own database, or a server. Both have the same tables. */
final class OfficeDatabase {
    private static final String SETTINGS = ";WRITE_DELAY=0;DB_CLOSE_ON_EXIT=FALSE;TRACE_LEVEL_FILE=0;CACHE_SIZE=65536"
            + ";LAZY_QUERY_EXECUTION=1";
    private static final String MIGRATIONS = "classpath:bedmark/index/office";
    private static final String SERVER = "jdbc:postgresql:";

    private OfficeDatabase() {
    }

    /** Whether a text names a server rather than a folder. */
    static boolean server(String url) {
        return url.startsWith(SERVER);
    }

    /** The URL of the database in a folder. */
    static String url(Path folder) {
        String path = folder.toAbsolutePath().normalize().resolve("office").toString();
        if (path.contains(";")) {
            throw new Refused(Defect.in(folder.toString(), "store-folder-unfit", ";"));
        }
        return "jdbc:h2:file:" + path + SETTINGS;
    }

    /**
     * Connects, with the tables as this version needs them.
     *
     * @throws Refused      {@code store-locked} where another program has the folder's database open
     * @throws OfficeBroken where the database can't be used
     */
    static Link open(String url) {
        Link link = new Link(connect(url));
        try {
            if (!current(link)) {
                migrate(url);
            }
            return link;
        } catch (RuntimeException e) {
            link.close();
            throw e;
        }
    }

    private static Connection connect(String url) {
        try {
            return server(url) ? DriverManager.getConnection(url) : DriverManager.getConnection(url, nobody());
        } catch (SQLException e) {
            if (!server(url) && e.getErrorCode() == ErrorCode.DATABASE_ALREADY_OPEN_1) {
                throw new Refused(Defect.in("", "store-locked"), e);
            }
            throw new OfficeBroken(e);
        } catch (RuntimeException e) {
            throw new OfficeBroken(e);
        }
    }

    private static Properties nobody() {
        Properties person = new Properties();
        person.setProperty("user", "");
        person.setProperty("password", "");
        return person;
    }

    /** Asked without the migration library, which takes longer to start than most commands take. */
    private static boolean current(Link link) {
        try {
            return link.whole(() -> link.rows("select content from settings where name = 'schema'",
                    row -> row.getString(1))).contains(OfficeTables.SCHEMA);
        } catch (OfficeBroken e) {
            return false;
        }
    }

    private static void migrate(String url) {
        try {
            Flyway.configure().dataSource(url, server(url) ? null : "", server(url) ? null : "")
                    .locations(MIGRATIONS).javaMigrations(new PackZones())
                    .placeholders(Map.of("bytes", server(url) ? "bytea" : "blob"))
                    .load().migrate();
        } catch (FlywayException e) {
            throw new OfficeBroken(e);
        }
    }
}
