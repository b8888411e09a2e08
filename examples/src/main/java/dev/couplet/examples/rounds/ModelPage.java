package dev.couplet.examples.rounds;

import dev.couplet.model.Rule;
import dev.couplet.model.Statement;
import java.util.List;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/** The first page of the report: what is to be decided, and by which rules. */
final class ModelPage {
  private final RoundsData data;
  private final Statement statement;
  private final RoundsModel rounds;

  private ModelPage(RoundsModel rounds) {
    this.rounds = rounds;
    this.data = rounds.data();
    this.statement = rounds.model().snapshot();
  }

  static String of(RoundsModel rounds) {
    return new ModelPage(rounds).text();
  }

  private String text() {
    Columns columns = new Columns("lrl");
    columns.row(
        "decide", count(statement.decisions().size()), "a van for each village: " + villages());
    columns.row("", "", "each one of " + data.vans().size() + ": " + join(data.vans().stream()));
    columns.row("require", rules(RuleKind.LOAD), "load: no van carries more than it can");
    columns.row("", "", capacities());
    columns.row("", "", crates());
    pairs(columns, RuleKind.TOGETHER, "must share a van", data.together());
    pairs(columns, RuleKind.APART, "must not share one", data.apart());
    columns.row("prefer", rules(RuleKind.WISH), wishes());
    columns.row(
        "minimise",
        "",
        "the distances between every two villages of the same van, in metres, and what the wishes"
            + " that are not granted cost");
    return Sheet.headed("1. The model").table(columns).toString();
  }

  private String villages() {
    return join(data.villages().stream());
  }

  private String capacities() {
    return join(data.vans().stream().map(van -> van + " " + van.capacity())) + " crates";
  }

  private String crates() {
    return data.crates() + " crates to carry, room for " + data.capacity();
  }

  private void pairs(Columns columns, RuleKind kind, String words, List<Pair> pairs) {
    if (!pairs.isEmpty()) {
      String each = pairs.size() == 1 ? "pair " : "pairs ";
      columns.row(
          "", rules(kind), pairs.size() + " " + each + words + ": " + join(pairs.stream(), "; "));
    }
  }

  private String wishes() {
    return data.wishes().isEmpty()
        ? "no wishes"
        : "wishes: "
            + join(data.wishes().stream().map(wish -> wish + " or " + wish.metres() + " m"), "; ");
  }

  private String rules(RuleKind kind) {
    return count(
        statement.rules().stream()
            .map(Rule::name)
            .filter(rule -> rounds.kindOf(rule).filter(kind::equals).isPresent())
            .count());
  }

  private static String count(long number) {
    return Long.toString(number);
  }

  private static String join(Stream<?> items) {
    return join(items, ", ");
  }

  private static String join(Stream<?> items, String between) {
    return items.map(Object::toString).collect(Collectors.joining(between));
  }
}
