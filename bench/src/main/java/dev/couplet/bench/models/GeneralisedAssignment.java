package dev.couplet.bench.models;

import static dev.couplet.model.Expr.sum;

import dev.couplet.model.Choice;
import dev.couplet.model.Expr;
import dev.couplet.model.Family;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import dev.couplet.model.Statement;
import java.util.ArrayList;
import java.util.List;

/**
 * Generalised assignment: each job to one agent, whose capacity the jobs' needs must not exceed;
 * the profit is to be maximised. A choice of an agent a job and a rule an agent. Lowered it has m n
 * bits and slack of floor(log2 capacity) + 1 bits an agent. Immutable.
 *
 * <p>Source: Cattrysse, Salomon and Van Wassenhove, "A set partitioning heuristic for the
 * generalized assignment problem" (1994), the problem's standard statement.
 */
public final class GeneralisedAssignment {
  private final Statement statement;
  private final Family<Integer, Choice<Integer>> agentOf;

  private GeneralisedAssignment(Statement statement, Family<Integer, Choice<Integer>> agentOf) {
    this.statement = statement;
    this.agentOf = agentOf;
  }

  /**
   * States the assignment, in time O(m n).
   *
   * @param profit an agent a row, a job a column
   * @param need likewise
   * @param capacity of each agent
   */
  public static GeneralisedAssignment of(
      String name, NumberTable profit, NumberTable need, List<Double> capacity) {
    need.require("the table of needs", profit.rows(), profit.columns());
    Places.requireLength("capacities", capacity.size(), profit.rows());
    Model model = Model.named(name);
    List<Integer> agents = Places.upTo(profit.rows());
    List<Integer> jobs = Places.upTo(profit.columns());
    Family<Integer, Choice<Integer>> agentOf = model.choices("agent of job", jobs, agents);
    List<Expr> profits = new ArrayList<>();
    for (int agent : agents) {
      model.require(
          "capacity of agent " + agent,
          sum(jobs, job -> agentOf.of(job).is(agent).times(need.at(agent - 1, job - 1)))
              .atMost(capacity.get(agent - 1)));
      for (int job : jobs) {
        profits.add(agentOf.of(job).is(agent).times(profit.at(agent - 1, job - 1)));
      }
    }
    model.maximize("profit", sum(profits));
    return new GeneralisedAssignment(model.snapshot(), agentOf);
  }

  /** The statement; its agents and jobs are counted from 1. */
  public Statement statement() {
    return statement;
  }

  /** The plan of the agents of jobs 1, 2, ..., counted from 1. */
  public Plan plan(int... agents) {
    Places.requireLength("agents", agents.length, agentOf.keys().size());
    Plan.Draft draft = statement.plan();
    agentOf.keys().forEach(job -> draft.set(agentOf.of(job), agents[job - 1]));
    return draft.evaluate();
  }
}
