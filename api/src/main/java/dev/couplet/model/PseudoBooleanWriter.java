package dev.couplet.model;

import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import dev.couplet.model.Statement.Sense;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;

/**
 * Writes one OPB text: works everything out first, so that nothing is written of what is refused,
 * then writes some kilobytes at a time.
 */
final class PseudoBooleanWriter {
  private static final int CHUNK = 1 << 14;

  /** A limited sum as the format has it: {@code sign * (terms + counts) >= limit}, or equal. */
  private record Line(
      String name, Polynomial terms, List<Count> counts, int sign, double limit, boolean equal) {}

  /** A term in a variable that counts misses. */
  private record Count(long coefficient, int variable) {}

  private final Statement statement;
  private final List<Line> lines = new ArrayList<>();
  private final PseudoBooleanObjective objective;
  private final StringBuilder text = new StringBuilder(CHUNK + 100);
  private final List<String> counters = new ArrayList<>();

  PseudoBooleanWriter(Statement statement) {
    this.statement = statement;
    this.objective = new PseudoBooleanObjective(statement);
    for (Decision decision : statement.decisions()) {
      statement.exactlyOne(decision).forEach(group -> addCode(decision, group));
      if (statement.isFixed(decision)) {
        addFixed(decision);
      }
    }
    for (Rule rule : statement.rules()) {
      addRule(rule);
    }
    objective.requireWhole();
  }

  private void addCode(Decision decision, List<Integer> group) {
    Polynomial.Builder sum = Polynomial.builder(statement.literals());
    group.forEach(literal -> sum.add(1, literal));
    lines.add(new Line(decision.code(), sum.build(), List.of(), 1, 1, true));
  }

  private void addFixed(Decision decision) {
    State fixed = statement.withFixed(State.zeros(statement.literals()));
    int first = statement.firstLiteral(decision);
    for (int literal = first; literal < first + statement.literals(decision); literal++) {
      Polynomial fact = Polynomial.builder(statement.literals()).add(1, literal).build();
      String name = "'" + decision.name() + "' is fixed";
      lines.add(new Line(name, fact, List.of(), 1, fixed.bit(literal), true));
    }
  }

  private void addRule(Rule rule) {
    if (rule.squared()) {
      throw new IllegalArgumentException(
          "rule '"
              + rule.name()
              + "' costs the square of its amount, which the format cannot say; prefer it at a cost"
              + " for each unit, or state the square as an objective");
    }
    for (Rule.Part part : rule.parts()) {
      if (part.terms().terms() > 0 && (rule.required() || rule.costPerUnit() != 0)) {
        addPart(rule, part);
      }
    }
  }

  private void addPart(Rule rule, Rule.Part part) {
    List<Count> over = misses(rule, part, part.range().highest() - part.highest(), -1);
    List<Count> under = misses(rule, part, part.lowest() - part.range().lowest(), 1);
    if (part.step() > 1 || part.lowest() == part.highest()) {
      List<Count> all = new ArrayList<>(over);
      all.addAll(under);
      double steps = (part.highest() - part.lowest()) / part.step();
      String meaning = "the steps of '" + rule.name() + "'";
      all.addAll(counts(meaning, steps, -(long) part.step(), BigDecimal.ZERO));
      lines.add(new Line(rule.name(), part.terms(), all, 1, part.lowest(), true));
      return;
    }
    if (Double.isFinite(part.lowest())) {
      lines.add(new Line(rule.name(), part.terms(), under, 1, part.lowest(), false));
    }
    if (Double.isFinite(part.highest())) {
      lines.add(new Line(rule.name(), part.terms(), over, -1, part.highest(), false));
    }
  }

  /**
   * Variables that count the misses of a preferred rule on one side, up to the most there can be.
   */
  private List<Count> misses(Rule rule, Rule.Part part, double most, int sign) {
    boolean counted = !rule.required() && Double.isFinite(most);
    double between = Math.floor(part.step() / 2);
    BigDecimal price = Text.decimal(part.cost(1));
    String meaning = "the miss of '" + rule.name() + "'";
    return counted ? counts(meaning, Math.max(most, between), sign, price) : List.of();
  }

