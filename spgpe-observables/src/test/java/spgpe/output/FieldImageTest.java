package spgpe.output;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.image.BufferedImage;
import java.io.IOException;
import java.nio.file.Path;
import javax.imageio.ImageIO;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class FieldImageTest {
  private static final ColourMap FOUR =
      ColourMap.ofTable(new int[] {0x000001, 0x000002, 0x000003, 0x000004}, 0xff0000);

  @TempDir private Path folder;

  @Test
  void pictureReadsBackCellByCell() throws IOException {
    Path path = folder.resolve("map.png");
    double[] values = {0, 1, 2, 3, 4, Double.NaN};
    FieldImage.of(values, 2, 3).withColours(FOUR).withCell(2).writePng(path);
    BufferedImage read = ImageIO.read(path.toFile());
    assertEquals(6, read.getWidth());
    assertEquals(4, read.getHeight());
    int[][] expected = {{1, 2, 3}, {4, 4, 0xff0000}};
    for (int y = 0; y < 4; y++) {
      for (int x = 0; x < 6; x++) {
        assertEquals(expected[y / 2][x / 2], read.getRGB(x, y) & 0xffffff);
      }
    }
    assertEquals(1, folder.toFile().list().length);
  }

  @Test
  void rangeClampsAndFirstRowMayBeAtTheBottom() {
    double[] values = {-10, Double.POSITIVE_INFINITY, .49, .5};
    FieldImage image =
        FieldImage.of(values, 2, 2).withColours(FOUR).withRange(0, 1).withFirstRowAtBottom();
    BufferedImage drawn = image.toImage();
    assertEquals(1, drawn.getRGB(0, 1) & 0xff);
    assertEquals(4, drawn.getRGB(1, 1) & 0xff);
    assertEquals(2, drawn.getRGB(0, 0) & 0xff);
    assertEquals(3, drawn.getRGB(1, 0) & 0xff);
    assertEquals(0, image.low());
    assertEquals(1, image.high());
  }

  @Test
  void constantAndHugeFields() {
    FieldImage constant = FieldImage.of(new double[] {5, 5}, 1, 2).withColours(FOUR);
    assertEquals(1, constant.toImage().getRGB(0, 0) & 0xff);
    double[] huge = {-Double.MAX_VALUE, Double.MAX_VALUE};
    BufferedImage drawn = FieldImage.of(huge, 1, 2).withColours(FOUR).toImage();
    assertEquals(1, drawn.getRGB(0, 0) & 0xff);
    assertEquals(4, drawn.getRGB(1, 0) & 0xff);
  }

  /**
   * Lightness recomputed from the stored bytes (IEC 61966-2-1 and CIE 15): 255 steps from 8 to 95
   * of .341 each; rounding to bytes moves a lightness by less than .3. Neighbours differ by .58 to
   * .64 in CIELAB, ten entries apart by 5.8 to 6.4; rounding widens that to 5.4 to 7.0.
   */
  @Test
  void sequentialMapIsUniformAndReadsInGrey() {
    double[][] lab = lab(ColourMap.sequential());
    for (int i = 0; i < 256; i++) {
      assertEquals(8 + 87 * i / 255.0, lab[i][0], .3);
    }
    for (int i = 10; i < 256; i++) {
      double distance = 0;
      for (int k = 0; k < 3; k++) {
        distance += Math.pow(lab[i][k] - lab[i - 10][k], 2);
      }
      assertEquals(6.1, Math.sqrt(distance), .9);
    }
    double[][] grey = lab(ColourMap.grey());
    for (int i = 0; i < 256; i++) {
      assertEquals(100 * i / 255.0, grey[i][0], .3);
      assertEquals(0, grey[i][1], .02);
    }
    assertNotEquals(ColourMap.grey().colour(Double.NaN), ColourMap.grey().colour(.5));
  }

  private static double[][] lab(ColourMap map) {
    double[][] result = new double[256][];
    for (int i = 0; i < 256; i++) {
      int colour = map.colour((i + .5) / 256);
      double r = linear(colour >> 16);
      double g = linear(colour >> 8 & 0xff);
      double b = linear(colour & 0xff);
      double x = f((.4124564 * r + .3575761 * g + .1804375 * b) / .95047);
      double y = f(.2126729 * r + .7151522 * g + .0721750 * b);
      double z = f((.0193339 * r + .1191920 * g + .9503041 * b) / 1.08883);
      result[i] = new double[] {116 * y - 16, 500 * (x - y), 200 * (y - z)};
    }
    return result;
  }

  private static double linear(int channel) {
    double value = channel / 255.0;
    return value <= .04045 ? value / 12.92 : Math.pow((value + .055) / 1.055, 2.4);
  }

  private static double f(double t) {
    return t > 216.0 / 24389 ? Math.cbrt(t) : (24389.0 / 27 * t + 16) / 116;
  }

  @Test
  void badInputIsRefusedWithTheReason() {
    double[] four = {1, 2, 3, 4};
    Failures.assertRefused(() -> FieldImage.of(four, 3, 2), "rows=3", "values.length=4");
    Failures.assertRefused(() -> FieldImage.of(four, 0, 4), "rows=0");
    Failures.assertRefused(
        () -> FieldImage.of(new double[] {Double.NaN}, 1, 1), "no finite number");
    FieldImage image = FieldImage.of(four, 2, 2);
    Failures.assertRefused(() -> image.withRange(1, 1), "low=1.0");
    Failures.assertRefused(() -> image.withRange(Double.NaN, 1), "low=NaN");
    Failures.assertRefused(() -> image.withCell(0), "pixels=0");
    Failures.assertRefused(() -> image.withCell(100_000), "cell=100000");
    Failures.assertRefused(() -> ColourMap.ofTable(new int[1], 0), "length=1");
    Failures.assertRefused(() -> ColourMap.ofTable(new int[] {0, 1 << 24}, 0), "colour=16777216");
    assertTrue(image.toImage().getWidth() == 2);
  }
}
