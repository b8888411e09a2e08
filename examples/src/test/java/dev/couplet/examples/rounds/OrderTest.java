package dev.couplet.examples.rounds;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.model.Plan;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Watch;
import dev.couplet.solve.Proof;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

/** The order of the visits, by itself and jointly with the choice of vans. */
class OrderTest {
  private static final Effort EFFORT = Effort.draws(100).seed(1).threads(2);

  @Test
  void theOrderOfUpToEightVillagesIsTheShortest() {
    SplittableRandom random = new SplittableRandom(4);
    for (int villages = 1; villages <= 8; villages++) {
      for (int trial = 0; trial < 3; trial++) {
        Round given = new Round(new Van("only", 99), villages(villages, random));
        Library library = new Library(random.nextInt(9000), random.nextInt(9000));
        VisitOrder.Ordered ordered = VisitOrder.of(given, library, EFFORT, Watch.none());
        long shortest = heldKarp(library, given).through((1 << villages) - 1);
        assertEquals(shortest, ordered.round().way(library));
        assertEquals(shortest, ordered.answer().value());
        assertTrue(ordered.answer().bound() <= shortest);
        assertEquals(List.copyOf(given.villages()), inOldOrder(given, ordered.round()));
        if (villages <= 7) {
          assertEquals(Proof.OPTIMAL, ordered.answer().proof());
        }
      }
    }
  }

  private static List<Village> inOldOrder(Round given, Round ordered) {
    List<Village> villages = new ArrayList<>(ordered.villages());
    villages.sort((one, other) -> given.villages().indexOf(one) - given.villages().indexOf(other));
    return villages;
  }

  private static HeldKarp heldKarp(Library library, Round round) {
    return new HeldKarp(
        new long[] {library.east(), library.north()},
        round.villages().stream()
            .map(village -> new long[] {village.east(), village.north()})
            .toArray(long[][]::new));
  }

  @Test
  void theJointModelCountsTheWaysAndTheUnmetWishes() {
    SplittableRandom random = new SplittableRandom(5);
    RoundsData data = RoundsReader.read(Folder.invented());
    JointModel joint = JointModel.of(data);
    for (int trial = 0; trial < 20; trial++) {
      List<Round> rounds = dealt(data, random);
      Plan plan = joint.plan(rounds);
      long ways = rounds.stream().mapToLong(round -> round.way(data.library())).sum();
      assertEquals(ways + unmetWishes(data, rounds), plan.value());
      assertEquals(rounds, joint.rounds(plan));
    }
  }

  /** The villages dealt out at random, no van more than it has stops for. */
  private static List<Round> dealt(RoundsData data, SplittableRandom random) {
    List<Village> left = new ArrayList<>(data.villages());
    List<Round> rounds = new ArrayList<>();
    int[] stops = {3, 3, 6};
    for (int van = 0; van < stops.length; van++) {
      List<Village> served = new ArrayList<>();
      for (int stop = 0; stop < stops[van]; stop++) {
        served.add(left.remove(random.nextInt(left.size())));
      }
      rounds.add(new Round(data.vans().get(van), served));
    }
    return rounds;
  }

  private static long unmetWishes(RoundsData data, List<Round> rounds) {
    long cost = 0;
    for (Wish wish : data.wishes()) {
      for (Round round : rounds) {
        boolean unmet =
            round.villages().contains(wish.village()) && !round.van().equals(wish.van());
        cost += unmet ? wish.metres() : 0;
      }
    }
    return cost;
  }

  @Test
  void theJointModelRefusesWhatTheOtherRefuses() {
    RoundsData data = RoundsReader.read(Folder.invented());
    RoundsModel rounds = RoundsModel.of(data);
    JointModel joint = JointModel.of(data);
    SplittableRandom random = new SplittableRandom(6);
    int kept = 0;
    for (int trial = 0; trial < 5000; trial++) {
      List<Round> dealt = dealt(data, random);
      Plan.Draft draft = rounds.model().plan();
      for (Round round : dealt) {
        round.villages().forEach(village -> draft.set(rounds.vanOf(village), round.van()));
      }
      boolean feasible = draft.evaluate().feasible();
      assertEquals(feasible, joint.plan(dealt).feasible());
      kept += feasible ? 1 : 0;
    }
    assertTrue(kept >= 5, "plans that keep all rules: " + kept);
  }

  @Test
  void oneVanOneVillageAndAVanThatStaysAtHome() {
    Village village = new Village("A", 1, 300, 400);
    List<Van> vans = List.of(new Van("full", 2), new Van("none", 0));
    RoundsData data =
        new RoundsData(List.of(village), vans, List.of(), List.of(), List.of(), new Library(0, 0));
    RoundsModel rounds = RoundsModel.of(data);
    Plan plan = rounds.model().plan().set(rounds.vanOf(village), vans.get(0)).evaluate();
    OrderRun run = OrderRun.of(rounds, plan, EFFORT, Watch.none());
    assertEquals(1000, run.stagedValue());
    assertEquals(1000, run.stagedBound());
    assertTrue(run.stagedProved());
    assertEquals(run.staged(), run.rounds());
    String page = OrderPage.of(run);
    assertTrue(page.contains("found nothing better"), page);
    assertTrue(page.contains("0 of 0       0  none"), page);
  }

  @Test
  void whatIsTooLargeIsSaidToBeSo() {
    List<Village> villages = villages(41, new SplittableRandom(7));
    List<Van> vans = List.of(new Van("a", 99), new Van("b", 99));
    RoundsData data = new RoundsData(villages, vans, List.of(), List.of(), List.of());
    RoundsModel rounds = RoundsModel.of(data);
    Plan.Draft draft = rounds.model().plan();
    villages.forEach(village -> draft.set(rounds.vanOf(village), vans.get(0)));
    assertFalse(OrderRun.possible(rounds, draft.evaluate()));
    assertTrue(OrderPage.without(true).contains("more than 40 villages"));
    villages.subList(0, 35).forEach(v -> draft.set(rounds.vanOf(v), vans.get(1)));
    Plan plan = draft.evaluate();
    assertTrue(OrderRun.possible(rounds, plan));
    OrderRun run = OrderRun.of(rounds, plan, Effort.draws(1), Watch.none());
    assertTrue(run.joint().isEmpty());
    assertFalse(run.stagedProved());
    String page = OrderPage.of(run);
    assertTrue(page.contains("too much here for one model"), page);
    assertFalse(page.contains("jointly  "), page);
  }

  private static List<Village> villages(int count, SplittableRandom random) {
    List<Village> villages = new ArrayList<>();
    for (int v = 0; v < count; v++) {
      villages.add(new Village("V" + v, 1, random.nextInt(9000), random.nextInt(9000)));
    }
    return villages;
  }
}
