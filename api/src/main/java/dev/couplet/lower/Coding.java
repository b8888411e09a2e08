package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import dev.couplet.lower.ChoiceEncoding.Code;
import dev.couplet.model.Count;
import dev.couplet.model.Decision;
import dev.couplet.model.Plan;
import dev.couplet.model.Statement;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;

/**
 * Which bits stand for which decision, in both directions.
 *
 * <p>Invariant: {@code bitOf[literal]} is the bit that is 1 exactly where the literal holds, or -1
 * if there is none; then {@code over[literal]} is the literal as a polynomial over all decision
 * bits. {@code start[literal]} is where the bits of the literal's decision begin, {@code
 * codeOf[bit]} which of the codes a bit is of, or -1, and {@code folded} the codes whose literals
 * are not all bits. Immutable once made.
 */
final class Coding {
  /** The literals {@code first ..} in code, their bits beginning at {@code bit}. */
  record Coded(Decision decision, int first, int bit, Code code) {}

  private final Statement statement;
  private final List<Coded> coded = new ArrayList<>();
  private final List<Coded> folded = new ArrayList<>();
  private final List<Recoded> recoded = new ArrayList<>();
  private final List<String> meanings = new ArrayList<>();
  private final int[] bitOf;
  private final int[] start;
  private final Polynomial[] over;
  private final int[] codeOf;
  private final boolean sameNumbers;

  Coding(Statement statement, Lowering settings) {
    this.statement = statement;
    this.bitOf = new int[statement.literals()];
    this.start = new int[statement.literals() + 1];
    Arrays.fill(bitOf, -1);
    this.over = new Polynomial[statement.literals()];
    Map<Object, Code> codes = new HashMap<>();
    for (Decision decision : statement.decisions()) {
      allot(decision, settings.codes(), codes);
    }
    start[statement.literals()] = meanings.size();
    boolean same = bitOf.length == meanings.size();
    for (int literal = 0; literal < bitOf.length; literal++) {
      same &= bitOf[literal] == literal;
    }
    this.sameNumbers = same;
    folded.forEach(this::spread);
    this.codeOf = new int[meanings.size()];
    Arrays.fill(codeOf, -1);
    for (int c = 0; c < coded.size(); c++) {
      Coded one = coded.get(c);
      Arrays.fill(codeOf, one.bit(), one.bit() + one.code().bits(), c);
    }
  }

  private void allot(Decision decision, Codes settings, Map<Object, Code> codes) {
    int first = statement.firstLiteral(decision);
    start[first] = meanings.size();
    List<Integer> free = statement.free(decision);
    if (decision instanceof Count count && !free.isEmpty() && recode(count, settings)) {
      return;
    }
    for (int literal : free) {
      bitOf[literal] = meanings.size();
      meanings.add(statement.describe(literal));
    }
    for (List<Integer> group : statement.exactlyOne(decision)) {
      ChoiceEncoding encoding = settings.of(decision);
      Code code =
          codes.computeIfAbsent(
              List.of(encoding, group.size()), key -> encoding.code(group.size()));
      Coded one = new Coded(decision, group.get(0), meanings.size(), code);
      coded.add(one);
      name(one);
      if (!isPlain(one)) {
        folded.add(one);
      }
    }
  }

  /** Allots bits that are not the digits of a count; false where they are the same. */
  private boolean recode(Count count, Codes settings) {
    long width = count.highest() - count.lowest();
    CountEncoding.Code digits = CountEncoding.binary().code(width);
    CountEncoding.Code code = settings.of(count).code(width);
    if (code.amounts().equals(digits.amounts()) && code.penalty().terms() == 0) {
      return false;
    }
    int first = statement.firstLiteral(count);
    recoded.add(new Recoded(count, first, digits, meanings.size(), code));
    code.amounts().forEach(amount -> meanings.add(amount + " of '" + count.name() + "'"));
    return true;
  }

