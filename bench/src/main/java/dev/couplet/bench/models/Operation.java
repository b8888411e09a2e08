package dev.couplet.bench.models;

/**
 * One step of a job.
 *
 * @param job counted from 1
 * @param step counted from 1
 * @param machine where it is done
 * @param time how long it takes, 0 or more
 */
public record Operation(int job, int step, int machine, int time) {
  /** Refuses a negative time. */
  public Operation {
    if (time < 0) {
      throw new IllegalArgumentException(
          "step " + step + " of job " + job + " takes " + time + ", it must be 0 or more");
    }
  }

  @Override
  public String toString() {
    return "step " + step + " of job " + job;
  }
}
