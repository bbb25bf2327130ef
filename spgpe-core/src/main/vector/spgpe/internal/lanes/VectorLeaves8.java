package spgpe.internal.lanes;

import jdk.incubator.vector.DoubleVector;
import jdk.incubator.vector.VectorSpecies;
import spgpe.internal.vector.VectorShapes;

/**
 * The passes of radix 8 of {@link VectorKernels}: the operations of a pass of radix 2 and one of
 * radix 4 in the same order, with one load and store for both. The second block of four rows has
 * the twiddle factor i w, written out: the same bits.
 */
final class VectorLeaves8 {
  private static final VectorSpecies<Double> S = VectorShapes.DOUBLES;
  private static final int WIDTH = S.length();

  private VectorLeaves8() {}

  static void toPoints(
      double[] re, double[] im, LaneFourier.Leaves leaves, int firstBlock, int lastBlock,
      int firstRow) {
    double[] twiddleRe = leaves.twiddles().re;
    double[] twiddleIm = leaves.twiddles().im;
    int lanes = leaves.layout().lanes();
    for (int block = firstBlock, row = firstRow, lane = 0; block < lastBlock; ) {
      double ur = twiddleRe[block];
      double ui = twiddleIm[block];
      double wr = twiddleRe[2 * block];
      double wi = twiddleIm[2 * block];
      double vr = twiddleRe[4 * block];
      double vi = twiddleIm[4 * block];
      double zr = twiddleRe[4 * block + 2];
      double zi = twiddleIm[4 * block + 2];
      int i = leaves.layout().at(row * lanes) + lane;
      int i1 = i + lanes;
      int i2 = i + 2 * lanes;
      int i3 = i + 3 * lanes;
      int i4 = i + 4 * lanes;
      int i5 = i + 5 * lanes;
      int i6 = i + 6 * lanes;
      int i7 = i + 7 * lanes;
      DoubleVector re6 = DoubleVector.fromArray(S, re, i6);
      DoubleVector im6 = DoubleVector.fromArray(S, im, i6);
      DoubleVector t2Re = re6.mul(ur).sub(im6.mul(ui));
      DoubleVector t2Im = re6.mul(ui).add(im6.mul(ur));
      DoubleVector re2 = DoubleVector.fromArray(S, re, i2);
      DoubleVector im2 = DoubleVector.fromArray(S, im, i2);
      DoubleVector a2Re = re2.add(t2Re);
      DoubleVector a2Im = im2.add(t2Im);
      DoubleVector b2Re = re2.sub(t2Re);
      DoubleVector b2Im = im2.sub(t2Im);
      DoubleVector re4 = DoubleVector.fromArray(S, re, i4);
      DoubleVector im4 = DoubleVector.fromArray(S, im, i4);
      DoubleVector t0Re = re4.mul(ur).sub(im4.mul(ui));
      DoubleVector t0Im = re4.mul(ui).add(im4.mul(ur));
      DoubleVector re0 = DoubleVector.fromArray(S, re, i);
      DoubleVector im0 = DoubleVector.fromArray(S, im, i);
      DoubleVector a0Re = re0.add(t0Re);
      DoubleVector a0Im = im0.add(t0Im);
      DoubleVector b0Re = re0.sub(t0Re);
      DoubleVector b0Im = im0.sub(t0Im);
      DoubleVector re7 = DoubleVector.fromArray(S, re, i7);
      DoubleVector im7 = DoubleVector.fromArray(S, im, i7);
      DoubleVector t3Re = re7.mul(ur).sub(im7.mul(ui));
      DoubleVector t3Im = re7.mul(ui).add(im7.mul(ur));
      DoubleVector re3 = DoubleVector.fromArray(S, re, i3);
      DoubleVector im3 = DoubleVector.fromArray(S, im, i3);
      DoubleVector a3Re = re3.add(t3Re);
      DoubleVector a3Im = im3.add(t3Im);
      DoubleVector b3Re = re3.sub(t3Re);
      DoubleVector b3Im = im3.sub(t3Im);
      DoubleVector re5 = DoubleVector.fromArray(S, re, i5);
      DoubleVector im5 = DoubleVector.fromArray(S, im, i5);
      DoubleVector t1Re = re5.mul(ur).sub(im5.mul(ui));
      DoubleVector t1Im = re5.mul(ui).add(im5.mul(ur));
      DoubleVector re1 = DoubleVector.fromArray(S, re, i1);
      DoubleVector im1 = DoubleVector.fromArray(S, im, i1);
      DoubleVector a1Re = re1.add(t1Re);
      DoubleVector a1Im = im1.add(t1Im);
      DoubleVector b1Re = re1.sub(t1Re);
      DoubleVector b1Im = im1.sub(t1Im);
      DoubleVector p2Re = a2Re.mul(wr).sub(a2Im.mul(wi));
      DoubleVector p2Im = a2Re.mul(wi).add(a2Im.mul(wr));
      DoubleVector pSumRe = a0Re.add(p2Re);
      DoubleVector pSumIm = a0Im.add(p2Im);
      DoubleVector pDifferenceRe = a0Re.sub(p2Re);
      DoubleVector pDifferenceIm = a0Im.sub(p2Im);
      DoubleVector p3Re = a3Re.mul(wr).sub(a3Im.mul(wi));
      DoubleVector p3Im = a3Re.mul(wi).add(a3Im.mul(wr));
      DoubleVector pCRe = a1Re.add(p3Re);
      DoubleVector pCIm = a1Im.add(p3Im);
      DoubleVector pDRe = a1Re.sub(p3Re);
      DoubleVector pDIm = a1Im.sub(p3Im);
      DoubleVector pOtherRe = pCRe.mul(vr).sub(pCIm.mul(vi));
      DoubleVector pOtherIm = pCRe.mul(vi).add(pCIm.mul(vr));
      DoubleVector pTurnedRe = pDRe.mul(vr).sub(pDIm.mul(vi));
      DoubleVector pTurnedIm = pDRe.mul(vi).add(pDIm.mul(vr));
      pSumRe.add(pOtherRe).intoArray(re, i);
      pSumIm.add(pOtherIm).intoArray(im, i);
      pSumRe.sub(pOtherRe).intoArray(re, i1);
      pSumIm.sub(pOtherIm).intoArray(im, i1);
      pDifferenceRe.sub(pTurnedIm).intoArray(re, i2);
      pDifferenceIm.add(pTurnedRe).intoArray(im, i2);
      pDifferenceRe.add(pTurnedIm).intoArray(re, i3);
      pDifferenceIm.sub(pTurnedRe).intoArray(im, i3);
      DoubleVector q2Re = b2Re.mul(-wi).sub(b2Im.mul(wr));
      DoubleVector q2Im = b2Re.mul(wr).sub(b2Im.mul(wi));
      DoubleVector qSumRe = b0Re.add(q2Re);
      DoubleVector qSumIm = b0Im.add(q2Im);
      DoubleVector qDifferenceRe = b0Re.sub(q2Re);
      DoubleVector qDifferenceIm = b0Im.sub(q2Im);
      DoubleVector q3Re = b3Re.mul(-wi).sub(b3Im.mul(wr));
      DoubleVector q3Im = b3Re.mul(wr).sub(b3Im.mul(wi));
      DoubleVector qCRe = b1Re.add(q3Re);
      DoubleVector qCIm = b1Im.add(q3Im);
      DoubleVector qDRe = b1Re.sub(q3Re);
      DoubleVector qDIm = b1Im.sub(q3Im);
      DoubleVector qOtherRe = qCRe.mul(zr).sub(qCIm.mul(zi));
      DoubleVector qOtherIm = qCRe.mul(zi).add(qCIm.mul(zr));
      DoubleVector qTurnedRe = qDRe.mul(zr).sub(qDIm.mul(zi));
      DoubleVector qTurnedIm = qDRe.mul(zi).add(qDIm.mul(zr));
      qSumRe.add(qOtherRe).intoArray(re, i4);
      qSumIm.add(qOtherIm).intoArray(im, i4);
      qSumRe.sub(qOtherRe).intoArray(re, i5);
      qSumIm.sub(qOtherIm).intoArray(im, i5);
      qDifferenceRe.sub(qTurnedIm).intoArray(re, i6);
      qDifferenceIm.add(qTurnedRe).intoArray(im, i6);
      qDifferenceRe.add(qTurnedIm).intoArray(re, i7);
      qDifferenceIm.sub(qTurnedRe).intoArray(im, i7);
      lane += WIDTH;
      if (lane == lanes) {
        lane = 0;
        block++;
        row += 8;
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
      double ur = twiddleRe[block];
      double ui = twiddleIm[block];
      double wr = twiddleRe[2 * block];
      double wi = twiddleIm[2 * block];
      double vr = twiddleRe[4 * block];
      double vi = twiddleIm[4 * block];
      double zr = twiddleRe[4 * block + 2];
      double zi = twiddleIm[4 * block + 2];
      int i = leaves.layout().at(row * lanes) + lane;
      int i1 = i + lanes;
      int i2 = i + 2 * lanes;
      int i3 = i + 3 * lanes;
      int i4 = i + 4 * lanes;
      int i5 = i + 5 * lanes;
      int i6 = i + 6 * lanes;
      int i7 = i + 7 * lanes;
      DoubleVector re0 = DoubleVector.fromArray(S, re, i);
      DoubleVector im0 = DoubleVector.fromArray(S, im, i);
      DoubleVector re1 = DoubleVector.fromArray(S, re, i1);
      DoubleVector im1 = DoubleVector.fromArray(S, im, i1);
      DoubleVector pSumRe = re0.add(re1);
      DoubleVector pSumIm = im0.add(im1);
      DoubleVector pCRe = re0.sub(re1);
      DoubleVector pCIm = im0.sub(im1);
      DoubleVector re2 = DoubleVector.fromArray(S, re, i2);
      DoubleVector im2 = DoubleVector.fromArray(S, im, i2);
      DoubleVector re3 = DoubleVector.fromArray(S, re, i3);
      DoubleVector im3 = DoubleVector.fromArray(S, im, i3);
      DoubleVector pOtherRe = re2.add(re3);
      DoubleVector pOtherIm = im2.add(im3);
      DoubleVector pDRe = re2.sub(re3);
      DoubleVector pDIm = im2.sub(im3);
      DoubleVector pDifferenceRe = pCRe.mul(vr).add(pCIm.mul(vi));
      DoubleVector pDifferenceIm = pCIm.mul(vr).sub(pCRe.mul(vi));
      DoubleVector pTurnedRe = pDRe.mul(vr).add(pDIm.mul(vi));
      DoubleVector pTurnedIm = pDIm.mul(vr).sub(pDRe.mul(vi));
      DoubleVector pARe = pSumRe.sub(pOtherRe);
      DoubleVector pAIm = pSumIm.sub(pOtherIm);
      DoubleVector pBRe = pDifferenceRe.sub(pTurnedIm);
      DoubleVector pBIm = pDifferenceIm.add(pTurnedRe);
      DoubleVector a0Re = pSumRe.add(pOtherRe);
      DoubleVector a0Im = pSumIm.add(pOtherIm);
      DoubleVector a1Re = pDifferenceRe.add(pTurnedIm);
      DoubleVector a1Im = pDifferenceIm.sub(pTurnedRe);
      DoubleVector a2Re = pARe.mul(wr).add(pAIm.mul(wi));
      DoubleVector a2Im = pAIm.mul(wr).sub(pARe.mul(wi));
      DoubleVector a3Re = pBRe.mul(wr).add(pBIm.mul(wi));
      DoubleVector a3Im = pBIm.mul(wr).sub(pBRe.mul(wi));
      DoubleVector re4 = DoubleVector.fromArray(S, re, i4);
      DoubleVector im4 = DoubleVector.fromArray(S, im, i4);
      DoubleVector re5 = DoubleVector.fromArray(S, re, i5);
      DoubleVector im5 = DoubleVector.fromArray(S, im, i5);
      DoubleVector qSumRe = re4.add(re5);
      DoubleVector qSumIm = im4.add(im5);
      DoubleVector qCRe = re4.sub(re5);
      DoubleVector qCIm = im4.sub(im5);
      DoubleVector re6 = DoubleVector.fromArray(S, re, i6);
      DoubleVector im6 = DoubleVector.fromArray(S, im, i6);
      DoubleVector re7 = DoubleVector.fromArray(S, re, i7);
      DoubleVector im7 = DoubleVector.fromArray(S, im, i7);
      DoubleVector qOtherRe = re6.add(re7);
      DoubleVector qOtherIm = im6.add(im7);
      DoubleVector qDRe = re6.sub(re7);
      DoubleVector qDIm = im6.sub(im7);
      DoubleVector qDifferenceRe = qCRe.mul(zr).add(qCIm.mul(zi));
      DoubleVector qDifferenceIm = qCIm.mul(zr).sub(qCRe.mul(zi));
      DoubleVector qTurnedRe = qDRe.mul(zr).add(qDIm.mul(zi));
      DoubleVector qTurnedIm = qDIm.mul(zr).sub(qDRe.mul(zi));
      DoubleVector qARe = qSumRe.sub(qOtherRe);
      DoubleVector qAIm = qSumIm.sub(qOtherIm);
      DoubleVector qBRe = qDifferenceRe.sub(qTurnedIm);
      DoubleVector qBIm = qDifferenceIm.add(qTurnedRe);
      DoubleVector b0Re = qSumRe.add(qOtherRe);
      DoubleVector b0Im = qSumIm.add(qOtherIm);
      DoubleVector b1Re = qDifferenceRe.add(qTurnedIm);
      DoubleVector b1Im = qDifferenceIm.sub(qTurnedRe);
      DoubleVector b2Re = qAIm.mul(wr).sub(qARe.mul(wi));
      DoubleVector b2Im = qAIm.mul(-wi).sub(qARe.mul(wr));
      DoubleVector b3Re = qBIm.mul(wr).sub(qBRe.mul(wi));
      DoubleVector b3Im = qBIm.mul(-wi).sub(qBRe.mul(wr));
      DoubleVector d0Re = a0Re.sub(b0Re);
      DoubleVector d0Im = a0Im.sub(b0Im);
      a0Re.add(b0Re).intoArray(re, i);
      a0Im.add(b0Im).intoArray(im, i);
      d0Re.mul(ur).add(d0Im.mul(ui)).intoArray(re, i4);
      d0Im.mul(ur).sub(d0Re.mul(ui)).intoArray(im, i4);
      DoubleVector d1Re = a1Re.sub(b1Re);
      DoubleVector d1Im = a1Im.sub(b1Im);
      a1Re.add(b1Re).intoArray(re, i1);
      a1Im.add(b1Im).intoArray(im, i1);
      d1Re.mul(ur).add(d1Im.mul(ui)).intoArray(re, i5);
      d1Im.mul(ur).sub(d1Re.mul(ui)).intoArray(im, i5);
      DoubleVector d2Re = a2Re.sub(b2Re);
      DoubleVector d2Im = a2Im.sub(b2Im);
      a2Re.add(b2Re).intoArray(re, i2);
      a2Im.add(b2Im).intoArray(im, i2);
      d2Re.mul(ur).add(d2Im.mul(ui)).intoArray(re, i6);
      d2Im.mul(ur).sub(d2Re.mul(ui)).intoArray(im, i6);
      DoubleVector d3Re = a3Re.sub(b3Re);
      DoubleVector d3Im = a3Im.sub(b3Im);
      a3Re.add(b3Re).intoArray(re, i3);
      a3Im.add(b3Im).intoArray(im, i3);
      d3Re.mul(ur).add(d3Im.mul(ui)).intoArray(re, i7);
      d3Im.mul(ur).sub(d3Re.mul(ui)).intoArray(im, i7);
      lane += WIDTH;
      if (lane == lanes) {
        lane = 0;
        block++;
        row += 8;
      }
    }
  }
}
