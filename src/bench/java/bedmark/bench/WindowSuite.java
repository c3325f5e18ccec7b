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
import java.util.stream.Collectors;
import java.util.stream.Stream;

/**
 * From the start of the virtual machine to a round that can be worked on, in a store of 5,000 surveys, against a bare
 * window with the same flags: each a process of its own with an archive of its own classes, turn by turn.
 */
final class WindowSuite implements Suite {
    private static final int SURVEYS = Integer.getInteger("bench.window.surveys", 5_000);
    private static final int TURNS = Integer.getInteger("bench.window.turns", 7);
    private static final List<String> FLAGS = List.of("-XX:TieredStopAtLevel=1", "-XX:+UseSerialGC",
            "-Dglass.platform=Monocle", "-Dmonocle.platform=Headless", "-Dprism.order=sw",
            "-Dheadless.geometry=1280x800-32", "-Xlog:disable");

    @Override
    public String name() {
        return "window";
    }

    @Override
    public List<Row> run() throws IOException, InterruptedException {
        try (BenchFolder folder = BenchFolder.make("start")) {
            Path store = folder.path().resolve("store");
            BenchStore.fill(store, SURVEYS);
            Program bare = Program.make(folder.path(), "bare");
            Program app = Program.make(folder.path(), "app", store.toString());
            double[] bares = new double[TURNS];
            double[] apps = new double[TURNS];
            double heap = 0;
            for (int turn = 0; turn < TURNS; turn++) {
                bares[turn] = bare.start().millis();
                Started started = app.start();
                apps[turn] = started.millis();
                heap = Math.max(heap, started.heap());
            }
            return List.of(
                    new Row(String.format("start to a round in a store of %d surveys (median %.0f ms), over a bare "
                            + "window (median %.0f ms)", SURVEYS, median(apps), median(bares)),
                            median(apps) / median(bares), "×", 2, true),
                    new Row("heap in use at the round", heap / (1 << 20), "MB", 120, true));
        }
    }

    private static double median(double[] values) {
        double[] sorted = values.clone();
        Arrays.sort(sorted);
        return sorted[sorted.length / 2];
    }

    /** What a program said of its start. */
    private record Started(double millis, double heap) {
    }

    /** A program with the archive of its classes. */
    private record Program(List<String> command) {

        static Program make(Path folder, String... arguments) throws IOException, InterruptedException {
            Path archive = folder.resolve(arguments[0] + ".jsa");
            Path classes = folder.resolve(arguments[0] + ".lst");
            String classpath = classpath(folder);
            run(command(List.of("-Xshare:off", "-XX:DumpLoadedClassList=" + classes), classpath, arguments));
            run(command(List.of("-Xshare:dump", "-XX:SharedClassListFile=" + classes,
                    "-XX:SharedArchiveFile=" + archive), classpath, arguments));
            return new Program(command(List.of("-XX:SharedArchiveFile=" + archive), classpath, arguments));
        }

        private static List<String> command(List<String> flags, String classpath, String... arguments) {
            List<String> command = new ArrayList<>();
            command.add(Path.of(System.getProperty("java.home"), "bin", "java").toString());
            command.addAll(FLAGS);
            command.addAll(flags);
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
            try (Stream<Path> libraries = Files.list(Path.of("target/bedmark/lib"))) {
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

        private static String run(List<String> command) throws IOException, InterruptedException {
            Process process = new ProcessBuilder(command).redirectErrorStream(true).start();
            String said = new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
            if (process.waitFor() != 0) {
                throw new IOException(said);
            }
            return said;
        }

        Started start() throws IOException, InterruptedException {
            String said = run(command);
            String[] parts = said.lines().filter(line -> line.startsWith("started ")).findFirst()
                    .orElseThrow(() -> new IOException(said)).split(" ");
            return new Started(Double.parseDouble(parts[1]), Double.parseDouble(parts[2]));
        }
    }
}
