package spgpe.internal.lanes;

/** The passes as plain loops: for one lane, for any odd number of them, and as the reference. */
public final class ScalarKernels implements LaneKernels {
  /** Makes the kernels. */
  public ScalarKernels() {}

  @Override
  public int width() {
    return 1;
  }

  @Override
  public void forwardTop(
      double[] re, double[] im, int length) {
    for (int i = 0; i < length; i++) {
      int i1 = i + length;
      int i2 = i + 2 * length;
      int i3 = i + 3 * length;
      double re0 = re[i];
      double im0 = im[i];
      double re2 = re[i2];
      double im2 = im[i2];
      double sumRe = re0 + re2;
      double sumIm = im0 + im2;
      double differenceRe = re0 - re2;
      double differenceIm = im0 - im2;
      double re1 = re[i1];
      double im1 = im[i1];
      double re3 = re[i3];
      double im3 = im[i3];
      double otherRe = re1 + re3;
      double otherIm = im1 + im3;
      double turnedRe = im1 - im3;
      double turnedIm = re1 - re3;
      re[i] = sumRe + otherRe;
      im[i] = sumIm + otherIm;
      re[i1] = sumRe - otherRe;
      im[i1] = sumIm - otherIm;
      re[i2] = differenceRe + turnedRe;
      im[i2] = differenceIm - turnedIm;
      re[i3] = differenceRe - turnedRe;
      im[i3] = differenceIm + turnedIm;
    }
  }

  @Override
  public void forward4(
      double[] re, double[] im, double wr, double wi, double vr, double vi, int begin, int length) {
    for (int i = begin, end = begin + length; i < end; i++) {
      int i1 = i + length;
      int i2 = i + 2 * length;
      int i3 = i + 3 * length;
      double re2 = re[i2];
      double im2 = im[i2];
      double aRe = re2 * wr - im2 * wi;
      double aIm = re2 * wi + im2 * wr;
      double re0 = re[i];
      double im0 = im[i];
      double sumRe = re0 + aRe;
      double sumIm = im0 + aIm;
      double differenceRe = re0 - aRe;
      double differenceIm = im0 - aIm;
      double re3 = re[i3];
      double im3 = im[i3];
      double bRe = re3 * wr - im3 * wi;
      double bIm = re3 * wi + im3 * wr;
      double re1 = re[i1];
      double im1 = im[i1];
      double cRe = re1 + bRe;
      double cIm = im1 + bIm;
      double dRe = re1 - bRe;
      double dIm = im1 - bIm;
      double otherRe = cRe * vr - cIm * vi;
      double otherIm = cRe * vi + cIm * vr;
      double turnedRe = dRe * vi + dIm * vr;
      double turnedIm = dRe * vr - dIm * vi;
      re[i] = sumRe + otherRe;
      im[i] = sumIm + otherIm;
      re[i1] = sumRe - otherRe;
      im[i1] = sumIm - otherIm;
      re[i2] = differenceRe + turnedRe;
      im[i2] = differenceIm - turnedIm;
      re[i3] = differenceRe - turnedRe;
      im[i3] = differenceIm + turnedIm;
    }
  }

  @Override
  public void forward2(
      double[] re, double[] im, double wr, double wi, int begin, int length) {
    for (int i = begin, end = begin + length; i < end; i++) {
      int i1 = i + length;
      double re1 = re[i1];
      double im1 = im[i1];
      double aRe = re1 * wr - im1 * wi;
      double aIm = re1 * wi + im1 * wr;
      double re0 = re[i];
      double im0 = im[i];
      re[i] = re0 + aRe;
      im[i] = im0 + aIm;
      re[i1] = re0 - aRe;
      im[i1] = im0 - aIm;
    }
  }

  @Override
  public void inverseTop(
      double[] re, double[] im, int length) {
    for (int i = 0; i < length; i++) {
      int i1 = i + length;
      int i2 = i + 2 * length;
      int i3 = i + 3 * length;
      double re0 = re[i];
      double im0 = im[i];
      double re1 = re[i1];
      double im1 = im[i1];
      double sumRe = re0 + re1;
      double sumIm = im0 + im1;
      double cRe = re0 - re1;
      double cIm = im0 - im1;
      double re2 = re[i2];
      double im2 = im[i2];
      double re3 = re[i3];
      double im3 = im[i3];
      double differenceRe = re2 + re3;
      double differenceIm = im2 + im3;
      double dRe = re2 - re3;
      double dIm = im2 - im3;
      re[i] = sumRe + differenceRe;
      im[i] = sumIm + differenceIm;
      re[i1] = cRe - dIm;
      im[i1] = cIm + dRe;
      re[i2] = sumRe - differenceRe;
      im[i2] = sumIm - differenceIm;
      re[i3] = cRe + dIm;
      im[i3] = cIm - dRe;
    }
  }

