package dev.couplet.embed;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.sampling.End;
import dev.couplet.sampling.Vigil;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.concurrent.atomic.AtomicInteger;
import org.junit.jupiter.api.Test;

/** The audit passes an embedder that is honest, and finds each way of breaking a promise. */
class EmbedderAuditTest {
  private static final OptionalInt UNKNOWN = OptionalInt.empty();
  private static final OptionalDouble UNKNOWN_SHARE = OptionalDouble.empty();

  /** Finds only what fits vertex by vertex in the same order, but keeps every promise. */
  private static final Embedder HONEST =
      (guest, host, effort, watch) -> {
        Vigil vigil = Vigil.begin(effort, watch);
        vigil.report(UNKNOWN_SHARE, UNKNOWN_SHARE, UNKNOWN_SHARE);
        while (effort.draws().isEmpty() && !vigil.over()) {
          Thread.onSpinWait();
        }
        List<int[]> sets = new ArrayList<>();
        host.presentVertices().stream()
            .limit(guest.vertices())
            .forEach(v -> sets.add(new int[] {v}));
        try {
          return new Fit.Fits(Embedding.of(guest, host, sets));
        } catch (IllegalArgumentException invalid) {
          return new Fit.NotFound(vigil.reason(), UNKNOWN);
        }
      };

  @Test
  void anHonestEmbedderPasses() {
    assertEquals(List.of(), EmbedderAudit.of(HONEST).breaches());
    EmbedderAudit.of(HONEST).orThrow();
  }

  @Test
  void aFalseProofIsFound() {
    finds("it fits, but", (g, h, e, w) -> new Fit.Impossible("I say so"));
  }

  @Test
  void aChangingAnswerIsFound() {
    AtomicInteger calls = new AtomicInteger();
    finds(
        "the same seed gave",
        (g, h, e, w) -> new Fit.NotFound(End.DONE, OptionalInt.of(calls.incrementAndGet())));
  }

  @Test
  void anotherGuestIsFound() {
    finds(
        "another guest or host",
        (g, h, e, w) -> new Fit.Fits(Embedding.of(Guests.complete(0), h, List.of())));
  }

  @Test
  void deafnessIsFound() {
    Embedder deaf = (g, h, e, w) -> new Fit.NotFound(End.DONE, UNKNOWN);
    finds("a stop asked for before the start", deaf);
    finds("an interrupt", deaf);
    finds("a deadline", deaf);
  }

  @Test
  void aSwallowedInterruptIsFound() {
    finds(
        "the flag was not left set",
        (g, h, e, w) -> {
          boolean interrupted = Thread.interrupted();
          return new Fit.NotFound(interrupted ? End.STOPPED : End.DONE, UNKNOWN);
        });
  }

  @Test
  void aSwallowedExceptionOfTheListenerIsFound() {
    finds(
        "a listener's exception was swallowed",
        (g, h, e, w) -> {
          try {
            Vigil.begin(e, w).report(UNKNOWN_SHARE, UNKNOWN_SHARE, UNKNOWN_SHARE);
          } catch (RuntimeException swallowed) {
            return new Fit.NotFound(End.DONE, UNKNOWN);
          }
          return new Fit.NotFound(End.DONE, UNKNOWN);
        });
  }

  @Test
  void anExceptionIsFound() {
    finds(
        "threw",
        (g, h, e, w) -> {
          if (g.vertices() == 0) {
            throw new IllegalArgumentException("no vertices");
          }
          return HONEST.embed(g, h, e, w);
        });
  }

  private static void finds(String breach, Embedder embedder) {
    AssertionError error =
        assertThrows(AssertionError.class, () -> EmbedderAudit.of(embedder).orThrow());
    assertTrue(error.getMessage().contains(breach), error.getMessage());
  }
}
