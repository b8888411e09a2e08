package dev.couplet.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.FormatException;
import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import java.io.IOException;
import java.io.StringReader;
import java.math.BigInteger;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;

/** Random texts and models, against an evaluator that knows nothing of the library. */
class PseudoBooleanTextProperties {
  private static final int BITS = 6;

  private static Model read(String text) throws IOException {
    return PseudoBooleanText.read("random", new StringReader(text));
  }

  private static String write(Statement statement) throws IOException {
    StringBuilder text = new StringBuilder();
    PseudoBooleanText.write(statement, text);
    return text.toString();
  }

  /** A text of the format: sums of one to four products of up to three literals. */
  private static String text(SplittableRandom random, boolean header) {
    int constraints = random.nextInt(4);
    StringBuilder text = new StringBuilder();
    if (header) {
      text.append("* #variable= " + BITS + " #constraint= " + constraints + "\n");
    }
    if (random.nextBoolean()) {
      text.append("min: ").append(sum(random)).append(";\n");
    }
    for (int c = 0; c < constraints; c++) {
      String relation = random.nextInt(4) == 0 ? "= " : ">= ";
      text.append(sum(random)).append(relation).append(random.nextInt(-4, 5)).append(" ;\n");
      text.append(random.nextInt(5) == 0 ? "* a note\n" : "");
    }
    return text.toString();
  }

  private static String sum(SplittableRandom random) {
    StringBuilder sum = new StringBuilder();
    for (int t = random.nextInt(1, 5); t > 0; t--) {
      int coefficient = random.nextInt(-9, 10);
      sum.append(coefficient >= 0 && random.nextBoolean() ? "+" : "").append(coefficient);
      sum.append(' ');
      for (int k = random.nextInt(1, 4); k > 0; k--) {
        sum.append(random.nextInt(3) == 0 ? "~x" : "x");
        sum.append(random.nextInt(1, BITS + 1)).append(' ');
      }
    }
    return sum.toString();
  }

  /** What a sum of a text is worth, word by word. */
  private static long worth(String sum, long pattern) {
    long worth = 0;
    long term = 0;
    for (String word : sum.strip().split(" ", -1)) {
      if (word.contains("x")) {
        long bit = pattern >>> Integer.parseInt(word.substring(word.indexOf('x') + 1)) - 1 & 1;
        term *= word.startsWith("~") ? 1 - bit : bit;
      } else {
        worth += term;
        term = Long.parseLong(word);
      }
    }
    return worth + term;
  }

  /** Whether a line of a text holds. */
  private static boolean holds(String line, long pattern) {
    String[] sides = line.replace(";", "").split(">?=", -1);
    long left = worth(sides[0], pattern);
    long right = Long.parseLong(sides[1].strip());
    return line.contains(">=") ? left >= right : left == right;
  }

  @Property(tries = 500)
  void everyAssignmentIsWorthWhatTheTextSays(@ForAll long seed) throws IOException {
    String text = text(new SplittableRandom(seed), true);
    List<String> lines = text.lines().filter(line -> !line.startsWith("*")).toList();
    List<String> constraints = lines.stream().filter(line -> !line.startsWith("min")).toList();
    boolean satisfiable = true;
    for (String line : constraints) {
      boolean any = false;
      for (long pattern = 0; pattern < 1 << BITS; pattern++) {
        any |= holds(line, pattern);
      }
      satisfiable &= any;
    }
    Statement statement;
    try {
      statement = read(text).snapshot();
    } catch (FormatException refused) {
      assertTrue(!satisfiable && refused.getMessage().contains("no plan"), refused.getMessage());
      return;
    }
    for (long pattern = 0; pattern < 1 << BITS; pattern++) {
      long assigned = pattern;
      Plan plan = statement.plan(State.ofWords(BITS, pattern));
      assertEquals(constraints.stream().allMatch(line -> holds(line, assigned)), plan.feasible());
      for (String line : lines) {
        if (line.startsWith("min: ")) {
          assertEquals(worth(line.substring(5).replace(";", ""), pattern), plan.value());
        }
      }
    }
  }

  @Property(tries = 500)
  void readingWhatWasWrittenIsTheSame(@ForAll long seed) throws IOException {
    Statement first;
    try {
      first = read(text(new SplittableRandom(seed), false)).snapshot();
    } catch (FormatException unsatisfiable) {
      return;
    }
    Statement second = read(write(first)).snapshot();
    assertSame(first, second);
    assertEquals(write(second), write(read(write(second)).snapshot()));
  }

