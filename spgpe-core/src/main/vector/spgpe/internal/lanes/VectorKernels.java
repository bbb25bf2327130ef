package spgpe.internal.lanes;

import jdk.incubator.vector.DoubleVector;
import jdk.incubator.vector.VectorSpecies;
import spgpe.internal.vector.VectorShapes;

/**
 * The passes with vector instructions, statement by statement those of {@link ScalarKernels}. One
 * loop in each method, and no vector leaves its method: longer methods are given up by the first
 * compiler, and vectors handed to other methods are objects.
 */
public final class VectorKernels implements LaneKernels {
  private static final VectorSpecies<Double> S = VectorShapes.DOUBLES;
  private static final int WIDTH = S.length();

  /** Made by name, since the class may not load everywhere. */
  public VectorKernels() {}

  @Override
  public int width() {
    return WIDTH;
  }

  @Override
  public void fromModes(
      double[] modesRe, double[] modesIm, double scale, double[] re, double[] im, int length) {
    for (int i = 0, end = length; i < end; i += WIDTH) {
      int i1 = i + length;
      int i2 = i + 2 * length;
      int i3 = i + 3 * length;
      DoubleVector re0 = DoubleVector.fromArray(S, modesRe, i).mul(scale);
      DoubleVector im0 = DoubleVector.fromArray(S, modesIm, i).mul(scale);
      DoubleVector re2 = DoubleVector.fromArray(S, modesRe, i2).mul(scale);
      DoubleVector im2 = DoubleVector.fromArray(S, modesIm, i2).mul(scale);
      DoubleVector sumRe = re0.add(re2);
      DoubleVector sumIm = im0.add(im2);
      DoubleVector differenceRe = re0.sub(re2);
      DoubleVector differenceIm = im0.sub(im2);
      DoubleVector re1 = DoubleVector.fromArray(S, modesRe, i1).mul(scale);
      DoubleVector im1 = DoubleVector.fromArray(S, modesIm, i1).mul(scale);
      DoubleVector re3 = DoubleVector.fromArray(S, modesRe, i3).mul(scale);
      DoubleVector im3 = DoubleVector.fromArray(S, modesIm, i3).mul(scale);
      DoubleVector otherRe = re1.add(re3);
      DoubleVector otherIm = im1.add(im3);
      DoubleVector turnedRe = re1.sub(re3);
      DoubleVector turnedIm = im1.sub(im3);
      sumRe.add(otherRe).intoArray(re, i);
      sumIm.add(otherIm).intoArray(im, i);
      sumRe.sub(otherRe).intoArray(re, i1);
      sumIm.sub(otherIm).intoArray(im, i1);
      differenceRe.sub(turnedIm).intoArray(re, i2);
      differenceIm.add(turnedRe).intoArray(im, i2);
      differenceRe.add(turnedIm).intoArray(re, i3);
      differenceIm.sub(turnedRe).intoArray(im, i3);
    }
  }

  @Override
  public void fromModesTurned(
      double[] modesRe, double[] modesIm, double scale, double wr, double wi, double vr, double vi,
      double[] re, double[] im, int length) {
    for (int i = 0, end = length; i < end; i += WIDTH) {
      int i1 = i + length;
      int i2 = i + 2 * length;
      int i3 = i + 3 * length;
      DoubleVector re2 = DoubleVector.fromArray(S, modesRe, i2);
      DoubleVector im2 = DoubleVector.fromArray(S, modesIm, i2);
      DoubleVector aRe = re2.mul(wr).sub(im2.mul(wi));
      DoubleVector aIm = re2.mul(wi).add(im2.mul(wr));
      DoubleVector re0 = DoubleVector.fromArray(S, modesRe, i).mul(scale);
      DoubleVector im0 = DoubleVector.fromArray(S, modesIm, i).mul(scale);
      DoubleVector sumRe = re0.add(aRe);
      DoubleVector sumIm = im0.add(aIm);
      DoubleVector differenceRe = re0.sub(aRe);
      DoubleVector differenceIm = im0.sub(aIm);
      DoubleVector re3 = DoubleVector.fromArray(S, modesRe, i3);
      DoubleVector im3 = DoubleVector.fromArray(S, modesIm, i3);
      DoubleVector bRe = re3.mul(wr).sub(im3.mul(wi));
      DoubleVector bIm = re3.mul(wi).add(im3.mul(wr));
      DoubleVector re1 = DoubleVector.fromArray(S, modesRe, i1).mul(scale);
      DoubleVector im1 = DoubleVector.fromArray(S, modesIm, i1).mul(scale);
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
    }
  }

