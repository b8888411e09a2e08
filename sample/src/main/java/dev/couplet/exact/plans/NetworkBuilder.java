package dev.couplet.exact.plans;

import dev.couplet.exact.plans.Terms.Term;
import dev.couplet.form.Polynomial;
import dev.couplet.model.Rule;
import dev.couplet.model.Statement;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.function.Predicate;

/** Reads a statement, or some of its rules, into a {@link Network}. */
final class NetworkBuilder {
  /** A part of a rule that some plan breaks. */
  private record Asked(Rule rule, Rule.Part part, String number) {
    /** What a miss by one whole unit costs, or by its square; 0 for a required rule. */
    BigDecimal price() {
      BigDecimal unit = Scale.decimal(part.unit());
      BigDecimal counted = rule.squared() ? unit.multiply(unit) : unit;
      return Scale.decimal(rule.costPerUnit()).multiply(counted);
    }

    /** What the largest miss costs at the most. */
    BigDecimal most() {
      BigDecimal missed = new BigDecimal(part.largestViolation());
      return price().multiply(rule.squared() ? missed.multiply(missed) : missed);
    }
  }

  private final Statement statement;
  private final Polynomial objective;
  private final List<Asked> asked;
  private final Variables plain;
  private final Terms terms;
  private final List<Row> rows = new ArrayList<>();
  private final Map<Long, long[]> tables = new TreeMap<>();
  private Variables variables;
  private long[] costs = {};
  private long constant;
  private long grain;

  private NetworkBuilder(Statement statement, Polynomial objective, Predicate<Rule> kept) {
    this.statement = statement;
    this.objective = objective;
    this.asked = asked(statement, kept);
    this.plain = Variables.of(statement, 0);
    this.variables = plain;
    this.terms = new Terms(plain);
  }

  private static List<Asked> asked(Statement statement, Predicate<Rule> kept) {
    List<Asked> asked = new ArrayList<>();
    for (int r = 0; r < statement.rules().size(); r++) {
      Rule rule = statement.rules().get(r);
      for (int p = 0; kept.test(rule) && p < rule.parts().size(); p++) {
        Rule.Part part = rule.parts().get(p);
        if (!part.alwaysKept()) {
          asked.add(new Asked(rule, part, r + "." + p));
        }
      }
    }
    return asked;
  }

  /** The network of a statement with those of its rules that are kept. */
  static Network of(Statement statement, Predicate<Rule> kept) {
    Polynomial objective = statement.objective().times(statement.sense().sign());
    return new NetworkBuilder(statement, objective, kept).network();
  }

  /** The network of some rules of a statement, without its objective. */
  static Network ofRules(Statement statement, Predicate<Rule> kept) {
    Polynomial nothing = Polynomial.builder(statement.literals()).build();
    return new NetworkBuilder(statement, nothing, kept).network();
  }

  private Network network() {
    List<Term> costly = terms.of(objective, 2);
    List<List<Term>> sums = asked.stream().map(one -> terms.of(one.part().terms(), 1)).toList();
    List<List<Integer>> products = terms.products();
    variables = Variables.of(statement, products.size());
    costs = new long[variables.values()];
    Scale scale = scale(costly);
    costly.forEach(term -> addCost(term, scale));
    for (int r = 0; r < asked.size(); r++) {
      addRow(asked.get(r), sums.get(r), scale);
    }
    for (int k = 0; k < products.size(); k++) {
      addProduct(products.get(k), plain.values() + 2 * k + 1);
    }
    List<Pair> pairs = pairs();
    return new Network(variables, scale, constant, costs, pairs, rows, grain);
  }

  private Scale scale(List<Term> costly) {
    List<BigDecimal> units = new ArrayList<>();
    BigDecimal magnitude = BigDecimal.ZERO;
    for (Term term : costly) {
      BigDecimal cost = Scale.decimal(term.coefficient());
      units.add(cost);
      magnitude = magnitude.add(cost.abs());
    }
    for (Asked one : asked) {
      units.add(one.price());
      magnitude = magnitude.add(one.most());
    }
    return Scale.of(units, magnitude);
  }

  private void addCost(Term term, Scale scale) {
    long whole = scale.whole(Scale.decimal(term.coefficient()));
    long cost = whole * scale.fine();
    List<Integer> values = term.values();
    switch (values.size()) {
      case 0 -> constant += cost;
      case 1 -> costs[values.get(0)] += cost;
      default -> {
        long[] table = table(values.get(0), values.get(1));
        table[cell(values.get(0), values.get(1))] += cost;
      }
    }
    if (!values.isEmpty()) {
      grain = gcd(grain, cost);
    }
  }

  private static long gcd(long a, long b) {
    return b == 0 ? Math.abs(a) : gcd(b, a % b);
  }

