package spgpe.internal.lanes;

import jdk.incubator.vector.DoubleVector;
import jdk.incubator.vector.VectorSpecies;
import spgpe.internal.vector.VectorShapes;

/** The passes of radix 4 of {@link VectorKernels} on neighbouring rows: many short blocks. */
final class VectorLeaves4 {
  private static final VectorSpecies<Double> S = VectorShapes.DOUBLES;
  private static final int WIDTH = S.length();

  private VectorLeaves4() {}

  static void toPoints(
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
      DoubleVector re2 = DoubleVector.fromArray(S, re, i2);
      DoubleVector im2 = DoubleVector.fromArray(S, im, i2);
      DoubleVector aRe = re2.mul(wr).sub(im2.mul(wi));
      DoubleVector aIm = re2.mul(wi).add(im2.mul(wr));
      DoubleVector re0 = DoubleVector.fromArray(S, re, i);
      DoubleVector im0 = DoubleVector.fromArray(S, im, i);
      DoubleVector sumRe = re0.add(aRe);
      DoubleVector sumIm = im0.add(aIm);
      DoubleVector differenceRe = re0.sub(aRe);
      DoubleVector differenceIm = im0.sub(aIm);
      DoubleVector re3 = DoubleVector.fromArray(S, re, i3);
      DoubleVector im3 = DoubleVector.fromArray(S, im, i3);
      DoubleVector bRe = re3.mul(wr).sub(im3.mul(wi));
      DoubleVector bIm = re3.mul(wi).add(im3.mul(wr));
      DoubleVector re1 = DoubleVector.fromArray(S, re, i1);
      DoubleVector im1 = DoubleVector.fromArray(S, im, i1);
      DoubleVector cRe = re1.add(bRe);
      DoubleVector cIm = im1.add(bIm);
      DoubleVector dRe = re1.sub(bRe);
      DoubleVector dIm = im1.sub(bIm);
      DoubleVector otherRe = cRe.mul(vr).sub(cIm.mul(vi));
      DoubleVector otherIm = cRe.mul(vi).add(cIm.mul(vr));
      DoubleVector turnedRe = dRe.mul(vr).sub(dIm.mul(vi));
      DoubleVector turnedIm = dRe.mul(vi).add(dIm.mul(vr));
      sumRe.add(otherRe).intoArray(re, i);
      sumIm.add(otherIm).intoArray(im, i);
      sumRe.sub(otherRe).intoArray(re, i1);
      sumIm.sub(otherIm).intoArray(im, i1);
      differenceRe.sub(turnedIm).intoArray(re, i2);
      differenceIm.add(turnedRe).intoArray(im, i2);
      differenceRe.add(turnedIm).intoArray(re, i3);
      differenceIm.sub(turnedRe).intoArray(im, i3);
      lane += WIDTH;
      if (lane == lanes) {
        lane = 0;
        block++;
        row += 4;
      }
    }
  }

  static void toModes(
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
      DoubleVector re0 = DoubleVector.fromArray(S, re, i);
      DoubleVector im0 = DoubleVector.fromArray(S, im, i);
      DoubleVector re1 = DoubleVector.fromArray(S, re, i1);
      DoubleVector im1 = DoubleVector.fromArray(S, im, i1);
      DoubleVector sumRe = re0.add(re1);
      DoubleVector sumIm = im0.add(im1);
      DoubleVector cRe = re0.sub(re1);
      DoubleVector cIm = im0.sub(im1);
      DoubleVector re2 = DoubleVector.fromArray(S, re, i2);
      DoubleVector im2 = DoubleVector.fromArray(S, im, i2);
      DoubleVector re3 = DoubleVector.fromArray(S, re, i3);
      DoubleVector im3 = DoubleVector.fromArray(S, im, i3);
      DoubleVector otherRe = re2.add(re3);
      DoubleVector otherIm = im2.add(im3);
      DoubleVector dRe = re2.sub(re3);
      DoubleVector dIm = im2.sub(im3);
      DoubleVector differenceRe = cRe.mul(vr).add(cIm.mul(vi));
      DoubleVector differenceIm = cIm.mul(vr).sub(cRe.mul(vi));
      DoubleVector turnedRe = dRe.mul(vr).add(dIm.mul(vi));
      DoubleVector turnedIm = dIm.mul(vr).sub(dRe.mul(vi));
      DoubleVector aRe = sumRe.sub(otherRe);
      DoubleVector aIm = sumIm.sub(otherIm);
      DoubleVector bRe = differenceRe.sub(turnedIm);
      DoubleVector bIm = differenceIm.add(turnedRe);
      sumRe.add(otherRe).intoArray(re, i);
      sumIm.add(otherIm).intoArray(im, i);
      differenceRe.add(turnedIm).intoArray(re, i1);
      differenceIm.sub(turnedRe).intoArray(im, i1);
      aRe.mul(wr).add(aIm.mul(wi)).intoArray(re, i2);
      aIm.mul(wr).sub(aRe.mul(wi)).intoArray(im, i2);
      bRe.mul(wr).add(bIm.mul(wi)).intoArray(re, i3);
      bIm.mul(wr).sub(bRe.mul(wi)).intoArray(im, i3);
      lane += WIDTH;
      if (lane == lanes) {
        lane = 0;
        block++;
        row += 4;
      }
    }
  }
}
