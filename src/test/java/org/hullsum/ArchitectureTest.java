package org.hullsum;

import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.tngtech.archunit.base.DescribedPredicate;
import com.tngtech.archunit.core.domain.JavaAccess;
import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import com.tngtech.archunit.lang.syntax.ArchRuleDefinition;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;

/**
 * Holds the floors of the house: which package may import which, as a whitelist. A package that is
 * not in the table is refused, so that a new room has to be drawn here first.
 */
class ArchitectureTest {
  private static final String BASE = "org.hullsum.";

  /** Fewer classes than this and the test would be looking at nothing. */
  private static final int FEWEST_CLASSES = 60;

  /** What each package may import of ours besides itself. */
  private static final Map<String, Set<String>> MAY_IMPORT =
      Map.ofEntries(
          Map.entry("problem", Set.of()),
          Map.entry("numeric", Set.of()),
          Map.entry("quadrature", Set.of("numeric")),
          Map.entry("units", Set.of("numeric", "problem")),
          Map.entry("expression", Set.of("units", "numeric", "problem")),
          Map.entry("mesh", Set.of("numeric", "problem")),
          Map.entry("geometry", Set.of("expression", "numeric")),
          Map.entry("field", Set.of("expression", "units", "numeric", "problem")),
          Map.entry(
              "model",
              Set.of("field", "mesh", "geometry", "expression", "units", "numeric", "problem")),
          Map.entry("network", Set.of("numeric", "units", "problem")),
          Map.entry(
              "flux",
              Set.of(
                  "model",
                  "field",
                  "mesh",
                  "geometry",
                  "expression",
                  "quadrature",
                  "units",
                  "numeric",
                  "problem")),
          Map.entry("closure", Set.of("geometry", "mesh", "numeric", "problem")),
          Map.entry(
              "audit",
              Set.of(
                  "network",
                  "flux",
                  "closure",
                  "model",
                  "field",
                  "mesh",
                  "geometry",
                  "expression",
                  "quadrature",
                  "units",
                  "numeric",
                  "problem")),
          Map.entry("report", Set.of("audit", "model", "units", "numeric", "problem")),
          Map.entry(
              "casefile",
              Set.of(
                  "model",
                  "field",
                  "mesh",
                  "geometry",
                  "expression",
                  "quadrature",
                  "units",
                  "numeric",
                  "problem")),
          Map.entry(
              "cli",
              Set.of(
                  "report",
                  "casefile",
                  "audit",
                  "network",
                  "flux",
                  "closure",
                  "model",
                  "field",
                  "mesh",
                  "geometry",
                  "expression",
                  "quadrature",
                  "units",
                  "numeric",
                  "problem")));

  private static JavaClasses classes;

  @BeforeAll
  static void readClasses() {
    classes =
        new ClassFileImporter()
            .withImportOption(ImportOption.Predefined.DO_NOT_INCLUDE_TESTS)
            .importPackages("org.hullsum");
  }

  @Test
  void thereAreClassesToLookAt() {
    assertTrue(classes.size() >= FEWEST_CLASSES, "only " + classes.size() + " classes were read");
  }

  @Test
  void everyClassStandsInAPackageOfTheTable() {
    Set<String> rooms =
        classes.stream()
            .map(JavaClass::getPackageName)
            .map(ArchitectureTest::room)
            .collect(Collectors.toCollection(TreeSet::new));
    rooms.removeAll(MAY_IMPORT.keySet());
    assertEquals(Set.of(), rooms, "packages that the table does not know");
  }

  @Test
  void everyPackageImportsOnlyWhatItsRowAllows() {
    List<String> broken =
        classes.stream()
            .flatMap(c -> c.getDirectDependenciesFromSelf().stream())
            .filter(d -> d.getTargetClass().getPackageName().startsWith(BASE))
            .filter(
                d -> {
                  String from = room(d.getOriginClass().getPackageName());
                  String to = room(d.getTargetClass().getPackageName());
                  return !from.equals(to) && !MAY_IMPORT.getOrDefault(from, Set.of()).contains(to);
                })
            .map(d -> d.getOriginClass().getName() + " imports " + d.getTargetClass().getName())
            .distinct()
            .sorted()
            .toList();
    assertEquals(List.of(), broken);
  }

  @Test
  void packagesFormNoCycle() {
    slices().matching("org.hullsum.(*)..").should().beFreeOfCycles().check(classes);
  }

  @Test
  void standardStreamsAndExitAreTouchedOnlyInTheCommandLine() {
    DescribedPredicate<JavaAccess<?>> process =
        DescribedPredicate.describe(
            "reach a standard stream, the console or the end of the process",
            access ->
                access.getTargetOwner().isEquivalentTo(System.class)
                        && Set.of("out", "err", "in", "exit", "console", "setOut", "setErr")
                            .contains(access.getTarget().getName())
                    || access.getTargetOwner().isEquivalentTo(Runtime.class)
                        && Set.of("exit", "halt").contains(access.getTarget().getName())
                    || access.getTarget().getName().equals("printStackTrace"));
    ArchRuleDefinition.noClasses()
        .that()
        .resideOutsideOfPackage("org.hullsum.cli..")
        .should()
        .accessTargetWhere(process)
        .check(classes);
  }

  private static String room(String packageName) {
    String rest = packageName.substring(BASE.length() - 1);
    return rest.isEmpty() ? "(base)" : rest.substring(1).split("\\.", 2)[0];
  }
}
