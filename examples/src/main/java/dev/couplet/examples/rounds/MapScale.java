package dev.couplet.examples.rounds;

import java.util.List;

/** Where on a drawing a place on the map lies: as large as fits into a box, not distorted. */
final class MapScale {
  private final double unitsPerMetre;
  private final double middleEast;
  private final double middleNorth;
  private final Box box;

  private MapScale(Box box, double unitsPerMetre, double middleEast, double middleNorth) {
    this.box = box;
    this.unitsPerMetre = unitsPerMetre;
    this.middleEast = middleEast;
    this.middleNorth = middleNorth;
  }

  static MapScale fitting(List<Village> villages, Box box) {
    double west = villages.stream().mapToInt(Village::east).min().orElse(0);
    double east = villages.stream().mapToInt(Village::east).max().orElse(0);
    double south = villages.stream().mapToInt(Village::north).min().orElse(0);
    double north = villages.stream().mapToInt(Village::north).max().orElse(0);
    double across = box.width() / Math.max(1, east - west);
    double along = box.height() / Math.max(1, north - south);
    return new MapScale(box, Math.min(across, along), (west + east) / 2, (south + north) / 2);
  }

  double x(Village village) {
    return box.x() + (village.east() - middleEast) * unitsPerMetre;
  }

  double y(Village village) {
    return box.y() - (village.north() - middleNorth) * unitsPerMetre;
  }

  double units(double metres) {
    return metres * unitsPerMetre;
  }

  /** The longest of 1, 2, 5, 10, 20, ... metres that is no longer than so much on the drawing. */
  int roundMetres(double longest) {
    int best = 1;
    for (int power = 1; power <= 10_000_000; power *= 10) {
      for (int metres : new int[] {power, 2 * power, 5 * power}) {
        best = units(metres) <= longest ? metres : best;
      }
    }
    return best;
  }
}
