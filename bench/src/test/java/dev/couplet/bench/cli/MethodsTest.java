package dev.couplet.bench.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.stream.Stream;
import java.util.stream.StreamSupport;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

class MethodsTest {
  private static final String INSTANCE = "seeded:16:60:5";

  static Stream<String> names() {
    return StreamSupport.stream(new Methods.Names().spliterator(), false);
  }

  /** Sixteen bits, so that a walk over all states says what is to be found. */
  @ParameterizedTest
  @MethodSource("names")
  void everyMethodFindsTheBestOfASmallInstance(String name) {
    CommandRun all = CommandRun.of("solve", INSTANCE, "--method", "enumeration");
    String best = all.row().get("value");
    CommandRun run =
        CommandRun.of("solve", INSTANCE, "--method", name, "--target", best, "--seconds", "20");
    assertEquals(0, run.status(), run.toString());
    assertEquals(best, run.row().get("value"));
    assertEquals(name, run.row().get("method"));
    assertTrue(run.number("bound") >= run.number("value"), run.toString());
  }

  @ParameterizedTest
  @ValueSource(strings = {"solver", "enumeration", "elimination", "branch"})
  void exactMethodsProveIt(String name) {
    CommandRun run = CommandRun.of("solve", INSTANCE, "--method", name, "--seconds", "20");
    assertEquals(0, run.status());
    assertEquals("optimal", run.row().get("proof"), run.toString());
    assertEquals("0", run.row().get("gap"));
  }

  @Test
  void theStandardMethodIsTheFirst() {
    assertEquals(Methods.STANDARD, names().findFirst().orElseThrow());
  }
}
