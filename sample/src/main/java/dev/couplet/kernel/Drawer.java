package dev.couplet.kernel;

import dev.couplet.form.State;
import java.util.List;

/** Makes draws, one or more at a time; belongs to one thread. */
@FunctionalInterface
public interface Drawer {
  /**
   * The states of draws {@code first} to {@code first + count - 1}, in order. Each must depend on
   * its own number alone, unless the pace ends it; then any valid states will do, the best known
   * first of all, and soon.
   */
  List<State> draw(int first, int count, Pace pace);
}
