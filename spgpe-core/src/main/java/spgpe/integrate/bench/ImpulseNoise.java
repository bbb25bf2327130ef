package spgpe.integrate.bench;

import java.util.ArrayList;
import java.util.List;
import spgpe.projector.Amplitudes;
import spgpe.reservoir.NoiseGenerator;

/**
 * Noise that is zero except for one number, to find the response of a linear scheme; remembers what
 * was asked for.
 */
final class ImpulseNoise implements NoiseGenerator {
  record Draw(long step, int use) {}

  private final List<Draw> draws = new ArrayList<>();
  private int chosenDraw = -1;
  private boolean imaginary;

  void silence() {
    chosenDraw = -1;
  }

  /** A one in place of one part of the number of mode 0 in one of the remembered draws. */
  void strike(int draw, boolean imaginaryPart) {
    chosenDraw = draw;
    imaginary = imaginaryPart;
  }

  int draws() {
    return draws.size();
  }

  @Override
  public void assign(int lane, long trajectory) {}

  @Override
  public void fill(long step, int use, Amplitudes normals) {
    normals.clear();
    Draw draw = new Draw(step, use);
    int index = draws.indexOf(draw);
    if (index < 0) {
      index = draws.size();
      draws.add(draw);
    }
    if (index == chosenDraw) {
      int mode = normals.region().indexOf(0);
      (imaginary ? normals.im(0) : normals.re(0))[mode] = 1;
    }
  }
}
