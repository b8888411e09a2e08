package dev.couplet.embed.template;

import dev.couplet.host.Cells;
import dev.couplet.host.Host;
import dev.couplet.host.King;
import dev.couplet.host.Lattice;
import java.util.List;
import java.util.Optional;

/** Branch sets that all meet each other, laid on a rectangle that can be moved over a lattice. */
interface Pattern {
  /** By how many rows the rectangle can be moved down, from the top. */
  int spareRows();

  /** By how many columns the rectangle can be moved to the right, from the left. */
  int spareColumns();

  /** The branch sets with the rectangle moved by so many rows and columns. */
  List<int[]> sets(int down, int right);

  /** The pattern of a number of sets, at least 1, for a host; empty if it has none as large. */
  static Optional<Pattern> of(int count, Host host) {
    Lattice lattice = host.lattice().orElse(null);
    if (lattice instanceof Cells cells) {
      return CellsPattern.of(count, cells);
    }
    if (lattice instanceof King king) {
      return KingPattern.of(count, king);
    }
    return Optional.empty();
  }
}
