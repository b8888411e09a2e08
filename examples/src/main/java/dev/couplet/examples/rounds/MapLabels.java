package dev.couplet.examples.rounds;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * Sets the names of places beside their marks, one after the other, each where it is in nobody's
 * way: off the other names, off the marks, inside the frame, and over as little of the lines as can
 * be.
 */
final class MapLabels {
  static final double FONT = 14;
  private static final double LETTER = 7.6;
  private static final double MARK = 11;
  private static final double IN_THE_WAY = 10_000;
  private static final double[] DISTANCES = {0, 8, 18, 30};

  private final Box frame;
  private final List<Box> marks = new ArrayList<>();
  private final List<double[]> lines = new ArrayList<>();
  private final Map<Place, Box> placed = new LinkedHashMap<>();

  MapLabels(Box frame) {
    this.frame = frame;
  }

  /** Something drawn at a place that no name may cover. */
  void addMark(double x, double y) {
    marks.add(Box.around(x, y, MARK, MARK));
  }

  /** A line that names had better not cover. */
  void addLine(double x1, double y1, double x2, double y2) {
    lines.add(new double[] {x1, y1, x2, y2});
  }

  /** Finds room for the name of a place, once all marks and lines are known. */
  Box place(Place place, String text, double x, double y) {
    Box best = frame;
    double least = Double.POSITIVE_INFINITY;
    for (double away : DISTANCES) {
      for (Box box : around(x, y, text.length() * LETTER / 2, away)) {
        double cost = away + cost(box);
        if (cost < least) {
          best = box;
          least = cost;
        }
      }
    }
    placed.put(place, best);
    return best;
  }

  /** The eight places around a mark: right and left first, then above and below, then between. */
  private static List<Box> around(double x, double y, double halfWidth, double away) {
    double halfHeight = FONT / 2 + 1;
    double beside = MARK + halfWidth + 2 + away;
    double above = MARK + halfHeight + away;
    List<Box> boxes = new ArrayList<>();
    for (int[] side :
        new int[][] {{1, 0}, {-1, 0}, {0, -1}, {0, 1}, {1, -1}, {1, 1}, {-1, -1}, {-1, 1}}) {
      boolean corner = side[0] != 0 && side[1] != 0;
      double lift = corner ? above - 6 : above;
      boxes.add(Box.around(x + side[0] * beside, y + side[1] * lift, halfWidth, halfHeight));
    }
    return boxes;
  }

  private double cost(Box box) {
    double cost = box.inside(frame) ? 0 : IN_THE_WAY;
    for (Box mark : marks) {
      cost += box.overlaps(mark) ? IN_THE_WAY : 0;
    }
    for (Box other : placed.values()) {
      cost += box.grown(2).overlaps(other) ? IN_THE_WAY : 0;
    }
    for (double[] line : lines) {
      cost += box.lengthInside(line[0], line[1], line[2], line[3]);
    }
    return cost;
  }
}
