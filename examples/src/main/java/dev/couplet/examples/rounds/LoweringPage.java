package dev.couplet.examples.rounds;

import dev.couplet.form.Qubo;
import dev.couplet.lower.Ledger;
import dev.couplet.lower.Lowered;
import dev.couplet.lower.Lowered.Weight;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * The second page of the report: the quadratic form, the weights, where a coefficient comes from.
 */
final class LoweringPage {
  private final RoundsModel rounds;
  private final Lowered lowered;
  private final Qubo form;

  private LoweringPage(RoundsModel rounds, Lowered lowered) {
    this.rounds = rounds;
    this.lowered = lowered;
    this.form = lowered.qubo();
  }

  static String of(RoundsModel rounds, Lowered lowered) {
    return new LoweringPage(rounds, lowered).text();
  }

  private String text() {
    Sheet sheet = Sheet.headed("2. The lowering to a quadratic form in bits");
    sheet.table(size()).blank();
    sheet.paragraph(
        "Each rule becomes a penalty: 0 where the rule is kept, 1 or more where it is broken. It"
            + " counts as many times as the rule's weight says.");
    sheet.blank();
    weights(sheet);
    sheet.blank();
    ledger(sheet);
    return sheet.toString();
  }

  private Columns size() {
    long possible = (long) form.size() * (form.size() - 1) / 2;
    return new Columns("lrl")
        .row("bits", number(form.size()), "")
        .row("  decision bits", number(lowered.decisionBits()), "one for each village and van")
        .row("  auxiliary bits", number(lowered.auxiliaryBits()), auxiliary())
        .row("pairs", number(form.pairs()), "of " + possible + " products of two bits are used");
  }

  /** The auxiliary bits by what they belong to: meanings end alike after "so much of". */
  private String auxiliary() {
    Map<String, Integer> counts = new LinkedHashMap<>();
    for (int bit = lowered.decisionBits(); bit < form.size(); bit++) {
      String meaning = lowered.ledger().meaning(bit);
      counts.merge(meaning.substring(meaning.indexOf(" of ") + " of ".length()), 1, Integer::sum);
    }
    List<String> parts = new ArrayList<>();
    counts.forEach((meaning, count) -> parts.add(count + " for " + meaning));
    return String.join(", ", parts);
  }

  /** Rows of the same kind, form, weight and reason are one; reasons are given below by letter. */
  private void weights(Sheet sheet) {
    Map<Line, List<String>> lines = new LinkedHashMap<>();
    Map<String, String> letters = new LinkedHashMap<>();
    for (Weight weight : lowered.weights()) {
      String kind = RuleKind.words(rounds.kindOf(weight.rule()));
      Line line = new Line(kind, weight.form(), weight.value(), weight.reason());
      lines.computeIfAbsent(line, l -> new ArrayList<>()).add(weight.rule());
      letters.putIfAbsent(weight.reason(), String.valueOf((char) ('a' + letters.size() % 26)));
    }
    Columns table = new Columns("rllrl").row("", "rules", "penalty", "weight", "why");
    lines.forEach(
        (line, rules) ->
            table.row(
                number(rules.size()),
                rules.size() == 1 ? rules.get(0) : line.kind(),
                line.form(),
                number(line.weight()),
                letters.getOrDefault(line.reason(), "")));
    sheet.table(table).blank();
    Columns reasons = new Columns("ll");
    letters.forEach((reason, letter) -> reasons.row(letter, reason));
    sheet.paragraph("Why a weight suffices:").table(reasons);
  }

  /** What the weights of some rules have in common. */
  private record Line(String kind, String form, double weight, String reason) {}

  /** One coefficient taken apart, of a pair in which many sources meet. */
  private void ledger(Sheet sheet) {
    if (rounds.data().villages().size() < 2) {
      return;
    }
    Pair pair = example();
    int one = bit(pair.one());
    int other = bit(pair.other());
    Ledger ledger = lowered.ledger();
    sheet.paragraph(
        "Every coefficient can be taken apart. For example, what is added where both '"
            + ledger.meaning(one)
            + "' and '"
            + ledger.meaning(other)
            + "' hold:");
    Columns table = new Columns("rl");
    for (Ledger.Entry entry : ledger.pair(one, other)) {
      table.row(number(entry.amount()), entry.source());
    }
    sheet.table(table.row(number(form.pair(one, other)), "in all"));
  }

  private Pair example() {
    List<Village> villages = rounds.data().villages();
    List<Pair> pairs = rounds.data().together();
    return pairs.isEmpty() ? new Pair(villages.get(0), villages.get(1)) : pairs.get(0);
  }

  /** The bit that says that a village is served by the first van. */
  private int bit(Village village) {
    return lowered.statement().firstLiteral(rounds.vanOf(village));
  }

  private static String number(double value) {
    return Numbers.shown(value);
  }
}
