package dev.couplet.exact;

/**
 * A walk over consecutive blocks of a state space that keeps the energies of the current block.
 *
 * <p>Blocks are walked in binary order. When bit t of the block's number turns to 1, all lower bits
 * are 0, and the energies are those of the block without bit t, which still stand in the array of
 * that block's own lowest bit, plus one step. Each energy is thus a sum of at most one term for
 * each upper variable, whatever the length of the walk, and costs one vector addition. One thread.
 */
final class Cursor {
  private final StateSpace space;
  private final double[][] energies;
  private long block;
  private double[] current;

  Cursor(StateSpace space, long block) {
    this.space = space;
    this.energies = new double[space.upper][1 << space.low];
    this.current = space.base;
    jump(block);
  }

  /** Goes to any block. */
  void jump(long to) {
    current = space.base;
    block = 0;
    for (long rest = to; rest != 0; rest &= ~Long.highestOneBit(rest)) {
      enter(block | Long.highestOneBit(rest));
    }
  }

  /** Goes to the next block. */
  void next() {
    long to = block + 1;
    long parent = to & to - 1;
    current = parent == 0 ? space.base : energies[Long.numberOfTrailingZeros(parent)];
    block = parent;
    enter(to);
  }

  private void enter(long to) {
    int bit = Long.numberOfTrailingZeros(to);
    double shift = space.field(bit + 1, block);
    Lanes.add(current, space.step[bit + 1], shift, energies[bit]);
    current = energies[bit];
    block = to;
  }

  long block() {
    return block;
  }

  /** The energies of the block's lanes with the middle variable 0; not to be kept. */
  double[] energies() {
    return current;
  }

  /** What the middle variable adds to lane j is {@code space.step[0][j]} plus this. */
  double middleField() {
    return space.field(0, block);
  }
}
