package spgpe.internal.random;

import jdk.incubator.vector.DoubleVector;
import jdk.incubator.vector.LongVector;
import jdk.incubator.vector.VectorOperators;
import jdk.incubator.vector.VectorSpecies;
import spgpe.internal.vector.VectorShapes;

/**
 * {@link NormalKernels} with vector instructions, operation by operation those of {@link BoxMuller};
 * the compiler turns the loops of {@link Philox} into vector code of its own that is as fast. Whole
 * numbers below 2^52 become doubles by writing them into the fraction of 2^52, which is exact. What
 * does not fill a vector is left to {@link PlainNormals}.
 */
public final class VectorNormals implements NormalKernels {
  private static final VectorSpecies<Double> D = VectorShapes.DOUBLES;
  private static final VectorSpecies<Long> L = VectorShapes.LONGS;
  private static final int WIDTH = D.length();
  /** Bits of 2^52 as a double. */
  private static final long WHOLE = 0x4330000000000000L;

  private final NormalKernels plain = new PlainNormals();

  /** Made by name, since the class may not load everywhere. */
  public VectorNormals() {}

  @Override
  public void fill(
      int count, int first, long[] words0, long word1, long[] words2, long word3, int key0,
      int key1, BoxMuller.Scratch s, double[] outRe, double[] outIm) {
    int whole = count - count % WIDTH;
    PlainNormals.encrypt(whole, first, words0, word1, words2, word3, key0, key1, s);
    reduceRadius(whole, s.c0, s.c1, s.mantissa, s.exponent);
    reduceAngle(whole, s.c2, s.c3, s.angle, s.quarterCos, s.quarterSin);
    radius(whole, s.mantissa, s.exponent, s.radius);
    pairs(whole, first, s, outRe, outIm);
    if (whole < count) {
      plain.fill(
          count - whole, first + whole, words0, word1, words2, word3, key0, key1, s, outRe, outIm);
    }
  }

  private static void reduceRadius(
      int count, long[] c0, long[] c1, double[] mantissa, double[] exponent) {
    for (int e = 0; e < count; e += WIDTH) {
      LongVector bits =
          LongVector.fromArray(L, c0, e)
              .lanewise(VectorOperators.LSHL, 20)
              .or(LongVector.fromArray(L, c1, e).lanewise(VectorOperators.LSHR, 12));
      LongVector u =
          bits.or(WHOLE).reinterpretAsDoubles().sub(0x1p52).add(0.5).mul(0x1p-52)
              .reinterpretAsLongs();
      LongVector fraction = u.and(BoxMuller.FRACTION);
      // 1 if the mantissa is to be halved, without masks, which are objects more often
      LongVector halve =
          LongVector.broadcast(L, BoxMuller.SQRT2_FRACTION).sub(fraction)
              .lanewise(VectorOperators.LSHR, 63);
      fraction
          .or(LongVector.broadcast(L, BoxMuller.ONE).sub(halve.lanewise(VectorOperators.LSHL, 52)))
          .reinterpretAsDoubles().intoArray(mantissa, e);
      u.lanewise(VectorOperators.LSHR, 52).add(halve).or(WHOLE).reinterpretAsDoubles()
          .sub(0x1p52 + 1023).intoArray(exponent, e);
    }
  }

  private static void reduceAngle(
      int count, long[] c2, long[] c3, double[] angle, double[] quarterCos, double[] quarterSin) {
    for (int e = 0; e < count; e += WIDTH) {
      LongVector centred =
          LongVector.fromArray(L, c2, e)
              .lanewise(VectorOperators.LSHL, 20)
              .or(LongVector.fromArray(L, c3, e).lanewise(VectorOperators.LSHR, 12))
              .add(1L << 49);
      centred.and((1L << 50) - 1).or(WHOLE).reinterpretAsDoubles().sub(0x1p52).sub(0x1p49)
          .mul(2 * Math.PI * 0x1p-52).intoArray(angle, e);
      LongVector quarter = centred.lanewise(VectorOperators.LSHR, 50);
      LongVector odd = quarter.and(1);
      LongVector one = quarter.and(2).lanewise(VectorOperators.LSHL, 62).or(BoxMuller.ONE);
      one.and(odd.sub(1)).reinterpretAsDoubles().intoArray(quarterCos, e);
      one.and(LongVector.zero(L).sub(odd)).reinterpretAsDoubles().intoArray(quarterSin, e);
    }
  }

  private static void radius(int count, double[] mantissa, double[] exponent, double[] out) {
    for (int e = 0; e < count; e += WIDTH) {
      DoubleVector m = DoubleVector.fromArray(D, mantissa, e);
      DoubleVector t = m.sub(1).div(m.add(1));
      DoubleVector q = t.mul(t);
      DoubleVector series =
          q.mul(1.0 / 21).add(1.0 / 19).mul(q).add(1.0 / 17).mul(q).add(1.0 / 15).mul(q)
              .add(1.0 / 13).mul(q).add(1.0 / 11).mul(q).add(1.0 / 9).mul(q).add(1.0 / 7).mul(q)
              .add(1.0 / 5).mul(q).add(1.0 / 3).mul(q).add(1);
      DoubleVector x = DoubleVector.fromArray(D, exponent, e);
      DoubleVector log =
          x.mul(BoxMuller.LN2_HIGH).add(x.mul(BoxMuller.LN2_LOW).add(t.mul(2).mul(series)));
      log.mul(-2).sqrt().intoArray(out, e);
    }
  }

  private static void pairs(
      int count, int first, BoxMuller.Scratch s, double[] outRe, double[] outIm) {
    for (int e = 0; e < count; e += WIDTH) {
      DoubleVector x = DoubleVector.fromArray(D, s.angle, e);
      DoubleVector q = x.mul(x);
      DoubleVector sine =
          q.mul(BoxMuller.S17).add(BoxMuller.S15).mul(q).add(BoxMuller.S13).mul(q)
              .add(BoxMuller.S11).mul(q).add(BoxMuller.S9).mul(q).add(BoxMuller.S7).mul(q)
              .add(BoxMuller.S5).mul(q).add(BoxMuller.S3).mul(q).add(1).mul(x);
      DoubleVector cosine =
          q.mul(BoxMuller.C16).add(BoxMuller.C14).mul(q).add(BoxMuller.C12).mul(q)
              .add(BoxMuller.C10).mul(q).add(BoxMuller.C8).mul(q).add(BoxMuller.C6).mul(q)
              .add(BoxMuller.C4).mul(q).add(BoxMuller.C2).mul(q).add(1);
      DoubleVector radius = DoubleVector.fromArray(D, s.radius, e);
      DoubleVector qc = DoubleVector.fromArray(D, s.quarterCos, e);
      DoubleVector qs = DoubleVector.fromArray(D, s.quarterSin, e);
      radius.mul(cosine.mul(qc).sub(sine.mul(qs))).intoArray(outRe, first + e);
      radius.mul(sine.mul(qc).add(cosine.mul(qs))).intoArray(outIm, first + e);
    }
  }
}
