package dev.couplet.audit;

import java.util.ArrayList;
import java.util.List;

/** What an audit looked at, and what it found wrong. Immutable. */
public final class Findings {
  /**
   * One thing that an audit found wrong.
   *
   * @param check the name of the check that failed
   * @param message what happened, on what input, and how to mend it
   */
  public record Finding(String check, String message) {
    @Override
    public String toString() {
      return "[" + check + "] " + message;
    }
  }

  private static final int SHOWN_PER_CHECK = 3;

  private final String subject;
  private final List<String> checks;
  private final List<Finding> findings;

  Findings(String subject, Iterable<String> checks, List<Finding> findings) {
    List<String> names = new ArrayList<>();
    checks.forEach(names::add);
    this.subject = subject;
    this.checks = List.copyOf(names);
    this.findings = List.copyOf(findings);
  }

  /** The names of the checks that were made, in the order of the audit. */
  public List<String> checks() {
    return checks;
  }

  /** All that was found wrong, in the order it was found; empty if every check held. */
  public List<Finding> all() {
    return findings;
  }

  /** Whether every check held. */
  public boolean none() {
    return findings.isEmpty();
  }

  /**
   * Does nothing if every check held.
   *
   * @throws AssertionError listing the findings, if there are any
   */
  public void orThrow() {
    if (!findings.isEmpty()) {
      throw new AssertionError(toString());
    }
  }

  /** One line if every check held; else a line for each finding, the first few of each check. */
  @Override
  public String toString() {
    if (findings.isEmpty()) {
      return "all " + checks.size() + " checks of " + subject + " hold";
    }
    long failed = checks.stream().filter(check -> of(check) > 0).count();
    StringBuilder text = new StringBuilder();
    text.append(failed).append(" of ").append(checks.size()).append(" checks of ").append(subject);
    text.append(failed == 1 ? " fails" : " fail");
    checks.forEach(check -> describe(check, text));
    return text.toString();
  }

  private void describe(String check, StringBuilder text) {
    findings.stream()
        .filter(finding -> finding.check().equals(check))
        .limit(SHOWN_PER_CHECK)
        .forEach(finding -> text.append("\n  ").append(finding));
    long hidden = of(check) - SHOWN_PER_CHECK;
    if (hidden > 0) {
      text.append("\n  [").append(check).append("] and ").append(hidden).append(" more like these");
    }
  }

  private long of(String check) {
    return findings.stream().filter(finding -> finding.check().equals(check)).count();
  }
}
