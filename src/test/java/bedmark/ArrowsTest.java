package bedmark;

import static com.tngtech.archunit.core.domain.JavaClass.Predicates.resideInAPackage;
import static com.tngtech.archunit.core.domain.JavaClass.Predicates.resideInAnyPackage;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;
import static org.junit.jupiter.api.Assertions.assertEquals;

import com.tngtech.archunit.base.DescribedPredicate;
import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import com.tngtech.archunit.lang.ArchRule;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;

/** Holds the arrows between the packages: who may know whom. */
class ArrowsTest {
    private static final JavaClasses CODE = new ClassFileImporter()
            .withImportOption(ImportOption.Predefined.DO_NOT_INCLUDE_TESTS).importPackages("bedmark");

    /** Each package with the packages of ours that it may see. */
    private static final Map<String, List<String>> MAY_SEE = new TreeMap<>(Map.ofEntries(
            Map.entry("quantity", List.of()),
            Map.entry("words", List.of()),
            Map.entry("diary", List.of()),
            Map.entry("engine", List.of()),
            Map.entry("document", List.of("quantity")),
            Map.entry("form", List.of("quantity", "document")),
            Map.entry("survey", List.of("quantity", "document", "form", "engine")),
            Map.entry("json", List.of("quantity", "document", "form", "engine", "survey")),
            Map.entry("wording", List.of("quantity", "words", "document", "engine", "form", "survey", "picture")),
            Map.entry("vault", List.of("document", "json")),
            Map.entry("journal", List.of("document", "survey", "json", "vault")),
            Map.entry("index", List.of("quantity", "document", "engine", "survey", "json", "journal",
                    "vault")),
            Map.entry("picture", List.of("quantity", "document", "engine", "survey")),
            Map.entry("pack", List.of("quantity", "document", "survey", "json", "journal")),
            Map.entry("dispatch", List.of("document", "engine", "survey", "json", "journal", "index", "pack")),
            Map.entry("photo", List.of("document", "pack")),
            Map.entry("office", List.of("quantity", "document", "engine", "form", "survey", "json", "journal", "index",
                    "pack")),
            Map.entry("report", List.of("quantity", "words", "document", "engine", "form", "survey", "json", "journal",
                    "index", "picture", "pack", "office", "wording"))));

    /** The two that people meet see all of the rooms, but not each other. */
    private static final List<String> FRONTS = List.of("screen", "command");

    static {
        List<String> rooms = List.copyOf(MAY_SEE.keySet());
        FRONTS.forEach(front -> MAY_SEE.put(front, rooms));
    }

    @TestFactory
    Stream<DynamicTest> eachPackageSeesOnlyThoseBelowIt() {
        return MAY_SEE.entrySet().stream().map(arrow -> DynamicTest.dynamicTest(arrow.getKey(), () -> {
            String[] allowed = Stream.concat(Stream.of(arrow.getKey()), arrow.getValue().stream())
                    .map(name -> "bedmark." + name + "..").toArray(String[]::new);
            DescribedPredicate<JavaClass> foreign = resideInAPackage("bedmark..")
                    .and(DescribedPredicate.not(resideInAnyPackage(allowed)));
            check(noClasses().that().resideInAPackage("bedmark." + arrow.getKey() + "..")
                    .should().dependOnClassesThat(foreign)
                    .because("arrows point one way, so that each room can be understood and changed alone"));
        }));
    }

    @Test
    void everyPackageHasItsArrows() {
        check(classes().that().resideOutsideOfPackage("bedmark").should().resideInAnyPackage(
                MAY_SEE.keySet().stream().map(name -> "bedmark." + name + "..").toArray(String[]::new))
                .because("a package without a rule is a package that sees everything"));
    }

    @Test
    void domainKnowsNoScreenNoDatabaseNoFileNoClock() {
        check(noClasses().that().resideInAnyPackage("bedmark.quantity..", "bedmark.engine..", "bedmark.form..",
                        "bedmark.survey..", "bedmark.document..", "bedmark.picture..")
                .should().dependOnClassesThat(resideInAnyPackage("javafx..", "java.sql..", "com.fasterxml..",
                        "java.nio.file..", "java.io.."))
                .because("the domain is the same on a tablet, in a command and in a test"));
        check(noClasses().that().resideInAnyPackage("bedmark.quantity..", "bedmark.engine..", "bedmark.form..",
                        "bedmark.survey..", "bedmark.document..", "bedmark.picture..")
                .should().dependOnClassesThat().haveFullyQualifiedName("java.time.Clock")
                .orShould().callMethod(java.time.OffsetDateTime.class, "now")
                .orShould().callMethod(java.time.Instant.class, "now")
                .orShould().callMethod(System.class, "currentTimeMillis")
                .orShould().callMethod(System.class, "nanoTime")
                .because("a survey judged today is judged the same tomorrow"));
    }

    @Test
    void onlyTheIndexKnowsSql() {
        check(noClasses().that().resideOutsideOfPackage("bedmark.index..")
                .should().dependOnClassesThat(resideInAnyPackage("java.sql..", "javax.sql..", "org.h2..",
                        "org.flywaydb..", "org.postgresql.."))
                .because("the database is an index that can be thrown away"));
    }

    @Test
    void onlyJsonKnowsTheJsonLibrary() {
        check(noClasses().that().resideOutsideOfPackage("bedmark.json..")
                .should().dependOnClassesThat(resideInAnyPackage("com.fasterxml..", "com.networknt.."))
                .because("documents are neutral trees everywhere else"));
    }

    @Test
    void onlyTheReportKnowsThePdfLibrary() {
        check(noClasses().that().resideOutsideOfPackage("bedmark.report..")
                .should().dependOnClassesThat(resideInAnyPackage("org.apache.pdfbox..", "org.apache.fontbox.."))
                .because("a page is drawn in one place, so that every one of them is tagged and has its faces"));
    }

    @Test
    void onlyCommandsWriteToTheStandardStreams() {
        check(noClasses().that().resideOutsideOfPackages("bedmark.command..", "bedmark")
                .should().accessField(System.class, "out")
                .orShould().accessField(System.class, "err")
                .orShould().accessField(System.class, "in")
                .because("what is printed there is an interface that scripts rely on"));
    }

    @Test
    void dragMethodsDoNotKnowEachOther() {
        String drag = "bedmark.engine.drag";
        List<String> seen = CODE.stream().filter(method -> method.getPackageName().equals(drag))
                .flatMap(method -> method.getDirectDependenciesFromSelf().stream()
                        .map(dependency -> dependency.getTargetClass().getBaseComponentType())
                        .filter(target -> target.getPackageName().equals(drag) && !target.equals(method)))
                .map(JavaClass::getName).toList();
        assertEquals(List.of(), seen, "methods are compared side by side, never built upon each other");
        assertEquals(5, CODE.stream().filter(method -> method.getPackageName().equals(drag)
                && !method.getSimpleName().equals("package-info")).count(), "four methods and their names");
    }

    @Test
    void modelsKnowNoScene() {
        check(noClasses().that().resideInAPackage("bedmark.screen..").and().haveSimpleNameEndingWith("Model")
                .should().dependOnClassesThat(resideInAnyPackage("javafx.scene..", "javafx.stage.."))
                .because("a view binds and a model decides, so that what it decides is tested without a window"));
    }

    @Test
    void packagesHaveNoCycles() {
        check(slices().matching("bedmark.(*)..").should().beFreeOfCycles()
                .because("a cycle makes two rooms one"));
    }

    private static void check(ArchRule rule) {
        rule.check(CODE);
    }
}
