package spgpe.examples.plot;

import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.Font;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.geom.Rectangle2D;
import java.awt.image.BufferedImage;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.text.DecimalFormat;
import java.text.DecimalFormatSymbols;
import java.util.List;
import java.util.Locale;
import javax.imageio.ImageIO;
import org.jfree.chart.JFreeChart;
import org.jfree.chart.annotations.XYDataImageAnnotation;
import org.jfree.chart.axis.LogAxis;
import org.jfree.chart.axis.NumberAxis;
import org.jfree.chart.axis.NumberTickUnit;
import org.jfree.chart.axis.ValueAxis;
import org.jfree.chart.plot.XYPlot;
import org.jfree.chart.renderer.LookupPaintScale;
import org.jfree.chart.renderer.xy.XYLineAndShapeRenderer;
import org.jfree.chart.title.PaintScaleLegend;
import org.jfree.chart.ui.RectangleEdge;
import org.jfree.data.xy.XYSeriesCollection;
import spgpe.output.ColourMap;
import spgpe.output.FieldImage;

/** The common look of the figures: white ground, dark text, series told apart by shade and dash. */
public final class Charts {
  private static final Font TEXT = new Font(Font.SANS_SERIF, Font.PLAIN, 14);

  private Charts() {}

  /**
   * Line colour of a series; from dark to light, so that they differ in grey as well.
   *
   * @param index index of the series
   * @return colour
   */
  public static Color colour(int index) {
    Color[] colours = {
      new Color(0x1b2a6b), new Color(0xa8324a), new Color(0xd9902f), new Color(0x5aa36a)
    };
    return colours[index % colours.length];
  }

  /**
   * Line stroke of a series.
   *
   * @param index index of the series
   * @return stroke
   */
  public static BasicStroke stroke(int index) {
    float[][] dashes = {{1, 0}, {8, 4}, {2, 3}, {8, 3, 2, 3}};
    return new BasicStroke(
        2, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND, 1, dashes[index % dashes.length], 0);
  }

  /**
   * A linear axis that need not include zero.
   *
   * @param label quantity and unit
   * @return the axis
   */
  public static NumberAxis linear(String label) {
    NumberAxis axis = new NumberAxis(label);
    axis.setAutoRangeIncludesZero(false);
    return styled(axis);
  }

  /**
   * A decade axis.
   *
   * @param label quantity and unit
   * @return the axis
   */
  public static LogAxis decades(String label) {
    LogAxis axis = new LogAxis(label);
    axis.setBase(10);
    axis.setTickUnit(new NumberTickUnit(1));
    axis.setMinorTickMarksVisible(true);
    axis.setMinorTickCount(9);
    axis.setNumberFormatOverride(
        new DecimalFormat("0.######", DecimalFormatSymbols.getInstance(Locale.ROOT)));
    return styled(axis);
  }

  private static <A extends ValueAxis> A styled(A axis) {
    axis.setLabelFont(TEXT);
    axis.setTickLabelFont(TEXT.deriveFont(12f));
    return axis;
  }

  /**
   * Finishes a chart.
   *
   * @param title one line
   * @param plot the plot
   * @param legend whether to show a legend
   * @return the chart
   */
  public static JFreeChart chart(String title, XYPlot plot, boolean legend) {
    plot.setBackgroundPaint(Color.WHITE);
    plot.setDomainGridlinePaint(new Color(0xd8d8d8));
    plot.setRangeGridlinePaint(new Color(0xd8d8d8));
    JFreeChart chart = new JFreeChart(title, TEXT.deriveFont(Font.BOLD, 15f), plot, legend);
    chart.setBackgroundPaint(Color.WHITE);
    if (legend) {
      chart.getLegend().setItemFont(TEXT.deriveFont(12f));
    }
    return chart;
  }

  /**
   * An axis with its range.
   *
   * @param label quantity and unit
   * @param low lower end
   * @param high upper end
   */
  public record Axis(String label, double low, double high) {}

  /**
   * A map of a field in the library's sequential colours, from dark to light, with a colour bar.
   *
   * @param title one line
   * @param field the picture, with the range of the colour axis
   * @param x horizontal axis
   * @param y vertical axis
   * @param colours axis of the colours
   * @return the chart
   */
  public static JFreeChart map(String title, FieldImage field, Axis x, Axis y, Axis colours) {
    XYPlot plot =
        new XYPlot(
            new XYSeriesCollection(), linear(x.label()), linear(y.label()),
            new XYLineAndShapeRenderer());
    plot.getDomainAxis().setRange(x.low(), x.high());
    plot.getRangeAxis().setRange(y.low(), y.high());
    plot.addAnnotation(
        new XYDataImageAnnotation(
            field.toImage(), x.low(), y.low(), x.high() - x.low(), y.high() - y.low()));
    JFreeChart chart = chart(title, plot, false);
    chart.addSubtitle(colourBar(colours));
    return chart;
  }

  private static PaintScaleLegend colourBar(Axis colours) {
    ColourMap map = ColourMap.sequential();
    LookupPaintScale scale = new LookupPaintScale(colours.low(), colours.high(), Color.GRAY);
    for (int i = 0; i < 256; i++) {
      scale.add(
          colours.low() + (colours.high() - colours.low()) * i / 256,
          new Color(map.colour((i + 0.5) / 256)));
    }
    PaintScaleLegend legend = new PaintScaleLegend(scale, linear(colours.label()));
    legend.setPosition(RectangleEdge.BOTTOM);
    legend.setSubdivisionCount(256);
    legend.setStripWidth(14);
    legend.setPadding(4, 60, 4, 20);
    return legend;
  }

  /**
   * Writes charts side by side into one PNG file; the file appears whole or not at all.
   *
   * @param file target
   * @param charts charts from left to right
   * @param width width of each, pixels
   * @param height height, pixels
   * @throws UncheckedIOException if the file cannot be written
   */
  public static void write(Path file, List<JFreeChart> charts, int width, int height) {
    BufferedImage image =
        new BufferedImage(width * charts.size(), height, BufferedImage.TYPE_INT_RGB);
    Graphics2D graphics = image.createGraphics();
    graphics.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
    for (int i = 0; i < charts.size(); i++) {
      charts.get(i).draw(graphics, new Rectangle2D.Double(i * (double) width, 0, width, height));
    }
    graphics.dispose();
    try {
      Path part = Files.createTempFile(file.toAbsolutePath().getParent(), "figure", ".part");
      try {
        ImageIO.write(image, "png", part.toFile());
        Files.move(part, file, StandardCopyOption.REPLACE_EXISTING);
      } finally {
        Files.deleteIfExists(part);
      }
    } catch (IOException e) {
      throw new UncheckedIOException("cannot write figure " + file + ": " + e.getMessage(), e);
    }
  }
}
