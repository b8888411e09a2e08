package dev.couplet.lower;

import dev.couplet.form.CheckReturnValue;
import dev.couplet.form.Polynomial;
import java.util.ArrayList;
import java.util.List;

/**
 * Where each coefficient of a lowered form came from: by rule, code and objective. Immutable.
 *
 * <p>The amounts of a coefficient, added in the order given, are the coefficient.
 */
@CheckReturnValue
public final class Ledger {
  /** What kind of source a contribution has. */
  public enum Kind {
    /** A part of the objective. */
    OBJECTIVE,
    /** What missing a preferred rule costs. */
    COST,
    /** The penalty of a rule. */
    PENALTY,
    /** The penalty of bits that stand for no option of a choice. */
    CODE,
    /** The penalty of an auxiliary bit that is not the product of two others it stands for. */
    PRODUCT
  }

  /**
   * One contribution to a coefficient.
   *
   * @param source the name of the rule or objective, or words that name the choice
   * @param kind what it is
   * @param amount what it adds
   */
  public record Entry(String source, Kind kind, double amount) {}

  /**
   * All that one source adds to the form: its terms, each times the factor.
   *
   * @param name the name of the rule or objective, or words that name the choice
   * @param kind what it is
   * @param terms a polynomial of degree at most 2 over the bits
   * @param factor what it is multiplied by: the weight of a penalty, a cost a unit, else 1
   */
  public record Source(String name, Kind kind, Polynomial terms, double factor) {
    /** The same in a form that has more bits by now. */
    Source inVariables(int size) {
      return new Source(name, kind, terms.inVariables(size), factor);
    }
  }

  private final List<Source> sources;
  private final List<String> meanings;

  Ledger(List<Source> sources, List<String> meanings) {
    this.sources = sources.stream().map(one -> one.inVariables(meanings.size())).toList();
    this.meanings = meanings;
  }

  /** The contributions to the constant. */
  public List<Entry> constant() {
    return entries();
  }

  /** The contributions to the coefficient of a bit. */
  public List<Entry> linear(int bit) {
    require(bit);
    return entries(bit);
  }

  /** The contributions to the coefficient of the product of two different bits. */
  public List<Entry> pair(int i, int j) {
    require(i);
    require(j);
    if (i == j) {
      throw new IllegalArgumentException("pair (" + i + ", " + j + ") names one bit twice");
    }
    return entries(i, j);
  }

  /** Everything that the form is the sum of, in the order in which it is added up. */
  public List<Source> sources() {
    return sources;
  }

  /** What a bit stands for, in words. */
  public String meaning(int bit) {
    require(bit);
    return meanings.get(bit);
  }

  /** The number of bits. */
  public int bits() {
    return meanings.size();
  }

  private List<Entry> entries(int... variables) {
    List<Entry> entries = new ArrayList<>();
    for (Source source : sources) {
      double coefficient = source.terms().coefficient(variables);
      if (coefficient != 0) {
        entries.add(new Entry(source.name(), source.kind(), source.factor() * coefficient));
      }
    }
    return List.copyOf(entries);
  }

  private void require(int bit) {
    if (bit < 0 || bit >= meanings.size()) {
      throw new IllegalArgumentException(
          "bit " + bit + " is not one of the " + meanings.size() + " bits of the form");
    }
  }

  @Override
  public String toString() {
    return "Ledger(" + sources.size() + " sources, " + meanings.size() + " bits)";
  }
}
