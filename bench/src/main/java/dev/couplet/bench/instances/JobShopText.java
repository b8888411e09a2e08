package dev.couplet.bench.instances;

import dev.couplet.bench.models.JobShop;
import dev.couplet.bench.models.Operation;
import dev.couplet.form.TokenReader;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;

/**
 * Job shop: comment lines that begin with {@code #}, a line {@code jobs machines}, and a line a job
 * of pairs: machine (from 0) and time. The makespan is to be minimised.
 *
 * <p>Source: common practice since Beasley, "OR-Library: distributing test problems by electronic
 * mail" (1990); the problems of Fisher and Thompson (1963) and Lawrence (1984).
 */
final class JobShopText implements Format {
  private static final int LARGEST = 1 << 12;
  private static final int LONGEST = 1 << 20;

  @Override
  public String kind() {
    return "jobshop";
  }

  @Override
  public boolean recognises(List<String> head) {
    List<String> lines = head.stream().filter(line -> !isComment(line)).toList();
    if (lines.size() < 2) {
      return false;
    }
    int machines = Format.lastNumber(lines.get(0), LARGEST);
    return machines > 0 && Format.numbersPerLine(lines, 2, 2 * machines);
  }

  @Override
  public Instance read(Source source) throws IOException {
    source.requireSingle();
    List<List<Operation>> jobs = read(source.tokens());
    return new Instance.OfModel(source.name(), JobShop.of(source.name(), jobs).statement());
  }

  /** The operations of each job, machines counted from 0. */
  static List<List<Operation>> read(TokenReader text) throws IOException {
    seekLine(text, "the line 'jobs machines'");
    int jobs = text.integer("the number of jobs", 1, LARGEST);
    int machines = text.integer("the number of machines", 1, LARGEST);
    text.endOfLine();
    List<List<Operation>> read = new ArrayList<>();
    for (int job = 1; job <= jobs; job++) {
      seekLine(text, "job " + job + " of " + jobs);
      read.add(readJob(text, job, machines));
    }
    while (text.nextLine()) {
      if (!isComment(text.line())) {
        text.endOfLine();
      }
    }
    return read;
  }

  private static List<Operation> readJob(TokenReader text, int job, int machines) {
    List<Operation> operations = new ArrayList<>();
    for (int step = 1; step <= machines; step++) {
      int machine = text.integer("the machine of step " + step, 0, machines - 1);
      int time = text.integer("the time of step " + step, 0, LONGEST);
      operations.add(new Operation(job, step, machine, time));
    }
    text.endOfLine();
    return operations;
  }

  private static void seekLine(TokenReader text, String what) throws IOException {
    do {
      if (!text.nextLine()) {
        throw text.fault("the text ends where " + what + " should stand");
      }
    } while (isComment(text.line()) || !text.hasToken());
  }

  private static boolean isComment(String line) {
    return line.strip().startsWith("#");
  }
}
