package dev.couplet.lower;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.couplet.form.Qubo;
import dev.couplet.model.Model;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** The rows on decisions of the table in {@link Lowering}, counted on lowered forms. */
class BitsOfDecisionsTest {
  private final Model model = Model.named("rows");

  private static List<Integer> options(int count) {
    return IntStream.range(0, count).boxed().toList();
  }

  private Qubo lowered(ChoiceEncoding encoding) {
    return Lowering.standard().with(encoding).with(Weights.fixed(1)).lower(model).qubo();
  }

  @ParameterizedTest
  @CsvSource({"2", "3", "7", "8", "9"})
  void choices(int k) {
    model.choice("c", options(k));
    Qubo oneHot = lowered(ChoiceEncoding.oneHot());
    assertEquals(k, oneHot.size());
    assertEquals(k * (k - 1) / 2, oneHot.pairs());
    assertEquals(2, oneHot.pair(0, k - 1));
    Qubo walls = lowered(ChoiceEncoding.domainWall());
    assertEquals(k - 1, walls.size());
    assertEquals(k - 2, walls.pairs());
    Qubo binary = lowered(ChoiceEncoding.binary());
    assertEquals(32 - Integer.numberOfLeadingZeros(k - 1), binary.size());
    assertEquals(0, binary.pairs());
  }

  @ParameterizedTest
  @CsvSource({"0, 0", "1, 1", "2, 2", "3, 2", "4, 3", "7, 3", "8, 4", "1000, 10"})
  void counts(long width, int bits) {
    model.count("n", -5, width - 5);
    assertEquals(bits, lowered(ChoiceEncoding.oneHot()).size(), "floor(log2 w) + 1");
    assertEquals(0, lowered(ChoiceEncoding.oneHot()).pairs());
  }

  @ParameterizedTest
  @CsvSource({"3, 1", "4, 1", "6, 1"})
  void orders(int items, int places) {
    model.order("o", options(items), places);
    Qubo form = lowered(ChoiceEncoding.oneHot());
    assertEquals(items * places, form.size());
    assertEquals(places * items * (items - 1) / 2, form.pairs());
  }

  @ParameterizedTest
  @CsvSource({"1", "5"})
  void fixedDecisionsTakeNone(int items) {
    model.fix(model.order("o", options(items)), options(items));
    model.fix(model.count("n", 0, 99), 7);
    assertEquals(0, lowered(ChoiceEncoding.oneHot()).size());
  }
}
