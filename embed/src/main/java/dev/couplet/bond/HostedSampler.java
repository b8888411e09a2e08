package dev.couplet.bond;

import dev.couplet.embed.Embedding;
import dev.couplet.form.Ising;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Sampler;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;

/**
 * A sampler that works on a host: puts the form onto the host of an embedding, lets another method
 * sample there, and reads the draws back. Energies are those of the form that was passed in.
 *
 * <p>Starts become host states with every set whole. What is known of the form's structure does not
 * hold on the host and is not passed on. The method draws in batches of {@value Batches#SIZE}, each
 * with a seed that follows from the run's, so that a run with a target ends soon after the first
 * draw that reaches it once read back; draws after that one are dropped. Immutable and thread-safe
 * if the method is.
 *
 * <p>Time: that of the method on the host's form, and O(m) a draw to read back.
 */
public final class HostedSampler implements Sampler {
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
    Reading reading = new Reading(form, guest, hosted, run.effort().target());
    List<State> starts = run.starts().stream().map(hosted::whole).toList();
    Batches batches = new Batches(run, starts);
    End end = End.DONE;
    while (end == End.DONE && batches.hasNext()) {
      Run batch = batches.next(reading.lowest);
      Draws draws = method.sample(reading.hostForm, batch);
      end = reading.take(draws);
      boolean whole = draws.total() == batch.effort().draws().orElse(-1);
      if (end == End.DONE && !whole) {
        break; // The method proved its answer, and would prove it again.
      }
    }
    return reading.result(end, run.effort().seed());
  }

  /** Host draws on their way back; mutable, used once. */
  private final class Reading {
    private final Qubo form;
    private final Ising guest;
    private final HostedForm hosted;
    private final Qubo hostForm;
    private final List<State> states = new ArrayList<>();
    private final long[] torn;
    private final double target;
    private double lowest = Double.POSITIVE_INFINITY;

    Reading(Qubo form, Ising guest, HostedForm hosted, OptionalDouble target) {
      this.form = form;
      this.guest = guest;
      this.hosted = hosted;
      this.target = target.orElse(Double.NEGATIVE_INFINITY);
      this.hostForm = hosted.ising().toQubo();
      this.torn = new long[form.size()];
    }

    /** Reads host draws back, up to the first that reaches the target. */
    End take(Draws draws) {
      for (State onHost : draws.inOrder()) {
        State state = readback.read(onHost, hosted, guest);
        states.add(state);
        for (int g = 0; g < torn.length; g++) {
          torn[g] += hosted.torn(onHost, g) ? 1 : 0;
        }
        double energy = form.value(state);
        lowest = Math.min(lowest, energy);
        if (energy <= target) {
          return End.TARGET;
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
