package dev.couplet.examples.rounds;

import dev.couplet.anneal.Annealing;
import dev.couplet.bond.HostedDraws;
import dev.couplet.bond.HostedSampler;
import dev.couplet.embed.Embedding;
import dev.couplet.embed.Fit;
import dev.couplet.embed.Guest;
import dev.couplet.embed.best.BestEmbedder;
import dev.couplet.host.Faults;
import dev.couplet.host.Host;
import dev.couplet.lower.Lowered;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Watch;
import dev.couplet.solve.Answer;
import dev.couplet.solve.Solver;
import java.util.Optional;

/**
 * The small copy on a sparse host: embedded, sampled there, read back; and solved directly, to
 * compare.
 *
 * @param copy the copy's form
 * @param host the host, with its faults
 * @param guest what was to be embedded
 * @param fit whether it was
 * @param draws what was drawn, if it was
 * @param direct the answer without a host
 */
record HostRun(
    Lowered copy, Host host, Guest guest, Fit fit, Optional<HostedDraws> draws, Answer direct) {
  static final double FAULTS = 0.02;
  private static final int ATTEMPTS = 16;

  /**
   * Makes the run; each of embedding, sampling and solving within the effort's time.
   *
   * @param effort how many draws to make on the host
   * @param watch who hears of the draws
   */
  static HostRun of(Lowered copy, Effort effort, Watch watch) {
    Host whole = Host.cells(4, 10, 10);
    Host host = whole.without(Faults.seeded(whole, FAULTS, 0, effort.seed()));
    Guest guest = Guest.of(copy.qubo());
    Fit fit = BestEmbedder.standard().embed(guest, host, attempts(effort));
    Optional<HostedDraws> draws = fit.embedding().map(found -> draw(copy, found, effort, watch));
    Answer direct = Solver.standard().solve(copy.statement(), effort, Watch.none());
    return new HostRun(copy, host, guest, fit, draws, direct);
  }

  private static Effort attempts(Effort effort) {
    Effort counted = Effort.draws(ATTEMPTS).seed(effort.seed()).threads(effort.threads());
    return effort.limit().map(counted::limit).orElse(counted);
  }

  private static HostedDraws draw(Lowered copy, Embedding found, Effort effort, Watch watch) {
    HostedSampler sampler = HostedSampler.on(found, Annealing.standard());
    return sampler.observe(copy.qubo(), Run.of(effort).watch(watch));
  }
}
