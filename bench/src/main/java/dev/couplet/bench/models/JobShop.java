package dev.couplet.bench.models;

import dev.couplet.model.Bit;
import dev.couplet.model.Count;
import dev.couplet.model.Expr;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import dev.couplet.model.Statement;
import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/**
 * Job shop: the operations of each job one after another, on each machine one at a time; the
 * makespan, when all is done, is to be minimised.
 *
 * <p>A whole number for the start of each operation and for the makespan, and for each two
 * operations on a machine a bit that says which comes first. Starts lie in the windows that a
 * quickly made schedule leaves: after what precedes in the job, and early enough for what follows
 * to end no later than that schedule. With o operations, q pairs on machines and a schedule that
 * ends at T, that is at most (o + 1) log2 T + q bits; lowered, each of the o + 2q rules has slack
 * of as many bits as a number. Immutable.
 *
 * <p>Source: Manne, "On the job-shop scheduling problem" (1960).
 */
public final class JobShop {
  private static final int LONGEST = 1 << 29;

  /** An operation, its place in the order of all, and the number that says when it begins. */
  private record Task(Operation operation, int place, Count start) {
    Expr until(Task other) {
      return other.start.minus(start);
    }
  }

  private record Pair(Task one, Task other, Bit oneFirst) {}

  private final Statement statement;
  private final List<Task> tasks;
  private final List<Pair> pairs;
  private final Count makespan;

  private JobShop(Statement statement, List<Task> tasks, List<Pair> pairs, Count makespan) {
    this.statement = statement;
    this.tasks = tasks;
    this.pairs = pairs;
    this.makespan = makespan;
  }

  /**
   * States the schedule, in time O(operations + pairs on a machine).
   *
   * @param jobs the operations of each job, in their order
   * @throws IllegalArgumentException if there is no job, or one without operations
   */
  public static JobShop of(String name, List<List<Operation>> jobs) {
    requireSense(name, jobs);
    Model model = Model.named(name);
    int horizon = Dispatch.makespan(jobs);
    int longest = jobs.stream().mapToInt(JobShop::time).max().orElse(0);
    List<Task> tasks = new ArrayList<>();
    jobs.forEach(job -> addTasks(model, job, horizon, tasks));
    Count makespan = model.count("makespan", longest, horizon);
    requireOrder(model, tasks, makespan);
    List<Pair> pairs = new ArrayList<>();
    onMachines(tasks).forEach(onOne -> addPairs(model, onOne, pairs));
    model.minimize("makespan", makespan);
    return new JobShop(model.snapshot(), List.copyOf(tasks), List.copyOf(pairs), makespan);
  }

  private static void requireSense(String name, List<List<Operation>> jobs) {
    if (jobs.isEmpty() || jobs.stream().anyMatch(List::isEmpty)) {
      throw new IllegalArgumentException("job shop " + name + " has no job, or an empty one");
    }
    double operations = jobs.stream().mapToInt(List::size).sum();
    Places.requireFew("job shop " + name, operations * jobs.size());
    long work = jobs.stream().flatMap(List::stream).mapToLong(Operation::time).sum();
    if (work > LONGEST) {
      throw new IllegalArgumentException(
          "the times of job shop " + name + " add up to " + work + ", more than " + LONGEST);
    }
  }

  private static int time(List<Operation> job) {
    return job.stream().mapToInt(Operation::time).sum();
  }

  private static void addTasks(Model model, List<Operation> job, int horizon, List<Task> tasks) {
    int before = 0;
    int left = time(job);
    for (Operation operation : job) {
      Count start = model.count("start of " + operation, before, horizon - left);
      tasks.add(new Task(operation, tasks.size(), start));
      before += operation.time();
      left -= operation.time();
    }
  }

  private static void requireOrder(Model model, List<Task> tasks, Count makespan) {
    for (int k = 0; k < tasks.size(); k++) {
      Task task = tasks.get(k);
      int job = task.operation().job();
      int time = task.operation().time();
      if (k + 1 < tasks.size() && tasks.get(k + 1).operation().job() == job) {
        Task next = tasks.get(k + 1);
        model.require(next.operation() + " after the one before", task.until(next).atLeast(time));
      } else {
        model.require("job " + job + " ends in time", makespan.minus(task.start()).atLeast(time));
      }
    }
  }

  private static Collection<List<Task>> onMachines(List<Task> tasks) {
    Map<Integer, List<Task>> onMachine = new TreeMap<>();
    for (Task task : tasks) {
      onMachine.computeIfAbsent(task.operation().machine(), m -> new ArrayList<>()).add(task);
    }
    return onMachine.values();
  }

  /** Operations of one job are in order already. */
  private static void addPairs(Model model, List<Task> onOne, List<Pair> pairs) {
    for (int a = 0; a < onOne.size(); a++) {
      for (int b = a + 1; b < onOne.size(); b++) {
        Task one = onOne.get(a);
        Task other = onOne.get(b);
        if (one.operation().job() != other.operation().job()) {
          Bit oneFirst = model.bit(one.operation() + " before " + other.operation());
          requireBefore(model, one, other, oneFirst.not());
          requireBefore(model, other, one, oneFirst);
          pairs.add(new Pair(one, other, oneFirst));
        }
      }
    }
  }

  /** Unless the literal holds: then the distance may be as small as the windows let it be. */
  private static void requireBefore(Model model, Task first, Task second, Expr unless) {
    int time = first.operation().time();
    long smallest = second.start().lowest() - first.start().highest();
    long slackened = Math.max(0, time - smallest);
    model.require(
        first.operation() + " done before " + second.operation() + ", if it comes first",
        first.until(second).plus(unless.times((double) slackened)).atLeast(time));
  }

  /** The statement. */
  public Statement statement() {
    return statement;
  }

  /**
   * The plan of a schedule, its makespan the end of the last operation. Where two operations on a
   * machine overlap the plan is infeasible.
   *
   * @param starts of all operations, in the order of the jobs and of the steps in each
   * @throws IllegalArgumentException if a start lies outside the window that the model allows
   */
  public Plan plan(List<Integer> starts) {
    Places.requireLength("starts", starts.size(), tasks.size());
    Plan.Draft draft = statement.plan();
    long end = makespan.lowest();
    for (Task task : tasks) {
      int start = starts.get(task.place());
      draft.set(task.start(), start);
      end = Math.max(end, start + task.operation().time());
    }
    for (Pair pair : pairs) {
      int oneEnds = starts.get(pair.one().place()) + pair.one().operation().time();
      draft.set(pair.oneFirst(), oneEnds <= starts.get(pair.other().place()));
    }
    return draft.set(makespan, end).evaluate();
  }
}
