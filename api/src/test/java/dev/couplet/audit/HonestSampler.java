package dev.couplet.audit;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Sampler;
import dev.couplet.sampling.Vigil;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import java.util.SplittableRandom;

/**
 * A plain sampler that keeps the contract: descent by single flips from random states, draws dealt
 * to threads in turn. Its steps are methods, so that a sabotaged heir can spoil exactly one.
 */
class HonestSampler implements Sampler {
  @Override
  public Draws sample(Qubo form, Run run) {
    check(form, run);
    Vigil vigil = run.begin();
    int asked = run.effort().draws().orElse(Integer.MAX_VALUE);
    List<State> states = new ArrayList<>();
    boolean hit = false;
    while (!hit && states.size() < asked && (states.isEmpty() || !over(vigil))) {
      int width = Math.min(run.effort().threads(), asked - states.size());
      List<State> round = round(form, run, vigil, states.size(), width);
      for (int k = 0; k < round.size() && !hit; k++) {
        states.add(round.get(k));
        hit = hits(form, run, round.get(k));
      }
      report(vigil, OptionalDouble.empty());
    }
    if (hit) {
      vigil.end(End.TARGET);
    }
    return result(form, run, states, vigil);
  }

  void check(Qubo form, Run run) {
    run.requireFit(form.size());
  }

  boolean over(Vigil vigil) {
    return vigil.over();
  }

  boolean hits(Qubo form, Run run, State state) {
    OptionalDouble target = run.effort().target();
    return target.isPresent() && form.value(state) <= target.getAsDouble();
  }

  void report(Vigil vigil, OptionalDouble share) {
    vigil.report(share, OptionalDouble.empty(), OptionalDouble.empty());
  }

  Draws result(Qubo form, Run run, List<State> states, Vigil vigil) {
    boolean stoppedEarly = vigil.over();
    return Draws.of(form, states, stoppedEarly ? vigil.reason() : End.DONE, run.effort().seed());
  }

  SplittableRandom stream(Run run, int draw, int thread) {
    return new SplittableRandom(run.effort().seed() + draw * 0x9E3779B97F4A7C15L);
  }

  /** Draws {@code first, first + 1, ...}, each on a thread of its own if there are several. */
  List<State> round(Qubo form, Run run, Vigil vigil, int first, int width) {
    State[] states = new State[width];
    if (width == 1) {
      states[0] = draw(form, run, vigil, first, 0);
      return List.of(states);
    }
    List<Thread> threads = new ArrayList<>();
    for (int k = 0; k < width; k++) {
      int own = k;
      Runnable work = () -> states[own] = draw(form, run, vigil, first + own, own);
      Thread thread = new Thread(work);
      threads.add(thread);
      thread.start();
    }
    threads.forEach(this::join);
    return List.of(states);
  }

  void join(Thread thread) {
    boolean interrupted = false;
    while (thread.isAlive()) {
      try {
        thread.join();
      } catch (InterruptedException e) {
        interrupted = true;
      }
    }
    if (interrupted) {
      Thread.currentThread().interrupt();
    }
  }

  State draw(Qubo form, Run run, Vigil vigil, int number, int thread) {
    SplittableRandom random = stream(run, number, thread);
    State state = begin(form, run, number, random);
    int sweeps = run.effort().sweeps().orElse(10);
    for (int sweep = 0; sweep < sweeps && !over(vigil); sweep++) {
      State before = state;
      for (int i = 0; i < form.size(); i++) {
        State flipped = state.with(i, !state.get(i));
        state = form.value(flipped) < form.value(state) ? flipped : state;
      }
      if (state.equals(before)) {
        break;
      }
    }
    return state;
  }

  State begin(Qubo form, Run run, int number, SplittableRandom random) {
    if (!run.starts().isEmpty()) {
      return run.starts().get(number % run.starts().size());
    }
    boolean[] values = new boolean[form.size()];
    for (int i = 0; i < values.length; i++) {
      values[i] = random.nextBoolean();
    }
    return State.of(values);
  }
}
