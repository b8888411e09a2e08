package dev.couplet.sampling;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

class DrawsTest {
  /** Energies: 00 is 1, 10 is 3, 01 is 3, 11 is -5. */
  private static final Qubo FORM =
      Qubo.builder(2).addConstant(1).addLinear(0, 2).addLinear(1, 2).addPair(0, 1, -10).build();

  private static Draws draws(String... states) {
    return Draws.of(FORM, Stream.of(states).map(State::parse).toList(), End.DONE, 7);
  }

  private static Draw row(String state, double energy, int multiplicity) {
    return new Draw(State.parse(state), energy, multiplicity);
  }

  @Test
  void equalStatesAreMergedAndTheLowestStandsFirst() {
    Draws draws = draws("00", "11", "00", "10", "00");
    assertEquals(List.of(row("11", -5, 1), row("00", 1, 3), row("10", 3, 1)), draws.rows());
    assertEquals(row("11", -5, 1), draws.best());
    assertEquals(5, draws.total());
    assertEquals(7, draws.seed());
    assertEquals(End.DONE, draws.end());
    List<Draw> iterated = new ArrayList<>();
    draws.forEach(iterated::add);
    assertEquals(draws.rows(), iterated);
    assertEquals("Draws(5 draws, 3 states, best -5.0, end DONE)", draws.toString());
  }

  @Test
  void drawsThatAreValuedAlreadyAreGatheredAlike() {
    for (String[] states : new String[][] {{"11"}, {"00", "11", "00", "10"}, {"01", "10", "10"}}) {
      List<Draw> valued = Stream.of(states).map(text -> Draw.of(FORM, State.parse(text))).toList();
      assertEquals(draws(states), Draws.of(valued, End.DONE, 7));
    }
    assertEquals(row("10", 3, 1), Draw.of(FORM, State.parse("10")));
  }

  @Test
  void valuedDrawsComeOneByOneAndOneAtLeast() {
    assertThrows(IllegalArgumentException.class, () -> Draws.of(List.of(), End.DONE, 7));
    List<Draw> merged = List.of(row("00", 1, 1), row("10", 3, 2));
    String message =
        assertThrows(IllegalArgumentException.class, () -> Draws.of(merged, End.DONE, 7))
            .getMessage();
    assertEquals("draw 1 has multiplicity 2; pass each by itself", message);
  }

  @Test
  void rowsOfEqualEnergyStandInTheOrderOfTheirFirstDraw() {
    assertEquals(List.of(row("01", 3, 1), row("10", 3, 2)), draws("01", "10", "10").rows());
    assertEquals(List.of(row("10", 3, 2), row("01", 3, 1)), draws("10", "01", "10").rows());
  }

  @Test
  void whereEachDrawEndedIsNotForgotten() {
    String[] states = {"10", "00", "11", "00", "01", "10", "11"};
    Draws draws = draws(states);
    assertEquals(Stream.of(states).map(State::parse).toList(), draws.inOrder());
    assertEquals(draws.inOrder(), draws.bound(-9).end(End.TARGET).inOrder());
    assertThrows(UnsupportedOperationException.class, () -> draws.inOrder().clear());
    assertThrows(IndexOutOfBoundsException.class, () -> draws.inOrder().get(7));
  }

  @Test
  void laterChangesOfTheStatesDoNotMatter() {
    List<State> states = new ArrayList<>(List.of(State.parse("00")));
    Draws draws = Draws.of(FORM, states, End.DONE, 7);
    states.add(State.parse("11"));
    assertEquals(draws("00"), draws);
    assertThrows(UnsupportedOperationException.class, () -> draws.rows().clear());
    assertThrows(
        UnsupportedOperationException.class,
        () -> {
          var rows = draws.iterator();
          rows.next();
          rows.remove();
        });
  }

  @Test
  void whatIsNoResultIsRefused() {
    assertEquals(
        "there is no draw; a run returns at least one state",
        assertThrows(IllegalArgumentException.class, DrawsTest::draws).getMessage());
    assertEquals(
        "the state has 3 variables, the form has 2",
        assertThrows(IllegalArgumentException.class, () -> draws("00", "000")).getMessage());
    assertEquals(
        "the multiplicity is 0, it must be 1 or more",
        assertThrows(IllegalArgumentException.class, () -> row("0", 1, 0)).getMessage());
  }

  @Test
  void aBoundLiesAtMostAtTheBestEnergy() {
    Draws draws = draws("11", "00");
    assertEquals(OptionalDouble.empty(), draws.bound());
    assertFalse(draws.proved());
    assertEquals(OptionalDouble.of(-7), draws.bound(-7).bound());
    assertFalse(draws.bound(-7).proved());
    assertTrue(draws.bound(-5).proved());
    assertFalse(draws.bound(Double.NEGATIVE_INFINITY).proved());
    assertEquals(draws.rows(), draws.bound(-5).rows());
    assertEquals(OptionalDouble.of(-5), draws.bound(-5).end(End.STOPPED).bound());
    assertEquals(
        "the bound -4.5 lies above the energy -5.0 of a draw",
        assertThrows(IllegalArgumentException.class, () -> draws.bound(-4.5)).getMessage());
    assertThrows(IllegalArgumentException.class, () -> draws.bound(Double.NaN));
  }

  @Test
  void resultsAreComparedByAllThatTheySay() {
    Draws draws = draws("00", "11");
    assertEquals(draws, draws("00", "11"));
    assertEquals(draws.hashCode(), draws("00", "11").hashCode());
    assertNotEquals(draws, draws("11", "00"));
    assertNotEquals(draws, draws("00", "11", "11"));
    assertNotEquals(draws, draws.bound(-5));
    assertNotEquals(draws, draws.end(End.TARGET));
    assertEquals(draws, draws.end(End.TARGET).end(End.DONE));
    List<State> states = List.of(State.parse("00"), State.parse("11"));
    assertNotEquals(draws, Draws.of(FORM, states, End.DONE, 8));
  }

  @Test
  void aFormWithoutVariablesHasOneState() {
    Draws draws =
        Draws.of(
            Qubo.builder(0).addConstant(2).build(),
            List.of(State.zeros(0), State.zeros(0)),
            End.DONE,
            1);
    assertEquals(List.of(new Draw(State.zeros(0), 2, 2)), draws.rows());
  }
}
