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
 * Which bits stand for which literals of a whole model, by reading few plans: the same pattern is
 * written into all decisions at once, which are read each from its own bits.
 *
 * <p>Bits are taken to be the literals where they read so under patterns that tell every two bits
 * apart; other codes are tabulated.
 */
final class CodedUnits {
  /** The most bits of a code that is tabulated. */
  static final int MOST_TABULATED = 12;

  private final Lowered lowered;
  private final Statement statement;
  private final List<CodedUnit> units = new ArrayList<>();
  private final int[] ofBit;
  private final int[] ofLiteral;

  CodedUnits(Lowered lowered, Notes notes) {
    this.lowered = lowered;
    this.statement = lowered.statement();
    this.ofBit = new int[lowered.decisionBits()];
    this.ofLiteral = new int[statement.literals()];
    List<CodedUnit> drafts = new ArrayList<>();
    boolean[] plain = plainDecisions();
    int most = 0;
    for (int d = 0; d < statement.decisions().size(); d++) {
      for (CodedUnit unit : unitsOf(statement.decisions().get(d), plain[d])) {
        drafts.add(unit);
        most = unit.plain() ? most : Math.max(most, unit.bits());
      }
    }
    if (most <= MOST_TABULATED) {
      tabulate(drafts, most);
    } else {
      drafts.stream()
          .filter(unit -> !unit.plain() && unit.bits() > MOST_TABULATED)
          .forEach(unit -> notes.add("code", tooLong(unit)));
    }
    units.addAll(drafts);
    for (int u = 0; u < units.size(); u++) {
      CodedUnit unit = units.get(u);
      Arrays.fill(ofBit, unit.firstBit(), unit.firstBit() + unit.bits(), u);
      Arrays.fill(ofLiteral, unit.firstLiteral(), unit.firstLiteral() + unit.literals(), u);
    }
  }

  private static String tooLong(CodedUnit unit) {
    return "not certified: '"
        + unit.decision().name()
        + "' is coded in "
        + unit.bits()
        + " bits that are not its literals, at most "
        + MOST_TABULATED
        + " are looked at; choose one bit an option there, or audit a smaller model";
  }

  /** Reads patterns under which every two bits differ once, and their opposites. */
  private boolean[] plainDecisions() {
    List<Decision> decisions = statement.decisions();
    boolean[] plain = new boolean[decisions.size()];
    for (int d = 0; d < plain.length; d++) {
      plain[d] = lowered.bits(decisions.get(d)).size() == statement.literals(decisions.get(d));
    }
    int rounds = 64 - Long.numberOfLeadingZeros(lowered.decisionBits());
    for (int round = 0; round < 2 * rounds; round++) {
      boolean[] bits = new boolean[lowered.qubo().size()];
      for (int bit = 0; bit < lowered.decisionBits(); bit++) {
        bits[bit] = (bit >>> (round / 2) & 1) == round % 2;
      }
      State literals = lowered.plan(State.of(bits)).literals();
      for (int d = 0; d < plain.length; d++) {
        plain[d] = plain[d] && same(decisions.get(d), bits, literals);
      }
    }
    return plain;
  }

  private boolean same(Decision decision, boolean[] bits, State literals) {
    int literal = statement.firstLiteral(decision);
    boolean same = true;
    for (int bit : lowered.bits(decision)) {
      same &= bits[bit] == literals.get(literal++);
    }
    return same;
  }

  private List<CodedUnit> unitsOf(Decision decision, boolean plain) {
    int groups = statement.exactlyOne(decision).size();
    int parts = Math.max(1, groups);
    List<Integer> own = lowered.bits(decision);
    int firstBit = own.isEmpty() ? 0 : own.get(0);
    int literals = statement.literals(decision) / parts;
    int bits = own.size() / parts;
    List<CodedUnit> cut = new ArrayList<>();
    for (int g = 0; g < parts; g++) {
      cut.add(
          new CodedUnit(
              decision,
              statement.firstLiteral(decision) + g * literals,
              literals,
              firstBit + g * bits,
              bits,
              groups > 0,
              plain ? List.of() : List.of(CodedUnit.BROKEN)));
    }
    return cut;
  }

  private void tabulate(List<CodedUnit> drafts, int most) {
    List<List<List<Integer>>> tables = new ArrayList<>();
    drafts.forEach(unit -> tables.add(new ArrayList<>()));
    boolean any = drafts.stream().anyMatch(unit -> !unit.plain());
    for (int pattern = 0; any && pattern < 1 << most; pattern++) {
      boolean[] bits = new boolean[lowered.qubo().size()];
      for (CodedUnit unit : drafts) {
        for (int k = 0; k < unit.bits() && !unit.plain(); k++) {
          bits[unit.firstBit() + k] = (pattern >>> k & 1) != 0;
        }
      }
      Plan plan = lowered.plan(State.of(bits));
      Set<Decision> undecided = new HashSet<>(plan.undecided());
      for (int u = 0; u < drafts.size(); u++) {
        CodedUnit unit = drafts.get(u);
        if (!unit.plain() && pattern < 1 << unit.bits()) {
          boolean broken = undecided.contains(unit.decision());
          tables.get(u).add(broken ? CodedUnit.BROKEN : holding(unit, plan.literals()));
        }
      }
    }
    for (int u = 0; u < tables.size(); u++) {
      CodedUnit unit = drafts.get(u);
      drafts.set(
          u,
          new CodedUnit(
              unit.decision(),
              unit.firstLiteral(),
              unit.literals(),
              unit.firstBit(),
              unit.bits(),
              unit.grouped(),
              tables.get(u)));
    }
  }

  private static List<Integer> holding(CodedUnit unit, State literals) {
    List<Integer> holding = new ArrayList<>();
    for (int k = 0; k < unit.literals(); k++) {
      if (literals.get(unit.firstLiteral() + k)) {
        holding.add(unit.firstLiteral() + k);
      }
    }
    return holding;
  }

  List<CodedUnit> all() {
    return units;
  }

  CodedUnit ofBit(int bit) {
    return units.get(ofBit[bit]);
  }

  CodedUnit ofLiteral(int literal) {
    return units.get(ofLiteral[literal]);
  }
}
