package dev.couplet.host;

import dev.couplet.form.CheckReturnValue;
import dev.couplet.form.FormatException;
import dev.couplet.form.TokenReader;
import java.io.IOException;
import java.io.Reader;
import java.util.HashSet;
import java.util.Set;

/**
 * Reads and writes a graph as text: a line {@code n m}, then m lines {@code i j}, vertices counted
 * from 1.
 *
 * <p>A third number on a line, the weight of the edge, is read past: a host's edges have none.
 * Empty lines and lines that begin with {@code #} are skipped. Linear in the length of the text.
 */
public final class EdgeList {
  private EdgeList() {}

  /**
   * Reads a graph.
   *
   * @param source the name of the text in error messages
   * @throws FormatException with line and column of the first fault, a loop or an edge listed twice
   *     among them
   * @throws IOException if the reader fails
   */
  @CheckReturnValue
  public static CompactGraph read(String source, Reader reader) throws IOException {
    TokenReader text = new TokenReader(source, reader);
    toNextLine(text, "the line of sizes 'n m'");
    int vertices = text.integer("the number of vertices", 0, 1 << 30);
    long pairs = (long) vertices * (vertices - 1) / 2;
    int edges = text.integer("the number of edges", 0, (int) Math.min(pairs, 1 << 30));
    text.endOfLine();
    GraphBuilder builder = CompactGraph.builder(vertices);
    Set<Long> seen = new HashSet<>();
    for (int e = 0; e < edges; e++) {
      toNextLine(text, "edge " + (e + 1) + " of " + edges);
      readEdge(text, vertices, seen, builder);
    }
    if (seekLine(text)) {
      throw text.fault("the text goes on after the " + edges + " edges that its first line tells");
    }
    return builder.build();
  }

  private static void readEdge(
      TokenReader text, int vertices, Set<Long> seen, GraphBuilder builder) {
    int u = text.integer("an end of the edge", 1, vertices) - 1;
    int v = text.integer("the other end of the edge", 1, vertices) - 1;
    if (u == v) {
      throw text.fault("the edge joins vertex " + (u + 1) + " to itself; remove it");
    }
    if (!seen.add((long) Math.min(u, v) << 32 | Math.max(u, v))) {
      throw text.fault("edge " + (u + 1) + " " + (v + 1) + " is listed twice; remove one");
    }
    if (text.hasToken()) {
      text.number("the weight of the edge");
    }
    text.endOfLine();
    builder.edge(u, v);
  }

  private static void toNextLine(TokenReader text, String what) throws IOException {
    if (!seekLine(text)) {
      throw text.fault("the text ends where " + what + " should stand");
    }
  }

  /** Moves to the next line that says something. */
  private static boolean seekLine(TokenReader text) throws IOException {
    while (text.nextLine()) {
      if (text.hasToken() && !text.line().stripLeading().startsWith("#")) {
        return true;
      }
    }
    return false;
  }

  /** Writes a graph; reading it again gives an equal one. */
  public static void write(CompactGraph graph, Appendable out) throws IOException {
    out.append(graph.vertices() + " " + graph.edges() + "\n");
    for (int u = 0; u < graph.vertices(); u++) {
      for (int v : graph.neighbours(u)) {
        if (u < v) {
          out.append((u + 1) + " " + (v + 1) + "\n");
        }
      }
    }
  }
}
