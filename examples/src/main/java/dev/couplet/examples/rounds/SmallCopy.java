package dev.couplet.examples.rounds;

import dev.couplet.model.Plan;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import java.util.stream.Stream;

/**
 * A part of the data that is small enough to try everything on: four villages and two vans, with
 * every kind of rule that the data has.
 *
 * <p>Villages come from the first pair that must share a van, the first that must not, and then
 * from wishes; these two pairs are kept, and the wishes. The vans' capacities are cut down in
 * proportion to the crates, so that loads are as tight as in the whole, and raised together, crate
 * by crate, until there is a plan: with two vans and one pair of each kind there is one at the
 * last.
 */
final class SmallCopy {
  private static final int VILLAGES = 4;
  private static final int VANS = 2;

  private final RoundsData whole;

  private SmallCopy(RoundsData whole) {
    this.whole = whole;
  }

  static RoundsData of(RoundsData whole) {
    return new SmallCopy(whole).data();
  }

  private RoundsData data() {
    List<Village> villages = villages();
    List<Wish> wishes =
        whole.wishes().stream().filter(w -> villages.contains(w.village())).toList();
    List<Van> vans =
        first(VANS, Stream.concat(wishes.stream().map(Wish::van), whole.vans().stream()));
    long most = villages.stream().mapToLong(Village::crates).sum();
    RoundsData copy = copy(villages, vans, wishes, 0);
    for (int more = 1; more <= most && !hasPlan(copy); more++) {
      copy = copy(villages, vans, wishes, more);
    }
    return copy;
  }

  private List<Village> villages() {
    Stream<Village> together = whole.together().stream().limit(1).flatMap(SmallCopy::both);
    Stream<Village> apart = whole.apart().stream().limit(1).flatMap(SmallCopy::both);
    Stream<Village> wishing = whole.wishes().stream().map(Wish::village);
    Stream<Village> paired = Stream.concat(together, apart);
    Stream<Village> others = Stream.concat(wishing, whole.villages().stream());
    List<Village> chosen = first(VILLAGES, Stream.concat(paired, others));
    return whole.villages().stream().filter(chosen::contains).toList();
  }

  private static Stream<Village> both(Pair pair) {
    return Stream.of(pair.one(), pair.other());
  }

  private static <T> List<T> first(int most, Stream<T> items) {
    Set<T> distinct = new LinkedHashSet<>(items.toList());
    return distinct.stream().limit(most).toList();
  }

  private RoundsData copy(List<Village> villages, List<Van> vans, List<Wish> wishes, int more) {
    List<Van> cut = cut(vans, villages, more);
    List<Wish> kept = new ArrayList<>();
    for (Wish wish : wishes) {
      int van = vans.indexOf(wish.van());
      if (van >= 0) {
        kept.add(new Wish(wish.village(), cut.get(van), wish.metres()));
      }
    }
    return new RoundsData(
        villages, cut, kept, firstOf(whole.together()), firstOf(whole.apart()), whole.library());
  }

  /** Capacities in the same proportion to the crates as in the whole, and so many more. */
  private List<Van> cut(List<Van> vans, List<Village> villages, int more) {
    long crates = villages.stream().mapToLong(Village::crates).sum();
    long carried = vans.stream().mapToLong(Van::capacity).sum();
    List<Van> cut = new ArrayList<>();
    for (Van van : vans) {
      double share = carried == 0 ? 0 : (double) van.capacity() / carried;
      double room = whole.crates() == 0 ? 1 : (double) whole.capacity() / whole.crates();
      cut.add(new Van(van.name(), (int) Math.floor(share * room * crates) + more));
    }
    return cut;
  }

  private static List<Pair> firstOf(List<Pair> pairs) {
    return pairs.stream().limit(1).toList();
  }

  /** Tries every plan. */
  private static boolean hasPlan(RoundsData data) {
    RoundsModel rounds = RoundsModel.of(data);
    int vans = data.vans().size();
    long plans = Math.round(StrictMath.pow(vans, data.villages().size()));
    for (long plan = 0; plan < plans; plan++) {
      Plan.Draft draft = rounds.model().plan();
      long rest = plan;
      for (Village village : data.villages()) {
        draft.set(rounds.vanOf(village), data.vans().get((int) (rest % vans)));
        rest /= vans;
      }
      if (draft.evaluate().feasible()) {
        return true;
      }
    }
    return false;
  }
}
