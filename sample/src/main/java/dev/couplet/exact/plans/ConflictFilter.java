package dev.couplet.exact.plans;

import dev.couplet.model.Rule;
import dev.couplet.model.Statement;
import dev.couplet.sampling.Vigil;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/**
 * Leaves out rules as long as the others have no plan that keeps them: first large parts of them,
 * then smaller ones, in the end one by one. A rule stays if leaving it out leaves a plan, or if
 * that cannot be told within the nodes of one try.
 *
 * <p>Source: the deletion filter of Chinneck, "Finding a useful subset of constraints for analysis
 * in an infeasible linear program" (1997), with the parts of Junker's divisions (2004).
 */
final class ConflictFilter {
  /** More nodes for a try than the whole took: what is left is often harder. */
  private static final long MORE = 1000;

  private final Statement statement;
  private final Vigil vigil;
  private final long nodes;
  private List<Rule> kept;
  private boolean told = true;
  private long taken;

  /** A filter that may take so many nodes altogether. */
  ConflictFilter(Statement statement, long nodes, Vigil vigil) {
    this.statement = statement;
    this.nodes = nodes;
    this.vigil = vigil;
    this.kept = statement.rules().stream().filter(Rule::required).toList();
  }

  /** A conflict; nothing if it is not proved that there is one. */
  Optional<Conflict> run() {
    if (!impossible(kept, nodes)) {
      return Optional.empty();
    }
    long most = Math.min(Long.MAX_VALUE / 4, taken) * 2 + MORE;
    int size = Math.max(1, kept.size() / 2);
    for (boolean last = false; !last; size = (size + 1) / 2) {
      last = size == 1;
      pass(size, most);
    }
    List<String> names = kept.stream().map(Rule::name).toList();
    return Optional.of(new Conflict(names, told));
  }

  /** Tries to leave out one stretch of so many rules after the other. */
  private void pass(int size, long most) {
    told = true;
    for (int from = 0; from < kept.size(); ) {
      int to = Math.min(kept.size(), from + size);
      List<Rule> others = new ArrayList<>(kept.subList(0, from));
      others.addAll(kept.subList(to, kept.size()));
      if (impossible(others, most)) {
        kept = others;
      } else {
        from = to;
      }
    }
  }

  /** Whether it is proved, within so many nodes, that no plan keeps these rules. */
  private boolean impossible(List<Rule> rules, long most) {
    long left = Math.min(most, nodes - taken);
    if (left <= 0 || vigil.over()) {
      told = false;
      return false;
    }
    Set<Rule> chosen = new HashSet<>(rules);
    Network network = NetworkBuilder.ofRules(statement, chosen::contains);
    Interchange interchange = Likeness.ofRules(statement, chosen::contains, network.variables);
    Best best = new Best(statement, network, ProofLog.NONE, OptionalDouble.empty(), vigil);
    Branching branching = new Branching(network, interchange, best, ProofLog.NONE, vigil);
    Partial root = new Partial(network);
    boolean all = !branching.begin(root, 1) || branching.walk(root, left) == best.cost();
    taken += branching.nodes();
    boolean none = all && best.plan().isEmpty();
    told &= none || best.plan().isPresent();
    return none;
  }
}
