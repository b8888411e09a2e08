package dev.couplet.bench.instances;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.bench.instances.PublishedData.Published;
import dev.couplet.exact.plans.PlanSearch;
import dev.couplet.exact.plans.PlanSearch.Found;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Watch;
import java.io.IOException;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

/**
 * Published instances with rules, proved by branching over their decisions within so many nodes:
 * the same nodes on every machine.
 *
 * <p>Values: the data folder's table; Cattrysse, Salomon and Van Wassenhove 1994, Petersen 1967,
 * Johnson and Trick 1996.
 */
class ProvedModelsTest {
  private static final PlanSearch SEARCH = PlanSearch.standard().nodes(100_000);

  private static Found search(Published row, InstanceReader reader) throws IOException {
    Instance instance = reader.read(row.path());
    var model = assertInstanceOf(Instance.OfModel.class, instance);
    return SEARCH.search(model.statement(), Optional.empty(), Effort.draws(1), Watch.none());
  }

  private static void proves(Published row, double value, Found found) {
    assertTrue(found.complete(), row.name() + " after " + found.nodes() + " nodes");
    assertEquals(value, found.best().orElseThrow().value(), 1e-9, row.name());
    assertEquals(value, found.bound(), 1e-9, row.name());
  }

  private static InstanceReader itemOf(Published row) {
    return InstanceReader.standard().item(row.name().charAt(row.name().length() - 1) - '0');
  }

  @Test
  void generalisedAssignmentsAndKnapsacks() throws IOException {
    for (String family : List.of("gap", "mknap")) {
      for (Published row : PublishedData.of(family)) {
        proves(row, row.best(), search(row, itemOf(row)));
      }
    }
  }

  @Test
  void cliques() throws IOException {
    List<String> small = List.of("johnson8-2-4", "hamming6-2", "hamming6-4", "MANN_a9");
    for (Published row : PublishedData.of("clique")) {
      if (small.contains(row.name())) {
        proves(row, row.best(), search(row, InstanceReader.standard().as("clique")));
      }
    }
  }

  /** A colouring with the chromatic number is found, and one colour fewer refuted. */
  @Test
  void colourings() throws IOException {
    for (Published row : PublishedData.of("colour")) {
      int colours = (int) row.best();
      proves(row, 0, search(row, InstanceReader.standard().as("colour:" + colours)));
      Found fewer = search(row, InstanceReader.standard().as("colour:" + (colours - 1)));
      assertTrue(fewer.complete(), row.name() + " after " + fewer.nodes() + " nodes");
      assertTrue(fewer.best().isEmpty(), row.name());
    }
  }
}
