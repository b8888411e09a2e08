package dev.couplet.embed;

import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Watch;
import dev.couplet.sampling.Watch.StopSignal;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.CompletionException;
import java.util.concurrent.atomic.AtomicLong;

/**
 * Checks, from a unit test, that an embedder keeps the promises of its interface:
 *
 * <pre>{@code EmbedderAudit.of(MyEmbedder.standard()).orThrow();}</pre>
 *
 * <p>It embeds small guests of many kinds in small hosts, whole and with faults, and checks that
 * what comes back is valid by a plain reading of the definition, that it is the same again for the
 * same seed and from another thread, that nothing known to fit is called impossible, and that a
 * stop signal, an interrupt, a deadline and an exception of the listener end the search as they
 * should. It does not judge how good the embeddings are. Immutable; takes seconds.
 */
public final class EmbedderAudit {
  private static final Effort COUNTED = Effort.draws(2).sweeps(40);

  private final Embedder embedder;
  private final List<String> breaches = new ArrayList<>();

  private EmbedderAudit(Embedder embedder) {
    this.embedder = embedder;
  }

  /** Runs all checks. */
  public static EmbedderAudit of(Embedder embedder) {
    EmbedderAudit audit = new EmbedderAudit(embedder);
    AuditCase.all().forEach(audit::checkCase);
    audit.checkStop();
    audit.checkInterrupt();
    audit.checkDeadline();
    audit.checkListener();
    return audit;
  }

  /** The promises found broken, each in a sentence; empty if none. */
  public List<String> breaches() {
    return List.copyOf(breaches);
  }

  /**
   * Insists that no promise is broken.
   *
   * @throws AssertionError listing those that are
   */
  public void orThrow() {
    if (!breaches.isEmpty()) {
      throw new AssertionError(
          breaches.size() + " promises broken:\n" + String.join("\n", breaches));
    }
  }

  private void checkCase(AuditCase example) {
    Effort effort = COUNTED.seed(example.seed());
    Fit fit;
    Fit again;
    try {
      fit = embedder.embed(example.guest(), example.host(), effort);
      again =
          CompletableFuture.supplyAsync(
                  () -> embedder.embed(example.guest(), example.host(), effort))
              .join();
    } catch (CompletionException | IllegalArgumentException | IllegalStateException thrown) {
      breaches.add(example + ": threw " + thrown);
      return;
    }
    expect(fit.equals(again), example + ": the same seed gave " + fit + ", then " + again);
    expect(
        !(example.fits() && fit instanceof Fit.Impossible),
        example + ": it fits, but was answered with " + fit);
    fit.embedding().ifPresent(embedding -> checkEmbedding(example, embedding));
  }

  private void checkEmbedding(AuditCase example, Embedding embedding) {
    boolean own = embedding.guest().equals(example.guest()) && embedding.host() == example.host();
    expect(own, example + ": the embedding is of another guest or host");
    PlainCheck.fault(example.guest(), example.host(), embedding)
        .ifPresent(fault -> breaches.add(example + ": " + fault));
  }

  private void checkStop() {
    StopSignal stop = StopSignal.create();
    stop.stop();
    AuditCase hard = AuditCase.hopeless();
    Fit fit = embedder.embed(hard.guest(), hard.host(), timeless(), Watch.stop(stop));
    expectEnd(fit, End.STOPPED, "a stop asked for before the start");
  }

  private void checkInterrupt() {
    AuditCase hard = AuditCase.hopeless();
    Thread.currentThread().interrupt();
    Fit fit = embedder.embed(hard.guest(), hard.host(), timeless());
    boolean kept = Thread.interrupted();
    expect(kept, "an interrupt: the flag was not left set");
    expectEnd(fit, End.STOPPED, "an interrupt");
  }

  /** By a clock that goes on by a second whenever it is read. */
  private void checkDeadline() {
    AuditCase hard = AuditCase.hopeless();
    AtomicLong seconds = new AtomicLong();
    Watch watch = Watch.none().clock(() -> seconds.incrementAndGet() * 1_000_000_000L);
    Effort gone = Effort.within(Duration.ofMillis(1));
    Fit atOnce = embedder.embed(hard.guest(), hard.host(), gone, watch);
    expectEnd(atOnce, End.DEADLINE, "a deadline that has passed at the first look");
    Effort timed = Effort.within(Duration.ofSeconds(5));
    Fit inTime = embedder.embed(hard.guest(), hard.host(), timed, watch);
    expect(!inTime.fits(), "a planar host cannot carry complete:5, but the answer was " + inTime);
  }

  private void checkListener() {
    AuditCase hard = AuditCase.hopeless();
    boolean[] called = {false};
    Watch watch =
        Watch.none()
            .progress(
                progress -> {
                  called[0] = true;
                  throw new ListenerFailed();
                });
    try {
      Fit fit = embedder.embed(hard.guest(), hard.host(), COUNTED, watch);
      expect(!called[0], "a listener's exception was swallowed, the answer was " + fit);
    } catch (ListenerFailed reachedTheCaller) {
      expect(called[0], "the listener was not called");
    }
  }

  private static Effort timeless() {
    return Effort.within(Duration.ofDays(1));
  }

  private void expectEnd(Fit fit, End end, String what) {
    boolean kept = !(fit instanceof Fit.NotFound found) || found.end() == end;
    expect(kept && !fit.fits(), what + ": answered with " + fit);
  }

  private void expect(boolean kept, String breach) {
    if (!kept) {
      breaches.add(breach);
    }
  }

  private static final class ListenerFailed extends RuntimeException {
    private static final long serialVersionUID = 1L;
  }
}