  private void name(Coded one) {
    Code code = one.code();
    String[] names = new String[code.bits()];
    Arrays.setAll(names, bit -> "bit " + bit + " of '" + one.decision().name() + "'");
    for (int k = 0; k < code.options().size(); k++) {
      int bit = plain(code.options().get(k));
      bitOf[one.first() + k] = bit < 0 ? -1 : one.bit() + bit;
      if (bit >= 0) {
        names[bit] = statement.describe(one.first() + k);
      }
    }
    meanings.addAll(Arrays.asList(names));
  }

  /** The bit that a polynomial is, or -1 if it is none. */
  private static int plain(Polynomial literal) {
    int[] bit = {-1};
    if (literal.terms() == 1 && literal.degree() == 1) {
      literal.forEachTerm((coefficient, bits) -> bit[0] = coefficient == 1 ? bits[0] : -1);
    }
    return bit[0];
  }

  /** Writes the literals that are no bit over the bits of the whole form. */
  private void spread(Coded one) {
    for (int k = 0; k < one.code().options().size(); k++) {
      if (bitOf[one.first() + k] < 0) {
        over[one.first() + k] = shifted(one.code().options().get(k), one.bit());
      }
    }
  }

  private Polynomial shifted(Polynomial local, int by) {
    Polynomial.Builder moved = Polynomial.builder(bits());
    local.forEachTerm(
        (coefficient, bits) -> {
          for (int k = 0; k < bits.length; k++) {
            bits[k] += by;
          }
          moved.add(coefficient, bits);
        });
    return moved.build();
  }

  /** Whether each literal is the bit of the same number. */
  boolean literalsAreBits() {
    return sameNumbers;
  }

  /** The number of decision bits. */
  int bits() {
    return meanings.size();
  }

  /** What each decision bit stands for. */
  List<String> meanings() {
    return meanings;
  }

  /** The bits of a decision: the first, and the one after the last. */
  int[] bitsOf(Decision decision) {
    int first = statement.firstLiteral(decision);
    return new int[] {start[first], start[first + statement.literals(decision)]};
  }

  /** The groups of literals of which one holds, each with its code. */
  List<Coded> coded() {
    return coded;
  }

  /** The counts whose bits are not their digits. */
  List<Recoded> recoded() {
    return recoded;
  }

  /** The penalty of such a count's code over all decision bits. */
  Polynomial penalty(Recoded one) {
    return shifted(one.code().penalty(), one.bit());
  }

  /** The penalty of a code over all decision bits. */
  Polynomial penalty(Coded one) {
    return shifted(one.code().penalty(), one.bit());
  }

  /** The sets of bits of which exactly one is 1 under any plan. */
  List<List<Integer>> exactlyOne() {
    List<List<Integer>> sets = new ArrayList<>();
    for (Coded one : coded) {
      List<Integer> set = new ArrayList<>();
      for (int k = 0; k < one.code().options().size() && bitOf[one.first() + k] >= 0; k++) {
        set.add(bitOf[one.first() + k]);
      }
      if (set.size() == one.code().options().size()) {
        sets.add(set);
      }
    }
    return sets;
  }

  /** Whether all literals of a polynomial are bits. */
  boolean ofBits(Polynomial literals) {
    boolean[] plain = {true};
    literals.forEachTerm(
        (coefficient, product) -> {
          for (int literal : product) {
            plain[0] &= bitOf[literal] >= 0;
          }
        });
    return plain[0];
  }

  /** Whether a polynomial over literals has digits of a count whose bits are others. */
  boolean hasDigits(Polynomial literals) {
    for (int literal : Terms.variables(literals)) {
      if (recoded.stream().anyMatch(one -> one.hasDigit(literal))) {
        return true;
      }
    }
    return false;
  }

