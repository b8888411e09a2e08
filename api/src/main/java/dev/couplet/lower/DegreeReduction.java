package dev.couplet.lower;

import dev.couplet.lower.Ledger.Source;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/**
 * Replaces terms of degree 3 and more by quadratic ones with auxiliary bits; minimised over these,
 * the value is unchanged for every pattern of the other bits.
 *
 * <p>All sources of a lowering are looked at together. Several plans are worked out: each product
 * by a {@link ProductForm} of its own; pairs shared among products wherever that saves bits, the
 * rest by forms; and where coefficients are to be small also pairs substituted down to degree 2,
 * shared and unshared. The best by the {@link Aim} is taken, of equals the first named here.
 */
final class DegreeReduction {
  private final List<Source> sources;
  private final List<Product> products;
  private final Aim aim;
  private final BitTable bits;

  private DegreeReduction(List<Source> sources, Aim aim, BitTable bits) {
    this.sources = sources;
    this.products = products(sources);
    this.aim = aim;
    this.bits = bits;
  }

  /**
   * The sources brought to degree 2, in their order, and a source more for each auxiliary bit that
   * several of them share.
   */
  static List<Source> of(List<Source> sources, Aim aim, BitTable bits) {
    boolean quadratic = sources.stream().allMatch(source -> source.terms().degree() <= 2);
    return quadratic ? sources : new DegreeReduction(sources, aim, bits).reduced();
  }

  private static List<Product> products(List<Source> sources) {
    List<Product> products = new ArrayList<>();
    for (int s = 0; s < sources.size(); s++) {
      int source = s;
      sources
          .get(s)
          .terms()
          .forEachTerm(
              (coefficient, variables) -> {
                if (variables.length > 2) {
                  products.add(new Product(source, coefficient, variables));
                }
              });
    }
    return products;
  }

  private List<Source> reduced() {
    Comparator<ReductionDraft> byBits = Comparator.comparingInt(ReductionDraft::auxiliaries);
    Comparator<ReductionDraft> bySize = Comparator.comparingDouble(ReductionDraft::largest);
    ReductionDraft best =
        drafts().stream()
            .min(
                aim == Aim.AUXILIARIES
                    ? byBits.thenComparing(bySize)
                    : bySize.thenComparing(byBits))
            .orElseThrow();
    return best.writeTo(bits);
  }

  private List<ReductionDraft> drafts() {
    int first = bits.size();
    ProductForms fewest = new ProductForms(Aim.AUXILIARIES);
    List<ReductionDraft> drafts = new ArrayList<>();
    drafts.add(draft(SharedPairs.none(products, first), fewest));
    drafts.add(draft(SharedPairs.saving(products, first, fewest), fewest));
    if (aim == Aim.COEFFICIENTS) {
      ProductForms smallest = new ProductForms(Aim.COEFFICIENTS);
      drafts.add(draft(SharedPairs.none(products, first), smallest));
      drafts.add(draft(SharedPairs.everywhere(products, first), smallest));
      drafts.add(draft(SharedPairs.apart(products, first), smallest));
    }
    return drafts;
  }

  private ReductionDraft draft(SharedPairs shared, ProductForms forms) {
    return new ReductionDraft(sources, products, shared, forms, bits.meanings());
  }
}
