package dev.couplet.bench.instances;

import dev.couplet.form.TokenReader;
import dev.couplet.host.CompactGraph;
import java.io.IOException;
import java.util.HashSet;
import java.util.List;
import java.util.Set;

/**
 * The graphs of the DIMACS challenges: comment lines {@code c ...}, a line {@code p edge n m}, then
 * lines {@code e i j} with vertices from 1. Some of the published files list every edge twice, once
 * from either end, and count both: m is the number of lines.
 *
 * <p>Source: Johnson and Trick (editors), "Cliques, coloring, and satisfiability: second DIMACS
 * implementation challenge" (1996).
 */
final class DimacsGraph {
  private static final int MOST_VERTICES = 1 << 24;
  private static final int MOST_EDGES = 1 << 28;

  private DimacsGraph() {}

  static boolean recognises(List<String> head) {
    return !head.isEmpty()
        && head.get(0).matches("[cp](\\s.*)?")
        && head.stream().anyMatch(line -> line.matches("p\\s+(edge|edges|col)\\s+.*"));
  }

  static CompactGraph read(TokenReader text) throws IOException {
    seekHeader(text);
    int vertices = text.integer("the number of vertices", 0, MOST_VERTICES);
    int lines = text.integer("the number of edge lines", 0, MOST_EDGES);
    text.endOfLine();
    Set<Long> edges = new HashSet<>();
    int read = 0;
    while (text.nextLine()) {
      if (isContent(text)) {
        readEdge(text, vertices, edges);
        read++;
      }
    }
    if (read != lines) {
      throw text.fault(
          "the header says "
              + lines
              + " edge lines, the text has "
              + read
              + "; correct the header");
    }
    return graph(vertices, edges);
  }

  private static void seekHeader(TokenReader text) throws IOException {
    do {
      if (!text.nextLine()) {
        throw text.fault("the text ends where the line 'p edge n m' should stand");
      }
    } while (!isContent(text));
    String letter = text.token("the line 'p edge n m'");
    if (!letter.equals("p")) {
      throw text.fault("'" + letter + "' stands where the line 'p edge n m' should begin");
    }
    String word = text.token("the word 'edge'");
    if (!word.matches("edge|edges|col")) {
      throw text.fault("the problem is '" + word + "', it must be 'edge'");
    }
  }

  private static boolean isContent(TokenReader text) {
    return text.hasToken() && !text.line().matches("\\s*c(\\s.*)?");
  }

  private static void readEdge(TokenReader text, int vertices, Set<Long> edges) {
    String letter = text.token("an edge");
    if (!letter.equals("e")) {
      throw text.fault("the line begins with '" + letter + "', an edge begins with 'e'");
    }
    int i = text.integer("the first vertex", 1, vertices);
    int j = text.integer("the second vertex", 1, vertices);
    if (i == j) {
      throw text.fault("edge " + i + " " + j + " is a loop; leave it out");
    }
    text.endOfLine();
    edges.add((long) Math.min(i, j) << 32 | Math.max(i, j));
  }

  private static CompactGraph graph(int vertices, Set<Long> edges) {
    var graph = CompactGraph.builder(vertices);
    edges.stream().sorted().forEach(e -> graph.edge((int) (e >> 32) - 1, e.intValue() - 1));
    return graph.build();
  }
}
