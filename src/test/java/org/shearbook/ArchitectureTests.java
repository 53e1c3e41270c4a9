package org.shearbook;

import static com.tngtech.archunit.base.DescribedPredicate.not;
import static com.tngtech.archunit.core.domain.JavaClass.Predicates.resideInAnyPackage;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static org.assertj.core.api.Assertions.assertThat;

import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import java.time.Clock;
import java.time.Instant;
import java.time.LocalDate;
import java.time.LocalDateTime;
import java.time.OffsetDateTime;
import java.time.ZonedDateTime;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;
import org.shearbook.desk.ShearbookApplication;
import org.springframework.modulith.core.ApplicationModules;

/** The house, as a test: rooms, edges, a science without frameworks, one injected clock. */
class ArchitectureTests {

    private static final JavaClasses CLASSES = new ClassFileImporter()
            .withImportOption(ImportOption.Predefined.DO_NOT_INCLUDE_TESTS).importPackages("org.shearbook");

    /** What each room of the science may use; the desk's rooms declare theirs in package-info. */
    private static final Map<String, Set<String>> SCIENCE = Map.of(
            "profile", Set.of(),
            "decode", Set.of("profile"),
            "quality", Set.of("profile", "decode"),
            "richardson", Set.of("profile"),
            "taylorgoldstein", Set.of("profile", "richardson"),
            "billow", Set.of("profile", "richardson", "taylorgoldstein"),
            "score", Set.of());

    @Test
    void theRoomsUseOnlyWhatTheyDeclareAndNoCircleRunsThroughThem() {
        ApplicationModules.of(ShearbookApplication.class).verify();
    }

    @Test
    void everyRoomOfTheDeskDeclaresWhatItMayUse() {
        ApplicationModules.of(ShearbookApplication.class).stream()
                .filter(module -> module.getBasePackage().getName().startsWith("org.shearbook.desk"))
                .forEach(module -> assertThat(module.getBasePackage()
                        .getAnnotation(org.springframework.modulith.ApplicationModule.class)
                        .map(declared -> declared.allowedDependencies())
                        .filter(allowed -> !Set.of(allowed).contains(org.springframework.modulith.ApplicationModule.OPEN_TOKEN)))
                        .as("allowedDependencies of %s", module.getIdentifier()).isPresent());
    }

    @Test
    void theRoomsOfTheScienceUseOnlyTheirNeighbours() {
        Set<String> undeclared = new TreeSet<>();
        for (JavaClass from : CLASSES) {
            String room = scienceRoom(from);
            if (room == null) {
                continue;
            }
            from.getDirectDependenciesFromSelf().forEach(dependency -> {
                String to = scienceRoom(dependency.getTargetClass());
                if (to != null && !to.equals(room) && !SCIENCE.getOrDefault(room, Set.of()).contains(to)) {
                    undeclared.add(room + " -> " + to + " (" + dependency.getDescription() + ")");
                }
            });
        }
        assertThat(undeclared).isEmpty();
    }

    @Test
    void theScienceKnowsNoFrameworkNoFileAndNoDesk() {
        noClasses().that().resideInAPackage("org.shearbook.met..")
                .should().dependOnClassesThat(not(resideInAnyPackage("org.shearbook.met..", "java.lang..", "java.util..", "java.time..",
                        "java.math..", "java.text..", "java.nio", "java.nio.charset..", "java.io..", "org.apache.commons.math3..", "org.apache.commons.csv..", "org.jspecify..", "")))
                .check(CLASSES);
        noClasses().that().resideInAPackage("org.shearbook.met..")
                .should().dependOnClassesThat().haveFullyQualifiedName("java.io.File")
                .orShould().dependOnClassesThat().haveFullyQualifiedName("java.time.Clock")
                .orShould().dependOnClassesThat().resideInAPackage("java.util.logging..")
                .check(CLASSES);
    }

    @Test
    void nobodyAsksForTheTimeWithoutAClock() {
        noClasses().should().callMethod(Instant.class, "now")
                .orShould().callMethod(LocalDate.class, "now")
                .orShould().callMethod(LocalDateTime.class, "now")
                .orShould().callMethod(ZonedDateTime.class, "now")
                .orShould().callMethod(OffsetDateTime.class, "now")
                .orShould().callMethod(System.class, "currentTimeMillis")
                .check(CLASSES);
        noClasses().that().doNotHaveSimpleName("ClockOfTheDesk").and().doNotHaveSimpleName("DemonstrationClock")
                .should().callMethod(Clock.class, "systemUTC")
                .orShould().callMethod(Clock.class, "systemDefaultZone")
                .check(CLASSES);
    }

    private static String scienceRoom(JavaClass type) {
        String prefix = "org.shearbook.met.";
        String name = type.getPackageName();
        return name.startsWith(prefix) ? name.substring(prefix.length()).split("\\.")[0] : null;
    }
}