  @Override
  public void inverse4(
      double[] re, double[] im, double wr, double wi, double vr, double vi, int begin, int length) {
    for (int i = begin, end = begin + length; i < end; i++) {
      int i1 = i + length;
      int i2 = i + 2 * length;
      int i3 = i + 3 * length;
      double re0 = re[i];
      double im0 = im[i];
      double re1 = re[i1];
      double im1 = im[i1];
      double sumRe = re0 + re1;
      double sumIm = im0 + im1;
      double cRe = re0 - re1;
      double cIm = im0 - im1;
      double re2 = re[i2];
      double im2 = im[i2];
      double re3 = re[i3];
      double im3 = im[i3];
      double differenceRe = re2 + re3;
      double differenceIm = im2 + im3;
      double dRe = re2 - re3;
      double dIm = im2 - im3;
      double otherRe = cRe * vr + cIm * vi;
      double otherIm = cIm * vr - cRe * vi;
      double turnedRe = dIm * vr - dRe * vi;
      double turnedIm = dRe * vr + dIm * vi;
      double aRe = sumRe - differenceRe;
      double aIm = sumIm - differenceIm;
      double bRe = otherRe + turnedRe;
      double bIm = otherIm - turnedIm;
      re[i] = sumRe + differenceRe;
      im[i] = sumIm + differenceIm;
      re[i1] = otherRe - turnedRe;
      im[i1] = otherIm + turnedIm;
      re[i2] = aRe * wr + aIm * wi;
      im[i2] = aIm * wr - aRe * wi;
      re[i3] = bRe * wr + bIm * wi;
      im[i3] = bIm * wr - bRe * wi;
    }
  }

  @Override
  public void inverse2(
      double[] re, double[] im, double wr, double wi, int begin, int length) {
    for (int i = begin, end = begin + length; i < end; i++) {
      int i1 = i + length;
      double re0 = re[i];
      double im0 = im[i];
      double re1 = re[i1];
      double im1 = im[i1];
      double aRe = re0 - re1;
      double aIm = im0 - im1;
      re[i] = re0 + re1;
      im[i] = im0 + im1;
      re[i1] = aRe * wr + aIm * wi;
      im[i1] = aIm * wr - aRe * wi;
    }
  }

  @Override
  public void inverseEdge(
      ModeEdge edge, double[] modesRe, double[] modesIm, double[] re, double[] im, int firstBlock,
      int lastBlock) {
    int[] places = edge.places;
    double[] factorRe = edge.factorRe;
    double[] factorIm = edge.factorIm;
    double[] twiddleRe = edge.twiddles.re;
    double[] twiddleIm = edge.twiddles.im;
    int lanes = edge.layout.lanes();
    for (int block = firstBlock, lane = 0; block < lastBlock; ) {
      int row = 4 * block;
      double wr = twiddleRe[block];
      double wi = twiddleIm[block];
      double vr = twiddleRe[2 * block];
      double vi = twiddleIm[2 * block];
      int i = edge.layout.at(row * lanes) + lane;
      int i1 = i + lanes;
      int i2 = i + 2 * lanes;
      int i3 = i + 3 * lanes;
      int m0 = places[row] + lane;
      double modeRe0 = modesRe[m0];
      double modeIm0 = modesIm[m0];
      double re0 = modeRe0 * factorRe[row] - modeIm0 * factorIm[row];
      double im0 = modeRe0 * factorIm[row] + modeIm0 * factorRe[row];
      int m1 = places[row + 1] + lane;
      double modeRe1 = modesRe[m1];
      double modeIm1 = modesIm[m1];
      double re1 = modeRe1 * factorRe[row + 1] - modeIm1 * factorIm[row + 1];
      double im1 = modeRe1 * factorIm[row + 1] + modeIm1 * factorRe[row + 1];
      double sumRe = re0 + re1;
      double sumIm = im0 + im1;
      double cRe = re0 - re1;
      double cIm = im0 - im1;
      int m2 = places[row + 2] + lane;
      double modeRe2 = modesRe[m2];
      double modeIm2 = modesIm[m2];
      double re2 = modeRe2 * factorRe[row + 2] - modeIm2 * factorIm[row + 2];
      double im2 = modeRe2 * factorIm[row + 2] + modeIm2 * factorRe[row + 2];
      int m3 = places[row + 3] + lane;
      double modeRe3 = modesRe[m3];
      double modeIm3 = modesIm[m3];
      double re3 = modeRe3 * factorRe[row + 3] - modeIm3 * factorIm[row + 3];
      double im3 = modeRe3 * factorIm[row + 3] + modeIm3 * factorRe[row + 3];
      double differenceRe = re2 + re3;
      double differenceIm = im2 + im3;
      double dRe = re2 - re3;
      double dIm = im2 - im3;
      double otherRe = cRe * vr + cIm * vi;
      double otherIm = cIm * vr - cRe * vi;
      double turnedRe = dIm * vr - dRe * vi;
      double turnedIm = dRe * vr + dIm * vi;
      double aRe = sumRe - differenceRe;
      double aIm = sumIm - differenceIm;
      double bRe = otherRe + turnedRe;
      double bIm = otherIm - turnedIm;
      re[i] = sumRe + differenceRe;
      im[i] = sumIm + differenceIm;
      re[i1] = otherRe - turnedRe;
      im[i1] = otherIm + turnedIm;
      re[i2] = aRe * wr + aIm * wi;
      im[i2] = aIm * wr - aRe * wi;
      re[i3] = bRe * wr + bIm * wi;
      im[i3] = bIm * wr - bRe * wi;
      lane++;
      if (lane == lanes) {
        lane = 0;
        block++;
      }
    }
  }

