package spgpe.hamiltonian;

import java.util.Arrays;
import spgpe.internal.check.Check;
import spgpe.projector.CoherentRegion;

/**
 * Uniform energy offsets of the components: K = sum over j of delta_j N_j. For a two-level detuning
 * delta use offsets +delta/2 and -delta/2. Immutable and thread-safe.
 */
public final class Detuning implements SpectralTerm {
  private final double[] offsets;

  private Detuning(double[] offsets) {
    this.offsets = offsets;
  }

  /**
   * Detuning of a pair: K = (delta/2)(N_1 - N_2).
   *
   * @param delta energy difference of the components, finite
   * @return the term
   * @throws IllegalArgumentException if delta is not finite
   */
  public static Detuning ofPair(double delta) {
    Check.finite(delta, "detuning");
    return new Detuning(new double[] {delta / 2, -delta / 2});
  }

  /**
   * General offsets.
   *
   * @param offsets one for each component, finite
   * @return the term
   * @throws IllegalArgumentException if a value is not finite or none is given
   */
  public static Detuning ofOffsets(double... offsets) {
    Check.notNull(offsets, "offsets");
    Check.argument(offsets.length > 0, "at least one energy offset must be given");
    for (double offset : offsets) {
      Check.finite(offset, "energy offset");
    }
    return new Detuning(offsets.clone());
  }

  @Override
  public void check(int components, CoherentRegion region) {
    Check.argument(
        offsets.length == components,
        "energy offsets must be one for each component: offsets=%s, components=%s",
        offsets.length, components);
  }

  @Override
  public void addTo(ModeMatrix matrix) {
    for (int m = 0; m < matrix.region().modes(); m++) {
      for (int c = 0; c < offsets.length; c++) {
        matrix.addDiagonal(m, c, offsets[c]);
      }
    }
  }

  @Override
  public String description() {
    return "Detuning(offsets=" + Arrays.toString(offsets) + ")";
  }
}
