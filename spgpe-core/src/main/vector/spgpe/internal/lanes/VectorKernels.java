package spgpe.internal.lanes;

import jdk.incubator.vector.DoubleVector;
import jdk.incubator.vector.VectorSpecies;

/**
 * The passes with vector instructions, statement by statement those of {@link ScalarKernels}. One
 * loop in each method, and no vector leaves its method: longer methods are given up by the first
 * compiler, and vectors handed to other methods are objects.
 */
final class VectorKernels implements LaneKernels {
  private static final VectorSpecies<Double> S = DoubleVector.SPECIES_256;
  private static final int WIDTH = S.length();

  @Override
  public int width() {
    return WIDTH;
  }

  @Override
  public void forwardTop(
      double[] re, double[] im, int length) {
    for (int i = 0; i < length; i += WIDTH) {
      int i1 = i + length;
      int i2 = i + 2 * length;
      int i3 = i + 3 * length;
      DoubleVector re0 = DoubleVector.fromArray(S, re, i);
      DoubleVector im0 = DoubleVector.fromArray(S, im, i);
      DoubleVector re2 = DoubleVector.fromArray(S, re, i2);
      DoubleVector im2 = DoubleVector.fromArray(S, im, i2);
      DoubleVector sumRe = re0.add(re2);
      DoubleVector sumIm = im0.add(im2);
      DoubleVector differenceRe = re0.sub(re2);
      DoubleVector differenceIm = im0.sub(im2);
      DoubleVector re1 = DoubleVector.fromArray(S, re, i1);
      DoubleVector im1 = DoubleVector.fromArray(S, im, i1);
      DoubleVector re3 = DoubleVector.fromArray(S, re, i3);
      DoubleVector im3 = DoubleVector.fromArray(S, im, i3);
      DoubleVector otherRe = re1.add(re3);
      DoubleVector otherIm = im1.add(im3);
      DoubleVector turnedRe = im1.sub(im3);
      DoubleVector turnedIm = re1.sub(re3);
      sumRe.add(otherRe).intoArray(re, i);
      sumIm.add(otherIm).intoArray(im, i);
      sumRe.sub(otherRe).intoArray(re, i1);
      sumIm.sub(otherIm).intoArray(im, i1);
      differenceRe.add(turnedRe).intoArray(re, i2);
      differenceIm.sub(turnedIm).intoArray(im, i2);
      differenceRe.sub(turnedRe).intoArray(re, i3);
      differenceIm.add(turnedIm).intoArray(im, i3);
    }
  }

  @Override
  public void forward4(
      double[] re, double[] im, double wr, double wi, double vr, double vi, int begin, int length) {
    for (int i = begin, end = begin + length; i < end; i += WIDTH) {
      int i1 = i + length;
      int i2 = i + 2 * length;
      int i3 = i + 3 * length;
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
      DoubleVector turnedRe = dRe.mul(vi).add(dIm.mul(vr));
      DoubleVector turnedIm = dRe.mul(vr).sub(dIm.mul(vi));
      sumRe.add(otherRe).intoArray(re, i);
      sumIm.add(otherIm).intoArray(im, i);
      sumRe.sub(otherRe).intoArray(re, i1);
      sumIm.sub(otherIm).intoArray(im, i1);
      differenceRe.add(turnedRe).intoArray(re, i2);
      differenceIm.sub(turnedIm).intoArray(im, i2);
      differenceRe.sub(turnedRe).intoArray(re, i3);
      differenceIm.add(turnedIm).intoArray(im, i3);
    }
  }

  @Override
  public void forward2(
      double[] re, double[] im, double wr, double wi, int begin, int length) {
    for (int i = begin, end = begin + length; i < end; i += WIDTH) {
      int i1 = i + length;
      DoubleVector re1 = DoubleVector.fromArray(S, re, i1);
      DoubleVector im1 = DoubleVector.fromArray(S, im, i1);
      DoubleVector aRe = re1.mul(wr).sub(im1.mul(wi));
      DoubleVector aIm = re1.mul(wi).add(im1.mul(wr));
      DoubleVector re0 = DoubleVector.fromArray(S, re, i);
      DoubleVector im0 = DoubleVector.fromArray(S, im, i);
      re0.add(aRe).intoArray(re, i);
      im0.add(aIm).intoArray(im, i);
      re0.sub(aRe).intoArray(re, i1);
      im0.sub(aIm).intoArray(im, i1);
    }
  }

