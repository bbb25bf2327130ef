package spgpe.theory;

/**
 * Transfer operator of two coupled components in the sector of total angular momentum M, on
 * products of single-component radial eigenstates {@code |k1, m> |k2, M - m>}.
 *
 * <p>A vector is a sequence of K x K blocks (rows k1, columns k2), one per m. Exchange of the
 * components maps the block range onto itself.
 */
final class PairOperator {
  private final RadialStates radial;
  private final int states;
  private final int total;
  private final int lowest;
  private final int blocks;
  private final double hopOne;
  private final double hopTwo;
  private final double shift;

  /**
   * Sets up the operator.
   *
   * @param radial single-component states
   * @param total total angular momentum, not negative
   * @param halfWidth blocks kept on each side of the centre
   * @param coherent J/(g T)^(2/3)
   * @param biquadratic kappa/g
   * @param shift alpha of the radial states minus alpha of the problem
   */
  PairOperator(
      RadialStates radial,
      int total,
      int halfWidth,
      double coherent,
      double biquadratic,
      double shift) {
    this.radial = radial;
    this.states = radial.states;
    this.total = total;
    int centre = total / 2;
    lowest = centre - halfWidth + (total % 2);
    blocks = 2 * halfWidth + 1 - (total % 2);
    hopOne = coherent;
    hopTwo = biquadratic;
    this.shift = shift;
  }

  /** Largest |m| that a sector of this size touches, with one spare for raised states. */
  static int momentaNeeded(int total, int halfWidth) {
    return halfWidth + total / 2 + total % 2 + 1;
  }

  int dimension() {
    return blocks * states * states;
  }

  /** Product state of the lowest radial states with weights falling from the centre. */
  double[] start(boolean odd) {
    double[] x = new double[dimension()];
    double middle = 0.5 * total;
    for (int b = 0; b < blocks; b++) {
      double distance = lowest + b - middle;
      for (int k = 0; k < states; k++) {
        for (int l = 0; l < states; l++) {
          double even = Math.exp(-0.1 * distance * distance - k - l);
          // Odd partner: antisymmetric under exchange, i.e. under (distance, k, l) to (-, l, k).
          x[index(b, k, l)] = odd ? even * (0.3 * (k - l) + 0.7 * distance) : even;
        }
      }
    }
    return x;
  }

  private int index(int block, int k, int l) {
    return (block * states + k) * states + l;
  }

  /** H x. */
  double[] apply(double[] x) {
    double[] y = new double[x.length];
    double[] work = new double[states * states];
    for (int b = 0; b < blocks; b++) {
      int m1 = lowest + b;
      double[] e1 = radial.energy[Math.abs(m1)];
      double[] e2 = radial.energy[Math.abs(total - m1)];
      for (int k = 0; k < states; k++) {
        for (int l = 0; l < states; l++) {
          int i = index(b, k, l);
          y[i] += (e1[k] + e2[l]) * x[i];
        }
      }
      if (shift != 0) {
        double[] left = radial.square[Math.abs(m1)];
        double[] right = radial.square[Math.abs(total - m1)];
        addBlock(left, false, x, b, null, false, y, b, shift, work);
        addBlock(null, false, x, b, right, true, y, b, shift, work);
      }
    }
    addDensityProduct(x, y, 0.5 * hopTwo, work);
    addHop(x, y, 1, -hopOne, -hopOne, work);
    addHop(x, y, 2, -0.25 * hopTwo, -0.25 * hopTwo, work);
    return y;
  }

  /** Re(s1^* s2) x. */
  double[] coherence(double[] x) {
    double[] y = new double[x.length];
    addHop(x, y, 1, 0.5, 0.5, new double[states * states]);
    return y;
  }

  /** i S_y x = (s1^* s2 - c.c.) x, real and antisymmetric. */
  double[] imaginaryCoherence(double[] x) {
    double[] y = new double[x.length];
    addHop(x, y, 1, 1, -1, new double[states * states]);
    return y;
  }

  /** (|s1|^2 - |s2|^2) x. */
  double[] imbalance(double[] x) {
    double[] y = new double[x.length];
    double[] work = new double[states * states];
    for (int b = 0; b < blocks; b++) {
      int m1 = lowest + b;
      addBlock(radial.square[Math.abs(m1)], false, x, b, null, false, y, b, 1, work);
      addBlock(null, false, x, b, radial.square[Math.abs(total - m1)], true, y, b, -1, work);
    }
    return y;
  }

  /** Adds factor |s1|^2 |s2|^2 x to y. */
  double[] densityProduct(double[] x) {
    double[] y = new double[x.length];
    addDensityProduct(x, y, 1, new double[states * states]);
    return y;
  }

