package dev.couplet.embed.template;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.embed.BranchSet;
import dev.couplet.embed.Embedder;
import dev.couplet.embed.EmbedderAudit;
import dev.couplet.embed.Embedding;
import dev.couplet.embed.Fit;
import dev.couplet.embed.Guest;
import dev.couplet.embed.Guests;
import dev.couplet.embed.PlainValidator;
import dev.couplet.host.Cells;
import dev.couplet.host.Faults;
import dev.couplet.host.Host;
import dev.couplet.sampling.Effort;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class TemplateEmbedderTest {
  private final Embedder templates = TemplateEmbedder.standard();

  @Test
  void keepsThePromisesOfEmbedders() {
    EmbedderAudit.of(templates).orThrow();
  }

  /** Published for ell-shaped sets: t m (m + 1) vertices in t m sets of m + 1. */
  @ParameterizedTest
  @CsvSource({"4,10,40,440,11", "4,18,72,1368,19", "4,1,4,8,2", "3,5,15,90,6", "1,4,4,20,5"})
  void cliquesOnCellsHaveEvenSets(int side, int cells, int guest, int total, int each) {
    Embedding embedding = fit(Guests.complete(guest), Host.cells(side, cells, cells));
    assertEquals(total, embedding.total());
    assertTrue(embedding.sets().stream().mapToInt(BranchSet::size).allMatch(s -> s == each));
  }

  @Test
  void onlyAsManyCellsAreUsedAsNeeded() {
    Embedding embedding = fit(Guests.complete(10), Host.cells(4, 5, 9));
    assertEquals(10 * 4, embedding.total());
  }

  /** Published: one more than t m fits, confirmed by construction for m = 1..8 and t = 4. */
  @ParameterizedTest
  @CsvSource({"4,1", "4,2", "4,3", "4,4", "4,5", "4,6", "4,7", "4,8", "1,1", "1,6", "2,3"})
  void oneMoreFitsAndNoMore(int side, int cells) {
    int most = side * cells + 1;
    Host host = Host.cells(side, cells, cells + 1);
    assertEquals(most, fit(Guests.complete(most), host).sets().size());
    Fit tooMany = templates.embed(Guests.complete(most + 1), host, Effort.draws(1));
    assertInstanceOf(Fit.Impossible.class, tooMany);
  }

  /** Published for the king's lattice: L + 1 vertices on L by L. */
  @ParameterizedTest
  @CsvSource({"2,2", "3,3", "4,4", "5,5", "8,8", "13,13", "20,20", "4,7", "7,4", "6,5", "5,6"})
  void cliquesOnKingsLattices(int rows, int columns) {
    int most = Math.min(rows, columns) + 1;
    Host host = Host.king(rows, columns);
    for (int n = 1; n <= most; n++) {
      Embedding embedding = fit(Guests.complete(n), host);
      assertTrue(embedding.longest() <= most - 1, embedding.toString());
    }
  }

  @Test
  void aLineOfAKingsLatticeCarriesAnEdge() {
    assertEquals(2, fit(Guests.complete(2), Host.king(1, 5)).total());
    assertEquals(2, fit(Guests.complete(2), Host.king(5, 1)).total());
    assertEquals(1, fit(Guests.complete(1), Host.king(1, 1)).total());
  }

  @Test
  void faultsAreAvoidedByMoving() {
    Cells cells = new Cells(4, 6, 6);
    Host whole = Host.of(cells);
    Host host =
        whole.without(
            Faults.vertices(cells.upright(2, 2, 0))
                .edge(cells.level(2, 3, 1), cells.level(2, 4, 1)));
    Embedding embedding = fit(Guests.complete(12), host);
    assertEquals(12 * 4, embedding.total());
    assertEquals(20 * 6, fit(Guests.complete(20), host).total());
    Fit none = templates.embed(Guests.complete(24), host, Effort.draws(1));
    assertFalse(none.fits());
    assertInstanceOf(Fit.NotFound.class, none);
  }

  @Test
  void sparseGuestsFitAsIfComplete() {
    Guest guest = Guests.random(30, 0.1, 4);
    Embedding embedding = fit(guest, Host.cells(4, 8, 8));
    assertEquals(30 * 9, embedding.total());
    Embedding trimmed = embedding.trimmed();
    assertEquals(List.of(), PlainValidator.faults(trimmed));
    assertTrue(trimmed.total() < 200, trimmed.toString());
  }

  @Test
  void hostsWithoutAPatternAreLeftAlone() {
    Fit fit = templates.embed(Guests.complete(4), Host.square(5, 5), Effort.draws(1));
    assertInstanceOf(Fit.NotFound.class, fit);
  }

  private Embedding fit(Guest guest, Host host) {
    Embedding embedding = templates.embed(guest, host, Effort.draws(1)).orThrow();
    assertEquals(List.of(), PlainValidator.faults(embedding));
    return embedding;
  }
}
