package spgpe.output;

import java.util.function.IntToDoubleFunction;
import spgpe.internal.check.Check;

/**
 * Table of colours for numbers between 0 and 1. Immutable and thread-safe.
 *
 * <p>{@link #sequential()} runs from near-black blue over magenta and orange to pale yellow with
 * equal steps of CIELAB lightness, and colour differences between neighbours that vary by less than
 * 10 percent: equal differences of the field look equal, and a grey print keeps the order.
 */
public final class ColourMap {
  private static final int ENTRIES = 256;

  private final int[] table;
  private final int missing;

  private ColourMap(int[] table, int missing) {
    this.table = table;
    this.missing = missing;
  }

  /**
   * Perceptually uniform map from dark to light that reads in grey. Computed in CIELAB (illuminant
   * D65) along lightness 8 + 87 t, hue 290&#176; + 160&#176; t, chroma 49 sin(pi (0.12 + 0.76 t)),
   * which stays inside sRGB.
   *
   * @return the map with 256 colours; missing values are drawn in mid green
   */
  public static ColourMap sequential() {
    return new ColourMap(
        lab(
            i -> 8 + 87 * position(i),
            i -> 49 * Math.sin(Math.PI * (0.12 + 0.76 * position(i))),
            i -> Math.toRadians(290 + 160 * position(i))),
        0x3c9d5a);
  }

  /**
   * Map from black to white with equal steps of CIELAB lightness.
   *
   * @return the map with 256 colours; missing values are drawn in red
   */
  public static ColourMap grey() {
    return new ColourMap(lab(i -> 100 * position(i), i -> 0, i -> 0), 0xcc3333);
  }

  /**
   * Map from the caller's own table.
   *
   * @param table colours 0xRRGGBB from the lowest to the highest value, at least two; copied
   * @param missing colour 0xRRGGBB of missing values (NaN)
   * @return the map
   * @throws IllegalArgumentException if the table is null, has fewer than two colours, or a colour
   *     lies outside 0x000000 to 0xFFFFFF
   */
  public static ColourMap ofTable(int[] table, int missing) {
    Check.notNull(table, "table");
    Check.argument(
        table.length >= 2, "a colour table needs at least two colours: length=%s", table.length);
    for (int colour : table) {
      Check.inRange(colour, 0, 0xffffff, "colour");
    }
    Check.inRange(missing, 0, 0xffffff, "missing");
    return new ColourMap(table.clone(), missing);
  }

  /**
   * Colour of a number: the table entry nearest below, ends included.
   *
   * @param fraction number; below 0 counts as 0, above 1 as 1, NaN as missing
   * @return colour 0xRRGGBB
   */
  public int colour(double fraction) {
    if (Double.isNaN(fraction)) {
      return missing;
    }
    double index = Math.floor(fraction * table.length);
    return table[(int) Math.max(0, Math.min(table.length - 1, index))];
  }

  private static double position(int entry) {
    return entry / (ENTRIES - 1.0);
  }

  private static int[] lab(
      IntToDoubleFunction lightness, IntToDoubleFunction chroma, IntToDoubleFunction hue) {
    int[] colours = new int[ENTRIES];
    for (int i = 0; i < ENTRIES; i++) {
      double c = chroma.applyAsDouble(i);
      double h = hue.applyAsDouble(i);
      colours[i] = rgb(lightness.applyAsDouble(i), c * Math.cos(h), c * Math.sin(h));
    }
    return colours;
  }

  // CIE 15 (CIELAB, D65 white point) and IEC 61966-2-1 (sRGB matrix and transfer function).
  private static int rgb(double lightness, double a, double b) {
    double fy = (lightness + 16) / 116;
    double x = 0.95047 * cube(fy + a / 500);
    double y = cube(fy);
    double z = 1.08883 * cube(fy - b / 200);
    int red = channel(3.2404542 * x - 1.5371385 * y - 0.4985314 * z);
    int green = channel(-0.9692660 * x + 1.8760108 * y + 0.0415560 * z);
    int blue = channel(0.0556434 * x - 0.2040259 * y + 1.0572252 * z);
    return red << 16 | green << 8 | blue;
  }

  private static double cube(double f) {
    double knee = 6.0 / 29;
    return f > knee ? f * f * f : 3 * knee * knee * (f - 4.0 / 29);
  }

  private static int channel(double linear) {
    double value = linear <= 0.0031308 ? 12.92 * linear : 1.055 * Math.pow(linear, 1 / 2.4) - 0.055;
    return (int) Math.round(255 * Math.max(0, Math.min(1, value)));
  }
}
