package dev.couplet.examples.rounds;

/** An upright rectangle on a drawing; y runs downwards. */
record Box(double left, double top, double right, double bottom) {
  static Box around(double x, double y, double halfWidth, double halfHeight) {
    return new Box(x - halfWidth, y - halfHeight, x + halfWidth, y + halfHeight);
  }

  double x() {
    return (left + right) / 2;
  }

  double y() {
    return (top + bottom) / 2;
  }

  double width() {
    return right - left;
  }

  double height() {
    return bottom - top;
  }

  /** This box with so much more room on every side. */
  Box grown(double by) {
    return new Box(left - by, top - by, right + by, bottom + by);
  }

  boolean inside(Box outer) {
    return left >= outer.left && right <= outer.right && top >= outer.top && bottom <= outer.bottom;
  }

  boolean overlaps(Box other) {
    return left < other.right && other.left < right && top < other.bottom && other.top < bottom;
  }

  /** The length of the part of a line inside this box. */
  double lengthInside(double x1, double y1, double x2, double y2) {
    double[] part = {0, 1};
    clip(part, x2 - x1, left - x1, right - x1);
    clip(part, y2 - y1, top - y1, bottom - y1);
    double across = x2 - x1;
    double along = y2 - y1;
    return Math.max(0, part[1] - part[0]) * Math.sqrt(across * across + along * along);
  }

  /** Cuts a part of a line down to where {@code from <= t * step <= to}. */
  private static void clip(double[] part, double step, double from, double to) {
    if (step == 0) {
      part[1] = from <= 0 && to >= 0 ? part[1] : part[0];
      return;
    }
    part[0] = Math.max(part[0], Math.min(from / step, to / step));
    part[1] = Math.min(part[1], Math.max(from / step, to / step));
  }
}
