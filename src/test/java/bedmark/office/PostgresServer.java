package bedmark.office;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.io.IOException;
import java.io.InputStream;
import java.net.ServerSocket;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.attribute.PosixFilePermissions;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.concurrent.TimeUnit;
import java.util.stream.Stream;

/**
 * A real PostgreSQL of the test's own: its binaries come from a Maven artifact. It refuses to run as root, so where the
 * tests do, it is run as the user nobody.
 */
final class PostgresServer implements AutoCloseable {
    private static final String ARCHIVE = "/postgres-linux-x86_64.txz";
    private static final String NOBODY = "65534";

    private final Path home;
    private final int port;

    private PostgresServer(Path home, int port) {
        this.home = home;
        this.port = port;
    }

    /** Whether this machine has what the server needs. */
    static boolean possible() {
        return System.getProperty("os.name").contains("Linux") && System.getProperty("os.arch").equals("amd64")
                && runs("tar", "--version") && runs("xz", "--version") && (!root() || runs("setpriv", "--version"));
    }

    private static boolean root() {
        return "root".equals(System.getProperty("user.name"));
    }

    static PostgresServer start() throws Exception {
        Path home = Files.createTempDirectory("bedmark-postgres");
        Files.setPosixFilePermissions(home, PosixFilePermissions.fromString("rwxr-xr-x"));
        try (InputStream archive = PostgresServer.class.getResourceAsStream(ARCHIVE)) {
            Files.copy(archive, home.resolve("server.txz"), StandardCopyOption.REPLACE_EXISTING);
        }
        assertEquals(0, run("tar", "-xJf", home.resolve("server.txz").toString(), "-C", home.toString()));
        Files.createDirectories(home.resolve("data"));
        if (root()) {
            assertEquals(0, run("chown", "-R", NOBODY + ":" + NOBODY, home.resolve("data").toString()));
        }
        int port;
        try (ServerSocket free = new ServerSocket(0)) {
            port = free.getLocalPort();
        }
        PostgresServer server = new PostgresServer(home, port);
        server.tool("initdb", "-D", server.data(), "-U", "bedmark", "--auth=trust", "-E", "UTF8", "--no-locale");
        server.up();
        return server;
    }

    private String data() {
        return home.resolve("data").toString();
    }

    String url() {
        return "jdbc:postgresql://127.0.0.1:" + port + "/postgres?user=bedmark&connectTimeout=5&socketTimeout=60";
    }

    private void up() throws Exception {
        tool("pg_ctl", "-D", data(), "-w", "-t", "60", "-l", data() + "/log", "-o",
                "-p " + port + " -c listen_addresses=127.0.0.1 -c unix_socket_directories=" + data()
                        + " -c max_connections=30", "start");
    }

    /** Ends every connection at once, as a power cut would, and starts the server again. */
    void restart() throws Exception {
        tool("pg_ctl", "-D", data(), "-w", "-m", "immediate", "stop");
        up();
    }

    private void tool(String name, String... arguments) throws IOException {
        List<String> command = new ArrayList<>();
        if (root()) {
            command.addAll(List.of("setpriv", "--reuid=" + NOBODY, "--regid=" + NOBODY, "--clear-groups"));
        }
        command.add(home.resolve("bin").resolve(name).toString());
        command.addAll(List.of(arguments));
        assertEquals(0, run(command.toArray(String[]::new)), name);
    }

    private static boolean runs(String... command) {
        try {
            return run(command) == 0;
        } catch (IOException e) {
            return false;
        }
    }

    private static int run(String... command) throws IOException {
        Process process = new ProcessBuilder(command).redirectOutput(ProcessBuilder.Redirect.DISCARD)
                .redirectError(ProcessBuilder.Redirect.DISCARD).start();
        try {
            assertEquals(true, process.waitFor(120, TimeUnit.SECONDS));
        } catch (InterruptedException e) {
            throw new IOException(e);
        }
        return process.exitValue();
    }

    @Override
    public void close() throws IOException {
        tool("pg_ctl", "-D", data(), "-w", "-m", "immediate", "stop");
        try (Stream<Path> files = Files.walk(home)) {
            for (Path file : files.sorted(Comparator.reverseOrder()).toList()) {
                Files.delete(file);
            }
        }
    }
}
