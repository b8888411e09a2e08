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
import java.util.SplittableRandom;
import java.util.concurrent.atomic.AtomicLong;
import java.util.concurrent.locks.LockSupport;

/** Samplers that break what the contract says of results and of randomness, each in one way. */
final class Sabotaged {
  private static final Sampler HONEST = new HonestSampler();

  private Sabotaged() {}

  /** Spoils what is made of the states. */
  static Sampler result(ResultMaker maker) {
    return new HonestSampler() {
      @Override
      Draws result(Qubo form, Run run, List<State> states, Vigil vigil) {
        return maker.make(form, run, states, super.result(form, run, states, vigil));
      }
    };
  }

  @FunctionalInterface
  interface ResultMaker {
    Draws make(Qubo form, Run run, List<State> states, Draws honest);
  }

  static Sampler energiesOfAnotherForm() {
    return result(
        (form, run, states, honest) ->
            Draws.of(form.times(2), states, honest.end(), honest.seed()));
  }

  static Sampler statesOfAnotherSize() {
    return result(
        (form, run, states, honest) -> {
          int size = form.size() + 1;
          List<State> longer = new ArrayList<>();
          states.forEach(s -> longer.add(State.zeros(size)));
          return Draws.of(Qubo.builder(size).build(), longer, honest.end(), honest.seed());
        });
  }

  static Sampler anotherSeed() {
    return result(
        (form, run, states, honest) -> Draws.of(form, states, honest.end(), honest.seed() + 1));
  }

  static Sampler losesADraw() {
    return result(
        (form, run, states, honest) ->
            states.size() < 2
                ? honest
                : Draws.of(form, states.subList(1, states.size()), honest.end(), honest.seed()));
  }

  static Sampler addsADraw() {
    return result(
        (form, run, states, honest) -> {
          List<State> more = new ArrayList<>(states);
          more.add(states.get(0));
          return Draws.of(form, more, honest.end(), honest.seed());
        });
  }

  static Sampler claimsAProof() {
    return result((form, run, states, honest) -> honest.bound(honest.best().energy()));
  }

  static Sampler alwaysSaysDone() {
    return result((form, run, states, honest) -> Draws.of(form, states, End.DONE, honest.seed()));
  }

  static Sampler neverSaysDone() {
    return result(
        (form, run, states, honest) -> Draws.of(form, states, End.STOPPED, honest.seed()));
  }

  static Sampler returnsNull() {
    return (form, run) -> null;
  }

  static Sampler refusesMoreThan(int size, String message) {
    return (form, run) -> {
      if (form.size() > size) {
        throw new IllegalArgumentException(message);
      }
      return HONEST.sample(form, run);
    };
  }

  static Sampler failsWithoutVariables() {
    return (form, run) -> {
      if (form.size() == 0) {
        throw new ArrayIndexOutOfBoundsException("0");
      }
      return HONEST.sample(form, run);
    };
  }

  static Sampler goesOnFromTheLastRun() {
    AtomicLong calls = new AtomicLong();
    return new HonestSampler() {
      @Override
      public Draws sample(Qubo form, Run run) {
        calls.incrementAndGet();
        return super.sample(form, run);
      }

      @Override
      SplittableRandom stream(Run run, int draw, int thread) {
        return new SplittableRandom(calls.get() + 1000L * draw);
      }
    };
  }

  static Sampler oneStreamAThread() {
    return new HonestSampler() {
      @Override
      SplittableRandom stream(Run run, int draw, int thread) {
        return new SplittableRandom(run.effort().seed() + draw + 100L * thread);
      }
    };
  }

  static Sampler oneStreamForAllDraws() {
    return new HonestSampler() {
      @Override
      SplittableRandom stream(Run run, int draw, int thread) {
        return new SplittableRandom(run.effort().seed());
      }
    };
  }

  /** Two runs at once tread on each other: the later one overwrites the seed of the first. */
  static Sampler keepsTheSeedInAField() {
    AtomicLong seed = new AtomicLong();
    return new HonestSampler() {
      @Override
      public Draws sample(Qubo form, Run run) {
        seed.set(run.effort().seed());
        LockSupport.parkNanos(1_000_000);
        return super.sample(form, run);
      }

      @Override
      SplittableRandom stream(Run run, int draw, int thread) {
        return new SplittableRandom(seed.get() + 1000L * draw);
      }
    };
  }
}
