package dev.couplet.sampling;

import static org.junit.jupiter.api.Assertions.assertAll;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.time.Duration;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;

class EffortTest {
  private static final Effort FULL =
      Effort.draws(10).sweeps(20).limit(Duration.ofSeconds(3)).target(-4).seed(5).threads(6);

  private static String refusal(Executable call) {
    return assertThrows(IllegalArgumentException.class, call).getMessage();
  }

  @Test
  void everySettingIsKept() {
    assertEquals(OptionalInt.of(10), FULL.draws());
    assertEquals(OptionalInt.of(20), FULL.sweeps());
    assertEquals(Optional.of(Duration.ofSeconds(3)), FULL.limit());
    assertEquals(OptionalDouble.of(-4), FULL.target());
    assertEquals(5, FULL.seed());
    assertEquals(6, FULL.threads());
    assertEquals(
        "Effort(10 draws, 20 sweeps, within PT3S, target -4.0, seed 5, threads 6)",
        FULL.toString());
  }

  @Test
  void whatIsNotSaidIsLeftOpen() {
    Effort counted = Effort.draws(1);
    assertEquals(OptionalInt.empty(), counted.sweeps());
    assertEquals(Optional.empty(), counted.limit());
    assertEquals(OptionalDouble.empty(), counted.target());
    assertEquals(1, counted.seed());
    assertEquals(1, counted.threads());
    assertEquals(OptionalInt.empty(), Effort.within(Duration.ofNanos(1)).draws());
    assertEquals(
        "Effort(within PT1M, seed 1, threads 1)", Effort.within(Duration.ofMinutes(1)).toString());
  }

  /** Each copy changes its own setting, leaves the others, and leaves the original. */
  @Test
  void copiesChangeOneSetting() {
    String before = FULL.toString();
    List<Effort> copies =
        List.of(
            FULL.sweeps(21),
            FULL.limit(Duration.ofSeconds(4)),
            FULL.target(-5),
            FULL.withoutTarget(),
            FULL.seed(6),
            FULL.threads(7));
    for (Effort copy : copies) {
      assertNotEquals(FULL, copy);
      Effort back = copy.sweeps(20).limit(Duration.ofSeconds(3)).target(-4).seed(5).threads(6);
      assertEquals(FULL, back);
      assertEquals(FULL.hashCode(), back.hashCode());
    }
    assertEquals(copies.size(), new HashSet<>(copies).size());
    assertEquals(before, FULL.toString());
    assertNotEquals(Effort.draws(10), Effort.draws(11));
    assertNotEquals(Effort.draws(10), Effort.within(Duration.ofSeconds(10)));
  }

  @Test
  void whatIsNoWorkIsRefused() {
    assertAll(
        () ->
            assertEquals(
                "the number of draws is 0, it must be 1 or more", refusal(() -> Effort.draws(0))),
        () ->
            assertEquals(
                "the number of sweeps is -1, it must be 1 or more", refusal(() -> FULL.sweeps(-1))),
        () ->
            assertEquals(
                "the number of threads is 0, it must be 1 or more", refusal(() -> FULL.threads(0))),
        () ->
            assertEquals(
                "the number of parts is 0, it must be 1 or more", refusal(() -> FULL.split(0))),
        () ->
            assertEquals(
                "the time limit is PT0S, it must be above zero",
                refusal(() -> FULL.limit(Duration.ZERO))),
        () ->
            assertEquals(
                "the time limit is PT-1S, it must be above zero",
                refusal(() -> Effort.within(Duration.ofSeconds(-1)))),
        () ->
            assertEquals(
                "the target is NaN, it must be a number", refusal(() -> FULL.target(Double.NaN))));
    assertEquals(
        OptionalDouble.of(Double.NEGATIVE_INFINITY),
        FULL.target(Double.NEGATIVE_INFINITY).target());
  }

  @Test
  void partsAddUpToTheWhole() {
    for (int parts = 1; parts <= 10; parts++) {
      List<Effort> shares = FULL.split(parts);
      assertEquals(parts, shares.size());
      assertEquals(10, shares.stream().mapToInt(e -> e.draws().orElseThrow()).sum());
      Duration time = Duration.ZERO;
      Set<Long> seeds = new HashSet<>();
      for (Effort share : shares) {
        time = time.plus(share.limit().orElseThrow());
        seeds.add(share.seed());
        assertEquals(
            FULL,
            Effort.draws(10)
                .sweeps(share.sweeps().orElseThrow())
                .limit(Duration.ofSeconds(3))
                .target(share.target().orElseThrow())
                .seed(5)
                .threads(share.threads()));
      }
      assertEquals(0, Duration.ofSeconds(3).minus(time).toNanos() / parts);
      assertEquals(parts, seeds.size());
    }
  }

  @Test
  void everyPartHasSomethingToDo() {
    List<Effort> shares = Effort.draws(2).limit(Duration.ofNanos(2)).split(5);
    for (Effort share : shares) {
      assertEquals(OptionalInt.of(1), share.draws());
      assertEquals(Optional.of(Duration.ofNanos(1)), share.limit());
    }
    Effort timed = Effort.within(Duration.ofSeconds(10)).split(4).get(3);
    assertEquals(OptionalInt.empty(), timed.draws());
    assertEquals(Optional.of(Duration.ofMillis(2500)), timed.limit());
  }

  @Test
  void theSameEffortIsSplitTheSameWay() {
    assertEquals(FULL.split(7), FULL.split(7));
    assertNotEquals(FULL.split(7).get(0).seed(), FULL.seed(8).split(7).get(0).seed());
  }

  /** The generator's definition: Steele, Lea and Flood 2014, with the mixer of SplitMix64. */
  @Test
  void seedsOfPartsAreTheSameEverywhere() {
    long seed = 1;
    for (Effort part : Effort.draws(3).seed(seed).split(3)) {
      seed += 0x9e3779b97f4a7c15L;
      long mixed = (seed ^ seed >>> 30) * 0xbf58476d1ce4e5b9L;
      mixed = (mixed ^ mixed >>> 27) * 0x94d049bb133111ebL;
      assertEquals(mixed ^ mixed >>> 31, part.seed());
    }
  }
}
