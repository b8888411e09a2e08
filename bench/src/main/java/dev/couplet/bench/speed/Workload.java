package dev.couplet.bench.speed;

import dev.couplet.model.Bit;
import dev.couplet.model.Expr;
import dev.couplet.model.Model;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;

/** Models of about a given number of terms, with whole coefficients from a seed. */
enum Workload {
  /** A linear coefficient a bit, and five times as many pairs at random. */
  SPARSE {
    @Override
    void add(int terms, List<Expr> sum, Bits bits, SplittableRandom random) {
      int size = Math.max(2, terms / 6);
      for (int i = 0; i < size; i++) {
        sum.add(bits.of(i).times(coefficient(random)));
      }
      for (int pair = size; pair < terms; pair++) {
        int i = random.nextInt(size);
        int j = random.nextInt(size - 1);
        Expr product = bits.of(i).times(bits.of(j < i ? j : j + 1));
        sum.add(product.times(coefficient(random)));
      }
    }
  },
  /** A linear coefficient a bit, and all pairs. */
  DENSE {
    @Override
    void add(int terms, List<Expr> sum, Bits bits, SplittableRandom random) {
      int size = (int) Math.sqrt(2.0 * terms);
      for (int i = 0; i < size; i++) {
        sum.add(bits.of(i).times(coefficient(random)));
        for (int j = i + 1; j < size; j++) {
          sum.add(bits.of(i).times(bits.of(j)).times(coefficient(random)));
        }
      }
    }
  };

  /** The bits of a model, made as they are asked for. */
  static final class Bits {
    private final Model model;
    private final List<Bit> made = new ArrayList<>();

    Bits(Model model) {
      this.model = model;
    }

    Bit of(int number) {
      while (made.size() <= number) {
        made.add(model.bit("x" + made.size()));
      }
      return made.get(number);
    }
  }

  abstract void add(int terms, List<Expr> sum, Bits bits, SplittableRandom random);

  /** From 1 to 100, of either sign. */
  private static int coefficient(SplittableRandom random) {
    return random.nextInt(1, 101) * (random.nextBoolean() ? 1 : -1);
  }

  /** The sum over bits of a model, still to be used in it. */
  Expr sum(int terms, Model model, long seed) {
    List<Expr> sum = new ArrayList<>(terms);
    add(terms, sum, new Bits(model), new SplittableRandom(seed));
    return Expr.sum(sum);
  }

  /** A model that minimises such a sum. */
  Model model(int terms, long seed) {
    Model model = Model.named(name());
    model.minimize("sum", sum(terms, model, seed));
    return model;
  }
}
