package dev.couplet.bond;

import dev.couplet.embed.Embedding;
import dev.couplet.form.Ising;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Draw;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Sampler;
import dev.couplet.sampling.Structure;
import dev.couplet.sampling.Vigil;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;

/**
 * A sampler that works on a host: puts the form onto the host of an embedding, lets another method
 * sample there, and reads the draws back. Energies are those of the form that was passed in.
 *
 * <p>Starts become host states with every set whole. What is known of the form's structure does not
 * hold on the host and is not passed on. With a target, host draws are made one at a time, so that
 * the run ends at the first that reaches it once read back. Immutable and thread-safe if the method
 * is.
 *
 * <p>Time: that of the method on the host's form, and O(m) a draw to read back.
 */
public final class HostedSampler implements Sampler {
  private static final Duration SHORTEST = Duration.ofNanos(1);

  private final Embedding embedding;
  private final Sampler method;
  private final BondStrength bonds;
  private final Readback readback;

  private HostedSampler(
      Embedding embedding, Sampler method, BondStrength bonds, Readback readback) {
    this.embedding = embedding;
    this.method = method;
    this.bonds = bonds;
    this.readback = readback;
  }

  /** Samples on an embedding's host with a method; certified bonds, readback by local field. */
  public static HostedSampler on(Embedding embedding, Sampler method) {
    return new HostedSampler(embedding, method, BondStrength.certified(), Readback.byLocalField());
  }

  /** This sampler with other bond strengths. */
  public HostedSampler bonds(BondStrength newBonds) {
    return new HostedSampler(embedding, method, newBonds, readback);
  }

  /** This sampler with another readback. */
  public HostedSampler readback(Readback newReadback) {
    return new HostedSampler(embedding, method, bonds, newReadback);
  }

  @Override
  public Draws sample(Qubo form, Run run) {
    return observe(form, run).draws();
  }

  /**
   * Samples, and tells how often each branch set was torn.
   *
   * @throws IllegalArgumentException if the embedding does not carry the form
   */
  public HostedDraws observe(Qubo form, Run run) {
    run.requireFit(form.size());
    Ising guest = form.toIsing();
    HostedForm hosted = HostedForm.of(embedding, guest, bonds);
    Reading reading = new Reading(form, guest, hosted);
    Run onHost =
        new Run(
            run.effort().withoutTarget(),
            run.watch(),
            run.starts().stream().map(hosted::whole).toList(),
            Structure.none());
    End end =
        run.effort().target().isPresent()
            ? oneByOne(reading, onHost, run.effort())
            : reading.take(method.sample(reading.hostForm, onHost));
    return reading.result(end, run.effort().seed());
  }

  /** Draws until one reaches the target once read back; each from the next number of the seed. */
  private End oneByOne(Reading reading, Run onHost, Effort effort) {
    Vigil vigil = onHost.begin();
    double target = effort.target().orElseThrow();
    long most = effort.draws().orElse(Integer.MAX_VALUE);
    SplittableRandom seeds = new SplittableRandom(effort.seed());
    List<State> starts = onHost.starts();
    for (int k = 0; k < most; k++) {
      if (k > 0 && vigil.over()) {
        return vigil.reason();
      }
      Run one =
          onHost
              .effort(left(onHost.effort(), vigil).seed(seeds.nextLong()))
              .starts(starts.isEmpty() ? starts : List.of(starts.get(k % starts.size())));
      End end = reading.take(method.sample(reading.hostForm, one));
      if (reading.lowest <= target) {
        return End.TARGET;
      }
      if (end != End.DONE) {
        return end;
      }
    }
    return End.DONE;
  }

  private static Effort left(Effort effort, Vigil vigil) {
    Effort one = Effort.draws(1).threads(effort.threads());
    Effort paced = effort.sweeps().isPresent() ? one.sweeps(effort.sweeps().getAsInt()) : one;
    return effort
        .limit()
        .map(limit -> limit.minus(vigil.elapsed()))
        .map(rest -> paced.limit(rest.isNegative() || rest.isZero() ? SHORTEST : rest))
        .orElse(paced);
  }

  /** Host draws on their way back; mutable, used once. */
  private final class Reading {
    private final Qubo form;
    private final Ising guest;
    private final HostedForm hosted;
    private final Qubo hostForm;
    private final List<State> states = new ArrayList<>();
    private final long[] torn;
    private double lowest = Double.POSITIVE_INFINITY;

    Reading(Qubo form, Ising guest, HostedForm hosted) {
      this.form = form;
      this.guest = guest;
      this.hosted = hosted;
      this.hostForm = hosted.ising().toQubo();
      this.torn = new long[form.size()];
    }

    End take(Draws draws) {
      for (Draw draw : draws) {
        State state = readback.read(draw.state(), hosted, guest);
        lowest = Math.min(lowest, form.value(state));
        for (int k = 0; k < draw.multiplicity(); k++) {
          states.add(state);
        }
        for (int g = 0; g < torn.length; g++) {
          torn[g] += hosted.torn(draw.state(), g) ? draw.multiplicity() : 0;
        }
      }
      return draws.end();
    }

    HostedDraws result(End end, long seed) {
      List<Double> shares = new ArrayList<>();
      for (long count : torn) {
        shares.add((double) count / states.size());
      }
      return new HostedDraws(Draws.of(form, states, end, seed), shares);
    }
  }

  @Override
  public String toString() {
    return "HostedSampler(" + method + " on " + embedding + ")";
  }
}
