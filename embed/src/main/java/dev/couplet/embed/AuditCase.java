package dev.couplet.embed;

import dev.couplet.host.CompactGraph;
import dev.couplet.host.Faults;
import dev.couplet.host.GraphBuilder;
import dev.couplet.host.Host;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;

/**
 * A guest and a host to try an embedder on.
 *
 * @param guest the guest
 * @param host the host
 * @param fits whether an embedding is known to exist
 * @param seed the seed to embed with
 */
record AuditCase(Guest guest, Host host, boolean fits, long seed) {
  private static final int RANDOM = 24;

  /** Complete 5 on a square lattice: a planar graph has no such minor (Wagner 1937). */
  static AuditCase hopeless() {
    return new AuditCase(Guests.complete(5), Host.square(7, 7), false, 1);
  }

  static List<AuditCase> all() {
    List<AuditCase> all = new ArrayList<>(extremes());
    SplittableRandom random = new SplittableRandom(20260101);
    for (int k = 0; k < RANDOM; k++) {
      all.add(partOfItsHost(random));
      all.add(anything(random));
    }
    return all;
  }

  private static List<AuditCase> extremes() {
    Host nothing = Host.of("empty", CompactGraph.builder(0).build());
    Host square = Host.square(3, 3);
    Host cells = Host.cells(4, 2, 2);
    Host apart = Host.square(2, 7).without(Faults.vertices(3, 10));
    return List.of(
        new AuditCase(edgeless(0), nothing, true, 1),
        new AuditCase(edgeless(0), square, true, 1),
        new AuditCase(edgeless(1), nothing, false, 1),
        new AuditCase(edgeless(9), square, true, 1),
        new AuditCase(edgeless(10), square, false, 1),
        new AuditCase(edgeless(3), apart, true, 1),
        new AuditCase(cycles(3, 3), cells, true, 1),
        new AuditCase(cycles(4, 6), apart, true, 1),
        new AuditCase(cycles(5, 4), apart, true, 1),
        new AuditCase(Guests.cycle(13), apart, false, 1),
        new AuditCase(Guests.complete(3), Host.cells(4, 1, 1), true, 1),
        new AuditCase(Guests.complete(8), cells, true, 1),
        new AuditCase(Guests.complete(40), cells, false, 1),
        hopeless());
  }

  private static Guest edgeless(int vertices) {
    return Guests.random(vertices, 0, 1);
  }

  private static Guest cycles(int one, int other) {
    GraphBuilder builder = CompactGraph.builder(one + other);
    Guests.cycle(one).graph().forEachEdge(builder::edge);
    Guests.cycle(other).graph().forEachEdge((u, v) -> builder.edge(one + u, one + v));
    return new Guest("two cycles", builder.build());
  }

  /** A host's vertices in another order, some of its edges left out: it fits. */
  private static AuditCase partOfItsHost(SplittableRandom random) {
    Host host = host(random);
    int[] present = host.presentVertices().stream().toArray();
    int[] number = new int[host.vertices()];
    for (int k = 0; k < present.length; k++) {
      int other = k + random.nextInt(present.length - k);
      int vertex = present[other];
      present[other] = present[k];
      number[vertex] = k;
    }
    double share = random.nextDouble();
    GraphBuilder builder = CompactGraph.builder(present.length);
    host.graph()
        .forEachEdge(
            (u, v) -> {
              if (random.nextDouble() < share) {
                builder.edge(number[u], number[v]);
              }
            });
    return new AuditCase(new Guest("part", builder.build()), host, true, random.nextLong());
  }

  private static AuditCase anything(SplittableRandom random) {
    int vertices = random.nextInt(12);
    Guest guest = Guests.random(vertices, random.nextDouble(), random.nextLong());
    return new AuditCase(guest, host(random), false, random.nextLong());
  }

  private static Host host(SplittableRandom random) {
    Host whole =
        switch (random.nextInt(5)) {
          case 0 -> Host.cells(1 + random.nextInt(4), 1 + random.nextInt(3), 1 + random.nextInt(3));
          case 1 -> Host.king(1 + random.nextInt(6), 1 + random.nextInt(6));
          case 2 -> Host.square(1 + random.nextInt(6), 1 + random.nextInt(6));
          case 3 -> Host.cubic(1 + random.nextInt(3), 1 + random.nextInt(3), 1 + random.nextInt(4));
          default -> {
            Guest any = Guests.random(1 + random.nextInt(30), 0.2, random.nextLong());
            yield Host.of(any.name(), any.graph());
          }
        };
    double share = random.nextInt(3) * 0.05;
    return whole.without(Faults.seeded(whole, share, share, random.nextLong()));
  }

  @Override
  public String toString() {
    return guest + " in " + host;
  }
}
