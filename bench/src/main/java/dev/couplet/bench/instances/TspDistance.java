package dev.couplet.bench.instances;

import dev.couplet.bench.models.NumberTable;
import java.util.Arrays;
import java.util.Optional;
import java.util.stream.Collectors;

/**
 * The distances that TSPLIB works out from coordinates, whole numbers all.
 *
 * <p>Geographical coordinates are degrees and minutes, {@code 47.30} for 47 degrees 30 minutes. The
 * degrees are cut off, not rounded, and pi is 3.141592: the published optima were found that way.
 *
 * <p>Source: Reinelt, "TSPLIB - a traveling salesman problem library" (1991).
 */
enum TspDistance {
  /** In the plane, rounded to the nearest. */
  EUC_2D {
    @Override
    double between(double x1, double y1, double x2, double y2) {
      return Math.floor(Math.sqrt(square(x1 - x2) + square(y1 - y2)) + 0.5);
    }
  },
  /** In the plane, divided by the square root of ten, rounded up. */
  ATT {
    @Override
    double between(double x1, double y1, double x2, double y2) {
      return Math.ceil(Math.sqrt((square(x1 - x2) + square(y1 - y2)) / 10));
    }
  },
  /** On the earth, in kilometres. */
  GEO {
    @Override
    double between(double x1, double y1, double x2, double y2) {
      double byLongitude = StrictMath.cos(radians(y1) - radians(y2));
      double byLatitude = StrictMath.cos(radians(x1) - radians(x2));
      double sum = StrictMath.cos(radians(x1) + radians(x2));
      double angle =
          StrictMath.acos(0.5 * ((1 + byLongitude) * byLatitude - (1 - byLongitude) * sum));
      return Math.floor(EARTH_RADIUS * angle + 1);
    }
  };

  private static final double EARTH_RADIUS = 6378.388;
  private static final double PI = 3.141592;

  abstract double between(double x1, double y1, double x2, double y2);

  static Optional<TspDistance> named(String name) {
    return Arrays.stream(values()).filter(distance -> distance.name().equals(name)).findFirst();
  }

  static String names() {
    return Arrays.stream(values()).map(Enum::name).collect(Collectors.joining(", "));
  }

  /** The distances between all cities, 0 from each to itself. */
  NumberTable table(double[] x, double[] y) {
    int n = x.length;
    double[] table = new double[n * n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        table[i * n + j] = i == j ? 0 : between(x[i], y[i], x[j], y[j]);
      }
    }
    return NumberTable.of(n, n, table);
  }

  private static double square(double number) {
    return number * number;
  }

  private static double radians(double degreesAndMinutes) {
    double degrees = (int) degreesAndMinutes;
    double minutes = degreesAndMinutes - degrees;
    return PI * (degrees + 5 * minutes / 3) / 180;
  }
}
