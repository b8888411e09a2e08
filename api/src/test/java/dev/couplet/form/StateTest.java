package dev.couplet.form;

import static org.junit.jupiter.api.Assertions.assertAll;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;

class StateTest {
  private static String refusal(Executable call) {
    return assertThrows(IllegalArgumentException.class, call).getMessage();
  }

  @Test
  void theEmptyStateIsAState() {
    State empty = State.parse("");
    assertEquals(0, empty.size());
    assertEquals(empty, State.zeros(0));
    assertEquals(empty, State.of());
    assertEquals(empty, State.ofWords(0));
    assertEquals(empty, State.ofWords(0, 0L));
    assertEquals(empty, empty.flipped());
    assertEquals("", empty.toText());
  }

  @Test
  void whatIsNoStateIsRefusedWithTheReason() {
    assertAll(
        () -> assertEquals("size is -1, it must be 0 or more", refusal(() -> State.zeros(-1))),
        () ->
            assertEquals(
                "a state is written with 0 and 1 only, found '2' at position 3",
                refusal(() -> State.parse("0102"))),
        () ->
            assertEquals(
                "a state of 65 variables needs 2 words, got 1",
                refusal(() -> State.ofWords(65, 0L))),
        () ->
            assertEquals(
                "word 1 has bits set beyond the 65 variables of the state",
                refusal(() -> State.ofWords(65, 0L, 2L))),
        () ->
            assertEquals(
                "word 1 has bits set beyond the 64 variables of the state",
                refusal(() -> State.ofWords(64, 0L, 1L))),
        () ->
            assertEquals(
                "cannot compare states of 2 and 3 variables",
                refusal(() -> State.zeros(2).distance(State.zeros(3)))));
  }

  @Test
  void placesOutsideAreRefused() {
    State state = State.parse("010");
    for (int outside : new int[] {-1, 3, 64, Integer.MIN_VALUE, Integer.MAX_VALUE}) {
      assertThrows(IndexOutOfBoundsException.class, () -> state.get(outside));
      assertThrows(IndexOutOfBoundsException.class, () -> state.with(outside, true));
      assertThrows(IndexOutOfBoundsException.class, () -> state.flipped(outside));
    }
  }

  @Test
  void nobodyReachesTheInside() {
    boolean[] values = {true, false};
    long[] words = {1};
    State fromValues = State.of(values);
    State fromWords = State.ofWords(2, words);
    values[0] = false;
    words[0] = 2;
    fromWords.toWords()[0] = 3;
    fromWords.toBooleans()[1] = true;
    fromWords.toBitSet().set(1);
    assertEquals("10", fromValues.toText());
    assertEquals("10", fromWords.toText());
  }

  @Test
  void longStatesAreShownInPart() {
    State state = State.zeros(1000);
    assertEquals("0".repeat(80) + "... (1000 variables)", state.toString());
    assertEquals("0".repeat(1000), state.toText());
    assertEquals("0".repeat(80), State.zeros(80).toString());
  }

  @Test
  void settingWhatIsSetGivesTheSameObject() {
    State state = State.parse("01");
    assertSame(state, state.with(1, true));
    assertTrue(state.with(0, true).get(0));
  }
}
