package dev.couplet.audit;

import dev.couplet.audit.RandomModels.Regime;
import dev.couplet.audit.Spec.Fact;
import dev.couplet.audit.Spec.Limit;
import dev.couplet.audit.Spec.Term;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.SplittableRandom;

/** Random {@link Spec}s of a regime: limits anywhere, so that some have no feasible assignment. */
final class Specs {
  private final Regime regime;
  private final SplittableRandom random;
  private final List<Integer> options = new ArrayList<>();

  private Specs(Regime regime, long seed) {
    this.regime = regime;
    this.random = new SplittableRandom(seed);
  }

  static Spec of(Regime regime, long seed) {
    return new Specs(regime, seed).spec();
  }

  private Spec spec() {
    int room = 1 + random.nextInt(regime == Regime.DENSE ? 7 : 11);
    while (room > 0) {
      boolean choice = regime == Regime.CHOICES || (regime == Regime.MIXED && random.nextBoolean());
      int size = choice ? 1 + random.nextInt(Math.min(room, 4)) : 0;
      options.add(size);
      room -= Math.max(1, size);
    }
    List<Limit> rules = new ArrayList<>();
    int count = random.nextInt(4);
    for (int r = 0; r < count; r++) {
      rules.add(limit("rule " + r));
    }
    int degree = regime == Regime.MIXED || regime == Regime.TIED ? 4 : 2;
    int most = regime == Regime.HUGE_RANGE ? 1 << 16 : 9;
    int terms = regime == Regime.DENSE ? options.size() * options.size() : options.size();
    return new Spec(options, rules, terms(terms, degree, most), random.nextBoolean());
  }

  private Limit limit(String name) {
    int degree = random.nextInt(5) == 0 ? 2 : 1;
    int count = degree == 2 ? 3 : 1 + random.nextInt(regime == Regime.SPARSE ? 3 : 7);
    List<Term> terms = terms(count, degree, regime == Regime.HUGE_RANGE ? 1 << 9 : 5);
    int kind = random.nextInt(4);
    BigDecimal low = kind == 0 ? null : around(terms);
    BigDecimal high = kind == 0 ? around(terms) : kind == 1 ? null : low;
    high = kind == 3 ? low.add(coefficient(3).abs()) : high;
    boolean wish = random.nextInt(3) == 0;
    BigDecimal cost = random.nextInt(8) == 0 ? BigDecimal.ZERO : coefficient(4).abs();
    return new Limit(
        name,
        terms,
        Optional.ofNullable(low),
        Optional.ofNullable(high),
        wish ? Optional.of(cost) : Optional.empty());
  }

  /** A number that the terms may come to: some of the coefficients added up. */
  private BigDecimal around(List<Term> terms) {
    BigDecimal sum = BigDecimal.ZERO;
    for (Term term : terms) {
      sum = random.nextBoolean() ? sum.add(term.coefficient()) : sum;
    }
    return random.nextInt(4) == 0 ? sum.add(coefficient(2)) : sum;
  }

  private List<Term> terms(int count, int degree, int most) {
    List<Term> terms = new ArrayList<>();
    for (int t = 0; t < count; t++) {
      List<Fact> facts = new ArrayList<>();
      int width = random.nextInt(10) == 0 ? 0 : 1 + random.nextInt(degree);
      for (int k = 0; k < width; k++) {
        int decision = random.nextInt(options.size());
        int option = options.get(decision) == 0 ? 1 : random.nextInt(options.get(decision));
        facts.add(new Fact(decision, option, random.nextInt(4) == 0));
      }
      terms.add(new Term(coefficient(most), facts));
    }
    return terms;
  }

  private BigDecimal coefficient(int most) {
    long sign = random.nextBoolean() ? 1 : -1;
    return switch (regime) {
      case TIED -> BigDecimal.valueOf(sign);
      case HUGE_RANGE -> BigDecimal.valueOf(sign * (1 + random.nextInt(1 + random.nextInt(most))));
      case DECIMAL -> BigDecimal.valueOf(sign * (1 + random.nextInt(100 * most)), 2);
      default -> BigDecimal.valueOf(sign * (1 + random.nextInt(most)));
    };
  }
}