  @Property(tries = 500)
  void modelsComeBack(@ForAll long seed) throws IOException {
    SplittableRandom random = new SplittableRandom(seed);
    Model model = Model.named("m");
    List<Bit> bits = new ArrayList<>();
    for (int i = 0; i < BITS; i++) {
      bits.add(model.bit("b" + i));
    }
    for (int r = random.nextInt(3); r > 0; r--) {
      Expr expr = expr(random, bits, 1);
      double low = random.nextInt(-6, 4);
      try {
        model.require("r" + r, expr.between(low, low + random.nextInt(3)));
      } catch (IllegalArgumentException unsatisfiable) {
        continue;
      }
    }
    double unit = Math.scalb(1.0, -random.nextInt(4)); // decimals whose sums do not round
    if (random.nextBoolean()) {
      model.maximize("o", expr(random, bits, unit).plus(random.nextInt(-9, 9) * 0.125));
    } else {
      model.minimize("o", expr(random, bits, unit));
    }
    Statement read = read(write(model.snapshot())).snapshot();
    assertSame(model.snapshot(), read);
    assertEquals(model.snapshot().sense(), read.sense());
  }

  private static Expr expr(SplittableRandom random, List<Bit> bits, double unit) {
    List<Expr> parts = new ArrayList<>();
    for (int t = random.nextInt(6); t > 0; t--) {
      Expr product = Expr.constant(1);
      for (int k = random.nextInt(1, 4); k > 0; k--) {
        Bit bit = bits.get(random.nextInt(BITS));
        product = product.times(random.nextInt(4) == 0 ? bit.not() : bit);
      }
      parts.add(product.times(random.nextInt(-99, 100) * unit));
    }
    return Expr.sum(parts);
  }

  /** The limits of each rule, each as "at least" or "equal", without common factors. */
  private static List<String> limits(Statement statement) {
    List<String> limits = new ArrayList<>();
    List<Rule.Part> parts =
        statement.rules().stream().flatMap(rule -> rule.parts().stream()).toList();
    for (Rule.Part rule : parts) {
      boolean equal = rule.lowest() == rule.highest();
      if (rule.terms().terms() > 0 && Double.isFinite(rule.lowest())) {
        limits.add(limit(rule.terms(), equal ? " = " : " >= ", (long) rule.lowest()));
      }
      if (rule.terms().terms() > 0 && Double.isFinite(rule.highest()) && !equal) {
        limits.add(limit(rule.terms().times(-1), " >= ", (long) -rule.highest()));
      }
    }
    return limits;
  }

  private static String limit(Polynomial terms, String relation, long limit) {
    BigInteger[] common = {BigInteger.valueOf(limit)};
    terms.forEachTerm(
        (coefficient, literals) ->
            common[0] = common[0].gcd(BigInteger.valueOf((long) coefficient)));
    long factor = common[0].longValue();
    StringBuilder text = new StringBuilder();
    terms.forEachTerm(
        (coefficient, literals) ->
            text.append((long) coefficient / factor).append(Arrays.toString(literals)));
    return text.append(relation).append(limit / factor).toString();
  }

  private static void assertSame(Statement first, Statement second) {
    assertEquals(first.literals(), second.literals());
    assertEquals(first.objective(), second.objective());
    assertEquals(limits(first), limits(second));
  }

  /** Letters of the format, so that many texts come near to being right. */
  private static final String LETTERS = "x~ 01-+;=>\nmin:*#couplet";

  @Property(tries = 2000)
  void brokenTextsAreFaultsOfFormat(@ForAll long seed) throws IOException {
    SplittableRandom random = new SplittableRandom(seed);
    StringBuilder text = new StringBuilder(text(random, random.nextBoolean()));
    if (random.nextInt(3) == 0) {
      text.insert(0, "*couplet constant 1\n*couplet decimals 2\n*couplet maximize\n");
    }
    for (int k = random.nextInt(1, 6); k > 0; k--) {
      int at = random.nextInt(text.length() + 1);
      if (random.nextBoolean() && at < text.length()) {
        text.deleteCharAt(at);
      } else {
        text.insert(at, LETTERS.charAt(random.nextInt(LETTERS.length())));
      }
    }
    try {
      assertTrue(read(text.toString()).snapshot().literals() >= 0);
    } catch (FormatException fault) {
      assertTrue(fault.line() >= 1 && fault.column() >= 1, fault.getMessage());
      assertTrue(fault.line() <= text.chars().filter(c -> c == '\n').count() + 1);
    }
  }
}
