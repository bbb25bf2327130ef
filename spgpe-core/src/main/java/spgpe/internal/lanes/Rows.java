package spgpe.internal.lanes;

/** Passes of radix 2 on two rows a and b; see {@link LaneKernels} for what they do. */
final class Rows {
  private Rows() {}

  static void first(
      double[] slotRe, double[] slotIm, double[] otherRe, double[] otherIm, double scale,
      double[] aRe, double[] aIm, double[] bRe, double[] bIm) {
    first(slotRe, otherRe, scale, aRe, bRe);
    first(slotIm, otherIm, scale, aIm, bIm);
  }

  private static void first(
      double[] slot, double[] other, double scale, double[] a, double[] b) {
    for (int i = 0; i < a.length; i++) {
      double x = scale * slot[i];
      double y = scale * other[i];
      a[i] = x + y;
      b[i] = x - y;
    }
  }

  static void firstTurned(
      double[] slotRe, double[] slotIm, double[] otherRe, double[] otherIm, double scale,
      double wr, double wi, double[] aRe, double[] aIm, double[] bRe, double[] bIm) {
    for (int i = 0; i < aRe.length; i++) {
      double re = otherRe[i] * wr - otherIm[i] * wi;
      double x = scale * slotRe[i];
      aRe[i] = x + re;
      bRe[i] = x - re;
    }
    for (int i = 0; i < aRe.length; i++) {
      double im = otherRe[i] * wi + otherIm[i] * wr;
      double y = scale * slotIm[i];
      aIm[i] = y + im;
      bIm[i] = y - im;
    }
  }

  static void sumAndDifference(double[] aRe, double[] aIm, double[] bRe, double[] bIm) {
    sumAndDifference(aRe, bRe);
    sumAndDifference(aIm, bIm);
  }

  private static void sumAndDifference(double[] a, double[] b) {
    for (int i = 0; i < a.length; i++) {
      double x = a[i];
      double y = b[i];
      a[i] = x + y;
      b[i] = x - y;
    }
  }

  /** With w = i. */
  static void quarterTurnToPoints(double[] aRe, double[] aIm, double[] bRe, double[] bIm) {
    for (int i = 0; i < aRe.length; i++) {
      double re = bRe[i];
      double im = bIm[i];
      double x = aRe[i];
      double y = aIm[i];
      aRe[i] = x - im;
      aIm[i] = y + re;
      bRe[i] = x + im;
      bIm[i] = y - re;
    }
  }

  /** With w = i. */
  static void quarterTurnToModes(double[] aRe, double[] aIm, double[] bRe, double[] bIm) {
    for (int i = 0; i < aRe.length; i++) {
      double re = aRe[i] - bRe[i];
      double im = aIm[i] - bIm[i];
      aRe[i] = aRe[i] + bRe[i];
      aIm[i] = aIm[i] + bIm[i];
      bRe[i] = im;
      bIm[i] = -re;
    }
  }

  static void toPoints(
      double[] aRe, double[] aIm, double[] bRe, double[] bIm, double wr, double wi) {
    for (int i = 0; i < aRe.length; i++) {
      double re = bRe[i] * wr - bIm[i] * wi;
      double im = bRe[i] * wi + bIm[i] * wr;
      double x = aRe[i];
      double y = aIm[i];
      aRe[i] = x + re;
      aIm[i] = y + im;
      bRe[i] = x - re;
      bIm[i] = y - im;
    }
  }

  static void toModes(
      double[] aRe, double[] aIm, double[] bRe, double[] bIm, double wr, double wi) {
    sumAndDifference(aRe, bRe);
    sumAndDifference(aIm, bIm);
    turnBack(bRe, bIm, wr, wi);
  }

  /** b = conj(w) b. */
  private static void turnBack(double[] bRe, double[] bIm, double wr, double wi) {
    for (int i = 0; i < bRe.length; i++) {
      double x = bRe[i];
      double y = bIm[i];
      bRe[i] = x * wr + y * wi;
      bIm[i] = y * wr - x * wi;
    }
  }

  static void last(
      double[] aRe, double[] aIm, double[] bRe, double[] bIm, double scale, double[] slotRe,
      double[] slotIm, double[] otherRe, double[] otherIm) {
    last(aRe, bRe, scale, slotRe, otherRe);
    last(aIm, bIm, scale, slotIm, otherIm);
  }

  private static void last(
      double[] a, double[] b, double scale, double[] slot, double[] other) {
    for (int i = 0; i < a.length; i++) {
      double x = a[i];
      double y = b[i];
      slot[i] = scale * (x + y);
      other[i] = scale * (x - y);
    }
  }

  static void addLastSum(double[] a, double[] b, double scale, double[] slot) {
    for (int i = 0; i < a.length; i++) {
      slot[i] += scale * (a[i] + b[i]);
    }
  }

  static void addLastDifference(
      double[] aRe, double[] aIm, double[] bRe, double[] bIm, double wr, double wi,
      double[] otherRe, double[] otherIm) {
    for (int i = 0; i < aRe.length; i++) {
      double re = aRe[i] - bRe[i];
      double im = aIm[i] - bIm[i];
      otherRe[i] += re * wr + im * wi;
      otherIm[i] += im * wr - re * wi;
    }
  }
}
