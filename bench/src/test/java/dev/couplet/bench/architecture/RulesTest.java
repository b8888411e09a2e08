package dev.couplet.bench.architecture;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Every rule finds the class that was written to break it, and no class written to keep it. */
class RulesTest {
  private static final String ROOT = RulesTest.class.getPackageName() + ".bad";
  private static final Rules RULES = new Rules(ROOT);
  private static final JavaClasses BAD = new ClassFileImporter().importPackages(ROOT);

  @Test
  void arrows() {
    onlyFinds(RULES.arrows(BAD), "form.Backward");
  }

  @Test
  void rooms() {
    onlyFinds(RULES.knownRooms(BAD), "spare.Homeless");
  }

  @Test
  void cycles() {
    List<String> found = RULES.packageCycles(BAD);
    assertEquals(1, found.size(), found.toString());
    assertTrue(found.get(0).contains("Slice form") && found.get(0).contains("Slice sampling"));
  }

  @Test
  void libraries() {
    onlyFinds(RULES.apiAlone(BAD), "form.Dependent");
  }

  @Test
  void printing() {
    onlyFinds(RULES.printing(BAD), "form.Loud");
    assertEquals(3, RULES.printing(BAD).size(), "out, err and the stack trace");
  }

  @Test
  void randomness() {
    onlyFinds(RULES.randomness(BAD), "form.Chancy");
    for (String way :
        List.of(
            "java.util.Random",
            "ThreadLocalRandom",
            "Math.random()",
            "StrictMath.random()",
            "shuffle")) {
      assertTrue(RULES.randomness(BAD).stream().anyMatch(line -> line.contains(way)), way);
    }
  }

  @Test
  void serialisation() {
    onlyFinds(RULES.serialisation(BAD), "form.Frozen>");
  }

  @Test
  void nullMarks() {
    assertEquals(List.of(ROOT + ".form", ROOT + ".spare"), RULES.packagesNotNullMarked(BAD));
  }

  @Test
  void publicTypes() {
    assertEquals(
        List.of(ROOT + ".form.Backward", ROOT + ".sampling.Forward"), RULES.publicApi(BAD));
  }

  private static void onlyFinds(List<String> found, String type) {
    assertTrue(!found.isEmpty(), "the rule does not bite");
    for (String line : found) {
      assertTrue(line.contains(ROOT + "." + type), line);
    }
  }
}
