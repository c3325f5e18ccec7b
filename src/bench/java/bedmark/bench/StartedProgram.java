package bedmark.bench;

import java.io.IOException;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.jar.JarEntry;
import java.util.jar.JarOutputStream;
import java.util.regex.MatchResult;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/**
 * A program with the archive of its classes, to be started again and again with the flags of the launcher.
 *
 * @param command starts it
 */
record StartedProgram(List<String> command, BenchDisplay display) {
    private static final Path LAUNCHED = Path.of("target/bedmark");
    private static final Pattern FLAG = Pattern.compile("-XX:\\S+");

    /**
     * What a program said of its start.
     *
     * @param millis     from the start of the virtual machine
     * @param busyMillis that all its threads were busy on a processor
     * @param heap       bytes in use
     */
    record Started(double millis, double busyMillis, double heap) {
    }

    /**
     * Makes the archive.
     *
     * @param home      the person's home, with the store that a program without arguments opens
     * @param arguments of {@link StartProbe}
     */
    static StartedProgram make(Path home, BenchDisplay display, String... arguments)
            throws IOException, InterruptedException {
        Path archive = home.resolve(String.join("-", arguments) + ".jsa");
        Path classes = home.resolve(String.join("-", arguments) + ".lst");
        String classpath = classpath(home);
        List<String> flags = flags(home, display);
        run(command(flags, List.of("-Xshare:off", "-XX:DumpLoadedClassList=" + classes), classpath, arguments),
                display);
        run(command(flags, List.of("-Xshare:dump", "-XX:SharedClassListFile=" + classes,
                "-XX:SharedArchiveFile=" + archive), classpath, arguments), display);
        return new StartedProgram(command(flags, List.of("-XX:SharedArchiveFile=" + archive), classpath, arguments),
                display);
    }

    /** The options that the launcher starts the program with. */
    static List<String> launcherOptions() throws IOException {
        return FLAG.matcher(Files.readString(LAUNCHED.resolve("bin/bedmark"))).results().map(MatchResult::group)
                .toList();
    }

    private static List<String> flags(Path home, BenchDisplay display) throws IOException {
        List<String> flags = new ArrayList<>(launcherOptions());
        flags.addAll(List.of("-Xlog:disable", "-Dfile.encoding=UTF-8", "-Duser.home=" + home,
                "-Dbedmark.home=" + LAUNCHED.toAbsolutePath()));
        flags.addAll(display.flags());
        return flags;
    }

    private static List<String> command(List<String> flags, List<String> sharing, String classpath,
                                        String... arguments) {
        List<String> command = new ArrayList<>();
        command.add(Path.of(System.getProperty("java.home"), "bin", "java").toString());
        command.addAll(flags);
        command.addAll(sharing);
        command.addAll(List.of("-cp", classpath, StartProbe.class.getName()));
        command.addAll(List.of(arguments));
        return command;
    }

    /** Jars only, since the archive holds no class from a folder: the packaged program, and what starts it here. */
    private static String classpath(Path folder) throws IOException {
        Path probe = folder.resolve("probe.jar");
        if (!Files.exists(probe)) {
            pack(probe);
        }
        try (Stream<Path> libraries = Files.list(LAUNCHED.resolve("lib"))) {
            return Stream.concat(Stream.of(probe), Stream.concat(
                            libraries.filter(file -> file.toString().endsWith(".jar")).sorted(),
                            Arrays.stream(System.getProperty("java.class.path").split(java.io.File.pathSeparator))
                                    .filter(entry -> entry.contains("monocle")).map(Path::of)))
                    .map(file -> file.toAbsolutePath().toString())
                    .collect(Collectors.joining(java.io.File.pathSeparator));
        }
    }

    private static void pack(Path jar) throws IOException {
        Path classes = Path.of("target/test-classes");
        try (OutputStream file = Files.newOutputStream(jar); JarOutputStream out = new JarOutputStream(file);
             Stream<Path> probes = Files.list(classes.resolve("bedmark/bench"))) {
            for (Path each : probes.filter(path -> path.getFileName().toString().startsWith("StartProbe"))
                    .sorted().toList()) {
                out.putNextEntry(new JarEntry(classes.relativize(each).toString().replace('\\', '/')));
                Files.copy(each, out);
                out.closeEntry();
            }
        }
    }

    private static String run(List<String> command, BenchDisplay display) throws IOException, InterruptedException {
        ProcessBuilder builder = new ProcessBuilder(command).redirectErrorStream(true);
        display.surround(builder.environment());
        Process process = builder.start();
        String said = new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
        if (process.waitFor() != 0) {
            throw new IOException(said);
        }
        return said;
    }

    Started start() throws IOException, InterruptedException {
        String said = run(command, display);
        String[] parts = said.lines().filter(line -> line.startsWith("started ")).findFirst()
                .orElseThrow(() -> new IOException(said)).split(" ");
        return new Started(Double.parseDouble(parts[1]), Double.parseDouble(parts[2]), Double.parseDouble(parts[3]));
    }
}
