package dev.couplet.exact.plans;

import dev.couplet.sampling.Vigil;
import java.util.Arrays;

/**
 * Removes values that no plan below the limit can take: those that a settled value excludes, those
 * with which a row cannot keep its limits any more, those whose cost is beyond the limit. One
 * thread; reused for all partials of one network.
 */
final class Propagation {
  private static final int LOOK_EVERY = 1 << 16;

  private final Network network;
  private final ProofLog log;
  private final Vigil vigil;
  private final Variables variables;
  private final int[] queue;
  private final boolean[] queued;
  private final boolean[] waiting;
  private final int[] rowQueue;
  private int head;
  private int length;
  private int rowHead;
  private int rowLength;

  /** How often each variable was in what failed; guides branching. */
  final long[] failures;

  /** Plans that cost more than this, in fine units, are of no interest. */
  long limit;

  /** Elementary steps since the last look at the clock. */
  long steps;

  private boolean over;

  Propagation(Network network, ProofLog log, Vigil vigil) {
    this.network = network;
    this.log = log;
    this.vigil = vigil;
    this.variables = network.variables;
    this.queue = new int[variables.count() + 1];
    this.queued = new boolean[variables.count()];
    this.waiting = new boolean[network.rows.length];
    this.rowQueue = new int[network.rows.length + 1];
    this.failures = new long[variables.count()];
    this.limit = network.ceiling;
    Arrays.fill(failures, 1);
  }

  /** Values with which the bound is beyond this are removed; a proof tells of none of them. */
  long removing() {
    return log.on() ? Long.MAX_VALUE / 2 : limit;
  }

  /** Whether so many steps have passed that it is time to look at the clock. */
  boolean due() {
    return steps >= LOOK_EVERY;
  }

  /** Whether the run has to end now; looks at the clock when it is due. */
  boolean over() {
    if (due()) {
      steps = 0;
      over = vigil.over();
    }
    return over;
  }

  /** Has the clock looked at before the next step. */
  void lookSoon() {
    steps += LOOK_EVERY;
  }

  /** Looks at everything once; false if no plan below the limit is left. */
  boolean begin(Partial partial) {
    for (int v = 0; log.on() && v < partial.left.length; v++) {
      if (!partial.left[v]) {
        log.cut(network, v);
      }
    }
    for (int i = 0; i < variables.count(); i++) {
      if (partial.choices[i] == 0) {
        return false;
      }
      push(i);
    }
    return run(partial);
  }

  /** Takes a value; false if no plan below the limit is left. */
  boolean take(Partial partial, int value) {
    int variable = variables.variableOf(value);
    for (int v = variables.first(variable); v < variables.end(variable); v++) {
      partial.left[v] = v == value;
    }
    partial.choices[variable] = 1;
    push(variable);
    return run(partial);
  }

  /** Removes a value, to be followed by {@link #run}; false if it was the variable's last. */
  boolean remove(Partial partial, int value) {
    int variable = variables.variableOf(value);
    log.cut(network, value);
    partial.left[value] = false;
    push(variable);
    return --partial.choices[variable] > 0;
  }

  private void push(int variable) {
    if (!queued[variable]) {
      queued[variable] = true;
      queue[(head + length++) % queue.length] = variable;
    }
  }

  /** Follows up what was removed, until nothing more follows. */
  boolean run(Partial partial) {
    while (length > 0 || rowLength > 0) {
      boolean kept = length > 0 ? variable(partial) : row(partial);
      if (!kept) {
        clear();
        return false;
      }
    }
    return partial.base <= limit;
  }

  /** Forgets what is waiting; to be called when a partial is given up halfway. */
  void clear() {
    while (length > 0) {
      queued[queue[head]] = false;
      head = (head + 1) % queue.length;
      length--;
    }
    while (rowLength > 0) {
      waiting[rowQueue[rowHead]] = false;
      rowHead = (rowHead + 1) % rowQueue.length;
      rowLength--;
    }
  }

  private boolean variable(Partial partial) {
    int variable = queue[head];
    head = (head + 1) % queue.length;
    length--;
    queued[variable] = false;
    for (int row : network.rowsOf[variable]) {
      if (!waiting[row]) {
        waiting[row] = true;
        rowQueue[(rowHead + rowLength++) % rowQueue.length] = row;
      }
    }
    if (partial.choices[variable] > 1 || partial.settled[variable] >= 0) {
      return true;
    }
    return settle(partial, variable);
  }

