package dev.couplet.bench.cli;

import dev.couplet.anneal.Annealing;
import dev.couplet.anneal.Cooling;
import dev.couplet.anneal.Finish;
import dev.couplet.anneal.Tempering;
import dev.couplet.exact.BranchAndBound;
import dev.couplet.exact.Elimination;
import dev.couplet.exact.Enumeration;
import dev.couplet.sampling.Sampler;
import dev.couplet.search.GreedyDescent;
import dev.couplet.search.Relinking;
import dev.couplet.search.Tabu;
import dev.couplet.solve.Solver;
import java.util.Iterator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** Every method by its name on the command line. */
final class Methods {
  /** What {@code solve} uses unless told otherwise. */
  static final String STANDARD = "solver";

  private static final Map<String, Sampler> SAMPLERS = new LinkedHashMap<>();
  private static final Map<String, Thermal> THERMAL = new LinkedHashMap<>();

  static {
    SAMPLERS.put("solver", Solver.standard());
    SAMPLERS.put("annealing", Annealing.standard());
    SAMPLERS.put("tempering", Tempering.standard());
    SAMPLERS.put("tabu", Tabu.standard());
    SAMPLERS.put("relink", Relinking.standard());
    SAMPLERS.put("descent", GreedyDescent.standard());
    SAMPLERS.put("enumeration", Enumeration.standard());
    SAMPLERS.put("elimination", Elimination.standard());
    SAMPLERS.put("branch", BranchAndBound.standard());

    THERMAL.put("annealing", Methods::annealing);
  }

  private Methods() {}

  /** A sampler and what it is called. */
  record Method(String name, Sampler sampler) {}

  /** Makes a sampler whose inverse temperature grows evenly between two temperatures. */
  @FunctionalInterface
  interface Thermal {
    Sampler between(double hot, double cold);
  }

  /** The names for {@code solve}. */
  static final class Names implements Iterable<String> {
    @Override
    public Iterator<String> iterator() {
      return List.copyOf(SAMPLERS.keySet()).iterator();
    }
  }

  /** The names for {@code rate}. */
  static final class ThermalNames implements Iterable<String> {
    @Override
    public Iterator<String> iterator() {
      return List.copyOf(THERMAL.keySet()).iterator();
    }
  }

  /**
   * The method of a name, with its own settings.
   *
   * @throws IllegalArgumentException if there is none, naming those there are
   */
  static Method named(String name) {
    return new Method(name, known(SAMPLERS, name));
  }

  /**
   * The method of a name whose temperatures can be set.
   *
   * @throws IllegalArgumentException if there is none, naming those there are
   */
  static Thermal thermal(String name) {
    return known(THERMAL, name);
  }

  /**
   * One of several by its name.
   *
   * @throws IllegalArgumentException if there is none, naming those there are
   */
  static <T> T known(Map<String, T> methods, String name) {
    T method = methods.get(name);
    if (method == null) {
      throw new IllegalArgumentException(
          "there is no method '"
              + name
              + "' for this; say one of "
              + String.join(", ", methods.keySet()));
    }
    return method;
  }

  private static Sampler annealing(double hot, double cold) {
    return Annealing.standard()
        .cooling(Cooling.inverseLinear())
        .hot(hot)
        .cold(cold)
        .finish(Finish.NONE);
  }
}
