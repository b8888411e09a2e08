package dev.couplet.audit;

import dev.couplet.form.State;
import dev.couplet.lower.Lowered;
import dev.couplet.model.Decision;
import dev.couplet.model.Plan;
import dev.couplet.model.Statement;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashSet;
import java.util.List;
import java.util.Set;

/**
 * Which literals of one decision each pattern of its bits stands for, found by reading plans from
 * the form: no code is taken on trust, since every value is compared later.
 *
 * <p>Where bit k alone makes literal k alone hold, and all bits all literals, the bits are taken to
 * be the literals; else every pattern of them is read and tabulated.
 */
final class DecisionBits {
  /** The most bits of a decision whose patterns are tabulated. */
  static final int MOST_TABULATED = 18;

  private final Lowered lowered;
  private final Decision decision;
  private final int firstLiteral;
  private final int literals;
  private final int firstBit;
  private final int bits;
  private final int[][] table;
  private final boolean[] undecided;

  DecisionBits(Lowered lowered, Decision decision) {
    Statement statement = lowered.statement();
    List<Integer> own = lowered.bits(decision);
    this.lowered = lowered;
    this.decision = decision;
    this.firstLiteral = statement.firstLiteral(decision);
    this.literals = statement.literals(decision);
    this.firstBit = own.isEmpty() ? 0 : own.get(0);
    this.bits = own.size();
    int patterns = plain() ? 0 : 1 << requireTabulated();
    this.table = new int[patterns][];
    this.undecided = new boolean[patterns];
    for (int pattern = 0; pattern < patterns; pattern++) {
      Plan plan = read(pattern);
      table[pattern] = holding(plan);
      undecided[pattern] = plan.undecided().contains(decision);
    }
  }

  private boolean plain() {
    boolean plain = bits == literals;
    for (int k = 0; k < bits && plain; k++) {
      plain = Arrays.equals(holding(read(1L << k)), new int[] {firstLiteral + k});
    }
    return plain && holding(read((1L << bits) - 1)).length == literals;
  }

  private int requireTabulated() {
    if (bits > MOST_TABULATED) {
      throw new IllegalArgumentException(
          "decision '"
              + decision.name()
              + "' is coded in "
              + bits
              + " bits that are not its literals; an exhaustive audit takes at most "
              + MOST_TABULATED
              + " of them: audit a smaller model made by the same code");
    }
    return bits;
  }

  private Plan read(long pattern) {
    boolean[] all = new boolean[lowered.qubo().size()];
    for (int k = 0; k < bits; k++) {
      all[firstBit + k] = (pattern >>> k & 1) != 0;
    }
    return lowered.plan(State.of(all));
  }

  private int[] holding(Plan plan) {
    List<Integer> holding = new ArrayList<>();
    for (int k = 0; k < literals; k++) {
      if (plan.literals().get(firstLiteral + k)) {
        holding.add(firstLiteral + k);
      }
    }
    return holding.stream().mapToInt(Integer::intValue).toArray();
  }

  /** Whether the bits are the literals. */
  boolean isPlain() {
    return table.length == 0;
  }

  int firstBit() {
    return firstBit;
  }

  int bits() {
    return bits;
  }

  /** The literal that a bit is, where they are the same. */
  int literal(int bit) {
    return firstLiteral + bit - firstBit;
  }

  /** The literals that hold under a pattern of all decision bits, where it is tabulated. */
  int[] holding(long pattern) {
    return table[own(pattern)];
  }

  /** Whether a pattern of all decision bits stands for no value, where it is tabulated. */
  boolean undecided(long pattern) {
    return undecided[own(pattern)];
  }

  private int own(long pattern) {
    return (int) (pattern >>> firstBit & (1L << bits) - 1);
  }

  /** How many different values patterns stand for, where they are tabulated. */
  long values() {
    Set<List<Integer>> different = new HashSet<>();
    for (int pattern = 0; pattern < table.length; pattern++) {
      if (!undecided[pattern]) {
        different.add(Arrays.stream(table[pattern]).boxed().toList());
      }
    }
    return different.size();
  }

  Decision decision() {
    return decision;
  }
}
