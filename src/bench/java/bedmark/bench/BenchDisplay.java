package bedmark.bench;

import java.io.BufferedReader;
import java.io.File;
import java.io.IOException;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * What the windows of a measurement stand on: a display that was started for them where the machine has a server for
 * one, else the glass that draws without a display.
 *
 * @param words   what it is, for the row
 * @param flags   what a virtual machine is told of it
 * @param named   the value of {@code DISPLAY}, which the program wants to see in any case
 * @param server  ends with the measurement
 */
record BenchDisplay(String words, List<String> flags, String named, Optional<Process> server)
        implements AutoCloseable {
    private static final String SERVER = "Xvfb";
    private static final List<String> HEADLESS = List.of("-Dglass.platform=Monocle", "-Dmonocle.platform=Headless",
            "-Dprism.order=sw", "-Dheadless.geometry=1280x800-32");

    /** A display of its own where {@code -Dbench.window.headless} does not forbid it and one can be had. */
    static BenchDisplay find() throws IOException {
        Optional<Path> program = Boolean.getBoolean("bench.window.headless") ? Optional.empty() : onPath();
        return program.isPresent() ? start(program.get())
                : new BenchDisplay("headless glass", HEADLESS, "none", Optional.empty());
    }

    private static Optional<Path> onPath() {
        return Arrays.stream(Optional.ofNullable(System.getenv("PATH")).orElse("").split(File.pathSeparator))
                .map(folder -> Path.of(folder, SERVER)).filter(Files::isExecutable).findFirst();
    }

    /** The server takes the first number that is free, and says which. */
    private static BenchDisplay start(Path program) throws IOException {
        Process server = new ProcessBuilder(program.toString(), "-displayfd", "1", "-screen", "0", "1280x800x24",
                "-nolisten", "tcp").redirectError(ProcessBuilder.Redirect.DISCARD).start();
        BufferedReader said = new BufferedReader(new InputStreamReader(server.getInputStream(),
                StandardCharsets.UTF_8));
        String number = said.readLine();
        if (number == null) {
            throw new IOException("the display did not start");
        }
        return new BenchDisplay("window on a display of its own", List.of(), ":" + number.strip(),
                Optional.of(server));
    }

    /** What a process finds around it. */
    void surround(Map<String, String> environment) {
        environment.put("DISPLAY", named);
        environment.remove("WAYLAND_DISPLAY");
    }

    @Override
    public void close() {
        server.ifPresent(Process::destroy);
    }
}
