package dev.couplet.exact.plans;

import dev.couplet.sampling.Vigil;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;

/**
 * Walks the tree of a network, depth first: at a node one variable takes each of its values in
 * turn, cheapest first, and what follows is followed up before the next variable is chosen.
 *
 * <p>The variable with the fewest values for how often it has been in what failed comes first
 * (Boussemart, Hemery, Lecoutre and Sais, "Boosting systematic search by weighting constraints",
 * 2004), of those the one whose cheapest value stands out most. One thread, no random numbers: the
 * walk is a function of network, start and number of nodes.
 */
final class Branching {
  private final Network network;
  private final Variables variables;
  private final Interchange interchange;
  private final ProofLog log;
  private final Propagation propagation;
  private final Sweeps sweeps;
  private final Rests rests;
  private final Vigil vigil;
  private final Best best;
  private final List<Node> path = new ArrayList<>();
  private long nodes;
  private boolean over;

  /** A node: what is left, the values to be tried, and how many have been. */
  private final class Node {
    final Partial partial = new Partial(network);
    int[] values = {};
    int next;
  }

  Branching(Network network, Interchange interchange, Best best, ProofLog log, Vigil vigil) {
    this.log = log;
    this.network = network;
    this.interchange = interchange;
    this.variables = network.variables;
    this.best = best;
    this.vigil = vigil;
    this.propagation = new Propagation(network, log, vigil);
    this.sweeps = new Sweeps(network, propagation);
    this.rests = new Rests(network, propagation);
  }

  /** The number of values that have been taken. */
  long nodes() {
    return nodes;
  }

  /** The multipliers that go with this walk's limit. */
  Multipliers multipliers() {
    propagation.limit = best.limit();
    return new Multipliers(network, propagation, sweeps, rests, log, vigil);
  }

  /** The whole network, followed up; false if no plan below the limit is left. */
  boolean begin(Partial root, int rounds) {
    propagation.limit = best.limit();
    return closed(propagation.begin(root) && sweeps.settle(root), root) && raise(root, rounds);
  }

  /** Sweeps until the bound rises no more, or so many rounds; false as for {@link #begin}. */
  boolean raise(Partial root, int rounds) {
    propagation.limit = best.limit();
    long before = root.base - 1;
    long least = 1;
    for (int round = 0; round < rounds && root.base - before >= least && !vigil.over(); round++) {
      before = root.base;
      if (!network.costless() && !sweeps.run(root)) {
        return closed(false, root);
      }
      least = Math.max(1, network.grain >> 10);
    }
    return closed(rests.run(root), root);
  }

  /** Passes on whether something is left; tells the log where nothing is. */
  private boolean closed(boolean left, Partial partial) {
    if (!left) {
      log.close(network, partial, propagation.limit);
    }
    return left;
  }

  /**
   * Walks below a root that is followed up.
   *
   * @return the lowest bound among what was not looked at; the best cost if that is all
   */
  long walk(Partial root, long mostNodes) {
    over = false;
    log.root();
    enter(0, root);
    int depth = 0;
    while (depth >= 0 && !over) {
      Node node = path.get(depth);
      if (node.next == node.values.length) {
        if (node.next > 0) {
          log.exhausted();
        }
        depth--;
        continue;
      }
      int value = node.values[node.next];
      if (node.partial.bound() + node.partial.costs[value] > best.limit()) {
        log.skip(network, node.partial, value);
        node.next++;
      } else if (nodes >= mostNodes || isOver(depth)) {
        over = true;
      } else if (descend(depth, value)) {
        depth++;
      }
    }
    return over ? open(depth) : best.cost();
  }

  private boolean isOver(int depth) {
    if (propagation.due()) {
      OptionalDouble bound = OptionalDouble.of(best.inOwnSense(open(depth)));
      vigil.report(OptionalDouble.empty(), best.value(), bound);
    }
    return propagation.over();
  }

