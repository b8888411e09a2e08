package dev.couplet.embed.best;

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
import dev.couplet.embed.path.PathEmbedder;
import dev.couplet.embed.template.TemplateEmbedder;
import dev.couplet.host.Faults;
import dev.couplet.host.Host;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Watch;
import java.time.Duration;
import java.util.List;
import java.util.concurrent.atomic.AtomicLong;
import org.junit.jupiter.api.Test;

class BestEmbedderTest {
  private final Embedder best = BestEmbedder.standard();

  @Test
  void keepsThePromisesOfEmbedders() {
    EmbedderAudit.of(best).orThrow();
  }

  /** Four host vertices: common practice. */
  @Test
  void aTriangleInACellTakesFourVertices() {
    assertEquals(4, fit(Guests.complete(3), Host.cells(4, 1, 1), Effort.draws(1)).total());
  }

  @Test
  void aDenseGuestTakesTheTemplateTrimmed() {
    Embedding embedding = fit(Guests.complete(72), Host.cells(4, 18, 18), Effort.draws(1));
    assertTrue(embedding.total() <= 1368, embedding.toString());
    assertEquals(19, embedding.longest());
  }

  @Test
  void aSparseGuestTakesTheShorterOfBoth() {
    Guest guest = Guests.random(20, 0.25, 2);
    Host host = Host.cells(4, 6, 6);
    Effort effort = Effort.draws(1).sweeps(60);
    int chosen = fit(guest, host, effort).total();
    int path = PathEmbedder.standard().embed(guest, host, effort).orThrow().total();
    int pattern =
        TemplateEmbedder.standard().embed(guest, host, effort).orThrow().trimmed().total();
    assertEquals(Math.min(path, pattern), chosen);
  }

  @Test
  void whereNoTemplateFitsPathsAreSought() {
    assertTrue(fit(Guests.complete(4), Host.square(6, 6), Effort.draws(1)).total() >= 4);
    Host whole = Host.cells(4, 4, 4);
    Host host = whole.without(Faults.seeded(whole, 0.05, 0, 3));
    assertTrue(fit(Guests.complete(12), host, Effort.draws(3)).total() >= 12);
  }

  @Test
  void theTimeOfTheTemplateIsCounted() {
    AtomicLong seconds = new AtomicLong();
    Watch watch = Watch.none().clock(() -> seconds.getAndIncrement() * 1_000_000_000L);
    Effort effort = Effort.within(Duration.ofSeconds(3));
    Fit fit = best.embed(Guests.complete(5), Host.square(9, 9), effort, watch);
    assertEquals(End.DEADLINE, assertInstanceOf(Fit.NotFound.class, fit).end());
    assertTrue(seconds.get() <= 8, "the clock was looked at " + seconds.get() + " times");
  }

  private Embedding fit(Guest guest, Host host, Effort effort) {
    Embedding embedding = best.embed(guest, host, effort).orThrow();
    assertEquals(List.of(), PlainValidator.faults(embedding));
    return embedding;
  }
}
