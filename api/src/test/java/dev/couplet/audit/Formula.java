package dev.couplet.audit;

import java.util.List;

/** A statement of logic in plain records, judged directly on an assignment. */
sealed interface Formula {
  boolean holds(int[] values);

  /** The decision is this option (a bit: 0 or 1). */
  record Is(int decision, int option) implements Formula {
    @Override
    public boolean holds(int[] values) {
      return values[decision] == option;
    }
  }

  record Not(Formula of) implements Formula {
    @Override
    public boolean holds(int[] values) {
      return !of.holds(values);
    }
  }

  record All(List<Formula> of) implements Formula {
    @Override
    public boolean holds(int[] values) {
      for (Formula one : of) {
        if (!one.holds(values)) {
          return false;
        }
      }
      return true;
    }
  }

  record Any(List<Formula> of) implements Formula {
    @Override
    public boolean holds(int[] values) {
      for (Formula one : of) {
        if (one.holds(values)) {
          return true;
        }
      }
      return false;
    }
  }

  record Odd(List<Formula> of) implements Formula {
    @Override
    public boolean holds(int[] values) {
      boolean odd = false;
      for (Formula one : of) {
        odd ^= one.holds(values);
      }
      return odd;
    }
  }
}