  @Override
  public void points4(
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
    }
  }

  @Override
  public void points2(double[] re, double[] im, double wr, double wi, int begin, int length) {
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
  public void pointLeaves(
      double[] re, double[] im, LaneFourier.Leaves leaves, int firstBlock, int lastBlock,
      int firstRow) {
    VectorLeaves4.toPoints(re, im, leaves, firstBlock, lastBlock, firstRow);
  }

  @Override
  public void modeLeaves(
      double[] re, double[] im, LaneFourier.Leaves leaves, int firstBlock, int lastBlock,
      int firstRow) {
    VectorLeaves4.toModes(re, im, leaves, firstBlock, lastBlock, firstRow);
  }

  @Override
  public void pointLeaves8(
      double[] re, double[] im, LaneFourier.Leaves leaves, int firstBlock, int lastBlock,
      int firstRow) {
    VectorLeaves8.toPoints(re, im, leaves, firstBlock, lastBlock, firstRow);
  }

  @Override
  public void modeLeaves8(
      double[] re, double[] im, LaneFourier.Leaves leaves, int firstBlock, int lastBlock,
      int firstRow) {
    VectorLeaves8.toModes(re, im, leaves, firstBlock, lastBlock, firstRow);
  }

  @Override
  public void modes2(double[] re, double[] im, double wr, double wi, int begin, int length) {
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
  public void modes4(
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
    }
  }

  @Override
  public void intoModes(
      double[] re, double[] im, double scale, double[] modesRe, double[] modesIm, int length) {
    for (int i = 0, end = length; i < end; i += WIDTH) {
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
      DoubleVector otherRe = re2.add(re3);
      DoubleVector otherIm = im2.add(im3);
      DoubleVector dRe = re2.sub(re3);
      DoubleVector dIm = im2.sub(im3);
      sumRe.add(otherRe).mul(scale).intoArray(modesRe, i);
      sumIm.add(otherIm).mul(scale).intoArray(modesIm, i);
      cRe.add(dIm).mul(scale).intoArray(modesRe, i1);
      cIm.sub(dRe).mul(scale).intoArray(modesIm, i1);
      sumRe.sub(otherRe).mul(scale).intoArray(modesRe, i2);
      sumIm.sub(otherIm).mul(scale).intoArray(modesIm, i2);
      cRe.sub(dIm).mul(scale).intoArray(modesRe, i3);
      cIm.add(dRe).mul(scale).intoArray(modesIm, i3);
    }
  }

  @Override
  public void addToModesTurned(
      double[] re, double[] im, double scale, double wr, double wi, double vr, double vi,
      double[] modesRe, double[] modesIm, int length) {
    for (int i = 0, end = length; i < end; i += WIDTH) {
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
      DoubleVector.fromArray(S, modesRe, i)
          .add(sumRe.add(otherRe).mul(scale)).intoArray(modesRe, i);
      DoubleVector.fromArray(S, modesIm, i)
          .add(sumIm.add(otherIm).mul(scale)).intoArray(modesIm, i);
      DoubleVector.fromArray(S, modesRe, i1)
          .add(differenceRe.add(turnedIm).mul(scale)).intoArray(modesRe, i1);
      DoubleVector.fromArray(S, modesIm, i1)
          .add(differenceIm.sub(turnedRe).mul(scale)).intoArray(modesIm, i1);
      DoubleVector.fromArray(S, modesRe, i2)
          .add(aRe.mul(wr).add(aIm.mul(wi))).intoArray(modesRe, i2);
      DoubleVector.fromArray(S, modesIm, i2)
          .add(aIm.mul(wr).sub(aRe.mul(wi))).intoArray(modesIm, i2);
      DoubleVector.fromArray(S, modesRe, i3)
          .add(bRe.mul(wr).add(bIm.mul(wi))).intoArray(modesRe, i3);
      DoubleVector.fromArray(S, modesIm, i3)
          .add(bIm.mul(wr).sub(bRe.mul(wi))).intoArray(modesIm, i3);
    }
  }
}
