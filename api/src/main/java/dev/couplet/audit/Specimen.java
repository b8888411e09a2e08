package dev.couplet.audit;

import dev.couplet.form.Qubo;
import dev.couplet.sampling.Structure;
import java.util.List;
import java.util.stream.IntStream;

/**
 * A form that samplers are tried on.
 *
 * @param name what a finding calls it
 * @param form the form
 * @param structure what is known of the form
 */
record Specimen(String name, Qubo form, Structure structure) {
  Specimen(String name, Qubo form) {
    this(name, form, Structure.none());
  }

  /** A user's own forms, named by their place in the list. */
  static List<Specimen> listOf(List<Qubo> forms) {
    return IntStream.range(0, forms.size())
        .mapToObj(k -> new Specimen("form " + k, forms.get(k)))
        .toList();
  }

  int size() {
    return form.size();
  }

  @Override
  public String toString() {
    return "'" + name + "' (" + form.size() + " variables, " + form.pairs() + " pairs)";
  }
}
