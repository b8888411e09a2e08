package dev.couplet.bench.architecture;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import dev.couplet.anneal.Annealing;
import dev.couplet.bench.instances.Instance;
import dev.couplet.form.Qubo;
import dev.couplet.host.Host;
import java.util.List;
import org.junit.jupiter.api.Test;

/** The design's rules, over the main classes of every module below this one and of its own. */
class ArchitectureTest {
  /** Fewer than this were not all the classes: a module is missing from the class path. */
  private static final int AT_LEAST = 180;

  private static final int MOST_PUBLIC_TYPES = 45;

  private static final Rules RULES = new Rules("dev.couplet");

  private static final JavaClasses ALL =
      new ClassFileImporter()
          .withImportOption(new ImportOption.DoNotIncludeTests())
          .withImportOption(location -> !location.contains("jmh_generated"))
          .importPackages("dev.couplet");

  @Test
  void allClassesWereRead() {
    assertTrue(ALL.size() >= AT_LEAST, ALL.size() + " classes were read");
    for (Class<?> one : List.of(Qubo.class, Host.class, Annealing.class, Instance.class)) {
      assertTrue(ALL.contain(one), "the module of " + one + " is missing");
    }
    assertTrue(!ALL.contain(ArchitectureTest.class), "tests were read");
  }

  @Test
  void everyClassStandsInARoomOfTheDesign() {
    assertEquals(List.of(), RULES.knownRooms(ALL));
  }

  @Test
  void roomsImportAlongTheArrows() {
    assertEquals(List.of(), RULES.arrows(ALL));
  }

  @Test
  void packagesFormNoCycle() {
    assertEquals(List.of(), RULES.packageCycles(ALL));
  }

  @Test
  void apiNeedsNoLibrary() {
    assertEquals(List.of(), RULES.apiAlone(ALL));
  }

  @Test
  void onlyProgramsPrint() {
    assertEquals(List.of(), RULES.printing(ALL));
  }

  @Test
  void randomNumbersComeFromSeeds() {
    assertEquals(List.of(), RULES.randomness(ALL));
  }

  @Test
  void nothingIsSerializable() {
    assertEquals(List.of(), RULES.serialisation(ALL));
  }

  @Test
  void everyPackageIsNullMarked() {
    assertEquals(List.of(), RULES.packagesNotNullMarked(ALL));
  }

  @Test
  void thePublicSurfaceOfApiIsSmall() {
    List<String> types = RULES.publicApi(ALL);
    assertTrue(types.size() <= MOST_PUBLIC_TYPES, types.size() + " public types: " + types);
    assertTrue(types.contains("dev.couplet.form.Qubo"), types.toString());
  }
}
