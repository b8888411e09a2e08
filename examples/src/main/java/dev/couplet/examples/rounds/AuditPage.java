package dev.couplet.examples.rounds;

import dev.couplet.audit.LoweringAudit;
import dev.couplet.audit.LoweringAudit.WeightSlack;
import dev.couplet.lower.Lowered;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Collectors;

/**
 * The third page of the report: the lowering of a small copy, made by the same code, tried on every
 * pattern of its decision bits.
 */
final class AuditPage {
  private final RoundsModel copy;
  private final Lowered lowered;
  private final LoweringAudit.Report report;

  private AuditPage(RoundsModel copy, Lowered lowered, LoweringAudit.Report report) {
    this.copy = copy;
    this.lowered = lowered;
    this.report = report;
  }

  static String of(RoundsModel copy, Lowered lowered, LoweringAudit.Report report) {
    return new AuditPage(copy, lowered, report).text();
  }

  private String text() {
    Sheet sheet = Sheet.headed("3. The audit of the lowering, on a small copy");
    sheet.paragraph(copyInWords()).blank().table(figures()).blank();
    sheet.paragraph("Each weight of the copy, and the least that would do if the others stay:");
    return sheet.table(weights()).toString();
  }

  private String copyInWords() {
    RoundsData data = copy.data();
    String villages =
        data.villages().stream()
            .map(village -> village.name() + " (" + village.crates() + ")")
            .collect(Collectors.joining(", "));
    String vans =
        data.vans().stream()
            .map(van -> van + " (" + van.capacity() + ")")
            .collect(Collectors.joining(" or "));
    return "Every pattern of bits is tried on a copy that the same code made, with capacities cut down: "
        + villages
        + " by "
        + vans
        + ".";
  }

  private Columns figures() {
    Columns table = new Columns("lrl");
    table.row("patterns", Long.toString(report.patterns()), "of " + bits());
    table.row("plans", Long.toString(report.feasible()), "keep all rules");
    report.optimum().ifPresent(value -> table.row("optimum", metres(value), "the best of these"));
    report
        .margin()
        .ifPresent(
            value ->
                table.row(
                    "margin",
                    metres(value),
                    "from there up to the best pattern that breaks a rule"));
    int findings = report.findings().all().size();
    return table.row("findings", number(findings), report.findings().toString());
  }

  private String bits() {
    return lowered.decisionBits()
        + " decision bits, each with "
        + lowered.auxiliaryBits()
        + " auxiliary bits at their best";
  }

  /**
   * A line for each kind of rule and weight, with the largest of their least weights. Wishes weigh
   * what they cost, no more and no less.
   */
  private Columns weights() {
    Map<Line, List<OptionalDouble>> lines = new LinkedHashMap<>();
    for (WeightSlack weight : report.weights()) {
      Optional<RuleKind> kind = copy.kindOf(weight.rule());
      if (!kind.equals(Optional.of(RuleKind.WISH))) {
        Line line = new Line(RuleKind.words(kind), weight.weight());
        lines.computeIfAbsent(line, l -> new ArrayList<>()).add(weight.infimum());
      }
    }
    Columns table = new Columns("rlrr").row("", "rules", "weight", "enough above");
    lines.forEach(
        (line, enough) ->
            table.row(number(enough.size()), line.kind(), number(line.weight()), least(enough)));
    return table;
  }

  /** What the weights of some rules have in common. */
  private record Line(String kind, double weight) {}

  private static String least(List<OptionalDouble> enough) {
    if (enough.stream().anyMatch(OptionalDouble::isEmpty)) {
      return "not analysed";
    }
    double largest =
        enough.stream().mapToDouble(OptionalDouble::getAsDouble).max().orElse(Double.NaN);
    return Double.isFinite(largest) ? number(largest) : "none would do";
  }

  private static String number(double value) {
    return Numbers.shown(value);
  }

  private static String metres(double value) {
    return Numbers.metres(value);
  }
}
