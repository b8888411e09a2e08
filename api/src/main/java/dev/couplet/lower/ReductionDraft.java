package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import dev.couplet.lower.Ledger.Kind;
import dev.couplet.lower.Ledger.Source;
import dev.couplet.lower.ProductForms.Fitted;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * One plan to bring all sources to degree 2: pairs that bits are put for, and the forms of the
 * products that are longer still. Its bits are numbered from {@code first} on, those of pairs
 * before the others.
 */
final class ReductionDraft {
  private final List<Source> sources;
  private final List<Product> products;
  private final SharedPairs shared;
  private final ProductForms forms;
  private final List<String> meanings;
  private final int first;
  private final int auxiliaries;

  ReductionDraft(
      List<Source> sources,
      List<Product> products,
      SharedPairs shared,
      ProductForms forms,
      List<String> meanings) {
    this.sources = sources;
    this.products = products;
    this.shared = shared;
    this.forms = forms;
    this.first = meanings.size();
    this.meanings = new ArrayList<>(meanings);
    for (Substitution one : shared.substitutions()) {
      this.meanings.add(this.meanings.get(one.x()) + " and " + this.meanings.get(one.y()));
    }
    int sum = shared.substitutions().size();
    for (int p = 0; p < products.size(); p++) {
      sum += forms.auxiliaries(products.get(p).coefficient(), shared.variables(p).length);
    }
    this.auxiliaries = sum;
  }

  /** How many bits it takes. */
  int auxiliaries() {
    return auxiliaries;
  }

  /** The largest coefficient of all sources together, each by its factor. */
  double largest() {
    Polynomial.Builder sum = Polynomial.builder(first + auxiliaries);
    written().forEach(source -> sum.add(source.terms(), source.factor()));
    double[] largest = {0};
    sum.build()
        .forEachTerm(
            (coefficient, variables) ->
                largest[0] =
                    Math.max(largest[0], variables.length == 0 ? 0 : Math.abs(coefficient)));
    return largest[0];
  }

  /** Adds the bits to the table; gives the sources of degree 2. */
  List<Source> writeTo(BitTable bits) {
    for (Substitution one : shared.substitutions()) {
      int w = bits.add(meanings.get(bits.size()));
      bits.completeWith(values -> values[w] = values[one.x()] && values[one.y()]);
    }
    for (int p = 0; p < products.size(); p++) {
      Product product = products.get(p);
      int[] variables = shared.variables(p);
      if (variables.length > 2) {
        Fitted form = forms.of(product.coefficient(), variables.length);
        String source = sources.get(product.source()).name();
        form.addTo(bits, variables, "'" + source + "'");
      }
    }
    return written();
  }

  private List<Source> written() {
    List<Polynomial.Builder> terms = new ArrayList<>();
    for (Source source : sources) {
      terms.add(lowDegrees(source.terms()));
    }
    int next = first + shared.substitutions().size();
    for (int p = 0; p < products.size(); p++) {
      Product product = products.get(p);
      int[] variables = shared.variables(p);
      Polynomial.Builder own = terms.get(product.source());
      if (variables.length <= 2) {
        own.add(product.coefficient(), variables);
      } else {
        Fitted form = forms.of(product.coefficient(), variables.length);
        form.form().addTo(own, Math.abs(product.coefficient()), variables, next);
        next += form.auxiliaries();
      }
    }
    List<Source> ties = ties(terms);
    List<Source> written = new ArrayList<>();
    for (int s = 0; s < sources.size(); s++) {
      Source source = sources.get(s);
      written.add(new Source(source.name(), source.kind(), terms.get(s).build(), source.factor()));
    }
    written.addAll(ties);
    return written;
  }

  private Polynomial.Builder lowDegrees(Polynomial terms) {
    Polynomial.Builder low = Polynomial.builder(first + auxiliaries);
    terms.forEachTerm(
        (coefficient, variables) -> {
          if (variables.length <= 2) {
            low.add(coefficient, variables);
          }
        });
    return low;
  }

  /** The ties of pairs that several sources share; those of one source's own are added to it. */
  private List<Source> ties(List<Polynomial.Builder> terms) {
    List<Source> ties = new ArrayList<>();
    for (int k = 0; k < shared.substitutions().size(); k++) {
      Substitution one = shared.substitutions().get(k);
      int[] owners =
          Arrays.stream(one.carriers()).map(p -> products.get(p).source()).distinct().toArray();
      Tie tie = new Tie();
      for (int p : one.carriers()) {
        Product product = products.get(p);
        double factor = owners.length == 1 ? 1 : sources.get(product.source()).factor();
        tie.carry(factor * product.coefficient());
      }
      if (owners.length == 1) {
        tie.addTo(terms.get(owners[0]), one.x(), one.y(), first + k);
      } else {
        Polynomial.Builder own = Polynomial.builder(first + auxiliaries);
        tie.addTo(own, one.x(), one.y(), first + k);
        ties.add(new Source("product of " + meanings.get(first + k), Kind.PRODUCT, own.build(), 1));
      }
    }
    return ties;
  }
}