  @Override
  public void forwardEdge(
      ModeEdge edge, double[] re, double[] im, double[] modesRe, double[] modesIm, int firstBlock,
      int lastBlock) {
    int[] places = edge.places;
    boolean[] kept = edge.kept;
    double[] factorRe = edge.factorRe;
    double[] factorIm = edge.factorIm;
    double[] twiddleRe = edge.twiddles.re;
    double[] twiddleIm = edge.twiddles.im;
    int lanes = edge.layout.lanes();
    for (int block = firstBlock, lane = 0; block < lastBlock; ) {
      int row = 4 * block;
      double wr = twiddleRe[block];
      double wi = twiddleIm[block];
      double vr = twiddleRe[2 * block];
      double vi = twiddleIm[2 * block];
      int i = edge.layout.at(row * lanes) + lane;
      int i1 = i + lanes;
      int i2 = i + 2 * lanes;
      int i3 = i + 3 * lanes;
      double re2 = re[i2];
      double im2 = im[i2];
      double aRe = re2 * wr - im2 * wi;
      double aIm = re2 * wi + im2 * wr;
      double re0 = re[i];
      double im0 = im[i];
      double sumRe = re0 + aRe;
      double sumIm = im0 + aIm;
      double differenceRe = re0 - aRe;
      double differenceIm = im0 - aIm;
      double re3 = re[i3];
      double im3 = im[i3];
      double bRe = re3 * wr - im3 * wi;
      double bIm = re3 * wi + im3 * wr;
      double re1 = re[i1];
      double im1 = im[i1];
      double cRe = re1 + bRe;
      double cIm = im1 + bIm;
      double dRe = re1 - bRe;
      double dIm = im1 - bIm;
      double otherRe = cRe * vr - cIm * vi;
      double otherIm = cRe * vi + cIm * vr;
      double turnedRe = dRe * vi + dIm * vr;
      double turnedIm = dRe * vr - dIm * vi;
      if (kept[row]) {
        int m = places[row] + lane;
        double x = sumRe + otherRe;
        double y = sumIm + otherIm;
        modesRe[m] += x * factorRe[row] - y * factorIm[row];
        modesIm[m] += x * factorIm[row] + y * factorRe[row];
      }
      if (kept[row + 1]) {
        int m = places[row + 1] + lane;
        double x = sumRe - otherRe;
        double y = sumIm - otherIm;
        modesRe[m] += x * factorRe[row + 1] - y * factorIm[row + 1];
        modesIm[m] += x * factorIm[row + 1] + y * factorRe[row + 1];
      }
      if (kept[row + 2]) {
        int m = places[row + 2] + lane;
        double x = differenceRe + turnedRe;
        double y = differenceIm - turnedIm;
        modesRe[m] += x * factorRe[row + 2] - y * factorIm[row + 2];
        modesIm[m] += x * factorIm[row + 2] + y * factorRe[row + 2];
      }
      if (kept[row + 3]) {
        int m = places[row + 3] + lane;
        double x = differenceRe - turnedRe;
        double y = differenceIm + turnedIm;
        modesRe[m] += x * factorRe[row + 3] - y * factorIm[row + 3];
        modesIm[m] += x * factorIm[row + 3] + y * factorRe[row + 3];
      }
      lane++;
      if (lane == lanes) {
        lane = 0;
        block++;
      }
    }
  }
}