  /**
   * The decisions, each once, of which a polynomial over bits has bits that are not all literals.
   */
  Set<Decision> codedIn(Polynomial bits) {
    Set<Decision> decisions = new LinkedHashSet<>();
    for (int bit : Terms.variables(bits)) {
      int at = bit < bits() ? codeOf[bit] : -1;
      if (at >= 0 && !isPlain(coded.get(at))) {
        decisions.add(coded.get(at).decision());
      }
    }
    return decisions;
  }

  /** A polynomial over literals as one over decision bits. */
  Polynomial overBits(Polynomial literals) {
    if (sameNumbers) {
      return literals;
    }
    Polynomial.Builder sum = Polynomial.builder(bits());
    withoutDigits(literals).forEachTerm((coefficient, product) -> add(sum, coefficient, product));
    return sum.build();
  }

  /** Digits of recoded counts replaced by bits, which are numbered from the last literal on. */
  private Polynomial withoutDigits(Polynomial literals) {
    if (recoded.isEmpty()) {
      return literals;
    }
    Set<Recoded> occurring = new LinkedHashSet<>();
    for (int literal : Terms.variables(literals)) {
      recoded.stream().filter(one -> one.hasDigit(literal)).forEach(occurring::add);
    }
    Polynomial result = literals.inVariables(bitOf.length + bits());
    for (Recoded one : occurring) {
      result = one.overBits(result, bitOf.length);
    }
    return result;
  }

  private void add(Polynomial.Builder sum, double coefficient, int[] product) {
    int[] plain = new int[product.length];
    int count = 0;
    Polynomial others = null;
    for (int literal : product) {
      if (literal >= bitOf.length) {
        plain[count++] = literal - bitOf.length;
      } else if (bitOf[literal] >= 0) {
        plain[count++] = bitOf[literal];
      } else {
        others = others == null ? over[literal] : others.times(over[literal]);
      }
    }
    int[] bits = Arrays.copyOf(plain, count);
    if (others == null) {
      sum.add(coefficient, bits);
    } else {
      sum.add(others.times(Polynomial.builder(bits()).add(coefficient, bits).build()), 1);
    }
  }

  /** The plan that a pattern of at least the decision bits stands for. */
  Plan plan(State pattern) {
    boolean[] literals = new boolean[bitOf.length];
    for (int literal = 0; literal < bitOf.length; literal++) {
      literals[literal] = bitOf[literal] >= 0 && pattern.get(bitOf[literal]);
    }
    Set<Decision> undecided = new HashSet<>();
    for (Coded one : folded) {
      int option = one.code().stoodFor(own(one, pattern));
      for (int k = 0; k < one.code().options().size(); k++) {
        literals[one.first() + k] = k == option;
      }
      if (option < 0) {
        undecided.add(one.decision());
      }
    }
    for (Recoded one : recoded) {
      if (!one.read(pattern, literals)) {
        undecided.add(one.count());
      }
    }
    return statement.plan(State.of(literals), undecided);
  }

  private boolean isPlain(Coded one) {
    for (int k = 0; k < one.code().options().size(); k++) {
      if (bitOf[one.first() + k] < 0) {
        return false;
      }
    }
    return true;
  }

  private static State own(Coded one, State pattern) {
    boolean[] bits = new boolean[one.code().bits()];
    for (int bit = 0; bit < bits.length; bit++) {
      bits[bit] = pattern.get(one.bit() + bit);
    }
    return State.of(bits);
  }

  /** Writes the pattern of a plan into the decision bits. */
  void write(State literals, boolean[] bits) {
    recoded.forEach(one -> one.write(literals, bits));
    for (int literal = 0; literal < bitOf.length; literal++) {
      if (bitOf[literal] >= 0) {
        bits[bitOf[literal]] = literals.get(literal);
      }
    }
    for (Coded one : folded) {
      for (int k = 0; k < one.code().options().size(); k++) {
        if (literals.get(one.first() + k)) {
          State pattern = one.code().patterns().get(k);
          for (int bit = 0; bit < one.code().bits(); bit++) {
            bits[one.bit() + bit] = pattern.get(bit);
          }
        }
      }
    }
  }
}
