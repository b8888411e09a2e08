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

  static MapScale fitting(List<? extends Place> places, Box box) {
    double west = places.stream().mapToInt(Place::east).min().orElse(0);
    double east = places.stream().mapToInt(Place::east).max().orElse(0);
    double south = places.stream().mapToInt(Place::north).min().orElse(0);
    double north = places.stream().mapToInt(Place::north).max().orElse(0);
    double across = box.width() / Math.max(1, east - west);
    double along = box.height() / Math.max(1, north - south);
    return new MapScale(box, Math.min(across, along), (west + east) / 2, (south + north) / 2);
  }

  double x(Place place) {
    return box.x() + (place.east() - middleEast) * unitsPerMetre;
  }

  double y(Place place) {
    return box.y() - (place.north() - middleNorth) * unitsPerMetre;
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
