package dev.couplet.bond;

import dev.couplet.embed.Embedding;
import dev.couplet.embed.Guest;
import dev.couplet.form.Ising;
import dev.couplet.host.CompactGraph;
import dev.couplet.host.GraphBuilder;
import dev.couplet.host.Host;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;

/**
 * A small random host, disjoint connected sets grown in it, and a form on what they can carry:
 * built backwards, so that no embedder is needed.
 */
record RandomHosting(Embedding embedding, Ising form) {
  static RandomHosting of(SplittableRandom random, int hostVertices, int guests) {
    Host host = Host.of("random", graph(random, hostVertices));
    int[] owner = new int[hostVertices];
    List<List<Integer>> sets = new ArrayList<>();
    for (int g = 0; g < guests; g++) {
      sets.add(new ArrayList<>());
      int seed = random.nextInt(hostVertices);
      while (owner[seed] != 0) {
        seed = (seed + 1) % hostVertices;
      }
      owner[seed] = g + 1;
      sets.get(g).add(seed);
    }
    grow(random, host.graph(), owner, sets);
    return carried(random, host, owner, sets);
  }

  private static CompactGraph graph(SplittableRandom random, int vertices) {
    GraphBuilder graph = CompactGraph.builder(vertices);
    for (int v = 1; v < vertices; v++) {
      graph.edge(random.nextInt(v), v);
      if (v > 1 && random.nextBoolean()) {
        graph.edge(random.nextInt(v), v);
      }
    }
    return graph.build();
  }

  private static void grow(
      SplittableRandom random, CompactGraph graph, int[] owner, List<List<Integer>> sets) {
    for (int step = 0; step < 2 * owner.length; step++) {
      int g = random.nextInt(sets.size());
      int from = sets.get(g).get(random.nextInt(sets.get(g).size()));
      int[] neighbours = graph.neighbours(from);
      int to = neighbours[random.nextInt(neighbours.length)];
      if (owner[to] == 0) {
        owner[to] = g + 1;
        sets.get(g).add(to);
      }
    }
  }

  private static RandomHosting carried(
      SplittableRandom random, Host host, int[] owner, List<List<Integer>> sets) {
    int guests = sets.size();
    GraphBuilder edges = CompactGraph.builder(guests);
    Ising.Builder form = Ising.builder(guests);
    boolean[][] met = new boolean[guests][guests];
    for (int g = 0; g < guests; g++) {
      form.addLinear(g, random.nextInt(-3, 4));
    }
    host.graph()
        .forEachEdge(
            (u, v) -> {
              int g = owner[u] - 1;
              int h = owner[v] - 1;
              if (g >= 0 && h >= 0 && g != h && !met[g][h]) {
                met[g][h] = met[h][g] = true;
                edges.edge(g, h);
                form.addPair(g, h, random.nextBoolean() ? 1 + random.nextInt(3) : -1);
              }
            });
    List<int[]> arrays = new ArrayList<>();
    sets.forEach(set -> arrays.add(set.stream().mapToInt(Integer::intValue).toArray()));
    Embedding embedding = Embedding.of(new Guest("random", edges.build()), host, arrays);
    return new RandomHosting(embedding, form.build());
  }
}