  /** Takes a value; true if there is something to be decided below. */
  private boolean descend(int depth, int value) {
    Node node = path.get(depth);
    nodes++;
    node.next++;
    propagation.limit = best.limit();
    propagation.steps += variables.values() + network.shifts + network.rows.length;
    Node child = node(depth + 1);
    child.partial.copy(node.partial);
    log.take(network, value);
    boolean left = propagation.take(child.partial, value) && tighten(child.partial);
    if (left && opened(depth + 1)) {
      return true;
    }
    log.close(network, child.partial, best.limit());
    return false;
  }

  private boolean tighten(Partial partial) {
    if (!sweeps.settle(partial)) {
      return false;
    }
    if (!network.costless() && !sweeps.run(partial)) {
      return false;
    }
    return rests.run(partial) && sweeps.settle(partial);
  }

  private void enter(int depth, Partial partial) {
    Node node = node(depth);
    node.partial.copy(partial);
    node.values = new int[0];
    node.next = 0;
    if (!opened(depth)) {
      node.values = new int[0];
      log.close(network, node.partial, best.limit());
    }
  }

  /** Chooses what to decide next; if nothing is left to decide, takes the plan and is false. */
  private boolean opened(int depth) {
    Partial partial = path.get(depth).partial;
    if (partial.open > 0) {
      choose(depth);
      return true;
    }
    // What was settled last may not be in the rests yet.
    if (rests.run(partial)) {
      best.found(partial);
      propagation.lookSoon();
    }
    return false;
  }

  private Node node(int depth) {
    while (path.size() <= depth) {
      path.add(new Node());
    }
    return path.get(depth);
  }

  private void choose(int depth) {
    Node node = path.get(depth);
    Partial partial = node.partial;
    int chosen = -1;
    long regret = 0;
    for (int i = 0; i < variables.count(); i++) {
      if (partial.settled[i] < 0) {
        long left = chosen < 0 ? -1 : compare(partial, i, chosen);
        long own = left <= 0 ? regret(partial, i) : 0;
        if (left < 0 || (left == 0 && own > regret)) {
          chosen = i;
          regret = own;
        }
      }
    }
    node.values = values(depth, chosen);
    node.next = 0;
  }

  /** Values for each failure, without a division. */
  private long compare(Partial partial, int one, int other) {
    return partial.choices[one] * propagation.failures[other]
        - partial.choices[other] * propagation.failures[one];
  }

  /** How much more than the cheapest value the next one costs; the cheapest costs 0. */
  private long regret(Partial partial, int variable) {
    long least = Long.MAX_VALUE;
    long second = Long.MAX_VALUE;
    for (int v = variables.first(variable); v < variables.end(variable); v++) {
      if (partial.left[v]) {
        second = Math.min(second, Math.max(least, partial.costs[v]));
        least = Math.min(least, partial.costs[v]);
      }
    }
    return second - least;
  }

  /** The values to try, cheapest first; of options that are alike and not taken yet, one. */
  private int[] values(int depth, int variable) {
    Partial partial = path.get(depth).partial;
    int[] taken = taken(depth);
    int[] values = new int[partial.choices[variable]];
    int count = 0;
    for (int v = variables.first(variable); v < variables.end(variable); v++) {
      if (partial.left[v] && !interchange.likeAnother(v, values, count, taken)) {
        int at = count++;
        for (; at > 0 && partial.costs[values[at - 1]] > partial.costs[v]; at--) {
          values[at] = values[at - 1];
        }
        values[at] = v;
      }
    }
    return Arrays.copyOf(values, count);
  }

  /** The values taken on the way to a depth. */
  private int[] taken(int depth) {
    int[] taken = new int[depth];
    for (int d = 0; d < depth; d++) {
      taken[d] = path.get(d).values[path.get(d).next - 1];
    }
    return taken;
  }

  /** The lowest bound among the values not tried at this depth and above. */
  private long open(int depth) {
    long lowest = best.cost();
    for (int d = 0; d <= depth; d++) {
      Node node = path.get(d);
      for (int k = node.next; k < node.values.length; k++) {
        lowest = Math.min(lowest, node.partial.bound() + node.partial.costs[node.values[k]]);
      }
    }
    return lowest;
  }
}