  @Override
  public void inverseTop(
      double[] re, double[] im, int length) {
    for (int i = 0; i < length; i += WIDTH) {
      int i1 = i + length;
      int i2 = i + 2 * length;
      int i3 = i + 3 * length;
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
      DoubleVector differenceRe = re2.add(re3);
      DoubleVector differenceIm = im2.add(im3);
      DoubleVector dRe = re2.sub(re3);
      DoubleVector dIm = im2.sub(im3);
      sumRe.add(differenceRe).intoArray(re, i);
      sumIm.add(differenceIm).intoArray(im, i);
      cRe.sub(dIm).intoArray(re, i1);
      cIm.add(dRe).intoArray(im, i1);
      sumRe.sub(differenceRe).intoArray(re, i2);
      sumIm.sub(differenceIm).intoArray(im, i2);
      cRe.add(dIm).intoArray(re, i3);
      cIm.sub(dRe).intoArray(im, i3);
    }
  }

  @Override
  public void inverse4(
      double[] re, double[] im, double wr, double wi, double vr, double vi, int begin, int length) {
    for (int i = begin, end = begin + length; i < end; i += WIDTH) {
      int i1 = i + length;
      int i2 = i + 2 * length;
      int i3 = i + 3 * length;
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
      DoubleVector differenceRe = re2.add(re3);
      DoubleVector differenceIm = im2.add(im3);
      DoubleVector dRe = re2.sub(re3);
      DoubleVector dIm = im2.sub(im3);
      DoubleVector otherRe = cRe.mul(vr).add(cIm.mul(vi));
      DoubleVector otherIm = cIm.mul(vr).sub(cRe.mul(vi));
      DoubleVector turnedRe = dIm.mul(vr).sub(dRe.mul(vi));
      DoubleVector turnedIm = dRe.mul(vr).add(dIm.mul(vi));
      DoubleVector aRe = sumRe.sub(differenceRe);
      DoubleVector aIm = sumIm.sub(differenceIm);
      DoubleVector bRe = otherRe.add(turnedRe);
      DoubleVector bIm = otherIm.sub(turnedIm);
      sumRe.add(differenceRe).intoArray(re, i);
      sumIm.add(differenceIm).intoArray(im, i);
      otherRe.sub(turnedRe).intoArray(re, i1);
      otherIm.add(turnedIm).intoArray(im, i1);
      aRe.mul(wr).add(aIm.mul(wi)).intoArray(re, i2);
      aIm.mul(wr).sub(aRe.mul(wi)).intoArray(im, i2);
      bRe.mul(wr).add(bIm.mul(wi)).intoArray(re, i3);
      bIm.mul(wr).sub(bRe.mul(wi)).intoArray(im, i3);
    }
  }

