package spgpe.statistics;

import spgpe.internal.check.Check;

/** Checks of the vector accumulators; the good path allocates nothing. */
final class VectorChecks {
  private VectorChecks() {}

  static void vector(double[] vector, int dimension) {
    Check.notNull(vector, "vector");
    if (vector.length != dimension) {
      Check.argument(
          false,
          "vector must have one entry per component: vector.length=%s, dimension=%s",
          vector.length,
          dimension);
    }
    for (int i = 0; i < dimension; i++) {
      if (!Double.isFinite(vector[i])) {
        Check.argument(false, "every component must be finite: vector[%s]=%s", i, vector[i]);
      }
    }
  }

  static void sameDimension(int mine, int other) {
    Check.argument(
        mine == other,
        "only accumulators of one dimension can be merged: dimension=%s, other.dimension=%s",
        mine,
        other);
  }
}
