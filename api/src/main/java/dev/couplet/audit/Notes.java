package dev.couplet.audit;

import dev.couplet.audit.Findings.Finding;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import java.util.function.Supplier;

/** Takes down the checks of one audit as they are made. Belongs to one thread. */
final class Notes {
  private final Set<String> checks = new LinkedHashSet<>();
  private final List<Finding> findings = new ArrayList<>();

  /** Makes a check; the message is only put together if it does not hold. */
  void expect(String check, boolean holds, Supplier<String> message) {
    checks.add(check);
    if (!holds) {
      findings.add(new Finding(check, message.get()));
    }
  }

  /** Takes down a check that does not hold. */
  void add(String check, String message) {
    expect(check, false, () -> message);
  }

  Findings of(String subject) {
    return new Findings(subject, checks, findings);
  }
}
