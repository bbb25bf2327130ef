package spgpe.observables.density;

import spgpe.internal.measure.PointwiseProfile;
import spgpe.model.Model;
import spgpe.projector.Field;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

/**
 * Spatial means of local products of the components 0 and 1, measured together by {@link #all}: the
 * numbers that an exact equilibrium theory of two coupled fields gives. The number of a moment is
 * its {@link #index()}.
 */
public enum PairMoment {
  /** n_1 = |psi_1|<sup>2</sup>. */
  DENSITY_1(0),
  /** n_2 = |psi_2|<sup>2</sup>. */
  DENSITY_2(1),
  /** Re psi_1<sup>*</sup> psi_2 = sqrt(n_1 n_2) cos phi. */
  COHERENCE(2),
  /** Im psi_1<sup>*</sup> psi_2 = S_y/2. */
  COHERENCE_IMAGINARY(3),
  /** S_y<sup>2</sup> = 4 n_1 n_2 sin<sup>2</sup> phi. */
  SPIN_Y_SQUARED(4),
  /** n_1<sup>2</sup>. */
  DENSITY_1_SQUARED(5),
  /** n_2<sup>2</sup>. */
  DENSITY_2_SQUARED(6),
  /** n_1 n_2. */
  DENSITY_PRODUCT(7),
  /** (n_1 - n_2)<sup>2</sup>. */
  SPIN_Z_SQUARED(8);

  private final int index;

  PairMoment(int index) {
    this.index = index;
  }

  /**
   * Place of the moment among the numbers of {@link #all}.
   *
   * @return index from 0
   */
  public int index() {
    return index;
  }

  /**
   * All moments.
   *
   * @return observable with one number for each moment, in the order of the constants
   */
  public static Observable all() {
    return new Observable() {
      @Override
      public String name() {
        return "moments of the pair";
      }

      @Override
      public int size(Model model) {
        PointwiseProfile.requireComponents(model, 2, name());
        return values().length;
      }

      @Override
      public void measure(Snapshot snapshot, double[] result) {
        addUp(snapshot.field(), result);
      }
    };
  }

  private static void addUp(Field f, double[] result) {
    java.util.Arrays.fill(result, 0);
    addUp(f.re(0), f.im(0), f.re(1), f.im(1), result);
    for (int i = 0; i < result.length; i++) {
      result[i] /= f.grid().points();
    }
  }

  private static void addUp(
      double[] reals1, double[] imaginary1, double[] reals2, double[] imaginary2,
      double[] result) {
    for (int i = 0; i < reals1.length; i++) {
      double re1 = reals1[i];
      double im1 = imaginary1[i];
      double re2 = reals2[i];
      double im2 = imaginary2[i];
      double n1 = re1 * re1 + im1 * im1;
      double n2 = re2 * re2 + im2 * im2;
      double re = re1 * re2 + im1 * im2;
      double im = re1 * im2 - im1 * re2;
      result[DENSITY_1.index] += n1;
      result[DENSITY_2.index] += n2;
      result[COHERENCE.index] += re;
      result[COHERENCE_IMAGINARY.index] += im;
      result[SPIN_Y_SQUARED.index] += 4 * im * im;
      result[DENSITY_1_SQUARED.index] += n1 * n1;
      result[DENSITY_2_SQUARED.index] += n2 * n2;
      result[DENSITY_PRODUCT.index] += n1 * n2;
      result[SPIN_Z_SQUARED.index] += (n1 - n2) * (n1 - n2);
    }
  }
}