  @Override
  public void inverse2(
      double[] re, double[] im, double wr, double wi, int begin, int length) {
    for (int i = begin, end = begin + length; i < end; i += WIDTH) {
      int i1 = i + length;
      DoubleVector re0 = DoubleVector.fromArray(S, re, i);
      DoubleVector im0 = DoubleVector.fromArray(S, im, i);
      DoubleVector re1 = DoubleVector.fromArray(S, re, i1);
      DoubleVector im1 = DoubleVector.fromArray(S, im, i1);
      DoubleVector aRe = re0.sub(re1);
      DoubleVector aIm = im0.sub(im1);
      re0.add(re1).intoArray(re, i);
      im0.add(im1).intoArray(im, i);
      aRe.mul(wr).add(aIm.mul(wi)).intoArray(re, i1);
      aIm.mul(wr).sub(aRe.mul(wi)).intoArray(im, i1);
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
      DoubleVector modeRe0 = DoubleVector.fromArray(S, modesRe, m0);
      DoubleVector modeIm0 = DoubleVector.fromArray(S, modesIm, m0);
      DoubleVector re0 = modeRe0.mul(factorRe[row]).sub(modeIm0.mul(factorIm[row]));
      DoubleVector im0 = modeRe0.mul(factorIm[row]).add(modeIm0.mul(factorRe[row]));
      int m1 = places[row + 1] + lane;
      DoubleVector modeRe1 = DoubleVector.fromArray(S, modesRe, m1);
      DoubleVector modeIm1 = DoubleVector.fromArray(S, modesIm, m1);
      DoubleVector re1 = modeRe1.mul(factorRe[row + 1]).sub(modeIm1.mul(factorIm[row + 1]));
      DoubleVector im1 = modeRe1.mul(factorIm[row + 1]).add(modeIm1.mul(factorRe[row + 1]));
      DoubleVector sumRe = re0.add(re1);
      DoubleVector sumIm = im0.add(im1);
      DoubleVector cRe = re0.sub(re1);
      DoubleVector cIm = im0.sub(im1);
      int m2 = places[row + 2] + lane;
      DoubleVector modeRe2 = DoubleVector.fromArray(S, modesRe, m2);
      DoubleVector modeIm2 = DoubleVector.fromArray(S, modesIm, m2);
      DoubleVector re2 = modeRe2.mul(factorRe[row + 2]).sub(modeIm2.mul(factorIm[row + 2]));
      DoubleVector im2 = modeRe2.mul(factorIm[row + 2]).add(modeIm2.mul(factorRe[row + 2]));
      int m3 = places[row + 3] + lane;
      DoubleVector modeRe3 = DoubleVector.fromArray(S, modesRe, m3);
      DoubleVector modeIm3 = DoubleVector.fromArray(S, modesIm, m3);
      DoubleVector re3 = modeRe3.mul(factorRe[row + 3]).sub(modeIm3.mul(factorIm[row + 3]));
      DoubleVector im3 = modeRe3.mul(factorIm[row + 3]).add(modeIm3.mul(factorRe[row + 3]));
      DoubleVector differenceRe = re2.add(re3);
      DoubleVector differenceIm = im2.add(im3);
      DoubleVector dRe = re2.sub(re3);
      DoubleVector dIm = im2.sub(im3);
      DoubleVector otherRe = cRe.mul(vr).add(cIm.mul(vi));
      DoubleVector otherIm = cIm.mul(vr).sub(cRe.mul(vi));
      DoubleVector turnedRe = dIm.mul(vr).sub(dRe.mul(vi));
      DoubleVector turnedIm = dRe.mul(vr).add(dIm.mul(vi));
      DoubleVector aRe = sumRe.sub(differenceRe);
      DoubleVector aIm = sumIm.sub(differenceIm);
      DoubleVector bRe = otherRe.add(turnedRe);
      DoubleVector bIm = otherIm.sub(turnedIm);
      sumRe.add(differenceRe).intoArray(re, i);
      sumIm.add(differenceIm).intoArray(im, i);
      otherRe.sub(turnedRe).intoArray(re, i1);
      otherIm.add(turnedIm).intoArray(im, i1);
      aRe.mul(wr).add(aIm.mul(wi)).intoArray(re, i2);
      aIm.mul(wr).sub(aRe.mul(wi)).intoArray(im, i2);
      bRe.mul(wr).add(bIm.mul(wi)).intoArray(re, i3);
      bIm.mul(wr).sub(bRe.mul(wi)).intoArray(im, i3);
      lane += WIDTH;
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
      DoubleVector turnedRe = dRe.mul(vi).add(dIm.mul(vr));
      DoubleVector turnedIm = dRe.mul(vr).sub(dIm.mul(vi));
      if (kept[row]) {
        int m = places[row] + lane;
        DoubleVector x = sumRe.add(otherRe);
        DoubleVector y = sumIm.add(otherIm);
        DoubleVector.fromArray(S, modesRe, m)
            .add(x.mul(factorRe[row]).sub(y.mul(factorIm[row]))).intoArray(modesRe, m);
        DoubleVector.fromArray(S, modesIm, m).add(x.mul(factorIm[row])
            .add(y.mul(factorRe[row]))).intoArray(modesIm, m);
      }
      if (kept[row + 1]) {
        int m = places[row + 1] + lane;
        DoubleVector x = sumRe.sub(otherRe);
        DoubleVector y = sumIm.sub(otherIm);
        DoubleVector.fromArray(S, modesRe, m)
            .add(x.mul(factorRe[row + 1]).sub(y.mul(factorIm[row + 1]))).intoArray(modesRe, m);
        DoubleVector.fromArray(S, modesIm, m).add(x.mul(factorIm[row + 1])
            .add(y.mul(factorRe[row + 1]))).intoArray(modesIm, m);
      }
      if (kept[row + 2]) {
        int m = places[row + 2] + lane;
        DoubleVector x = differenceRe.add(turnedRe);
        DoubleVector y = differenceIm.sub(turnedIm);
        DoubleVector.fromArray(S, modesRe, m)
            .add(x.mul(factorRe[row + 2]).sub(y.mul(factorIm[row + 2]))).intoArray(modesRe, m);
        DoubleVector.fromArray(S, modesIm, m).add(x.mul(factorIm[row + 2])
            .add(y.mul(factorRe[row + 2]))).intoArray(modesIm, m);
      }
      if (kept[row + 3]) {
        int m = places[row + 3] + lane;
        DoubleVector x = differenceRe.sub(turnedRe);
        DoubleVector y = differenceIm.add(turnedIm);
        DoubleVector.fromArray(S, modesRe, m)
            .add(x.mul(factorRe[row + 3]).sub(y.mul(factorIm[row + 3]))).intoArray(modesRe, m);
        DoubleVector.fromArray(S, modesIm, m).add(x.mul(factorIm[row + 3])
            .add(y.mul(factorRe[row + 3]))).intoArray(modesIm, m);
      }
      lane += WIDTH;
      if (lane == lanes) {
        lane = 0;
        block++;
      }
    }
  }
}
