package spgpe.internal.measure;

import spgpe.model.Model;
import spgpe.projector.Field;
import spgpe.run.Snapshot;

/**
 * The coherence X = psi_1 psi_2<sup>*</sup> of the components 0 and 1 and its phase at every point,
 * computed once for each look and shared by all observables of the relative phase. Live arrays,
 * read only. Belongs to one thread.
 */
public final class PairProfiles {
  private final double[] re;
  private final double[] im;
  private final double[] cosine;
  private final double[] sine;
  private final double[] angle;
  private final double[] size;
  private boolean hasFactors;
  private boolean hasAngle;

  private PairProfiles(Model model) {
    int points = model.region().grid().points();
    re = new double[points];
    im = new double[points];
    cosine = new double[points];
    sine = new double[points];
    angle = new double[points];
    size = new double[points];
  }

  /**
   * The profiles of a snapshot.
   *
   * @param snapshot what is measured, of two components at least
   * @return profiles, valid as long as the snapshot's field
   */
  public static PairProfiles of(Snapshot snapshot) {
    return snapshot.computed(
        PairProfiles.class, PairProfiles.class, PairProfiles::new, (s, p) -> p.take(s.field()));
  }

  private void take(Field field) {
    multiply(field.re(0), field.im(0), field.re(1), field.im(1));
    hasFactors = false;
    hasAngle = false;
  }

  private void multiply(double[] re1, double[] im1, double[] re2, double[] im2) {
    for (int i = 0; i < re.length; i++) {
      re[i] = re1[i] * re2[i] + im1[i] * im2[i];
      im[i] = im1[i] * re2[i] - re1[i] * im2[i];
    }
  }

  /**
   * Re X.
   *
   * @return one number for each point
   */
  public double[] re() {
    return re;
  }

  /**
   * Im X.
   *
   * @return one number for each point
   */
  public double[] im() {
    return im;
  }

  /**
   * cos phi = Re X/|X|; 0 where X vanishes.
   *
   * @return one number for each point
   */
  public double[] cosine() {
    computeFactors();
    return cosine;
  }

  /**
   * sin phi = Im X/|X|; 0 where X vanishes.
   *
   * @return one number for each point
   */
  public double[] sine() {
    computeFactors();
    return sine;
  }

  /**
   * phi in (-pi, pi]; 0 where X vanishes.
   *
   * @return one number for each point, radians
   */
  public double[] angle() {
    if (!hasAngle) {
      for (int i = 0; i < angle.length; i++) {
        angle[i] = Math.atan2(im[i] + 0.0, re[i]); // a negative zero would give -pi
      }
      hasAngle = true;
    }
    return angle;
  }

  private void computeFactors() {
    if (hasFactors) {
      return;
    }
    double least = Double.POSITIVE_INFINITY;
    double largest = 0;
    for (int i = 0; i < re.length; i++) {
      double square = re[i] * re[i] + im[i] * im[i];
      size[i] = square;
      least = Math.min(least, square);
      largest = Math.max(largest, square);
    }
    if (least > Double.MIN_NORMAL && largest < Double.POSITIVE_INFINITY) {
      for (int i = 0; i < re.length; i++) {
        double root = Math.sqrt(size[i]);
        cosine[i] = re[i] / root;
        sine[i] = im[i] / root;
      }
    } else {
      for (int i = 0; i < re.length; i++) {
        double root = Math.hypot(re[i], im[i]); // slow, but right where squares leave the range
        cosine[i] = root == 0 ? 0 : re[i] / root;
        sine[i] = root == 0 ? 0 : im[i] / root;
      }
    }
    hasFactors = true;
  }
}
