package spgpe.observables.density;

import spgpe.internal.measure.PointwiseProfile;
import spgpe.model.Model;
import spgpe.projector.Field;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

/**
 * Spatial means of local products of the components 0 and 1, measured together by {@link #all}: the
 * numbers that an exact equilibrium theory of two coupled fields gives. The number of a moment is
 * its {@link #ordinal()}.
 */
public enum PairMoment {
  /** n_1 = |psi_1|<sup>2</sup>. */
  DENSITY_1,
  /** n_2 = |psi_2|<sup>2</sup>. */
  DENSITY_2,
  /** Re psi_1<sup>*</sup> psi_2 = sqrt(n_1 n_2) cos phi. */
  COHERENCE,
  /** Im psi_1<sup>*</sup> psi_2 = S_y/2. */
  COHERENCE_IMAGINARY,
  /** S_y<sup>2</sup> = 4 n_1 n_2 sin<sup>2</sup> phi. */
  SPIN_Y_SQUARED,
  /** n_1<sup>2</sup>. */
  DENSITY_1_SQUARED,
  /** n_2<sup>2</sup>. */
  DENSITY_2_SQUARED,
  /** n_1 n_2. */
  DENSITY_PRODUCT,
  /** (n_1 - n_2)<sup>2</sup>. */
  SPIN_Z_SQUARED;

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
    int points = f.grid().points();
    for (int i = 0; i < points; i++) {
      double re1 = f.re(0)[i];
      double im1 = f.im(0)[i];
      double re2 = f.re(1)[i];
      double im2 = f.im(1)[i];
      double n1 = re1 * re1 + im1 * im1;
      double n2 = re2 * re2 + im2 * im2;
      double re = re1 * re2 + im1 * im2;
      double im = re1 * im2 - im1 * re2;
      result[DENSITY_1.ordinal()] += n1;
      result[DENSITY_2.ordinal()] += n2;
      result[COHERENCE.ordinal()] += re;
      result[COHERENCE_IMAGINARY.ordinal()] += im;
      result[SPIN_Y_SQUARED.ordinal()] += 4 * im * im;
      result[DENSITY_1_SQUARED.ordinal()] += n1 * n1;
      result[DENSITY_2_SQUARED.ordinal()] += n2 * n2;
      result[DENSITY_PRODUCT.ordinal()] += n1 * n2;
      result[SPIN_Z_SQUARED.ordinal()] += (n1 - n2) * (n1 - n2);
    }
    for (int i = 0; i < result.length; i++) {
      result[i] /= points;
    }
  }
}
