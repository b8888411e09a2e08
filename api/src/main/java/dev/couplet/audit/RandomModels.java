package dev.couplet.audit;

import dev.couplet.model.Model;

/**
 * Small models drawn at random, for property tests of whatever takes a model: encodings, weights,
 * samplers, bounds.
 *
 * <p>A regime and a seed make one model, always the same. It has 1 to {@value #MOST_LITERALS}
 * literals, so that an {@link LoweringAudit} takes milliseconds, and at least one plan that keeps
 * every required rule. Stateless and thread-safe.
 */
public final class RandomModels {
  /** The most literals that a model has: a bit counts one, a choice one for each option. */
  public static final int MOST_LITERALS = 14;

  /** What kind of models. */
  public enum Regime {
    /** Many bits, few terms and rules, each over two or three literals. */
    SPARSE,
    /** Few bits, every pair in the objective, rules over all bits. */
    DENSE,
    /** Coefficients 1 and -1 only: many plans are equally good. */
    TIED,
    /** Coefficients of very different magnitude. */
    HUGE_RANGE,
    /** Coefficients and limits with decimals. */
    DECIMAL,
    /** Choices only. */
    CHOICES,
    /** Bits and choices, products of up to four literals, preferred rules, both senses. */
    MIXED,
    /**
     * Bits and choices, nested and, or, xor and not, conditions under guards, choices that all
     * differ, tables, preferred rules that cost the amount or its square.
     */
    LOGIC
  }

  private RandomModels() {}

  /** The model of a regime and a seed. */
  public static Model of(Regime regime, long seed) {
    return new RandomModel(regime, seed).model();
  }
}