  private long[] table(int lower, int upper) {
    int one = variables.variableOf(lower);
    int other = variables.variableOf(upper);
    long key = (long) one << 32 | other;
    return tables.computeIfAbsent(
        key, k -> new long[variables.values(one) * variables.values(other)]);
  }

  private int cell(int lower, int upper) {
    int one = variables.variableOf(lower);
    int other = variables.variableOf(upper);
    int row = lower - variables.first(one);
    return row * variables.values(other) + upper - variables.first(other);
  }

  private void addRow(Asked one, List<Term> sum, Scale scale) {
    Rule rule = one.rule();
    Rule.Part part = one.part();
    Map<Integer, long[]> byVariable = new TreeMap<>();
    for (Term term : sum) {
      int value = term.values().get(0);
      int variable = variables.variableOf(value);
      byVariable
              .computeIfAbsent(variable, k -> new long[variables.values(variable)])[
              value - variables.first(variable)] +=
          (long) term.coefficient();
    }
    long price = rule.required() ? -1 : scale.whole(one.price()) * scale.fine();
    if (price == 0) {
      return;
    }
    Row row =
        new Row(
            one.number(),
            byVariable.keySet().stream().mapToInt(Integer::intValue).toArray(),
            byVariable.values().toArray(long[][]::new),
            limit(part.lowest()),
            limit(part.highest()),
            (long) part.step(),
            price,
            rule.squared());
    grain = row.required() ? grain : gcd(grain, price);
    if (row.variables.length == 0) {
      constant += row.charge(0);
    } else if (row.variables.length == 1 || (row.variables.length == 2 && small(row))) {
      tabulate(row);
    } else {
      rows.add(row);
    }
  }

  private static long limit(double limit) {
    return Double.isInfinite(limit) ? (limit < 0 ? -Row.FREE : Row.FREE) : (long) limit;
  }

  private boolean small(Row row) {
    long cells = (long) variables.values(row.variables[0]) * variables.values(row.variables[1]);
    return cells <= 1 << 16;
  }

  /** A row over one or two variables is a table of what each combination costs. */
  private void tabulate(Row row) {
    long[] ones = row.coefficients[0];
    int first = variables.first(row.variables[0]);
    if (row.variables.length == 1) {
      for (int a = 0; a < ones.length; a++) {
        costs[first + a] = plus(costs[first + a], row, ones[a]);
      }
      return;
    }
    long[] others = row.coefficients[1];
    long[] table = table(first, variables.first(row.variables[1]));
    for (int a = 0; a < ones.length; a++) {
      for (int b = 0; b < others.length; b++) {
        int cell = a * others.length + b;
        table[cell] = plus(table[cell], row, ones[a] + others[b]);
      }
    }
  }

  private static long plus(long cost, Row row, long sum) {
    if (cost == Pair.NEVER || (row.required() && !row.keeps(sum))) {
      return Pair.NEVER;
    }
    return cost + row.charge(sum);
  }

  /** An auxiliary variable holds where all values of its product do, and only there. */
  private void addProduct(List<Integer> values, int product) {
    int auxiliary = variables.variableOf(product);
    int[] all = new int[values.size() + 1];
    long[][] counts = new long[all.length][];
    for (int k = 0; k < values.size(); k++) {
      int value = values.get(k);
      all[k] = variables.variableOf(value);
      counts[k] = new long[variables.values(all[k])];
      counts[k][value - variables.first(all[k])] = 1;
      long[] table = table(value, product);
      int other = variables.first(all[k]);
      for (int v = other; v < variables.end(all[k]); v++) {
        if (v != value) {
          table[cell(v, product)] = Pair.NEVER;
        }
      }
    }
    all[values.size()] = auxiliary;
    counts[values.size()] = new long[] {0, -1};
    String name = "product of " + values.size() + " literals";
    rows.add(new Row(name, all, counts, -Row.FREE, values.size() - 1, 1, -1, false));
  }

  /** The tables with nothing below 0; what is taken out goes to the constant. */
  private List<Pair> pairs() {
    List<Pair> pairs = new ArrayList<>();
    int shift = 0;
    for (Map.Entry<Long, long[]> entry : tables.entrySet()) {
      long[] table = entry.getValue();
      long least = Arrays.stream(table).min().orElse(0);
      if (least != Pair.NEVER) {
        for (int c = 0; c < table.length; c++) {
          table[c] -= table[c] == Pair.NEVER ? 0 : least;
        }
        constant += least;
      }
      int one = (int) (entry.getKey() >> 32);
      int other = entry.getKey().intValue();
      pairs.add(new Pair(one, other, table, shift));
      shift += variables.values(one) + variables.values(other);
    }
    return pairs;
  }
}