  /** Moves all costs of a variable with one value left to where they no longer depend on it. */
  private boolean settle(Partial partial, int variable) {
    int value = variables.first(variable);
    while (!partial.left[value]) {
      value++;
    }
    partial.settled[variable] = value;
    partial.open--;
    partial.base += partial.costs[value];
    partial.costs[value] = 0;
    for (int p : network.pairsOf[variable]) {
      Pair pair = network.pairs[p];
      int other = pair.one() == variable ? pair.other() : pair.one();
      if (partial.settled[other] < 0 && !settle(partial, pair, variable, value, other)) {
        failures[variable]++;
        failures[other]++;
        return false;
      }
    }
    return true;
  }

  private boolean settle(Partial partial, Pair pair, int variable, int value, int other) {
    boolean rows = pair.one() == variable;
    int own = value - variables.first(variable);
    int width = variables.values(pair.other());
    int first = variables.first(other);
    int count = variables.values(other);
    int ownShift = pair.shift() + (rows ? own : variables.values(pair.one()) + own);
    int otherShift = pair.shift() + (rows ? variables.values(pair.one()) : 0);
    steps += count;
    for (int b = 0; b < count; b++) {
      if (!partial.left[first + b]) {
        continue;
      }
      long cost = pair.costs()[rows ? own * width + b : b * width + own];
      if (cost == Pair.NEVER) {
        if (!remove(partial, first + b)) {
          return false;
        }
      } else {
        long moved = cost + partial.shifts[ownShift] + partial.shifts[otherShift + b];
        partial.costs[first + b] += moved;
        partial.shifts[otherShift + b] -= moved;
      }
    }
    return true;
  }

  private boolean row(Partial partial) {
    Row row = network.rows[rowQueue[rowHead]];
    waiting[rowQueue[rowHead]] = false;
    rowHead = (rowHead + 1) % rowQueue.length;
    rowLength--;
    if (!row.required() || filter(partial, row)) {
      return true;
    }
    for (int variable : row.variables) {
      failures[variable]++;
    }
    return false;
  }

  private boolean filter(Partial partial, Row row) {
    long least = 0;
    long most = 0;
    int open = 0;
    for (int k = 0; k < row.variables.length; k++) {
      int variable = row.variables[k];
      least += least(partial, row, k);
      most += most(partial, row, k);
      open += partial.choices[variable] > 1 ? 1 : 0;
      steps += row.coefficients[k].length;
    }
    if (least > row.highest || most < row.lowest || (open == 0 && !row.keeps(least))) {
      return false;
    }
    boolean stepping = row.step > 1 && open == 1;
    boolean kept = least >= row.lowest && most <= row.highest && !stepping;
    if (kept || open == 0) {
      return true;
    }
    for (int k = 0; k < row.variables.length; k++) {
      if (partial.choices[row.variables[k]] > 1 && !filter(partial, row, k, least, most)) {
        return false;
      }
    }
    return true;
  }

  private boolean filter(Partial partial, Row row, int k, long least, long most) {
    int first = variables.first(row.variables[k]);
    long othersLeast = least - least(partial, row, k);
    long othersMost = most - most(partial, row, k);
    for (int a = 0; a < row.coefficients[k].length; a++) {
      long own = row.coefficients[k][a];
      boolean out = othersLeast + own > row.highest || othersMost + own < row.lowest;
      out |= othersLeast == othersMost && !row.keeps(othersLeast + own);
      if (partial.left[first + a] && out && !remove(partial, first + a)) {
        return false;
      }
    }
    return true;
  }

  /** The least that a variable adds to a row. */
  long least(Partial partial, Row row, int k) {
    int first = variables.first(row.variables[k]);
    long least = Long.MAX_VALUE;
    for (int a = 0; a < row.coefficients[k].length; a++) {
      least = partial.left[first + a] ? Math.min(least, row.coefficients[k][a]) : least;
    }
    return least;
  }

  /** The most that a variable adds to a row. */
  long most(Partial partial, Row row, int k) {
    int first = variables.first(row.variables[k]);
    long most = Long.MIN_VALUE;
    for (int a = 0; a < row.coefficients[k].length; a++) {
      most = partial.left[first + a] ? Math.max(most, row.coefficients[k][a]) : most;
    }
    return most;
  }
}
