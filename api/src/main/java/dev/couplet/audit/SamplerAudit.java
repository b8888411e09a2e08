package dev.couplet.audit;

import dev.couplet.form.Qubo;
import dev.couplet.sampling.Sampler;
import java.time.Duration;
import java.util.List;
import java.util.Optional;

/**
 * Runs the contract of samplers over one of them, from a unit test:
 *
 * <pre>{@code
 * SamplerAudit.contract(mySampler).orThrow();
 * }</pre>
 *
 * <p>The sampler is tried on forms of every regime (no variables, one, all zero, disconnected,
 * ties, magnitudes from 1e-300 to 1e300, more variables than a word has bits). The checks, by the
 * names that findings carry:
 *
 * <ul>
 *   <li>results: {@code draws} (at least one), {@code states}, {@code energies} (those of the form
 *       itself), {@code merged}, {@code order}, {@code counts}, {@code bound} (no state lies below
 *       it), {@code seed}, {@code end}, {@code returns}
 *   <li>randomness: {@code repeat} (same seed, same draws), {@code threads} (however many), {@code
 *       apart} (draws do not share random numbers), {@code shared instance} (many callers at once)
 *   <li>the course of a run: {@code target}, {@code starts}, {@code structure} (refused if it does
 *       not fit), {@code stop}, {@code interrupt}, {@code deadline} (on a clock of the audit's
 *       own), {@code listener}, {@code listener throws}, {@code threads end}
 * </ul>
 *
 * <p>A method with a limit may refuse forms of more than 12 variables, by an
 * IllegalArgumentException that names the size; {@code forms} checks that. A method whose draws do
 * not depend on the seed passes as it is. A method that proves its answer (a {@linkplain
 * dev.couplet.sampling.Draws#bound() bound} equal to the best energy, or below it by no more than
 * the rounding of real coefficients) may return fewer draws than asked for, or every optimum, and
 * may be done before it sees a stop or a deadline that comes while it works.
 *
 * <p>Cost: a few hundred short runs, some of them on up to three threads. Immutable.
 */
public final class SamplerAudit {
  private final Sampler sampler;
  private final Optional<List<Qubo>> forms;
  private final Duration patience;

  private SamplerAudit(Sampler sampler, Optional<List<Qubo>> forms, Duration patience) {
    this.sampler = sampler;
    this.forms = forms;
    this.patience = patience;
  }

  /** The whole contract, over the audit's own forms; nothing runs yet. */
  public static SamplerAudit contract(Sampler sampler) {
    return new SamplerAudit(sampler, Optional.empty(), Duration.ofMinutes(1));
  }

  /**
   * This audit over the given forms instead, for a sampler that takes no others; the largest should
   * be hard enough not to be solved by the first few thousand steps.
   *
   * @throws IllegalArgumentException if there is none
   */
  public SamplerAudit forms(List<Qubo> newForms) {
    if (newForms.isEmpty()) {
      throw new IllegalArgumentException("the list of forms is empty; an audit needs at least one");
    }
    return new SamplerAudit(sampler, Optional.of(List.copyOf(newForms)), patience);
  }

  /**
   * This audit with another time after which a run counts as lost (a minute, if not said); no run
   * of the audit is meant to come near it.
   *
   * @throws IllegalArgumentException if the time is not above zero
   */
  public SamplerAudit patience(Duration newPatience) {
    if (newPatience.isZero() || newPatience.isNegative()) {
      throw new IllegalArgumentException("the patience is " + newPatience + ", it must be above 0");
    }
    return new SamplerAudit(sampler, forms, newPatience);
  }

  /** Makes all checks. */
  public Findings run() {
    Notes notes = new Notes();
    try {
      examine(new Trials(sampler, patience, notes));
    } catch (Callers.Lost lost) {
      notes.add("returns", String.valueOf(lost.getMessage()));
    }
    return notes.of("the sampler " + sampler);
  }

  private void examine(Trials trials) {
    trials.accept(
        forms.map(Specimen::listOf).orElseGet(Gallery::all),
        forms.isPresent() ? Integer.MAX_VALUE : Gallery.SMALL);
    if (!trials.specimens().isEmpty()) {
      SeedChecks.examine(trials);
      TargetChecks.examine(trials);
      StartChecks.examine(trials);
      StopChecks.examine(trials);
      ListenerChecks.examine(trials);
    }
  }

  /**
   * Makes all checks and insists that every one holds.
   *
   * @throws AssertionError listing what does not hold, and how to mend it
   */
  public void orThrow() {
    run().orThrow();
  }
}
