package dev.couplet.solve;

import dev.couplet.exact.BranchAndBound;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Run;
import java.time.Duration;
import java.util.List;
import java.util.Optional;

/**
 * Tries to prove the minimum of a form by branch and bound, with a share of the effort: half the
 * time that is left; or, where nothing but draws are counted, so many nodes, on small forms only.
 */
final class ProofStage {
  private static final int MOST_BITS = 2000;
  private static final int FEW_BITS = 128;
  private static final long FEW_NODES = 500;

  private ProofStage() {}

  /** The best state found and a bound; nothing if the form is too large to be worth a try. */
  static Optional<Draws> run(Qubo form, List<State> starts, Course course) {
    Optional<Duration> time = course.left().limit();
    int most = time.isPresent() ? MOST_BITS : FEW_BITS;
    if (form.size() > most) {
      return Optional.empty();
    }
    Effort effort = time.map(left -> course.left().limit(half(left))).orElse(course.left());
    BranchAndBound method = BranchAndBound.standard();
    BranchAndBound limited = time.isPresent() ? method : method.nodes(FEW_NODES);
    Run run = Run.of(effort.withoutTarget()).starts(starts).watch(course.quietly());
    Draws draws = limited.sample(form, run);
    course.finished("branch and bound", draws.proved() ? "proved" : "not proved");
    return Optional.of(draws);
  }

  private static Duration half(Duration left) {
    Duration half = left.dividedBy(2);
    return half.isZero() ? left : half;
  }
}
