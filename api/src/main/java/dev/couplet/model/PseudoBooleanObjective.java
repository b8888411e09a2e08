package dev.couplet.model;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.List;

/**
 * What an OPB text minimises: the objective and the costs of misses, all times the power of ten
 * that makes them whole.
 */
final class PseudoBooleanObjective {
  /** Receives whole coefficients. */
  @FunctionalInterface
  interface Visitor {
    void visit(long coefficient, int[] variables);
  }

  private final Statement statement;
  private final List<BigDecimal> costs = new ArrayList<>();
  private final List<Integer> counters = new ArrayList<>();
  private int decimals;

  PseudoBooleanObjective(Statement statement) {
    this.statement = statement;
    statement
        .objective()
        .forEachTerm(
            (coefficient, literals) -> {
              if (literals.length > 0) {
                note(Text.decimal(coefficient));
              }
            });
  }

  private void note(BigDecimal number) {
    decimals = Math.max(decimals, number.stripTrailingZeros().scale());
  }

  /** Adds what one variable beyond the literals costs. */
  void add(BigDecimal cost, int variable) {
    note(cost);
    costs.add(cost);
    counters.add(variable);
  }

  double constant() {
    return statement.objective().constant();
  }

  /** The power of ten that everything is written by. */
  int decimals() {
    return decimals;
  }

  boolean isEmpty() {
    int constants = constant() == 0 ? 0 : 1;
    return costs.isEmpty() && statement.objective().terms() == constants;
  }

  /** Refuses what is not exact below 2^51, all added up. */
  void requireWhole() {
    BigDecimal[] sum = {BigDecimal.ZERO};
    if (decimals <= PseudoBooleanText.MOST_DECIMALS) {
      statement
          .objective()
          .forEachTerm(
              (coefficient, literals) -> {
                if (literals.length > 0) {
                  sum[0] = sum[0].add(Text.decimal(coefficient).abs());
                }
              });
      costs.forEach(cost -> sum[0] = sum[0].add(cost.abs()));
      sum[0] = sum[0].scaleByPowerOfTen(decimals);
    }
    boolean tooFine = decimals > PseudoBooleanText.MOST_DECIMALS;
    if (tooFine || sum[0].compareTo(BigDecimal.valueOf(PseudoBooleanText.LIMIT)) >= 0) {
      throw new IllegalArgumentException(
          "the objective of model '"
              + statement.name()
              + "' cannot be written in whole numbers: with "
              + decimals
              + " decimals it adds up to 2^51 or more; round its coefficients and costs to fewer"
              + " decimals or choose a larger unit");
    }
  }

  /** Passes on the terms without the constant, to be minimised. */
  void forEachTerm(Visitor visitor) {
    int sign = statement.sense().sign();
    statement
        .objective()
        .forEachTerm(
            (coefficient, literals) -> {
              if (literals.length > 0) {
                visitor.visit(sign * whole(Text.decimal(coefficient)), literals);
              }
            });
    for (int k = 0; k < costs.size(); k++) {
      visitor.visit(whole(costs.get(k)), new int[] {counters.get(k)});
    }
  }

  private long whole(BigDecimal number) {
    return number
        .scaleByPowerOfTen(decimals)
        .setScale(0, RoundingMode.UNNECESSARY)
        .longValueExact();
  }
}