  /** Variables that hold a whole number up to the most, at a price for each unit. */
  private List<Count> counts(String meaning, double most, long factor, BigDecimal price) {
    List<Count> counts = new ArrayList<>();
    for (long coefficient : Digits.of((long) most)) {
      int variable = statement.literals() + counters.size();
      counters.add(coefficient + " of " + meaning);
      counts.add(new Count(factor * coefficient, variable));
      if (price.signum() != 0) {
        objective.add(price.multiply(BigDecimal.valueOf(coefficient)), variable);
      }
    }
    return counts;
  }

  void write(Appendable out) throws IOException {
    try {
      writeHeader(out);
      writeObjective(out);
      for (Line line : lines) {
        comment(line.name());
        writeSum(line, out);
        text.append(line.equal() ? "= " : ">= ");
        text.append((long) (line.sign() * line.limit())).append(" ;\n");
        flush(out, CHUNK);
      }
      flush(out, 0);
    } catch (UncheckedIOException failed) {
      throw failed.getCause();
    }
  }

  private void writeHeader(Appendable out) {
    int variables = statement.literals() + counters.size();
    text.append("* #variable= ").append(variables);
    text.append(" #constraint= ").append(lines.size());
    Set<List<Integer>> products = products();
    if (!products.isEmpty()) {
      text.append(" #product= ").append(products.size()).append(" sizeproduct= ");
      text.append(products.stream().mapToLong(List::size).sum());
    }
    text.append('\n');
    comment(statement.name());
    for (int k = 0; k < variables; k++) {
      int literals = statement.literals();
      String meaning = k < literals ? statement.describe(k) : counters.get(k - literals);
      comment("x" + (k + 1) + " is " + meaning);
      flush(out, CHUNK);
    }
  }

  /** The different products of two literals or more. */
  private Set<List<Integer>> products() {
    Set<List<Integer>> products = new HashSet<>();
    Polynomial.TermVisitor collect =
        (coefficient, literals) -> {
          if (literals.length > 1) {
            List<Integer> product = new ArrayList<>(literals.length);
            for (int literal : literals) {
              product.add(literal);
            }
            products.add(product);
          }
        };
    statement.objective().forEachTerm(collect);
    lines.forEach(line -> line.terms().forEachTerm(collect));
    return products;
  }

  private void writeObjective(Appendable out) {
    if (objective.constant() != 0) {
      BigDecimal constant = Text.decimal(objective.constant());
      text.append(PseudoBooleanText.CONSTANT).append(' ').append(constant).append('\n');
    }
    if (objective.decimals() > 0) {
      text.append(PseudoBooleanText.DECIMALS).append(' ').append(objective.decimals()).append('\n');
    }
    if (statement.sense() == Sense.MAXIMIZE) {
      text.append(PseudoBooleanText.MAXIMIZE).append('\n');
    }
    if (!objective.isEmpty()) {
      text.append("min: ");
      objective.forEachTerm(
          (coefficient, variables) -> {
            term(coefficient, variables);
            flush(out, CHUNK);
          });
      text.append(";\n");
    }
  }

  private void writeSum(Line line, Appendable out) {
    line.terms()
        .forEachTerm(
            (coefficient, literals) -> {
              term(line.sign() * (long) coefficient, literals);
              flush(out, CHUNK);
            });
    for (Count count : line.counts()) {
      term(line.sign() * count.coefficient(), count.variable());
    }
  }

  private void term(long coefficient, int... variables) {
    text.append(coefficient < 0 ? "" : "+").append(coefficient).append(' ');
    for (int variable : variables) {
      text.append('x').append(variable + 1).append(' ');
    }
  }

  /** A name in one line. */
  private void comment(String words) {
    text.append("* ").append(words.replaceAll("\\p{Cntrl}", " ")).append('\n');
  }

  private void flush(Appendable out, int above) {
    if (text.length() >= above) {
      try {
        out.append(text);
      } catch (IOException failed) {
        throw new UncheckedIOException(failed);
      }
      text.setLength(0);
    }
  }
}
