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
  public void fromModes(
      double[] modesRe, double[] modesIm, double scale, double[] re, double[] im, int length) {
    for (int i = 0, end = length; i < end; i++) {
      int i1 = i + length;
      int i2 = i + 2 * length;
      int i3 = i + 3 * length;
      double re0 = scale * modesRe[i];
      double im0 = scale * modesIm[i];
      double re2 = scale * modesRe[i2];
      double im2 = scale * modesIm[i2];
      double sumRe = re0 + re2;
      double sumIm = im0 + im2;
      double differenceRe = re0 - re2;
      double differenceIm = im0 - im2;
      double re1 = scale * modesRe[i1];
      double im1 = scale * modesIm[i1];
      double re3 = scale * modesRe[i3];
      double im3 = scale * modesIm[i3];
      double otherRe = re1 + re3;
      double otherIm = im1 + im3;
      double turnedRe = re1 - re3;
      double turnedIm = im1 - im3;
      re[i] = sumRe + otherRe;
      im[i] = sumIm + otherIm;
      re[i1] = sumRe - otherRe;
      im[i1] = sumIm - otherIm;
      re[i2] = differenceRe - turnedIm;
      im[i2] = differenceIm + turnedRe;
      re[i3] = differenceRe + turnedIm;
      im[i3] = differenceIm - turnedRe;
    }
  }

  @Override
  public void fromModesTurned(
      double[] modesRe, double[] modesIm, double scale, double wr, double wi, double vr, double vi,
      double[] re, double[] im, int length) {
    for (int i = 0, end = length; i < end; i++) {
      int i1 = i + length;
      int i2 = i + 2 * length;
      int i3 = i + 3 * length;
      double re2 = modesRe[i2];
      double im2 = modesIm[i2];
      double aRe = re2 * wr - im2 * wi;
      double aIm = re2 * wi + im2 * wr;
      double re0 = scale * modesRe[i];
      double im0 = scale * modesIm[i];
      double sumRe = re0 + aRe;
      double sumIm = im0 + aIm;
      double differenceRe = re0 - aRe;
      double differenceIm = im0 - aIm;
      double re3 = modesRe[i3];
      double im3 = modesIm[i3];
      double bRe = re3 * wr - im3 * wi;
      double bIm = re3 * wi + im3 * wr;
      double re1 = scale * modesRe[i1];
      double im1 = scale * modesIm[i1];
      double cRe = re1 + bRe;
      double cIm = im1 + bIm;
      double dRe = re1 - bRe;
      double dIm = im1 - bIm;
      double otherRe = cRe * vr - cIm * vi;
      double otherIm = cRe * vi + cIm * vr;
      double turnedRe = dRe * vr - dIm * vi;
      double turnedIm = dRe * vi + dIm * vr;
      re[i] = sumRe + otherRe;
      im[i] = sumIm + otherIm;
      re[i1] = sumRe - otherRe;
      im[i1] = sumIm - otherIm;
      re[i2] = differenceRe - turnedIm;
      im[i2] = differenceIm + turnedRe;
      re[i3] = differenceRe + turnedIm;
      im[i3] = differenceIm - turnedRe;
    }
  }

  @Override
  public void points4(
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
      double turnedRe = dRe * vr - dIm * vi;
      double turnedIm = dRe * vi + dIm * vr;
      re[i] = sumRe + otherRe;
      im[i] = sumIm + otherIm;
      re[i1] = sumRe - otherRe;
      im[i1] = sumIm - otherIm;
      re[i2] = differenceRe - turnedIm;
      im[i2] = differenceIm + turnedRe;
      re[i3] = differenceRe + turnedIm;
      im[i3] = differenceIm - turnedRe;
    }
  }

  @Override
  public void points2(double[] re, double[] im, double wr, double wi, int begin, int length) {
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
  public void pointLeaves(
      double[] re, double[] im, LaneFourier.Leaves leaves, int firstBlock, int lastBlock,
      int firstRow) {
    double[] twiddleRe = leaves.twiddles().re;
    double[] twiddleIm = leaves.twiddles().im;
    int lanes = leaves.layout().lanes();
    for (int block = firstBlock, row = firstRow, lane = 0; block < lastBlock; ) {
      double wr = twiddleRe[block];
      double wi = twiddleIm[block];
      double vr = twiddleRe[2 * block];
      double vi = twiddleIm[2 * block];
      int i = leaves.layout().at(row * lanes) + lane;
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
      double turnedRe = dRe * vr - dIm * vi;
      double turnedIm = dRe * vi + dIm * vr;
      re[i] = sumRe + otherRe;
      im[i] = sumIm + otherIm;
      re[i1] = sumRe - otherRe;
      im[i1] = sumIm - otherIm;
      re[i2] = differenceRe - turnedIm;
      im[i2] = differenceIm + turnedRe;
      re[i3] = differenceRe + turnedIm;
      im[i3] = differenceIm - turnedRe;
      lane++;
      if (lane == lanes) {
        lane = 0;
        block++;
        row += 4;
      }
    }
  }

  @Override
  public void modeLeaves(
      double[] re, double[] im, LaneFourier.Leaves leaves, int firstBlock, int lastBlock,
      int firstRow) {
    double[] twiddleRe = leaves.twiddles().re;
    double[] twiddleIm = leaves.twiddles().im;
    int lanes = leaves.layout().lanes();
    for (int block = firstBlock, row = firstRow, lane = 0; block < lastBlock; ) {
      double wr = twiddleRe[block];
      double wi = twiddleIm[block];
      double vr = twiddleRe[2 * block];
      double vi = twiddleIm[2 * block];
      int i = leaves.layout().at(row * lanes) + lane;
      int i1 = i + lanes;
      int i2 = i + 2 * lanes;
      int i3 = i + 3 * lanes;
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
      double otherRe = re2 + re3;
      double otherIm = im2 + im3;
      double dRe = re2 - re3;
      double dIm = im2 - im3;
      double differenceRe = cRe * vr + cIm * vi;
      double differenceIm = cIm * vr - cRe * vi;
      double turnedRe = dRe * vr + dIm * vi;
      double turnedIm = dIm * vr - dRe * vi;
      double aRe = sumRe - otherRe;
      double aIm = sumIm - otherIm;
      double bRe = differenceRe - turnedIm;
      double bIm = differenceIm + turnedRe;
      re[i] = sumRe + otherRe;
      im[i] = sumIm + otherIm;
      re[i1] = differenceRe + turnedIm;
      im[i1] = differenceIm - turnedRe;
      re[i2] = aRe * wr + aIm * wi;
      im[i2] = aIm * wr - aRe * wi;
      re[i3] = bRe * wr + bIm * wi;
      im[i3] = bIm * wr - bRe * wi;
      lane++;
      if (lane == lanes) {
        lane = 0;
        block++;
        row += 4;
      }
    }
  }

  @Override
  public void modes2(double[] re, double[] im, double wr, double wi, int begin, int length) {
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
  public void modes4(
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
      double otherRe = re2 + re3;
      double otherIm = im2 + im3;
      double dRe = re2 - re3;
      double dIm = im2 - im3;
      double differenceRe = cRe * vr + cIm * vi;
      double differenceIm = cIm * vr - cRe * vi;
      double turnedRe = dRe * vr + dIm * vi;
      double turnedIm = dIm * vr - dRe * vi;
      double aRe = sumRe - otherRe;
      double aIm = sumIm - otherIm;
      double bRe = differenceRe - turnedIm;
      double bIm = differenceIm + turnedRe;
      re[i] = sumRe + otherRe;
      im[i] = sumIm + otherIm;
      re[i1] = differenceRe + turnedIm;
      im[i1] = differenceIm - turnedRe;
      re[i2] = aRe * wr + aIm * wi;
      im[i2] = aIm * wr - aRe * wi;
      re[i3] = bRe * wr + bIm * wi;
      im[i3] = bIm * wr - bRe * wi;
    }
  }

  @Override
  public void intoModes(
      double[] re, double[] im, double scale, double[] modesRe, double[] modesIm, int length) {
    for (int i = 0, end = length; i < end; i++) {
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
      double otherRe = re2 + re3;
      double otherIm = im2 + im3;
      double dRe = re2 - re3;
      double dIm = im2 - im3;
      modesRe[i] = scale * (sumRe + otherRe);
      modesIm[i] = scale * (sumIm + otherIm);
      modesRe[i1] = scale * (cRe + dIm);
      modesIm[i1] = scale * (cIm - dRe);
      modesRe[i2] = scale * (sumRe - otherRe);
      modesIm[i2] = scale * (sumIm - otherIm);
      modesRe[i3] = scale * (cRe - dIm);
      modesIm[i3] = scale * (cIm + dRe);
    }
  }

  @Override
  public void addToModesTurned(
      double[] re, double[] im, double scale, double wr, double wi, double vr, double vi,
      double[] modesRe, double[] modesIm, int length) {
    for (int i = 0, end = length; i < end; i++) {
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
      double otherRe = re2 + re3;
      double otherIm = im2 + im3;
      double dRe = re2 - re3;
      double dIm = im2 - im3;
      double differenceRe = cRe * vr + cIm * vi;
      double differenceIm = cIm * vr - cRe * vi;
      double turnedRe = dRe * vr + dIm * vi;
      double turnedIm = dIm * vr - dRe * vi;
      double aRe = sumRe - otherRe;
      double aIm = sumIm - otherIm;
      double bRe = differenceRe - turnedIm;
      double bIm = differenceIm + turnedRe;
      modesRe[i] += scale * (sumRe + otherRe);
      modesIm[i] += scale * (sumIm + otherIm);
      modesRe[i1] += scale * (differenceRe + turnedIm);
      modesIm[i1] += scale * (differenceIm - turnedRe);
      modesRe[i2] += aRe * wr + aIm * wi;
      modesIm[i2] += aIm * wr - aRe * wi;
      modesRe[i3] += bRe * wr + bIm * wi;
      modesIm[i3] += bIm * wr - bRe * wi;
    }
  }
}
