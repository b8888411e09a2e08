package dev.couplet.exact.plans;

import dev.couplet.form.Polynomial;
import dev.couplet.model.Choice;
import dev.couplet.model.Decision;
import dev.couplet.model.Rule;
import dev.couplet.model.Statement;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.function.Predicate;

/**
 * Finds options that a statement treats alike, by trying: two options are swapped in every choice,
 * and objective and rules must come out as they were, rules in any order and whatever their names.
 *
 * <p>Time O(options x classes x size of the statement).
 */
final class Likeness {
  private static final long MOST_STEPS = 1L << 24;
  private static final int SHOWN = 8;

  /** A part of a rule, apart from its name. */
  private record Part(
      Polynomial terms,
      double lowest,
      double highest,
      double step,
      double unit,
      boolean required,
      double price,
      boolean squared) {
    Part swapped(Polynomial newTerms) {
      return new Part(newTerms, lowest, highest, step, unit, required, price, squared);
    }
  }

  private final Statement statement;
  private final Polynomial objective;
  private final List<Part> parts = new ArrayList<>();
  private final List<List<Integer>> partsOf = new ArrayList<>();

  /** For each option its literal in each choice that has it, by the choice's number. */
  private final Map<Object, Map<Integer, Integer>> literals = new LinkedHashMap<>();

  private Likeness(Statement statement, Polynomial objective, Predicate<Rule> kept) {
    this.statement = statement;
    this.objective = objective;
    for (int literal = 0; literal < statement.literals(); literal++) {
      partsOf.add(new ArrayList<>());
    }
    statement.rules().stream().filter(kept).forEach(this::add);
    for (int d = 0; d < statement.decisions().size(); d++) {
      Decision decision = statement.decisions().get(d);
      if (decision instanceof Choice<?> choice && !statement.isFixed(choice)) {
        for (int k = 0; k < choice.options().size(); k++) {
          Object option = choice.options().get(k);
          literals
              .computeIfAbsent(option, key -> new LinkedHashMap<>())
              .put(d, statement.firstLiteral(choice) + k);
        }
      }
    }
  }

  private void add(Rule rule) {
    for (Rule.Part part : rule.parts()) {
      int number = parts.size();
      parts.add(
          new Part(
              part.terms(),
              part.lowest(),
              part.highest(),
              part.step(),
              part.unit(),
              rule.required(),
              rule.costPerUnit(),
              rule.squared()));
      part.terms()
          .forEachTerm(
              (coefficient, product) -> {
                for (int literal : product) {
                  List<Integer> own = partsOf.get(literal);
                  if (own.isEmpty() || own.get(own.size() - 1) != number) {
                    own.add(number);
                  }
                }
              });
    }
  }

  /** The options that a statement with those of its rules that are kept treats alike. */
  static Interchange of(Statement statement, Predicate<Rule> kept, Variables variables) {
    Likeness likeness = new Likeness(statement, statement.objective(), kept);
    return likeness.cheap() ? likeness.interchange(variables) : Interchange.none(variables);
  }

  /** The options that some rules of a statement treat alike, whatever its objective. */
  static Interchange ofRules(Statement statement, Predicate<Rule> kept, Variables variables) {
    Polynomial nothing = Polynomial.builder(statement.literals()).build();
    Likeness likeness = new Likeness(statement, nothing, kept);
    return likeness.cheap() ? likeness.interchange(variables) : Interchange.none(variables);
  }

  private boolean cheap() {
    long size = (long) statement.literals() + objective.terms();
    for (Part part : parts) {
      size += part.terms().terms();
    }
    long options = literals.size();
    return options > 1 && size <= MOST_STEPS / options / options;
  }

  private Interchange interchange(Variables variables) {
    List<Object> options = List.copyOf(literals.keySet());
    List<List<Integer>> classes = new ArrayList<>();
    int[] classOf = new int[options.size()];
    int[] optionOf = new int[variables.values()];
    Arrays.fill(optionOf, -1);
    for (int o = 0; o < options.size(); o++) {
      classOf[o] = classOf(o, options, classes);
      for (int literal : literals.getOrDefault(options.get(o), Map.of()).values()) {
        optionOf[variables.valueOf(literal)] = o;
      }
    }
    List<String> found = new ArrayList<>();
    for (List<Integer> one : classes) {
      if (one.size() > 1) {
        found.add(inWords(one, options));
      }
    }
    return new Interchange(optionOf, classOf, found);
  }

  private int classOf(int option, List<Object> options, List<List<Integer>> classes) {
    for (int c = 0; c < classes.size(); c++) {
      if (alike(options.get(classes.get(c).get(0)), options.get(option))) {
        classes.get(c).add(option);
        return c;
      }
    }
    classes.add(new ArrayList<>(List.of(option)));
    return classes.size() - 1;
  }

  private static String inWords(List<Integer> one, List<Object> options) {
    List<String> names = one.stream().map(o -> String.valueOf(options.get(o))).toList();
    String shown = String.join(", ", names.subList(0, Math.min(SHOWN, names.size())));
    return names.size() > SHOWN ? shown + " and " + (names.size() - SHOWN) + " more" : shown;
  }

  private boolean alike(Object one, Object other) {
    Map<Integer, Integer> ones = literals.getOrDefault(one, Map.of());
    Map<Integer, Integer> others = literals.getOrDefault(other, Map.of());
    if (ones.size() < 2 || !ones.keySet().equals(others.keySet())) {
      return false;
    }
    int[] swap = new int[statement.literals()];
    Arrays.setAll(swap, literal -> literal);
    ones.forEach(
        (choice, literal) -> {
          int counterpart = others.getOrDefault(choice, literal);
          swap[literal] = counterpart;
          swap[counterpart] = literal;
        });
    return sameRules(swap) && swapped(objective, swap).equals(objective);
  }

  /** Whether the parts that are touched are the same after the swap, each as often. */
  private boolean sameRules(int[] swap) {
    boolean[] touched = new boolean[parts.size()];
    for (int literal = 0; literal < swap.length; literal++) {
      if (swap[literal] != literal) {
        partsOf.get(literal).forEach(part -> touched[part] = true);
      }
    }
    Map<Part, Integer> surplus = new HashMap<>();
    for (int p = 0; p < touched.length; p++) {
      if (touched[p]) {
        Part part = parts.get(p);
        surplus.merge(part, 1, Integer::sum);
        surplus.merge(part.swapped(swapped(part.terms(), swap)), -1, Integer::sum);
      }
    }
    return surplus.values().stream().allMatch(count -> count == 0);
  }

  private static Polynomial swapped(Polynomial terms, int[] swap) {
    Polynomial.Builder swapped = Polynomial.builder(terms.size());
    terms.forEachTerm(
        (coefficient, product) ->
            swapped.add(coefficient, Arrays.stream(product).map(k -> swap[k]).toArray()));
    return swapped.build();
  }
}
