package dev.couplet.form;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.TreeSet;
import java.util.stream.IntStream;
import net.jqwik.api.Arbitraries;
import net.jqwik.api.Arbitrary;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.Provide;
import net.jqwik.api.constraints.IntRange;
import net.jqwik.api.constraints.Size;

/** The linear-time orders against the stable sort of the platform, with a plain comparator. */
class OrderProperties {
  private static final int SIZE = 12;

  @Provide
  Arbitrary<List<int[]>> pairs() {
    Arbitrary<int[]> pair =
        Arbitraries.integers().between(0, SIZE - 1).array(int[].class).ofSize(2);
    Arbitrary<int[]> tied = Arbitraries.integers().between(3, 4).array(int[].class).ofSize(2);
    Arbitrary<List<int[]>> mixed = Arbitraries.oneOf(pair, tied).list().ofMaxSize(60);
    return Arbitraries.oneOf(mixed, mixed.map(OrderProperties::sorted));
  }

  private static List<int[]> sorted(List<int[]> pairs) {
    return pairs.stream().sorted(Arrays::compare).toList();
  }

  private static int[] column(List<int[]> pairs, int side) {
    return pairs.stream().mapToInt(pair -> pair[side]).toArray();
  }

  @Property
  void pairsAreOrderedByRowThenColumnThenArrival(@ForAll("pairs") List<int[]> pairs) {
    List<Integer> slow = new ArrayList<>(IntStream.range(0, pairs.size()).boxed().toList());
    slow.sort((a, b) -> Arrays.compare(pairs.get(a), pairs.get(b)));
    int[] fast = PairOrder.of(column(pairs, 0), column(pairs, 1), pairs.size(), SIZE);
    assertArrayEquals(slow.stream().mapToInt(p -> p).toArray(), fast);
  }

  /** Few keys, so that many are equal; more positions than one run. */
  @Property
  void mergingSortsStably(@ForAll @Size(max = 100) List<@IntRange(max = 9) Integer> keys) {
    int[] positions = IntStream.range(0, keys.size()).toArray();
    MergeSort.sort(positions, (a, b) -> keys.get(a) - keys.get(b));
    List<Integer> slow = new ArrayList<>(IntStream.range(0, keys.size()).boxed().toList());
    slow.sort(Comparator.comparing(keys::get));
    assertArrayEquals(slow.stream().mapToInt(p -> p).toArray(), positions);
  }

  @Provide
  Arbitrary<List<List<Integer>>> products() {
    Arbitrary<Integer> variables = Arbitraries.integers().between(0, SIZE - 1);
    return variables.list().ofMaxSize(5).list().ofMaxSize(150);
  }

  @Property
  void repeatsOfAVariableAreDropped(@ForAll("products") List<List<Integer>> products) {
    for (List<Integer> product : products) {
      int[] factor = product.stream().mapToInt(v -> v).toArray();
      int end = TermOrder.canonical(factor, 0, factor.length);
      int[] distinct = new TreeSet<>(product).stream().mapToInt(v -> v).toArray();
      assertArrayEquals(distinct, Arrays.copyOf(factor, end));
    }
  }

  @Property
  void termsAreOrderedByDegreeThenVariablesThenArrival(
      @ForAll("products") List<List<Integer>> products) {
    List<int[]> terms =
        products.stream()
            .map(product -> new TreeSet<>(product).stream().mapToInt(v -> v).toArray())
            .toList();
    int[] start = new int[terms.size() + 1];
    for (int t = 0; t < terms.size(); t++) {
      start[t + 1] = start[t] + terms.get(t).length;
    }
    int[] factor = terms.stream().flatMapToInt(Arrays::stream).toArray();
    List<Integer> slow = new ArrayList<>(IntStream.range(0, terms.size()).boxed().toList());
    slow.sort(
        Comparator.<Integer>comparingInt(t -> terms.get(t).length)
            .thenComparing((a, b) -> Arrays.compare(terms.get(a), terms.get(b))));
    int[] fast = TermOrder.of(start, factor, terms.size(), SIZE);
    assertArrayEquals(slow.stream().mapToInt(t -> t).toArray(), fast);
  }
}
