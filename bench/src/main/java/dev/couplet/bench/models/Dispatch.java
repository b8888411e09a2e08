package dev.couplet.bench.models;

import java.util.HashMap;
import java.util.List;
import java.util.Map;

/**
 * A schedule that is quickly made, to know by when everything can be done: again and again the
 * operation that can begin first is put down, among equals that of the job with most work left.
 * O(operations x jobs).
 *
 * <p>Common practice: a non-delay schedule by the rule of most work remaining.
 */
final class Dispatch {
  private final List<List<Operation>> jobs;
  private final int[] next;
  private final int[] jobFree;
  private final int[] workLeft;
  private final Map<Integer, Integer> machineFree = new HashMap<>();

  private Dispatch(List<List<Operation>> jobs) {
    this.jobs = jobs;
    this.next = new int[jobs.size()];
    this.jobFree = new int[jobs.size()];
    this.workLeft = jobs.stream().mapToInt(Dispatch::work).toArray();
  }

  private static int work(List<Operation> job) {
    return job.stream().mapToInt(Operation::time).sum();
  }

  /** When the last operation of the schedule ends. */
  static int makespan(List<List<Operation>> jobs) {
    Dispatch dispatch = new Dispatch(jobs);
    int end = 0;
    for (int job = dispatch.first(); job >= 0; job = dispatch.first()) {
      end = Math.max(end, dispatch.put(job));
    }
    return end;
  }

  /** The job whose next operation is put down; -1 if all are done. */
  private int first() {
    int best = -1;
    for (int job = 0; job < next.length; job++) {
      if (next[job] < jobs.get(job).size() && (best < 0 || before(job, best))) {
        best = job;
      }
    }
    return best;
  }

  private boolean before(int job, int other) {
    int difference = begin(job) - begin(other);
    return difference < 0 || (difference == 0 && workLeft[job] > workLeft[other]);
  }

  private int begin(int job) {
    int machine = jobs.get(job).get(next[job]).machine();
    return Math.max(jobFree[job], machineFree.getOrDefault(machine, 0));
  }

  private int put(int job) {
    Operation operation = jobs.get(job).get(next[job]);
    int end = begin(job) + operation.time();
    jobFree[job] = end;
    machineFree.put(operation.machine(), end);
    workLeft[job] -= operation.time();
    next[job]++;
    return end;
  }
}
