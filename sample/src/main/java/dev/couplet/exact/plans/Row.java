package dev.couplet.exact.plans;

/**
 * A sum over the values of some variables, with limits that must be kept or are charged for.
 *
 * <p>A row can be moved into the costs of its values in part: with a multiplier m, m times the sum
 * is added to them, and m times the limit on m's side taken from the constant. What is left to
 * charge is then {@link #rest}, never below 0 for a required row, whose sum keeps its limits. All
 * numbers are whole; costs in fine units.
 */
final class Row {
  /** Stands for no limit; sums are far below. */
  static final long FREE = 1L << 60;

  /** The number of the rule, a dot, and the number of its part; or words. */
  final String number;

  final int[] variables;
  final long[][] coefficients;
  final long lowest;
  final long highest;
  final long step;

  /** What a unit outside the limits costs; -1 if it is forbidden. */
  final long price;

  final boolean squared;

  Row(
      String number,
      int[] variables,
      long[][] coefficients,
      long lowest,
      long highest,
      long step,
      long price,
      boolean squared) {
    this.number = number;
    this.variables = variables;
    this.coefficients = coefficients;
    this.lowest = lowest;
    this.highest = highest;
    this.step = step;
    this.price = price;
    this.squared = squared;
  }

  boolean required() {
    return price < 0;
  }

  /** Whether a sum keeps limits and step. */
  boolean keeps(long sum) {
    return violation(sum) == 0;
  }

  private long violation(long sum) {
    if (step == 1 || sum <= lowest || sum >= highest) {
      return Math.max(0, Math.max(sum - highest, lowest - sum));
    }
    long beyond = (sum - lowest) % step;
    return Math.min(beyond, step - beyond);
  }

  /** What a sum is charged; 0 for a required row. */
  long charge(long sum) {
    long missed = required() ? 0 : violation(sum);
    return squared ? price * missed * missed : required() ? 0 : price * missed;
  }

  /** Whether multipliers other than 0 make sense. */
  boolean movable() {
    return required() || (!squared && step == 1 && price > 0);
  }

  /** The nearest multiplier that is allowed. */
  long allowed(long multiplier) {
    if (!movable()) {
      return 0;
    }
    long least = lowest == -FREE ? 0 : required() ? -FREE : -price;
    long most = highest == FREE ? 0 : required() ? FREE : price;
    return Math.max(least, Math.min(most, multiplier));
  }

  /** The constant that comes with a multiplier. */
  long offset(long multiplier) {
    return multiplier == 0 ? 0 : multiplier > 0 ? multiplier * highest : multiplier * lowest;
  }

  /** The least that is left to charge for a sum between two numbers, beside the multiplier. */
  long rest(long least, long most, long multiplier) {
    if (least == most) {
      return charge(least) - multiplier * least + offset(multiplier);
    }
    long wanted = multiplier > 0 ? highest : lowest;
    long sum = Math.max(least, Math.min(most, wanted));
    long charged = step == 1 || sum < lowest || sum > highest ? charge(sum) : 0;
    return charged - multiplier * sum + offset(multiplier);
  }
}
