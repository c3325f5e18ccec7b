package bedmark.engine;

import static com.tngtech.archunit.core.domain.JavaClass.Predicates.resideInAPackage;
import static com.tngtech.archunit.core.domain.JavaClass.Predicates.resideOutsideOfPackages;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;
import static org.junit.jupiter.api.Assertions.assertEquals;

import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.domain.JavaModifier;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Holds what the engine may know: nothing but the language, and its parts nothing of the whole. */
class EngineArrowsTest {
    private static final JavaClasses ENGINE = new ClassFileImporter()
            .withImportOption(ImportOption.Predefined.DO_NOT_INCLUDE_TESTS).importPackages("bedmark.engine");

    @Test
    void theEngineKnowsNothingButTheLanguage() {
        noClasses().should().dependOnClassesThat(resideOutsideOfPackages("bedmark.engine..", "java.lang..",
                        "java.util.."))
                .because("a formula is the same on every device, at every time, in every language").check(ENGINE);
        noClasses().should().dependOnClassesThat().haveFullyQualifiedName("java.util.Locale")
                .because("the engine speaks in numbers and codes").check(ENGINE);
    }

    @Test
    void theFormulasDoNotKnowWhoAsks() {
        noClasses().that().resideInAPackage("bedmark.engine.*..")
                .should().dependOnClassesThat(resideInAPackage("bedmark.engine"))
                .because("a formula can be read and tested alone").check(ENGINE);
        slices().matching("bedmark.engine.(*)..").should().beFreeOfCycles().check(ENGINE);
    }

    @Test
    void nothingInTheEngineChangesOnceItIsMade() {
        classes().that().areNotAssignableTo(Enum.class).and().doNotHaveSimpleName("Tape")
                .should().haveOnlyFinalFields()
                .because("an assessment is a function of what goes in").check(ENGINE);
        assertEquals(List.of(), ENGINE.stream().flatMap(owner -> owner.getFields().stream())
                .filter(field -> field.getModifiers().contains(JavaModifier.STATIC)
                        && !field.getModifiers().contains(JavaModifier.FINAL)).toList());
    }
}
