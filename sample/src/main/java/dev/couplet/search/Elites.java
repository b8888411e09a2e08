package dev.couplet.search;

import dev.couplet.form.State;
import java.util.ArrayList;
import java.util.List;

/** The best states of one draw, all of different energies once it is full. */
final class Elites {
  private final int capacity;
  private final List<State> state = new ArrayList<>();
  private final List<Long> energy = new ArrayList<>();

  Elites(int capacity) {
    this.capacity = capacity;
  }

  boolean full() {
    return state.size() == capacity;
  }

  int size() {
    return state.size();
  }

  State state(int k) {
    return state.get(k);
  }

  State best() {
    return state.get(extreme(-1));
  }

  /** The lowest energy. */
  long lowest() {
    return energy.get(extreme(-1));
  }

  /** Adds one of the first states. */
  void add(State newState, long newEnergy) {
    state.add(newState);
    energy.add(newEnergy);
  }

  /** Puts a state in the place of the worst, if it is lower and no other has its energy. */
  boolean improve(State newState, long newEnergy) {
    int worst = extreme(1);
    if (newEnergy >= energy.get(worst) || energy.contains(newEnergy)) {
      return false;
    }
    state.set(worst, newState);
    energy.set(worst, newEnergy);
    return true;
  }

  /** The place of the highest energy, or of the lowest if {@code sign} is -1. */
  private int extreme(int sign) {
    int place = 0;
    for (int k = 1; k < energy.size(); k++) {
      if (sign * Long.compare(energy.get(k), energy.get(place)) > 0) {
        place = k;
      }
    }
    return place;
  }
}
