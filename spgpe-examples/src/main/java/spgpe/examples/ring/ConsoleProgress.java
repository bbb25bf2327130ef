package spgpe.examples.ring;

import java.io.PrintStream;
import java.util.Locale;
import spgpe.run.Progress;
import spgpe.run.ProgressListener;

/** Progress on the error stream: a bar on a terminal, a line for each quarter otherwise. */
final class ConsoleProgress implements ProgressListener {
  private static final int WIDTH = 40;

  private final PrintStream out;
  private final String label;
  private final boolean terminal;
  private int shown = -1;

  ConsoleProgress(PrintStream out, String label, boolean terminal) {
    this.out = out;
    this.label = label;
    this.terminal = terminal;
  }

  @Override
  public void progressed(Progress progress) {
    int steps = terminal ? WIDTH : 4;
    int done = (int) (steps * progress.ended() / progress.total());
    boolean last = progress.ended() == progress.total();
    if (done == shown) {
      return;
    }
    shown = done;
    String state =
        String.format(
            Locale.ROOT, "%s: %d of %d trajectories, %d decayed",
            label, progress.ended(), progress.total(), progress.stopped());
    if (terminal) {
      out.print("\r[" + "#".repeat(done) + ".".repeat(WIDTH - done) + "] " + state);
      if (last) {
        out.println();
      }
    } else if (done > 0) {
      out.println(state);
    }
    out.flush();
  }
}