  /** (|s1|^2 + |s2|^2) x /2 or, with fourth powers, (|s1|^4 + |s2|^4) x /2. */
  double[] meanPower(double[] x, boolean fourth) {
    double[] y = new double[x.length];
    double[] work = new double[states * states];
    double[][] power = fourth ? radial.fourth : radial.square;
    for (int b = 0; b < blocks; b++) {
      int m1 = lowest + b;
      addBlock(power[Math.abs(m1)], false, x, b, null, false, y, b, 0.5, work);
      addBlock(null, false, x, b, power[Math.abs(total - m1)], true, y, b, 0.5, work);
    }
    return y;
  }

  /** s1 x as a vector of the sector M+1 described by {@code target}. */
  double[] raiseFirst(double[] x, PairOperator target) {
    double[] y = new double[target.dimension()];
    double[] work = new double[states * states];
    for (int b = 0; b < blocks; b++) {
      int m1 = lowest + b;
      int to = m1 + 1 - target.lowest;
      if (to >= 0 && to < target.blocks) {
        double[] up = m1 >= 0 ? radial.raiseOne[m1] : radial.raiseOne[-m1 - 1];
        addBlock(up, m1 < 0, x, b, null, false, y, to, 1, work);
      }
    }
    return y;
  }

  /** Projects x on the even (+) or odd (-) class under exchange of the components. */
  void symmetrise(double[] x, int sign) {
    for (int b = 0; b < blocks; b++) {
      int mirror = blocks - 1 - b;
      for (int k = 0; k < states; k++) {
        for (int l = 0; l < states; l++) {
          int i = index(b, k, l);
          int j = index(mirror, l, k);
          if (i <= j) {
            double mean = 0.5 * (x[i] + sign * x[j]);
            x[i] = mean;
            x[j] = sign * mean;
          }
        }
      }
    }
  }

  private void addDensityProduct(double[] x, double[] y, double factor, double[] work) {
    if (factor == 0) {
      return;
    }
    for (int b = 0; b < blocks; b++) {
      int m1 = lowest + b;
      double[] left = radial.square[Math.abs(m1)];
      double[] right = radial.square[Math.abs(total - m1)];
      addBlock(left, false, x, b, right, true, y, b, factor, work);
    }
  }

  /**
   * Adds {@code down (s1^*)^step s2^step x + up s1^step (s2^*)^step x}.
   */
  private void addHop(
      double[] x, double[] y, int step, double down, double up, double[] work) {
    if (down == 0 && up == 0) {
      return;
    }
    for (int b = step; b < blocks; b++) {
      int from1 = lowest + b - step;
      int from2 = total - lowest - b;
      // s1^step takes from1 to from1 + step; s2^step takes from2 to from2 + step.
      double[] raise1 = raise(from1, step);
      boolean flip1 = raisingIsTransposed(from1, step);
      double[] raise2 = raise(from2, step);
      boolean flip2 = raisingIsTransposed(from2, step);
      addBlock(raise1, !flip1, x, b, raise2, !flip2, y, b - step, down, work);
      addBlock(raise1, flip1, x, b - step, raise2, flip2, y, b, up, work);
    }
  }

  private double[] raise(int from, int step) {
    if (step == 1) {
      return from >= 0 ? radial.raiseOne[from] : radial.raiseOne[-from - 1];
    }
    if (from == -1) {
      return radial.square[1];
    }
    return from >= 0 ? radial.raiseTwo[from] : radial.raiseTwo[-from - 2];
  }

  private static boolean raisingIsTransposed(int from, int step) {
    return step == 1 ? from < 0 : from < -1;
  }

  /**
   * y[to] += factor A x[from] B, where A is {@code left} (transposed if flagged) or one if null and
   * B is {@code right} as stored or transposed, or one if null. Flag of the right matrix: true
   * means the matrix R acts on k2, i.e. B = R^T; false means B = R.
   */
  private void addBlock(
      double @org.jspecify.annotations.Nullable [] left,
      boolean leftTransposed,
      double[] x,
      int from,
      double @org.jspecify.annotations.Nullable [] right,
      boolean rightActs,
      double[] y,
      int to,
      double factor,
      double[] work) {
    int n = states;
    int offset = from * n * n;
    if (left == null) {
      System.arraycopy(x, offset, work, 0, n * n);
    } else {
      java.util.Arrays.fill(work, 0);
      for (int i = 0; i < n; i++) {
        for (int k = 0; k < n; k++) {
          double a = leftTransposed ? left[k * n + i] : left[i * n + k];
          for (int l = 0; l < n; l++) {
            work[i * n + l] += a * x[offset + k * n + l];
          }
        }
      }
    }
    int target = to * n * n;
    for (int i = 0; i < n; i++) {
      for (int l = 0; l < n; l++) {
        double w = factor * work[i * n + l];
        if (right == null) {
          y[target + i * n + l] += w;
        } else if (rightActs) {
          for (int j = 0; j < n; j++) {
            y[target + i * n + j] += w * right[j * n + l];
          }
        } else {
          for (int j = 0; j < n; j++) {
            y[target + i * n + j] += w * right[l * n + j];
          }
        }
      }
    }
  }
}
