package dev.couplet.form;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import java.math.BigInteger;
import java.util.BitSet;
import net.jqwik.api.Arbitraries;
import net.jqwik.api.Arbitrary;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.Provide;

/** A state against its text, a plain string of 0 and 1. */
class StateProperties {
  @Provide
  Arbitrary<String> texts() {
    Arbitrary<String> mixed = Arbitraries.strings().withChars('0', '1').ofMaxLength(200);
    Arbitrary<String> flat =
        Arbitraries.of("0", "1")
            .flatMap(
                c ->
                    Arbitraries.of(0, 1, 63, 64, 65, 127, 128, 129)
                        .map(length -> c.repeat(length)));
    return Arbitraries.oneOf(mixed, flat);
  }

  /** Pairs that differ late or only in length, which independent texts hardly ever do. */
  @Provide
  Arbitrary<String[]> relatives() {
    return texts()
        .flatMap(
            text ->
                Arbitraries.integers()
                    .between(0, text.length())
                    .flatMap(
                        cut ->
                            texts()
                                .map(tail -> new String[] {text, text.substring(0, cut) + tail})));
  }

  @Property
  void everyViewShowsTheSameValues(@ForAll("texts") String text) {
    State state = State.parse(text);
    assertEquals(text, state.toText());
    assertEquals(text.length(), state.size());
    assertEquals((int) text.chars().filter(c -> c == '1').count(), state.ones());
    BitSet bits = state.toBitSet();
    boolean[] values = state.toBooleans();
    for (int i = 0; i < text.length(); i++) {
      boolean one = text.charAt(i) == '1';
      assertEquals(one, state.get(i));
      assertEquals(one ? 1 : 0, state.bit(i));
      assertEquals(one ? -1 : 1, state.spin(i));
      assertEquals(one, bits.get(i));
      assertEquals(one, values[i]);
    }
  }

  @Property
  void everyViewBringsTheStateBack(@ForAll("texts") String text) {
    State state = State.parse(text);
    assertEquals(state, State.of(state.toBooleans()));
    assertEquals(state, State.ofWords(text.length(), state.toWords()));
    assertEquals(state.hashCode(), State.of(state.toBooleans()).hashCode());
  }

  /** The words are the binary number whose lowest digit is variable 0. */
  @Property
  void wordsAreABinaryNumber(@ForAll("texts") String text) {
    String digits = "0" + new StringBuilder(text).reverse();
    BigInteger number = new BigInteger(digits, 2);
    long[] words = State.parse(text).toWords();
    assertEquals((text.length() + 63) / 64, words.length);
    for (int w = 0; w < words.length; w++) {
      assertEquals(number.shiftRight(64 * w).longValue(), words[w]);
    }
  }

  @Property
  void oneFlipChangesOnePlace(@ForAll("texts") String text, @ForAll int place) {
    if (text.isEmpty()) {
      return;
    }
    int i = Math.floorMod(place, text.length());
    char other = text.charAt(i) == '0' ? '1' : '0';
    String expected = text.substring(0, i) + other + text.substring(i + 1);
    State state = State.parse(text);
    assertEquals(expected, state.flipped(i).toText());
    assertEquals(expected, state.with(i, other == '1').toText());
    assertEquals(1, state.distance(state.flipped(i)));
    assertEquals(text, state.toText());
  }

  @Property
  void allFlipsAreUndoneByAllFlips(@ForAll("texts") String text) {
    State state = State.parse(text);
    String swapped = text.replace('0', 'x').replace('1', '0').replace('x', '1');
    assertEquals(swapped, state.flipped().toText());
    assertEquals(state, state.flipped().flipped());
    assertEquals(text.length(), state.distance(state.flipped()));
    assertArrayEquals(State.parse(swapped).toWords(), state.flipped().toWords());
  }

  @Property
  void theOrderIsThatOfTexts(@ForAll("relatives") String[] texts) {
    State left = State.parse(texts[0]);
    State right = State.parse(texts[1]);
    int expected = Integer.signum(texts[0].compareTo(texts[1]));
    assertEquals(expected, Integer.signum(left.compareTo(right)));
    assertEquals(-expected, Integer.signum(right.compareTo(left)));
    assertEquals(texts[0].equals(texts[1]), left.equals(right));
  }

  @Property
  void theDistanceCountsPlacesThatDiffer(@ForAll("relatives") String[] texts) {
    int common = Math.min(texts[0].length(), texts[1].length());
    State left = State.parse(texts[0].substring(0, common));
    State right = State.parse(texts[1].substring(0, common));
    int differing = 0;
    for (int i = 0; i < common; i++) {
      differing += texts[0].charAt(i) == texts[1].charAt(i) ? 0 : 1;
    }
    assertEquals(differing, left.distance(right));
  }
}
