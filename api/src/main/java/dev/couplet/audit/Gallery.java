package dev.couplet.audit;

import dev.couplet.form.Ising;
import dev.couplet.form.Qubo;
import dev.couplet.sampling.Structure;
import java.util.List;
import java.util.SplittableRandom;

/** The forms that every sampler is tried on: one of each regime, the degenerate ones first. */
final class Gallery {
  /** Every sampler takes forms of up to so many variables; methods with a limit may refuse more. */
  static final int SMALL = 12;

  private Gallery() {}

  static List<Specimen> all() {
    return List.of(
        new Specimen("no variables", Qubo.builder(0).addConstant(3).build()),
        new Specimen("one variable, better at 1", Qubo.builder(1).addLinear(0, -2).build()),
        new Specimen("one variable, better at 0", Qubo.builder(1).addLinear(0, 2).build()),
        new Specimen("all zero", Qubo.builder(SMALL).build()),
        new Specimen("frustrated triangle", triangle()),
        new Specimen("two parts and idle variables", disconnected()),
        new Specimen("magnitudes from 1e-300 to 1e300", wideRange()),
        new Specimen("dense integers", dense(10, true)),
        new Specimen("dense reals", dense(SMALL, false)),
        new Specimen("three choices of four", choices(), structureOfChoices()),
        new Specimen("torus of ties", torus(4)),
        new Specimen("chain of more than a word", chain(70)));
  }

  private static Qubo triangle() {
    Ising.Builder ising = Ising.builder(3);
    return ising.addPair(0, 1, 1).addPair(1, 2, 1).addPair(0, 2, 1).build().toQubo();
  }

  private static Qubo disconnected() {
    Qubo.Builder form = Qubo.builder(9).addConstant(-5);
    form.addPair(0, 2, -3).addPair(2, 4, 2).addLinear(0, 1);
    return form.addPair(5, 7, 4).addLinear(5, -1).addLinear(7, -1).build();
  }

  private static Qubo wideRange() {
    Qubo.Builder form = Qubo.builder(8);
    double[] magnitudes = {1e-300, 1e-150, 1e-9, 1, 1e9, 1e150, 1e299, 1e300};
    for (int i = 0; i < 8; i++) {
      form.addLinear(i, (i % 2 == 0 ? 1 : -1) * magnitudes[i]);
      form.addPair(i, (i + 3) % 8, (i % 3 == 0 ? 1 : -1) * magnitudes[7 - i]);
    }
    return form.build();
  }

  private static Qubo dense(int size, boolean whole) {
    SplittableRandom random = new SplittableRandom(size);
    Qubo.Builder form = Qubo.builder(size);
    for (int i = 0; i < size; i++) {
      for (int j = 0; j <= i; j++) {
        double value = whole ? random.nextInt(-20, 21) : random.nextDouble(-1, 1);
        if (i == j) {
          form.addLinear(i, value);
        } else {
          form.addPair(i, j, value);
        }
      }
    }
    return form.build();
  }

  /** Exactly one of each four variables, with a cost for neighbouring choices alike. */
  private static Qubo choices() {
    Qubo.Builder form = Qubo.builder(12).addConstant(30);
    for (int i = 0; i < 12; i++) {
      form.addLinear(i, -10 + i % 5);
      for (int j = i + 1; j < 12; j++) {
        if (i / 4 == j / 4) {
          form.addPair(i, j, 20);
        } else if (i % 4 == j % 4) {
          form.addPair(i, j, 3);
        }
      }
    }
    return form.build();
  }

  private static Structure structureOfChoices() {
    return Structure.exactlyOne(
        List.of(List.of(0, 1, 2, 3), List.of(4, 5, 6, 7), List.of(8, 9, 10, 11)));
  }

  private static Qubo torus(int side) {
    SplittableRandom random = new SplittableRandom(side);
    Ising.Builder form = Ising.builder(side * side);
    for (int v = 0; v < side * side; v++) {
      int right = v / side * side + (v + 1) % side;
      int below = (v + side) % (side * side);
      form.addPair(v, right, random.nextBoolean() ? 1 : -1);
      form.addPair(v, below, random.nextBoolean() ? 1 : -1);
    }
    return form.build().toQubo();
  }

  private static Qubo chain(int size) {
    SplittableRandom random = new SplittableRandom(size);
    Qubo.Builder form = Qubo.builder(size);
    for (int i = 1; i < size; i++) {
      form.addPair(i - 1, i, random.nextInt(-3, 4)).addLinear(i, random.nextInt(-2, 3));
    }
    return form.build();
  }
}
