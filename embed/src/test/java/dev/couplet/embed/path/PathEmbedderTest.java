package dev.couplet.embed.path;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.embed.Embedder;
import dev.couplet.embed.EmbedderAudit;
import dev.couplet.embed.Embedding;
import dev.couplet.embed.Fit;
import dev.couplet.embed.Guest;
import dev.couplet.embed.Guests;
import dev.couplet.embed.PlainValidator;
import dev.couplet.host.Faults;
import dev.couplet.host.Host;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Watch;
import dev.couplet.sampling.Watch.StopSignal;
import java.time.Duration;
import java.util.List;
import java.util.concurrent.atomic.AtomicLong;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class PathEmbedderTest {
  private final Embedder paths = PathEmbedder.standard();

  @Test
  void keepsThePromisesOfEmbedders() {
    EmbedderAudit.of(paths).orThrow();
  }

  /** Four host vertices: common practice. */
  @Test
  void aTriangleInACellTakesFourVertices() {
    Embedding embedding = fit(Guests.complete(3), Host.cells(4, 1, 1), Effort.draws(1));
    assertEquals(4, embedding.total());
    assertEquals(2, embedding.longest());
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5})
  void completeSixteenFitsWithinTenSeconds(long seed) {
    Embedding embedding =
        fit(Guests.complete(16), Host.cells(4, 8, 8), within(10).seed(seed).sweeps(60));
    assertTrue(embedding.longest() <= 12, embedding.toString());
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5})
  void hundredVerticesOfDegreeThreeFitWithinTenSeconds(long seed) {
    Embedding embedding = fit(Guests.regular(3, 100, seed), Host.cells(4, 8, 8), within(10));
    assertTrue(embedding.longest() <= 12, embedding.toString());
  }

  @Test
  void aSparseRandomGuestFitsWithinTwentySeconds() {
    Guest guest = Guests.random(60, 0.1, 1);
    Embedding first = fit(guest, Host.cells(4, 18, 18), within(20).target(1000));
    Embedding shorter = fit(guest, Host.cells(4, 18, 18), Effort.draws(1).sweeps(60));
    assertTrue(shorter.total() <= first.total(), first + ", " + shorter);
  }

  @Test
  void faultsAreGoneAround() {
    Host whole = Host.cells(4, 8, 8);
    Host host = whole.without(Faults.seeded(whole, 0.05, 0.02, 3));
    assertTrue(fit(Guests.complete(14), host, Effort.draws(2).sweeps(60)).total() >= 14);
  }

  @Test
  void countedEffortsAreDeterministic() {
    Host host = Host.cells(4, 4, 4);
    Guest guest = Guests.random(14, 0.4, 5);
    Effort effort = Effort.draws(2).sweeps(50).seed(11);
    Fit first = paths.embed(guest, host, effort);
    assertTrue(first.fits());
    assertEquals(first, paths.embed(guest, host, effort));
    assertEquals(first, PathEmbedder.standard().embed(guest, host, effort.threads(2)));
  }

  @Test
  void whatCannotBeFoundEndsAndTellsTheOverlap() {
    Fit fit = paths.embed(Guests.complete(5), Host.square(6, 6), Effort.draws(2).sweeps(30));
    Fit.NotFound notFound = assertInstanceOf(Fit.NotFound.class, fit);
    assertEquals(End.DONE, notFound.end());
    assertTrue(notFound.overlap().orElseThrow() >= 1, fit.toString());
  }

  @Test
  void aGuestWithoutEdgesMayFillItsHost() {
    Embedding embedding = fit(Guests.random(36, 0, 1), Host.king(6, 6), Effort.draws(1));
    assertEquals(36, embedding.total());
  }

  @Test
  void anEmptyGuestFits() {
    assertEquals(0, fit(Guests.complete(0), Host.square(2, 2), Effort.draws(1)).total());
  }

  @Test
  void guestAndHostMayFallApart() {
    Host host = Host.square(5, 9).without(Faults.vertices(4, 13, 22, 31, 40));
    Guest two = Guest.of("two", Guests.grid(4, 4).graph().toJGraphT());
    assertTrue(fit(two, host, Effort.draws(3)).total() >= 16);
    Fit tooWide = paths.embed(Guests.cycle(21), host, Effort.draws(1));
    assertInstanceOf(Fit.Impossible.class, tooWide);
  }

  @Test
  void aTargetEndsTheSearchEarly() {
    Host host = Host.cells(4, 6, 6);
    int rough = 0;
    int fine = 0;
    for (int seed = 1; seed <= 5; seed++) {
      Guest guest = Guests.regular(3, 40, seed);
      int first = fit(guest, host, Effort.draws(1).target(1000)).total();
      int best = fit(guest, host, Effort.draws(1)).total();
      assertTrue(best <= first, best + " after " + first);
      rough += first;
      fine += best;
    }
    assertTrue(fine < rough, fine + " after " + rough);
  }

  @Test
  void aStopFromTheListenerKeepsWhatWasFound() {
    StopSignal stop = StopSignal.create();
    AtomicLong seconds = new AtomicLong();
    Watch watch =
        Watch.stop(stop)
            .progress(p -> p.best().ifPresent(found -> stop.stop()))
            .clock(() -> seconds.incrementAndGet() * 1_000_000_000L);
    Effort effort = Effort.draws(1).sweeps(1_000_000);
    Fit fit = paths.embed(Guests.complete(6), Host.cells(4, 2, 2), effort, watch);
    assertEquals(List.of(), PlainValidator.faults(fit.orThrow()));
  }

  private static Effort within(int seconds) {
    return Effort.within(Duration.ofSeconds(seconds));
  }

  private Embedding fit(Guest guest, Host host, Effort effort) {
    long began = System.nanoTime();
    Embedding embedding = paths.embed(guest, host, effort).orThrow();
    double seconds = (System.nanoTime() - began) * 1e-9;
    effort
        .limit()
        .ifPresent(limit -> assertTrue(seconds < limit.toSeconds() + 1, seconds + " seconds"));
    assertEquals(List.of(), PlainValidator.faults(embedding));
    return embedding;
  }
}
