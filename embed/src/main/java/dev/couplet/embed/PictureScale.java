package dev.couplet.embed;

import dev.couplet.host.Host;
import java.util.stream.IntStream;

/**
 * Turns a host's places into pixels. What is drawn is measured in units: the length of the shortest
 * edge, or the mean spacing of the vertices if that is less.
 */
final class PictureScale {
  private static final double COMFORT = 28;
  private static final double LARGEST = 3000;
  private static final double CLOSE = 0.1;

  /** The unit in pixels. */
  final double unit;

  final double width;
  final double height;

  private final Host host;
  private final double left;
  private final double top;
  private final double factor;

  PictureScale(Host host) {
    this.host = host;
    int n = host.vertices();
    left = IntStream.range(0, n).mapToDouble(host::x).min().orElse(0);
    top = IntStream.range(0, n).mapToDouble(host::y).min().orElse(0);
    double wide = IntStream.range(0, n).mapToDouble(host::x).max().orElse(0) - left;
    double high = IntStream.range(0, n).mapToDouble(host::y).max().orElse(0) - top;
    double longest = Math.max(wide, high);
    double spacing = Math.max(Math.sqrt(wide * high / Math.max(1, n)), longest / Math.max(1, n));
    double step = Math.max(Math.min(shortestEdge(host), spacing), CLOSE * spacing);
    factor = longest > 0 ? Math.min(COMFORT / step, LARGEST / longest) : 1;
    unit = longest > 0 ? factor * step : COMFORT;
    width = factor * wide;
    height = factor * high;
  }

  double x(int vertex) {
    return factor * (host.x(vertex) - left);
  }

  double y(int vertex) {
    return factor * (host.y(vertex) - top);
  }

  /** The length of the shortest edge; infinite if there is none. */
  private static double shortestEdge(Host host) {
    double[] shortest = {Double.POSITIVE_INFINITY};
    host.whole()
        .forEachEdge(
            (u, v) -> {
              double length = Math.hypot(host.x(u) - host.x(v), host.y(u) - host.y(v));
              shortest[0] = Math.min(shortest[0], length);
            });
    return shortest[0];
  }
}
