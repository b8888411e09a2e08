package dev.couplet.reduce;

/** How a removed bit gets its value from bits that were removed later, or not at all. */
sealed interface Undo {
  /** Sets the removed bit. */
  void apply(boolean[] values);

  /** Bit {@code i} has one value. */
  record Fixed(int i, boolean value) implements Undo {
    @Override
    public void apply(boolean[] values) {
      values[i] = value;
    }
  }

  /** Bit {@code i} equals bit {@code j}, or its negation. */
  record Copied(int i, int j, boolean negated) implements Undo {
    @Override
    public void apply(boolean[] values) {
      values[i] = values[j] != negated;
    }
  }

  /** Bit {@code i} is 1 where {@code a + b y} is negative. */
  record Leaf(int i, double a, int y, double b) implements Undo {
    @Override
    public void apply(boolean[] values) {
      values[i] = a + (values[y] ? b : 0) < 0;
    }
  }

  /** Bit {@code i} is 1 where {@code a + b y + c z} is negative. */
  record Chain(int i, double a, int y, double b, int z, double c) implements Undo {
    @Override
    public void apply(boolean[] values) {
      values[i] = a + (values[y] ? b : 0) + (values[z] ? c : 0) < 0;
    }
  }
}
