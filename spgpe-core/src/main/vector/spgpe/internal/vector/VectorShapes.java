package spgpe.internal.vector;

import jdk.incubator.vector.DoubleVector;
import jdk.incubator.vector.VectorShape;
import jdk.incubator.vector.VectorSpecies;

/**
 * The width of the vectors: what the machine prefers, or the number of bits of the system property
 * {@code spgpe.engine.bits} (128, 256 or 512). Results do not depend on it. Other widths than the
 * machine's own work, but slowly.
 */
public final class VectorShapes {
  /** Doubles of a vector. */
  public static final VectorSpecies<Double> DOUBLES = doubles();

  /** Longs of a vector, as many as doubles. */
  public static final VectorSpecies<Long> LONGS =
      VectorSpecies.of(long.class, DOUBLES.vectorShape());

  private VectorShapes() {}

  private static VectorSpecies<Double> doubles() {
    Integer bits = Integer.getInteger("spgpe.engine.bits");
    return bits == null
        ? DoubleVector.SPECIES_PREFERRED
        : VectorSpecies.of(double.class, VectorShape.forBitSize(bits));
  }
}
