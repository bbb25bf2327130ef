package spgpe.internal.lanes;

/**
 * Where rows lie in an array: element times lanes, and a gap of 8 doubles after every chunk of some
 * thousand, so that rows whose distance is a power of two do not share the sets of a cache. A chunk
 * is a whole number of the blocks that a pass works on. Lanes that are not a power of two have no
 * gaps. Immutable.
 */
public final class LaneLayout {
  private static final int SMALLEST_CHUNK = 512;
  private static final int GAP = 8;
  private static final int SKEW = 72;

  /** A shift that leaves no chunk to count. */
  private static final int NO_CHUNKS = 31;

  private final int points;
  private final int lanes;
  private final int shift;

  /**
   * Makes a layout.
   *
   * @param points number of elements, a power of two
   * @param lanes length of a row
   */
  public LaneLayout(int points, int lanes) {
    this.points = points;
    this.lanes = lanes;
    this.shift = Integer.bitCount(lanes) == 1 ? chunkShift(points, lanes) : NO_CHUNKS;
  }

  private static int chunkShift(int points, int lanes) {
    int bits = Integer.numberOfTrailingZeros(points);
    // the blocks of the first passes: radix 4, then radix 2 if the number of bits is odd
    int shift = Integer.numberOfTrailingZeros(lanes) + (bits % 2 == 0 ? 2 : 3);
    while (1 << shift < SMALLEST_CHUNK) {
      shift += 2;
    }
    return shift;
  }

  /**
   * Number of elements.
   *
   * @return elements
   */
  public int points() {
    return points;
  }

  /**
   * Length of a row.
   *
   * @return lanes
   */
  public int lanes() {
    return lanes;
  }

  /**
   * Index with the gaps of an index without: the begin of a row, or the distance of two rows that
   * are a power of two apart.
   *
   * @param index multiple of the number of lanes
   * @return index in the array
   */
  public int at(int index) {
    return index + (index >> shift) * GAP;
  }

  /**
   * Length of the arrays.
   *
   * @return doubles
   */
  public int length() {
    return at(points * lanes);
  }

  /**
   * Makes an array. Arrays of one workspace get different lengths, so that the same index of
   * several of them is not the same place of a page: processors take such accesses for dependent.
   *
   * @param number number of the array in its workspace
   * @return zeros
   */
  public double[] newArray(int number) {
    return new double[length() + SKEW * (1 + number % 8)];
  }

  /**
   * Number of elements between gaps.
   *
   * @return elements of a chunk; all if there are no gaps
   */
  public int chunkPoints() {
    return shift == NO_CHUNKS ? points : Math.min(points, (1 << shift) / lanes);
  }
}
