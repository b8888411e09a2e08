package dev.couplet.exact;

import dev.couplet.form.Qubo;
import java.util.Arrays;

/**
 * The buckets of an elimination order, in that order, each linked to those whose tables it takes.
 */
final class BucketTree {
  final Bucket[] buckets;
  private final int[][] sources;

  BucketTree(Qubo form, EliminationOrder order) {
    int size = form.size();
    int count = order.eliminated();
    int[] turn = new int[size];
    for (int k = 0; k < count; k++) {
      turn[order.variable(k)] = k;
    }
    buckets = new Bucket[count];
    sources = new int[count][0];
    for (int k = 0; k < count; k++) {
      int[] scope = byTurn(order, order.scope(k), turn);
      double[] pair = new double[scope.length];
      for (int s = 0; s < scope.length; s++) {
        pair[s] = form.pair(order.variable(k), scope[s]);
      }
      buckets[k] = new Bucket(order.variable(k), scope, pair);
    }
    int[] position = new int[size];
    for (int k = 0; k < count; k++) {
      int[] scope = buckets[k].scope;
      if (scope.length > 0) {
        int at = turn[scope[0]];
        Bucket taker = buckets[at];
        for (int s = 0; s < taker.scope.length; s++) {
          position[taker.scope[s]] = s;
        }
        taker.takeIn(scope, position);
        sources[at] = Arrays.copyOf(sources[at], sources[at].length + 1);
        sources[at][sources[at].length - 1] = k;
      }
    }
  }

  private static int[] byTurn(EliminationOrder order, int[] scope, int[] turn) {
    int[] turns = new int[scope.length];
    for (int s = 0; s < scope.length; s++) {
      turns[s] = turn[scope[s]];
    }
    Arrays.sort(turns);
    for (int s = 0; s < scope.length; s++) {
      turns[s] = order.variable(turns[s]);
    }
    return turns;
  }

  /** The numbers of the buckets whose tables bucket k takes in; not to be changed. */
  int[] sources(int k) {
    return sources[k];
  }

  /** Table entries computed in one elimination, tables taken in counted again. */
  double steps() {
    double steps = 0;
    for (int k = 0; k < buckets.length; k++) {
      steps += (double) buckets[k].entries() * (1 + sources[k].length);
    }
    return steps;
  }

  /** The most table entries that are held at one time. */
  double held() {
    double held = 0;
    double most = 0;
    for (int k = 0; k < buckets.length; k++) {
      held += buckets[k].entries();
      most = Math.max(most, held);
      for (int source : sources[k]) {
        held -= buckets[source].entries();
      }
    }
    return most;
  }
}
