package dev.couplet.bench.instances;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.bench.instances.PublishedData.Published;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.model.Statement.Sense;
import java.io.IOException;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Reads every published file of the kinds there are. */
class PublishedFilesTest {
  @ParameterizedTest
  @ValueSource(strings = {"bqp", "gset", "be", "torus"})
  void everyFileIsToldByItsContentAndRead(String family) throws IOException {
    List<Published> rows = PublishedData.of(family);
    assertFalse(rows.isEmpty());
    for (Published row : rows) {
      Instance.OfForm instance = InstanceReader.standard().readForm(row.path());
      assertEquals(row.name(), instance.name());
      assertEquals(row.size(), instance.form().size(), row.name());
      assertEquals(Sense.MAXIMIZE, instance.sense());
      assertTrue(instance.form().exact(), row.name());
    }
  }

  /** G48 is a bipartite torus: all its 6000 edges can be cut (Helmberg and Rendl 2000). */
  @Test
  void theBipartiteGraphIsCutWhole() throws IOException {
    Published row =
        PublishedData.of("gset").stream()
            .filter(r -> r.name().equals("G48"))
            .findFirst()
            .orElseThrow();
    Instance.OfForm instance = InstanceReader.standard().readForm(row.path());
    State sides = twoColours(instance.form());
    assertEquals(row.best(), instance.value(instance.form().value(sides)));
    assertEquals(6000, instance.form().pairs());
  }

  @ParameterizedTest
  @CsvSource({"tsp, tsp", "qap, qap", "gap, gap", "mknap, knapsack", "jobshop, jobshop"})
  void everyFileWithRulesIsToldByItsContent(String family, String kind) throws IOException {
    List<Published> rows = PublishedData.of(family);
    assertFalse(rows.isEmpty());
    for (Published row : rows) {
      assertEquals(Optional.of(kind), InstanceReader.kindOf(row.path()), row.name());
    }
  }

  /** A graph says nothing of what is sought. */
  @ParameterizedTest
  @ValueSource(strings = {"clique", "colour"})
  void whatIsSoughtOfAGraphMustBeSaid(String family) {
    for (Published row : PublishedData.of(family)) {
      IllegalArgumentException fault =
          assertThrows(
              IllegalArgumentException.class, () -> InstanceReader.standard().read(row.path()));
      assertTrue(fault.getMessage().endsWith("say --as, one of colour:K, clique"), row.name());
    }
  }

  /** Walks along the pairs, giving each new variable the other value than where it came from. */
  private static State twoColours(Qubo form) {
    boolean[] value = new boolean[form.size()];
    boolean[] seen = new boolean[form.size()];
    for (boolean changed = true; changed; ) {
      changed = spread(form, value, seen);
      for (int i = 0; i < seen.length && !changed; i++) {
        changed = !seen[i];
        seen[i] = true;
      }
    }
    return State.of(value);
  }

  private static boolean spread(Qubo form, boolean[] value, boolean[] seen) {
    boolean[] changed = {false};
    form.forEachPair(
        (i, j, ignored) -> {
          if (seen[i] != seen[j]) {
            value[seen[i] ? j : i] = !value[seen[i] ? i : j];
            seen[i] = true;
            seen[j] = true;
            changed[0] = true;
          }
        });
    return changed[0];
  }
}
